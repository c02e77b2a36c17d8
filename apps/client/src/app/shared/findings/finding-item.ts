import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Finding } from '#calc';
import { FindingMark } from './finding-mark';

/** A finding in full: what was compared, why it matters, what mends it, its source. */
@Component({
  selector: 'lw-finding-item',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'finding' },
  styles: ':host { white-space: normal; } .src { color: var(--mat-sys-on-surface-variant); }',
  template: `
    <lw-finding-mark [kind]="finding().severity" />
    <div>
      <b>{{ finding().title }}.</b>&ngsp;
      @if (finding().detail; as detail) { {{ detail }}&ngsp; }
      <span class="mend">{{ finding().remedy }}</span>&ngsp;
      <span class="code">{{ finding().code }}</span>&ngsp;
      @if (source()) { <span class="src tiny">{{ finding().source }}</span> }
    </div>`,
})
export class FindingItem {
  readonly finding = input.required<Finding>();
  readonly source = input(false);
}
