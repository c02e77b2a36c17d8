import { computed, inject, Injectable, Injector } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MappingViewStore } from './mapping-view-store';
import { MoveDialog } from './move-dialog/move-dialog';
import type { Cargo } from './moves/drop-target';
import { MoveStore } from './moves/move-store';
import type { MenuAct, MenuOf } from './row-menu/row-menu';
import { SwapDialog } from './swap-dialog/swap-dialog';

/** What menus and buttons do with rows: by themselves, or through a dialog that asks where to. */
@Injectable()
export class MoveActs {
  private readonly view = inject(MappingViewStore);
  private readonly move = inject(MoveStore);
  private readonly dialog = inject(MatDialog);
  private readonly injector = inject(Injector);

  /** Two mapped channels of one kind can be swapped. */
  readonly pair = computed(() => {
    const rows = this.view.markedRows();
    return rows.length === 2 && rows[0].purpose === rows[1].purpose ? rows : null;
  });

  swapPair(): void {
    const pair = this.pair();
    const [a, b] = (pair ?? []).map((row) => row.occupant?.dispenser.id);
    if (pair && a && b) this.move.swap(a, b, pair[0].purpose);
  }

  /** What a row carries, by its `data-lift`: "list" with a dispenser's id, or "channel" with its key. */
  cargoAt(lift: string): Cargo | null {
    const [kind, key] = lift.split(' ');
    if (kind === 'list') return this.view.cargoOf(key);
    const row = this.view.rowsByKey().get(key);
    return row ? this.view.cargoFrom(row) : null;
  }

  act(act: MenuAct, of: MenuOf): void {
    const cargo = this.cargoAt(`${of.kind} ${of.key}`);
    if (!cargo) return;
    if (act === 'unmap') this.move.unmap(this.view.marked().has(of.key) ? this.view.marked() : [of.key]);
    else this.ask(cargo, of.key, act === 'swap');
  }

  /** Asks where all go that are chosen in the list, or among the channels. */
  moveSelected(kind: MenuOf['kind']): void {
    const key = kind === 'list' ? this.view.selectedOpen()[0]?.dispenser.id : this.view.markedRows()[0]?.key;
    const cargo = key === undefined ? null : this.cargoAt(`${kind} ${key}`);
    if (cargo && key !== undefined) this.ask(cargo, key, false);
  }

  private ask(cargo: Cargo, from: string, swap: boolean): void {
    this.move.lift({ cargo, by: 'form', from });
    if (swap) this.move.aim(null);
    const options = { width: '440px', injector: this.injector };
    const opened = swap ? this.dialog.open(SwapDialog, options) : this.dialog.open(MoveDialog, options);
    opened.afterClosed().subscribe(() => this.move.cancel());
  }
}
