import { CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollableWindow, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, type ElementRef, inject, input, output, signal, viewChild } from '@angular/core';
import type { Mend } from '../../shared/findings/finding-mend';
import { ChannelSection, type Searching } from '../channel-section/channel-section';
import { channelAct, isTyped } from '../channel-keys';
import type { ChannelRow, GroupSection } from '../mapping-rows';
import { MappingViewStore } from '../mapping-view-store';
import { Measured } from '../measured';
import { carryAct } from '../moves/carry-keys';
import { nextGroup, stepped, stopsOf } from '../moves/drop-target';
import { MoveStore } from '../moves/move-store';
import type { OpenLane } from '../open-lanes';
import { focusNow, focusSoon } from '../row-focus';
import { estimatedPx, sameHeights } from '../section-heights';
import { SectionScroll } from '../section-scroll';
import { all, extended, NONE, picked, toggled } from '../selection';

/** Channels up to which all are drawn. */
const WHOLE = 600;

/** The channels of the modules shown, by group with its worst load. Arrow keys move, typing in a free channel searches. */
@Component({
  selector: 'lw-channel-table',
  imports: [CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollableWindow, CdkVirtualScrollViewport, ChannelSection, Measured, NgTemplateOutlet, SectionScroll],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.still]': 'move.move() !== null' },
  templateUrl: './channel-table.html',
  styleUrl: './channel-table.css',
})
export class ChannelTable {
  protected readonly view = inject(MappingViewStore);
  protected readonly move = inject(MoveStore);
  readonly open = input.required<readonly OpenLane[]>();
  readonly editable = input.required<boolean>();
  readonly projectId = input.required<string>();
  readonly phone = input.required<boolean>();
  /** Height of a channel's row, px. */
  readonly rowPx = input.required<number>();
  readonly assigned = output<{ readonly lane: OpenLane; readonly row: ChannelRow }>();
  /** Shift+Enter: all that are chosen, from this channel on. */
  readonly filled = output<ChannelRow>();
  readonly unassigned = output<ReadonlySet<string>>();
  readonly fillAsked = output<string>();
  /** The menu of a mapped channel is wanted at this button. */
  readonly menuAsked = output<{ readonly at: HTMLElement; readonly row: ChannelRow }>();
  readonly mended = output<Mend>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');
  private readonly viewport = viewChild(CdkVirtualScrollViewport);
  private readonly heightOf = signal<ReadonlyMap<string, number>>(new Map());
  protected readonly searching = signal<Searching | null>(null);
  protected readonly heights = computed(() => this.view.sections().map((s) => this.heightOf().get(s.key) ?? estimatedPx(s, this.rowPx())), { equal: sameHeights });
  protected readonly whole = computed(() => this.view.channels().length <= WHOLE);
  protected readonly tabStop = computed(() => {
    const key = this.view.focusedKey();
    return key !== null && this.view.rowsByKey().has(key) ? key : (this.view.channels()[0]?.key ?? null);
  });
  private readonly keys = computed(() => this.view.channels().map((row) => row.key));

  protected readonly keyOf = (_index: number, section: GroupSection): string => section.key;

  /** Puts the keyboard on a channel or a group's head, drawing it first where it is out of sight. */
  goTo(key: string | undefined): void {
    if (key === undefined) return;
    if (this.view.rowsByKey().has(key)) this.view.focusedKey.set(key);
    if (this.focusNow(key)) return;
    const at = this.view.sections().findIndex((s) => s.key === key || s.channels.some((row) => row.key === key));
    if (at >= 0) this.viewport()?.scrollToIndex(at);
    focusSoon(this.scroller().nativeElement, `[data-drop="${key}"]`);
  }

  /** The first channel that is proposed. */
  goToProposed(): void {
    this.goTo(this.view.channels().find((r) => r.proposed)?.key);
  }

  /** The first channel of a module. */
  goToModule(moduleId: string): void {
    this.goTo(this.view.channels().find((r) => r.module.id === moduleId)?.key);
  }

  protected measure(key: string, px: number): void {
    if (px > 0 && this.heightOf().get(key) !== px) this.heightOf.update((known) => new Map(known).set(key, px));
  }

  protected press(event: KeyboardEvent): void {
    const key = keyAt(event);
    if (key === null || isInside(event)) return;
    if (this.move.carrying()) return this.carry(event, key);
    const row = this.view.rowsByKey().get(key);
    if (row) this.act(event, row);
  }

  protected click(event: MouseEvent): void {
    const row = this.view.rowsByKey().get(keyAt(event) ?? '');
    const target = event.target as HTMLElement;
    if (!row) return;
    if (target.closest('[data-search]')) return this.search(row);
    const menu = target.closest<HTMLElement>('[data-menu]');
    if (menu) return this.menuAsked.emit({ at: menu, row });
    if (target.closest('a, button, input') || this.searching()?.key === row.key) return;
    this.pick(row, event);
    this.focusNow(row.key);
  }

  protected searchAt(event: MouseEvent): void {
    const row = this.view.rowsByKey().get(keyAt(event) ?? '');
    if (row) this.search(row);
  }

  protected focused(event: FocusEvent): void {
    const key = keyAt(event);
    if (key === null || (event.target as HTMLElement).dataset['drop'] !== key) return;
    if (this.move.carrying()) this.move.aim(key);
    if (this.view.rowsByKey().has(key)) this.view.focusedKey.set(key);
  }

  protected choose(lane: OpenLane, row: ChannelRow): void {
    this.searching.set(null);
    this.assigned.emit({ lane, row });
    this.step(row, 1);
  }

  protected leave(row: ChannelRow): void {
    if (this.searching()?.key !== row.key) return;
    this.searching.set(null);
    this.goTo(row.key);
  }

  private pick(row: ChannelRow, event: MouseEvent): void {
    if (!this.editable()) return;
    if (!row.occupant || row.proposed) return this.view.channelSelection.set(NONE);
    const keys = { shift: event.shiftKey, ctrl: event.ctrlKey || event.metaKey || this.view.selecting() };
    this.view.channelSelection.update((before) => picked(before, this.view.mappedOrder(), row.key, keys));
  }

  private act(event: KeyboardEvent, row: ChannelRow): void {
    const act = channelAct(event);
    if (act && (this.editable() || act === 'up' || act === 'down')) {
      event.preventDefault();
      this.acts[act](row);
    } else if (this.editable() && !row.occupant && isTyped(event)) {
      event.preventDefault();
      // Whoever types fast is ahead of the field that opens: what came before it is kept.
      const before = this.searching();
      this.searching.set({ key: row.key, first: (before?.key === row.key ? before.first : '') + event.key });
    }
  }

  private readonly acts: Readonly<Record<NonNullable<ReturnType<typeof channelAct>>, (row: ChannelRow) => void>> = {
    up: (row) => this.step(row, -1),
    down: (row) => this.step(row, 1),
    'extend-up': (row) => this.extend(row, -1),
    'extend-down': (row) => this.extend(row, 1),
    all: () => this.view.channelSelection.set(all(this.view.mappedOrder())),
    toggle: (row) => row.occupant && !row.proposed && this.view.channelSelection.update((before) => toggled(before, row.key)),
    search: (row) => this.search(row),
    fill: (row) => this.filled.emit(row),
    unmap: (row) => this.unassigned.emit(this.view.marked().size > 0 ? this.view.marked() : new Set([row.key])),
    move: (row) => this.liftFrom(row),
  };

  private liftFrom(row: ChannelRow): void {
    const cargo = this.view.cargoFrom(row);
    if (!cargo) return;
    this.move.lift({ cargo, by: 'keys', from: row.key });
    this.goTo(this.move.aimed() ?? undefined);
  }

  private carry(event: KeyboardEvent, key: string): void {
    const act = carryAct(event);
    if (!act) return;
    event.preventDefault();
    event.stopPropagation();
    const stops = stopsOf(this.view.sections());
    if (act.kind === 'step') return this.goTo(stepped(stops, key, act.by) ?? undefined);
    if (act.kind === 'group') return this.goTo(nextGroup(this.view.sections(), key, act.by) ?? undefined);
    const from = this.move.move()?.from;
    if (act.kind === 'cancel') this.move.cancel();
    else if (act.kind === 'unmap') this.move.dropOnList();
    else if (!this.move.drop()) return;
    if (act.kind === 'cancel' && from !== undefined && this.view.rowsByKey().has(from)) this.goTo(from);
  }

  /** Shift with an arrow: from the row that was left to the next that is mapped. */
  private extend(row: ChannelRow, by: 1 | -1): void {
    const order = this.view.mappedOrder();
    if (this.view.channelSelection().anchor === null && row.occupant) this.view.channelSelection.set({ ids: new Set([row.key]), anchor: row.key });
    const next = order[order.indexOf(row.key) + by];
    if (next === undefined || !row.occupant) return this.step(row, by);
    this.view.channelSelection.update((before) => extended(before, order, next));
    this.goTo(next);
  }

  private search(row: ChannelRow): void {
    if (this.editable() && !row.occupant) this.searching.set({ key: row.key, first: '' });
  }

  private step(row: ChannelRow, by: number): void {
    this.goTo(stepped(this.keys(), row.key, by) ?? undefined);
  }

  private focusNow(key: string): boolean {
    return focusNow(this.scroller().nativeElement, `[data-drop="${key}"]`);
  }
}

const keyAt = (event: Event): string | null => (event.target as Element).closest<HTMLElement>('[data-drop]')?.dataset['drop'] ?? null;

/** Keys typed in a field or on a button inside a row are theirs. */
const isInside = (event: Event): boolean => (event.target as Element).closest('input, select, button, a') !== null;
