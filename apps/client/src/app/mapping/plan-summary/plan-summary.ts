import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { FindingMark } from '../../shared/findings/finding-mark';
import { BoardStore } from '../board-store';
import { isOver } from '../moves/load-after';
import { MoveStore } from '../moves/move-store';
import { loadsWords, planWords } from '../moves/plan-words';

/** What would come of the move that a form prepares. Read aloud when it changes. */
@Component({
  selector: 'lw-plan-summary',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-live': 'polite' },
  styles: `
    :host { display: block; min-height: 60px; padding: 8px 12px; border: 1px solid var(--lw-rule); font: var(--mat-sys-body-small); }
    lw-finding-mark { display: inline-block; vertical-align: -2px; margin-right: 4px; }`,
  template: `
    @if (words(); as words) {
      <p [class.c-error]="refused()">@if (refused()) { <lw-finding-mark kind="error" /> }{{ words }}</p>
      @for (line of loads(); track line) { <p class="quiet">{{ line }}</p> }
      @if (over()) { <p class="c-error"><lw-finding-mark kind="error" />More than the rating allows.</p> }
    } @else { <p class="quiet">Choose where it goes; what would come of it stands here.</p> }`,
})
export class PlanSummary {
  private readonly store = inject(BoardStore);
  private readonly move = inject(MoveStore);
  protected readonly refused = computed(() => this.move.plan()?.kind === 'refused');
  protected readonly words = computed(() => {
    const [board, plan, target] = [this.store.board(), this.move.plan(), this.move.target()];
    return board && plan && target ? planWords(board, plan, target) : '';
  });
  protected readonly loads = computed(() => {
    const loads = this.move.loads();
    return loads ? loadsWords(loads) : [];
  });
  protected readonly over = computed(() => this.move.loads()?.groups.some(isOver) ?? false);
}
