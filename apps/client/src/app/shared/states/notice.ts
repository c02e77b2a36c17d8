import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { FindingMark, type FindingMarkKind } from '../findings/finding-mark';

/** A hairline frame with its mark in the margin. Words go in; buttons marked `acts` stand at its right. */
@Component({
  selector: 'lw-notice',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[attr.role]': "kind() === 'error' ? 'alert' : 'status'" },
  styles: ':host { display: block; }',
  template: `
    <div class="banner {{ kind() }}">
      <lw-finding-mark [kind]="kind()" [size]="16" />
      <div class="says"><ng-content /></div>
      <div class="acts"><ng-content select="[acts]" /></div>
    </div>`,
})
export class Notice {
  readonly kind = input<FindingMarkKind>('note');
}
