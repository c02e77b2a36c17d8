import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormField } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FindingMark } from '../../shared/findings/finding-mark';
import { tagOf } from '../board';
import { BoardStore } from '../board-store';
import { placeOptions } from '../moves/place-options';
import { FILL_ORDERS, type FillOrder } from '../moves/fill-order';
import { isOver } from '../moves/load-after';
import { targetOf } from '../moves/drop-target';
import { loadsWords, planWords } from '../moves/plan-words';
import { PreviewStore } from '../preview-store';

/** A group or module filled in a chosen order, shown in the table before anything is saved. */
@Component({
  selector: 'lw-fill-panel',
  imports: [FindingMark, MatButton, MatCheckbox, MatFormField, MatInput],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './fill-panel.html',
  styleUrl: '../preview-panel/preview-panel.css',
})
export class FillPanel {
  protected readonly store = inject(BoardStore);
  protected readonly previews = inject(PreviewStore);

  protected readonly orders = FILL_ORDERS;
  protected readonly places = computed(() => {
    const board = this.store.board();
    return board ? placeOptions(board, null) : [];
  });
  protected readonly plan = computed(() => this.previews.fill()?.plan ?? null);
  protected readonly placed = computed(() => {
    const plan = this.plan();
    return plan && plan.kind !== 'refused' ? new Set(plan.placements.map((p) => p.dispenserId)).size : 0;
  });
  protected readonly words = computed(() => {
    const [board, plan, filling] = [this.store.board(), this.plan(), this.previews.filling()];
    return board && plan && filling ? planWords(board, plan, targetOf(filling.targetKey)) : '';
  });
  protected readonly loads = computed(() => {
    const loads = this.previews.fillLoads();
    return loads ? loadsWords(loads) : [];
  });
  protected readonly over = computed(() => this.previews.fillLoads()?.groups.some(isOver) ?? false);
  protected readonly staying = computed(() => {
    const board = this.store.board();
    const ids = this.previews.fill()?.staying ?? [];
    return { count: ids.length, tags: board ? ids.slice(0, 40).map((id) => tagOf(board, id)).join(', ') + (ids.length > 40 ? ' and more' : '') : '' };
  });

  protected aim(targetKey: string): void {
    this.previews.filling.update((filling) => filling && { ...filling, targetKey });
  }

  protected sort(order: string): void {
    this.previews.filling.update((filling) => filling && { ...filling, order: order as FillOrder });
  }
}
