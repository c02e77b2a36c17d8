import type { RowChange } from '#contract';
import { cellInput, type CellContext, type RowEdit, typedCell } from './cell-values';
import { COLUMNS, columnAt, type ColumnId } from './grid-columns';
import type { PointRow } from './point-rows';

/** Edits of several cells, and the cells that refuse: with one refusal nothing is sent. */
export interface CellEdits {
  readonly edits: readonly RowEdit[];
  readonly refusals: readonly { readonly tag: string; readonly column: string; readonly reason: string }[];
}

/** The value of one cell put into the same column of other rows. */
export function fillEdits(from: PointRow, column: ColumnId, into: readonly PointRow[], context: CellContext): CellEdits {
  const text = cellInput(column, from, context.demandPer);
  return collected(into.filter((row) => row !== from).map((row) => ({ row, column, text })), context);
}

/** The cells of one column left blank. */
export const clearEdits = (rows: readonly PointRow[], column: ColumnId, context: CellContext): CellEdits =>
  collected(rows.map((row) => ({ row, column, text: '' })), context);

/**
 * A block of a spreadsheet put in with its upper left cell at `column` of the first row. What reaches below the
 * last row or beyond the last column is left out; a single value fills all `rows`.
 */
export function pasteEdits(block: readonly (readonly string[])[], rows: readonly PointRow[], column: ColumnId, below: readonly PointRow[], context: CellContext): CellEdits {
  const single = block.length === 1 && block[0]?.length === 1;
  const lines = single ? rows.map((row) => ({ row, cells: block[0] })) : below.slice(0, block.length).map((row, i) => ({ row, cells: block[i] }));
  return collected(lines.flatMap(({ row, cells }) => cells.flatMap((text, i) => {
    const to = COLUMNS[columnAt(column) + i];
    return to && (to.editable || text !== '') ? [{ row, column: to.id, text }] : [];
  })), context);
}

/** One change a row: several cells of a row travel together. */
export function changesOf(edits: readonly RowEdit[]): readonly RowChange[] {
  const byRow = new Map<string, RowEdit>();
  for (const edit of edits) {
    const before = byRow.get(edit.id);
    byRow.set(edit.id, { ...edit, values: { ...before?.values, ...edit.values } });
  }
  return [...byRow.values()].map(({ collection, id, values }) => ({ collection, op: 'update', id, values: { ...values } }));
}

/** In one sentence, for the notice above the grid. */
export function refusalText({ refusals }: CellEdits): string {
  const first = refusals[0];
  if (!first) return '';
  const others = refusals.length - 1;
  return `${first.tag}, ${first.column}: ${first.reason}${others > 0 ? ` ${others} more ${others === 1 ? 'cell' : 'cells'} cannot take it either.` : ''}`;
}

function collected(cells: readonly { readonly row: PointRow; readonly column: ColumnId; readonly text: string }[], context: CellContext): CellEdits {
  const edits: RowEdit[] = [];
  const refusals: { tag: string; column: string; reason: string }[] = [];
  const tags = new Map(context.tags);
  for (const { row, column, text } of cells) {
    const typed = typedCell(column, text, row, { ...context, tags });
    if (!typed.ok) refusals.push({ tag: row.point.tag, column: COLUMNS[columnAt(column)].head.toLowerCase(), reason: typed.reason });
    else {
      edits.push(typed.value);
      // Two rows of one block may not take the same tag either.
      if (column === 'tag') tags.set(typed.value.values['tag'] as string, row.point.id);
    }
  }
  return { edits, refusals };
}
