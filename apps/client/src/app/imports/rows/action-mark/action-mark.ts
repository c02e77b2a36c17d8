import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { ImportRow } from '#contract';
import { FindingMark } from '../../../shared/findings/finding-mark';

/** What a row does, as a shape: a plus in a box, a delta, a double line, an octagon, a dash. The word stands beside it. */
@Component({
  selector: 'lw-action-mark',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
  styles: ':host { display: inline-flex; flex: none; width: 14px; } .slate { stroke: var(--mat-sys-primary); } .quiet-line { stroke: var(--mat-sys-on-surface-variant); }',
  template: `
    @switch (action()) {
      @case ('update') { <lw-finding-mark kind="changed" /> }
      @case ('hold') { <lw-finding-mark kind="error" /> }
      @case ('create') {
        <svg width="14" height="14" viewBox="0 0 14 14" fill="none"><path class="slate" stroke-width="1.5" d="M.75 .75h12.5v12.5H.75z" /><path class="slate" stroke-width="1.6" d="M7 3.8v6.4M3.8 7h6.4" /></svg>
      }
      @case ('same') { <svg width="14" height="14" viewBox="0 0 14 14" fill="none"><path class="quiet-line" stroke-width="1.5" d="M2.5 5h9M2.5 9h9" /></svg> }
      @case ('skip') { <svg width="14" height="14" viewBox="0 0 14 14" fill="none"><path class="quiet-line" stroke-width="1.5" d="M4 7h6" /></svg> }
    }`,
})
export class ActionMark {
  readonly action = input.required<ImportRow['action']>();
}

/** The word beside the mark. */
export const ACTION_WORDS: Readonly<Record<ImportRow['action'], string>> = {
  create: 'New', update: 'Update', same: 'Same', hold: 'Held back', skip: 'Skipped',
};
