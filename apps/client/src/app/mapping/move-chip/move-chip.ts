import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { FindingMark } from '../../shared/findings/finding-mark';
import { BoardStore } from '../board-store';
import type { DragPoint } from '../moves/drag-gesture';
import { isOver } from '../moves/load-after';
import { MoveStore } from '../moves/move-store';
import { cargoWords, loadsWords, planWords } from '../moves/plan-words';

/** What follows the pointer: who is carried, what a drop here would do, and the loads after it. */
@Component({
  selector: 'lw-move-chip',
  imports: [FindingMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true', '[style.transform]': 'place()' },
  styles: `
    :host { position: fixed; left: 0; top: 0; z-index: 20; max-width: 300px; padding: 7px 11px 8px; pointer-events: none; background: var(--lw-sheet); border: 1px solid var(--lw-rule-strong); border-radius: var(--mat-sys-corner-small); box-shadow: var(--mat-sys-level3); font: var(--mat-sys-body-small); }
    .refused { display: grid; grid-template-columns: auto 1fr; gap: 6px; align-items: start; }
    .refused { color: var(--mat-sys-error); }
    lw-finding-mark { margin-top: 2px; }`,
  template: `
    <b class="tag">{{ who() }}</b>
    @if (words(); as words) {
      <div [class.refused]="refused()">@if (refused()) { <lw-finding-mark kind="error" /> }<span>{{ words }}</span></div>
      @for (line of loads(); track line) { <div class="quiet">{{ line }}</div> }
      @if (over()) { <div class="refused"><lw-finding-mark kind="error" /><span>More than the rating allows.</span></div> }
    } @else { <div class="quiet">Drop on a channel, a group or a module.</div> }`,
})
export class MoveChip {
  private readonly store = inject(BoardStore);
  private readonly move = inject(MoveStore);
  readonly at = input.required<DragPoint>();

  /** Beside the pointer, on the side where there is room. */
  protected readonly place = computed(() => {
    const { x, y } = this.at();
    const left = x + 330 > innerWidth ? `calc(${x - 16}px - 100%)` : `${x + 16}px`;
    const top = y + 130 > innerHeight ? `calc(${y - 14}px - 100%)` : `${y + 18}px`;
    return `translate(${left}, ${top})`;
  });
  protected readonly who = computed(() => {
    const [board, move] = [this.store.board(), this.move.move()];
    return board && move ? cargoWords(board, move.cargo) : '';
  });
  protected readonly refused = computed(() => this.move.plan()?.kind === 'refused');
  protected readonly words = computed(() => {
    const [board, plan, target] = [this.store.board(), this.move.plan(), this.move.target()];
    return board && plan && target ? planWords(board, plan, target) : null;
  });
  protected readonly loads = computed(() => {
    const loads = this.move.loads();
    return loads ? loadsWords(loads) : [];
  });
  protected readonly over = computed(() => this.move.loads()?.groups.some(isOver) ?? false);
}
