import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollableWindow, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, type ElementRef, inject, input, output, signal, viewChild } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import { formatAmps } from '#calc';
import { Icon } from '../../shared/icon/icon';
import { channelAct } from '../channel-keys';
import { MappingViewStore } from '../mapping-view-store';
import { MoveStore } from '../moves/move-store';
import { stepped } from '../moves/drop-target';
import type { OpenLane } from '../open-lanes';
import { focusNow, focusSoon } from '../row-focus';
import { all, extended, NONE, picked, toggled } from '../selection';

/** Dispensers that lack an output or a status input, to be chosen and put on channels. */
@Component({
  selector: 'lw-unmapped-list',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollableWindow, CdkVirtualScrollViewport, Icon, MatCheckbox, NgTemplateOutlet],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './unmapped-list.html',
  styleUrl: './unmapped-list.css',
})
export class UnmappedList {
  protected readonly view = inject(MappingViewStore);
  private readonly move = inject(MoveStore);
  readonly lanes = input.required<readonly OpenLane[]>();
  readonly editable = input.required<boolean>();
  readonly phone = input.required<boolean>();
  /** Height of a row, px. */
  readonly rowPx = input.required<number>();
  /** Said where no row is shown. */
  readonly empty = input.required<string>();
  /** The keyboard has picked up what is chosen. */
  readonly lifted = output<void>();
  /** The menu of a dispenser is wanted at this button. */
  readonly menuAsked = output<{ readonly at: HTMLElement; readonly dispenserId: string }>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');
  private readonly viewport = viewChild(CdkVirtualScrollViewport);
  private readonly focusedId = signal<string | null>(null);
  protected readonly amps = formatAmps;
  private readonly order = computed(() => this.lanes().map((lane) => lane.dispenser.id));
  protected readonly allOn = computed(() => this.lanes().length > 0 && this.lanes().every((l) => this.view.selected().has(l.dispenser.id)));
  protected readonly someOn = computed(() => !this.allOn() && this.lanes().some((l) => this.view.selected().has(l.dispenser.id)));
  protected readonly tabStop = computed(() => {
    const id = this.focusedId();
    return id !== null && this.order().includes(id) ? id : (this.order()[0] ?? null);
  });

  protected readonly idOf = (_index: number, lane: OpenLane): string => lane.dispenser.id;

  /** Puts the keyboard on a dispenser's row, drawing it first where it is out of sight. */
  goTo(id: string | null): void {
    if (id === null || this.focusNow(id)) return;
    this.viewport()?.scrollToIndex(this.order().indexOf(id));
    focusSoon(this.scroller().nativeElement, `[data-row="${id}"]`);
  }

  protected selectAll(on: boolean): void {
    this.view.openSelection.set(on ? all(this.order()) : NONE);
  }

  protected press(event: KeyboardEvent): void {
    const id = idAt(event);
    if (id === null || (event.target as HTMLElement).dataset['row'] !== id) return;
    const act = channelAct(event);
    const handler = act && this.acts[act];
    if (!handler || (!this.editable() && act !== 'up' && act !== 'down')) return;
    event.preventDefault();
    handler(id);
  }

  protected click(event: MouseEvent): void {
    const id = idAt(event);
    const target = event.target as HTMLElement;
    if (id === null) return;
    const menu = target.closest<HTMLElement>('[data-menu]');
    if (menu) return this.menuAsked.emit({ at: menu, dispenserId: id });
    if (!this.editable()) return;
    const ticked = target.closest('[data-tick]') !== null || this.view.selecting() || this.phone();
    const keys = { shift: event.shiftKey, ctrl: event.ctrlKey || event.metaKey || ticked };
    this.view.openSelection.update((before) => picked(before, this.order(), id, keys));
    this.focusNow(id);
  }

  protected focused(event: FocusEvent): void {
    this.focusedId.set(idAt(event));
  }

  private readonly acts: Readonly<Partial<Record<NonNullable<ReturnType<typeof channelAct>>, (id: string) => void>>> = {
    up: (id) => this.goTo(stepped(this.order(), id, -1)),
    down: (id) => this.goTo(stepped(this.order(), id, 1)),
    'extend-up': (id) => this.extend(id, -1),
    'extend-down': (id) => this.extend(id, 1),
    all: () => this.view.openSelection.set(all(this.order())),
    toggle: (id) => this.view.openSelection.update((before) => toggled(before, id)),
    search: (id) => this.lift(id),
    move: (id) => this.lift(id),
  };

  private lift(id: string): void {
    this.move.lift({ cargo: this.view.cargoOf(id), by: 'keys', from: id });
    this.lifted.emit();
  }

  private extend(id: string, by: number): void {
    const next = stepped(this.order(), id, by);
    if (next === null) return;
    if (this.view.openSelection().anchor === null) this.view.openSelection.set({ ids: new Set([id]), anchor: id });
    this.view.openSelection.update((before) => extended(before, this.order(), next));
    this.goTo(next);
  }

  private focusNow(id: string): boolean {
    return focusNow(this.scroller().nativeElement, `[data-row="${id}"]`);
  }
}

const idAt = (event: Event): string | null => (event.target as Element).closest<HTMLElement>('[data-row]')?.dataset['row'] ?? null;
