import { inject, Injectable } from '@angular/core';
import { v7 as newId } from 'uuid';
import { ProjectStore } from '../core/project/project-store';
import { volumeText } from '../shared/fields/typed';
import { bulkEdits, NO_BULK_VALUES } from './bulk-changes';
import { cellInput, cellText, type RowEdit, typedCell } from './cell-values';
import { type CellEdits, changesOf, clearEdits, fillEdits, pasteEdits, refusalText } from './grid-changes';
import { type ColumnId, COLUMNS, columnAt } from './grid-columns';
import type { PointRow } from './point-rows';
import { PointsViewStore } from './points-view-store';

/** What a new point starts with. */
export interface NewPoint {
  readonly tag: string;
  readonly description: string | null;
  readonly function: string | null;
  readonly machine: string | null;
  readonly typeId: string | null;
}

/** The page's edits on their way to the project: one cell as an edit, several rows as one change set. */
@Injectable()
export class PointEdits {
  private readonly project = inject(ProjectStore);
  private readonly view = inject(PointsViewStore);

  /** Takes what was typed into the open cell; false where it cannot be, with the reason at the cell. */
  commitCell(text: string): boolean {
    const open = this.view.editing();
    const row = open && this.view.rows().find((each) => each.point.id === open.pointId);
    if (!open || !row) return true;
    if (text.trim() === cellInput(open.column, row, this.view.unit())) {
      this.view.editing.set(null);
      return true;
    }
    const typed = typedCell(open.column, text, row, this.view.context());
    if (!typed.ok) {
      this.view.editing.set({ ...open, text, reason: typed.reason });
      return false;
    }
    this.view.editing.set(null);
    if (differs(typed.value, row)) this.one(typed.value, row);
    return true;
  }

  /** The value of the first row of the range into the others; without a range that of the row above, or of this row into all that are ticked. */
  fillDown(): void {
    const focus = this.view.focus();
    const row = this.view.focusedRow();
    if (!focus || !row || !this.view.canEdit()) return;
    const range = this.view.rangeRows();
    const shown = this.view.shown();
    const above = shown[shown.indexOf(row) - 1];
    const ticked = this.view.tickedRows();
    if (range.length > 1) this.fill(range[0], focus.column, range);
    else if (ticked.length > 1 && this.view.ticked().has(row.point.id)) this.fill(row, focus.column, ticked);
    else if (above) this.fill(above, focus.column, [row]);
  }

  clear(): void {
    const focus = this.view.focus();
    if (!focus || !this.view.canEdit() || !COLUMNS[columnAt(focus.column)]?.editable) return;
    this.several(clearEdits(this.view.rangeRows(), focus.column, this.view.context()), 'cleared');
  }

  paste(block: readonly (readonly string[])[]): void {
    const focus = this.view.focus();
    if (!focus || !this.view.canEdit()) return;
    const shown = this.view.shown();
    const first = this.view.rangeRows()[0];
    const below = first ? shown.slice(shown.indexOf(first)) : [];
    this.several(pasteEdits(block, this.view.rangeRows(), focus.column, below, this.view.context()), 'pasted');
  }

  /** The range's cells of the focused column, as text for a spreadsheet. */
  copied(): string {
    const column = this.view.focus()?.column;
    return column ? this.view.rangeRows().map((row) => cellText(column, row, this.view.unit())).join('\n') : '';
  }

  /** All edits in one change set; with one refusal none, and the page says why. */
  several(result: CellEdits, what: string, summary?: string): void {
    this.view.refusal.set(result.refusals.length > 0 ? `Nothing was ${what}. ${refusalText(result)}` : null);
    const changes = changesOf(result.edits);
    if (result.refusals.length > 0 || changes.length === 0) return;
    void this.project.apply(summary ?? null, changes);
  }

  /** A dose and cartridge for one point or several; with one whose type cannot give it for none. */
  setDose(rows: readonly PointRow[], cartridgeUl: number, doseUl: number): void {
    const { edits, refusals } = bulkEdits(rows, { ...NO_BULK_VALUES, dose: volumeText(doseUl), cartridge: volumeText(cartridgeUl) });
    const pulsed = edits.map((edit): RowEdit => ({ ...edit, values: { ...edit.values, method: 'pulse' } }));
    const whose = rows.length === 1 ? rows[0].point.tag : counted(rows.length, 'point');
    this.several({ edits: pulsed, refusals }, 'changed', `Dose and cartridge of ${whose}`);
  }

  editPoint(row: PointRow, values: Readonly<Record<string, unknown>>): void {
    void this.project.edit('points', row.point.id, values);
  }

  editDispenser(row: PointRow, values: Readonly<Record<string, unknown>>): void {
    if (row.dispenser) void this.project.edit('dispensers', row.dispenser.id, values);
  }

  addDispenser(row: PointRow): void {
    void this.project.create('dispensers', { pointId: row.point.id }, `Dispenser at ${row.point.tag}`);
  }

  /** A point with its dispenser, in one change set. */
  async add(point: NewPoint): Promise<boolean> {
    const { typeId, ...values } = point;
    const id = newId();
    const wiring = this.project.design()?.dispenserTypes.find((type) => type.id === typeId)?.wiring ?? null;
    const made = await this.project.apply(`Point ${point.tag}`, [
      { collection: 'points', op: 'create', id, values },
      { collection: 'dispensers', op: 'create', id: newId(), values: { pointId: id, typeId, wiring } },
    ]);
    if (made) this.view.goTo({ pointId: id, column: 'doseUl' });
    return made;
  }

  /** The server takes dispensers and channels along. */
  async remove(rows: readonly PointRow[]): Promise<void> {
    const what = rows.length === 1 ? `Point ${rows[0].point.tag}` : `${rows.length} points`;
    const gone = await this.project.apply(`${what} deleted`, rows.map((row) => ({ collection: 'points', op: 'delete', id: row.point.id })));
    if (gone) this.view.tick(rows.map((row) => row.point.id), false);
  }

  private fill(from: PointRow, column: ColumnId, into: readonly PointRow[]): void {
    this.several(fillEdits(from, column, into, this.view.context()), 'filled down');
  }

  private one(edit: RowEdit, row: PointRow): void {
    if (edit.collection === 'points') this.editPoint(row, edit.values);
    else this.editDispenser(row, edit.values);
  }
}

const counted = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? '' : 's'}`;

function differs({ collection, values }: RowEdit, row: PointRow): boolean {
  const held = (collection === 'points' ? row.point : row.dispenser) as Readonly<Record<string, unknown>> | null;
  return Object.entries(values).some(([field, value]) => held?.[field] !== value);
}
