import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { FindingItem } from '../../shared/findings/finding-item';
import { HardwareViewStore } from '../hardware-view-store';

/** What the checks found about a row, under that row, with the edit that mends it where one is known. */
@Component({
  selector: 'lw-found-list',
  imports: [FindingItem, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: grid; gap: 8px; } button { margin: 6px 0 0 24px; }',
  template: `
    @for (finding of findings(); track finding.key) {
      <div>
        <lw-finding-item [finding]="finding" />
        @if (view.mendOf(finding); as mend) { <button matButton="outlined" type="button" (click)="view.mend(mend)">{{ mend.label }}</button> }
      </div>
    }`,
})
export class FoundList {
  /** Id of the row that they are about; a group's is its key. */
  readonly subject = input.required<string>();
  protected readonly view = inject(HardwareViewStore);
  protected readonly findings = computed(() => this.view.findingsOf(this.subject()));
}
