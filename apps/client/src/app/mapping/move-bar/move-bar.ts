import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { FindingMark } from '../../shared/findings/finding-mark';
import { BoardStore } from '../board-store';
import { MoveStore } from '../moves/move-store';
import { cargoWords, loadsWords, planWords, targetWords } from '../moves/plan-words';

/** While the keyboard carries something: what it carries, where it is, what Enter would do. The same is said aloud. */
@Component({
  selector: 'lw-move-bar',
  imports: [FindingMark, MatButton, MatCheckbox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'group', 'aria-label': 'Move under way' },
  styles: `
    :host { display: flex; flex: none; flex-wrap: wrap; align-items: center; gap: 4px 14px; padding: 8px 14px; border-top: 1px solid var(--lw-rule-strong); background: var(--mat-sys-surface-container-low); font: var(--mat-sys-body-small); }
    p { flex-basis: 100%; }
    mat-checkbox { --mat-checkbox-label-text-size: 13px; margin-left: -8px; }
    mat-checkbox + button { margin-left: auto; }
    .refused { color: var(--mat-sys-error); }
    lw-finding-mark { display: inline-block; vertical-align: -2px; margin-right: 4px; }`,
  template: `
    <p>
      <b class="tag">{{ who() }}</b>&ngsp;<span class="quiet">over</span> {{ where() }}.
      <span [class.refused]="refused()">@if (refused()) { <lw-finding-mark kind="error" /> }{{ words() }}</span>
      @for (line of loads(); track line) { <span class="quiet"> {{ line }}</span> }
    </p>
    <mat-checkbox [checked]="store.withStatus()" (change)="follow($event.checked)">with status inputs</mat-checkbox>
    <button matButton="filled" type="button" [disabled]="refused()" (click)="dropped.emit()">Place <kbd class="desk-only">Enter</kbd></button>
    <button matButton="outlined" type="button" (click)="cancelled.emit()">Cancel <kbd class="desk-only">Esc</kbd></button>`,
})
export class MoveBar {
  protected readonly store = inject(BoardStore);
  private readonly move = inject(MoveStore);
  readonly dropped = output<void>();
  readonly cancelled = output<void>();

  protected readonly who = computed(() => {
    const [board, move] = [this.store.board(), this.move.move()];
    return board && move ? cargoWords(board, move.cargo) : '';
  });
  protected readonly where = computed(() => {
    const [board, target] = [this.store.board(), this.move.target()];
    return board && target ? targetWords(board, target) : 'no channel';
  });
  protected readonly refused = computed(() => this.move.plan()?.kind === 'refused');
  protected readonly words = computed(() => {
    const [board, plan, target] = [this.store.board(), this.move.plan(), this.move.target()];
    return board && plan && target ? planWords(board, plan, target) : '';
  });
  protected readonly loads = computed(() => {
    const loads = this.move.loads();
    return loads ? loadsWords(loads) : [];
  });

  protected follow(on: boolean): void {
    this.store.withStatus.set(on);
    this.move.repeat();
  }
}
