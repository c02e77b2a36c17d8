import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import { BreakpointObserver } from '@angular/cdk/layout';
import { afterNextRender, ChangeDetectionStrategy, Component, computed, DestroyRef, effect, type ElementRef, inject, input, output, signal, untracked, viewChild, viewChildren } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { DEMAND_UNITS, type DemandUnit, type Project } from '#calc';
import { map } from 'rxjs';
import { Icon } from '../../shared/icon/icon';
import { cellInput } from '../cell-values';
import { type ColumnId, COLUMNS, stepEditable } from '../grid-columns';
import { type EditorAct, type GridCommand, gridCommand, pastedBlock } from '../grid-keys';
import { PointEdits } from '../point-edits';
import { PointRowLine } from '../point-row/point-row';
import type { GridLine, PointGroup, PointRow } from '../point-rows';
import { PointsViewStore } from '../points-view-store';
import { columnTemplate, rowsInView } from './grid-layout';

/**
 * The table of points. The grid keeps the keyboard and names the active cell, so that cells may come and go with
 * scrolling; only a cell that is being edited takes the keyboard itself.
 */
@Component({
  selector: 'lw-points-grid',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollableElement, CdkVirtualScrollViewport, Icon, MatMenu, MatMenuItem, MatMenuTrigger, PointRowLine],
  changeDetection: ChangeDetectionStrategy.OnPush,
  // Browsers send the clipboard's events to where the text caret was, so they are heard on the document.
  host: { '(document:paste)': 'paste($event)', '(document:copy)': 'copy($event)' },
  styleUrl: './points-grid.css',
  templateUrl: './points-grid.html',
})
export class PointsGrid {
  protected readonly view = inject(PointsViewStore);
  private readonly edits = inject(PointEdits);
  readonly project = input.required<Project>();
  /** Ctrl+Enter: the lane page of the focused point. */
  readonly laneAsked = output<PointRow>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');
  private readonly head = viewChild.required<ElementRef<HTMLElement>>('head');
  private readonly lineViews = viewChildren(PointRowLine);
  private readonly scrolled = signal({ top: 0, height: 0 });
  private readonly coarse = toSignal(inject(BreakpointObserver).observe('(pointer: coarse)').pipe(map((state) => state.matches)), { initialValue: false });
  protected readonly rowPx = computed(() => (this.coarse() ? 48 : 28));

  protected readonly columns = COLUMNS;
  protected readonly units = DEMAND_UNITS;
  protected readonly unitChoices = Object.keys(DEMAND_UNITS) as readonly DemandUnit[];
  protected readonly layout = computed(() => columnTemplate(this.view.rows().map((row) => row.point.tag)));
  protected readonly inView = computed(() => rowsInView(this.view.lines(), this.scrolled(), this.rowPx()));
  protected readonly activeCell = computed(() => {
    const focus = this.view.focus();
    return focus && `cell-${focus.pointId}-${focus.column}`;
  });
  protected readonly allTicked = computed(() => this.view.shown().length > 0 && this.view.shown().every((row) => this.view.ticked().has(row.point.id)));

  constructor() {
    effect(() => {
      const focus = this.view.focus();
      untracked(() => focus && this.reveal(focus.pointId, focus.column));
    });
    const destroy = inject(DestroyRef);
    afterNextRender(() => {
      const watch = new ResizeObserver(() => this.measure());
      watch.observe(this.scroller().nativeElement);
      destroy.onDestroy(() => watch.disconnect());
    });
  }

  /** Takes the keyboard. */
  focus(): void {
    this.scroller().nativeElement.focus({ preventScroll: true });
  }

  protected measure(): void {
    const { scrollTop, clientHeight } = this.scroller().nativeElement;
    this.scrolled.set({ top: scrollTop, height: clientHeight - this.head().nativeElement.offsetHeight });
  }

  protected readonly lineKey = (_index: number, line: GridLine): string => line.key;

  protected press(event: KeyboardEvent): void {
    if (event.target !== this.scroller().nativeElement) return;
    const command = gridCommand(event, Math.max(1, Math.floor(this.scrolled().height / this.rowPx()) - 1));
    if (!command) return;
    event.preventDefault();
    this.obey(command);
  }

  protected paste(event: ClipboardEvent): void {
    if (document.activeElement !== this.scroller().nativeElement) return;
    event.preventDefault();
    this.edits.paste(pastedBlock(event.clipboardData?.getData('text/plain') ?? ''));
  }

  protected copy(event: ClipboardEvent): void {
    if (document.activeElement !== this.scroller().nativeElement) return;
    event.preventDefault();
    event.clipboardData?.setData('text/plain', this.edits.copied());
  }

  protected pick(row: PointRow, column: ColumnId, extend: boolean): void {
    const open = this.view.editing();
    if (open?.pointId === row.point.id && open.column === column) return;
    if (open?.reason) {
      // What was typed is not lost for a click elsewhere.
      setTimeout(() => this.lineViews().forEach((line) => line.focusEditor()));
      return;
    }
    this.view.goTo({ pointId: row.point.id, column }, extend);
    this.view.sheetOpen.set(true);
  }

  protected openCell(row: PointRow, column: ColumnId): void {
    if (this.view.editing()) return;
    this.view.goTo({ pointId: row.point.id, column });
    this.open();
  }

  private open(): void {
    const row = this.view.focusedRow();
    const column = this.view.focus()?.column;
    if (row && column) this.view.edit(cellInput(column, row, this.view.unit()), false);
  }

  protected act({ act, text }: { readonly act: EditorAct; readonly text: string }): void {
    const open = this.view.editing();
    if (!open) return;
    if (act === 'cancel') this.view.editing.set(null);
    else if (!this.edits.commitCell(text)) return;
    this.view.goTo(open);
    if (act === 'down' || act === 'up') this.view.move(act === 'down' ? 1 : -1, 0);
    if (act === 'right' || act === 'left') this.view.goTo({ pointId: open.pointId, column: stepEditable(open.column, act === 'right' ? 1 : -1) });
    this.focus();
  }

  /** The editor lost the keyboard without a key: what was typed is taken, or stays with its reason. */
  protected leave(row: PointRow, text: string): void {
    if (this.view.editing()?.pointId === row.point.id) this.edits.commitCell(text);
  }

  protected tickGroup(group: PointGroup): void {
    this.view.tick(group.rows.map((row) => row.point.id), !this.groupTicked(group));
    this.focus();
  }

  protected groupTicked(group: PointGroup): boolean {
    return group.rows.every((row) => this.view.ticked().has(row.point.id));
  }

  protected tickAll(): void {
    this.view.tick(this.view.shown().map((row) => row.point.id), !this.allTicked());
  }

  protected tick(row: PointRow): void {
    this.view.tick([row.point.id], !this.view.ticked().has(row.point.id));
    this.focus();
  }

  private obey(command: GridCommand): void {
    const row = this.view.focusedRow();
    switch (command.kind) {
      case 'move': return this.view.move(command.rows, command.columns, command.extend);
      case 'edge': return this.view.moveToEdge(command.rows, command.columns, command.extend);
      case 'edit': return command.text === null ? this.open() : this.view.edit(command.text, true);
      case 'clear': return this.edits.clear();
      case 'fill-down': return this.edits.fillDown();
      case 'tick': return row && this.view.canEdit() ? this.view.tickRange(row.point.id) : undefined;
      case 'tick-all': return this.view.canEdit() ? this.tickAll() : undefined;
      case 'alternatives': return this.view.openPanel('dose');
      case 'next-finding': return this.view.goToNextFinding();
      case 'lane': return row?.dispenser ? this.laneAsked.emit(row) : undefined;
      case 'leave': return this.view.refusal.set(null);
    }
  }

  /** Scrolls as little as shows the cell below the head and beside the frozen columns. */
  private reveal(pointId: string, column: ColumnId): void {
    const scroller = this.scroller().nativeElement;
    const cell = this.head().nativeElement.querySelector<HTMLElement>(`[data-column="${column}"]`);
    const lines = this.view.lines();
    const at = lines.findIndex((line) => line.key === pointId);
    const top = at * this.rowPx();
    // The first row of a group brings the group's head along.
    const lead = lines[at - 1]?.kind === 'group' ? this.rowPx() : 0;
    const room = scroller.clientHeight - this.head().nativeElement.offsetHeight;
    if (top - lead < scroller.scrollTop) scroller.scrollTop = top - lead;
    else if (top + this.rowPx() > scroller.scrollTop + room) scroller.scrollTop = top + this.rowPx() - room;
    if (!cell || column === 'tag') return;
    const frozen = this.layout().frozenPx;
    if (cell.offsetLeft - frozen < scroller.scrollLeft) scroller.scrollLeft = cell.offsetLeft - frozen;
    else if (cell.offsetLeft + cell.offsetWidth > scroller.scrollLeft + scroller.clientWidth) scroller.scrollLeft = cell.offsetLeft + cell.offsetWidth - scroller.clientWidth;
  }
}
