import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { FindingMark } from '../findings/finding-mark';

/** Whether the work is with the server. */
export type SaveStateView =
  | { readonly kind: 'saved' }
  | { readonly kind: 'saving'; readonly count: number }
  | { readonly kind: 'refused'; readonly problem: { readonly title: string; readonly detail?: string } };

@Component({
  selector: 'lw-save-state',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-live': 'polite' },
  styles: ':host { display: inline-flex; align-items: center; gap: 5px; font: var(--mat-sys-body-small); white-space: nowrap; } .bad { color: var(--mat-sys-error); font-weight: 500; }',
  template: `
    @let s = state();
    @switch (s.kind) {
      @case ('saved') { <span class="quiet">All saved</span> }
      @case ('saving') { <span class="quiet">Saving</span> }
      @case ('refused') { <lw-finding-mark kind="error" /><span class="bad">Not saved</span> }
    }`,
})
export class SaveStateLine {
  readonly state = input.required<SaveStateView>();
}
