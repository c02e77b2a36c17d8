import { ChangeDetectionStrategy, Component, output, signal, viewChild } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Icon } from '../../shared/icon/icon';

/** Whose menu it is: a mapped channel's (its key), or a dispenser's that is not mapped (its id). */
export interface MenuOf {
  readonly kind: 'channel' | 'list';
  readonly key: string;
  /** How many its acts would move: those chosen with it. */
  readonly count: number;
}

export type MenuAct = 'move' | 'swap' | 'unmap';

/** One menu for all rows, opened at a row's button. */
@Component({
  selector: 'lw-row-menu',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: '.at { position: fixed; width: 1px; height: 1px; padding: 0; border: 0; opacity: 0; pointer-events: none; }',
  template: `
    <button type="button" class="at" tabindex="-1" aria-hidden="true" [style.left.px]="at().x" [style.top.px]="at().y" [matMenuTriggerFor]="menu" [matMenuTriggerRestoreFocus]="false" (menuClosed)="giveBack()"></button>
    <mat-menu #menu="matMenu" xPosition="before">
      <button mat-menu-item type="button" (click)="choose('move')"><lw-icon name="move" /> {{ of()?.kind === 'list' ? 'Place on…' : 'Move to…' }}{{ more() }}</button>
      @if (of()?.kind === 'channel') {
        @if (of()?.count === 1) { <button mat-menu-item type="button" (click)="choose('swap')"><lw-icon name="swap" /> Swap with…</button> }
        <button mat-menu-item type="button" (click)="choose('unmap')"><lw-icon name="close" /> Unmap{{ more() }}</button>
      }
    </mat-menu>`,
})
export class RowMenu {
  readonly chosen = output<{ readonly act: MenuAct; readonly of: MenuOf }>();

  private readonly trigger = viewChild.required(MatMenuTrigger);
  protected readonly at = signal({ x: 0, y: 0 });
  protected readonly of = signal<MenuOf | null>(null);
  private button: HTMLElement | null = null;

  open(button: HTMLElement, of: MenuOf): void {
    const box = button.getBoundingClientRect();
    this.button = button;
    this.of.set(of);
    this.at.set({ x: box.right, y: box.bottom });
    // The menu opens where its trigger stands once that has been drawn there.
    requestAnimationFrame(() => this.trigger().openMenu());
  }

  protected more(): string {
    const count = this.of()?.count ?? 1;
    return count > 1 ? ` (${count})` : '';
  }

  protected choose(act: MenuAct): void {
    const of = this.of();
    if (of) this.chosen.emit({ act, of });
  }

  protected giveBack(): void {
    this.button?.focus({ preventScroll: true });
  }
}
