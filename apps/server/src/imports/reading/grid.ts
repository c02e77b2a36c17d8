/**
 * What every reader of files makes and every step of the interpretation takes: rows of text cells, as a
 * person sees them. The readers (CSV today, workbooks likewise) know nothing of fields, the interpretation
 * nothing of files.
 */
export interface Grid {
  readonly rows: readonly GridRow[];
}

/**
 * A row of the file. A reader whose files have no ragged rows pads each row to the width of the widest,
 * so that a cell beyond the heading row is always the sign of a broken record.
 */
export interface GridRow {
  /** The number a person sees: the record of a CSV, the row of a sheet; from 1. */
  readonly number: number;
  /** The physical line the record begins on, from 1; the same as `number` where rows are no lines. */
  readonly line: number;
  readonly cells: readonly string[];
}

/** The sign that separates whole and decimal digits in a file. */
export type DecimalMark = '.' | ',';

/** Bounds of an upload. Rows count up to the last one with content, heading rows included. */
export const LIMITS = { bytes: 10_000_000, rows: 50_000, columns: 200, cellLength: 4_000 } as const;

/** How far down the heading row is looked for. */
export const HEADER_SEARCH_ROWS = 20;

/** The letter of a column as spreadsheets count: 0 is A, 26 is AA. */
export function columnLetter(index: number): string {
  const rest = String.fromCharCode(65 + (index % 26));
  return index < 26 ? rest : columnLetter(Math.floor(index / 26) - 1) + rest;
}

/** The index of a column letter, the inverse of `columnLetter`; -1 when it is none. */
export function columnIndex(letter: string): number {
  if (!/^[A-Z]{1,3}$/.test(letter)) return -1;
  return [...letter].reduce((sum, each) => sum * 26 + each.charCodeAt(0) - 64, 0) - 1;
}

/** Outer blanks of every kind gone: spaces, tabs, line ends, no-break spaces. */
export function trimmed(cell: string): string {
  return cell.trim();
}

/** Whether nothing but blanks stands in the row. */
export function isBlankRow(row: GridRow): boolean {
  return row.cells.every((cell) => trimmed(cell) === '');
}

/** The row with this number, if the grid has it. */
export function rowNumbered(grid: Grid, number: number): GridRow | undefined {
  return grid.rows.find((row) => row.number === number);
}

/** The rows below the heading row up to the last one with content; blank rows behind it count for nothing. */
export function rowsBelow(grid: Grid, headerRow: number): readonly GridRow[] {
  const below = grid.rows.filter((row) => row.number > headerRow);
  const last = below.findLastIndex((row) => !isBlankRow(row));
  return below.slice(0, last + 1);
}

/** Cells of one column in these rows, trimmed, blanks left out. */
export function filledCells(rows: readonly GridRow[], index: number): string[] {
  return rows.map((row) => trimmed(row.cells[index] ?? '')).filter((cell) => cell !== '');
}
