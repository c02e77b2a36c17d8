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
export const LIMITS = { bytes: 25_000_000, rows: 100_000, columns: 200, cellLength: 4_000 } as const;

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
  // most cells begin and end with a plain letter or digit
  return isPlain(cell.charCodeAt(0)) && isPlain(cell.charCodeAt(cell.length - 1)) ? cell : cell.trim();
}

/** Whether nothing but blanks stands in the cell. */
export function isBlank(cell: string): boolean {
  return cell === '' || (!isPlain(cell.charCodeAt(0)) && cell.trim() === '');
}

function isPlain(code: number): boolean {
  return code > 32 && code < 160;
}

/** Whether nothing but blanks stands in the row. */
export function isBlankRow({ cells }: GridRow): boolean {
  for (const cell of cells) if (!isBlank(cell)) return false;
  return true;
}

/** The row with this number, if the grid has it. */
export function rowNumbered(grid: Grid, number: number): GridRow | undefined {
  const row = grid.rows[placeOf(grid, number)];
  return row?.number === number ? row : undefined;
}

/** The rows below the heading row up to the last one with content; blank rows behind it count for nothing. */
export function rowsBelow(grid: Grid, headerRow: number): readonly GridRow[] {
  let end = grid.rows.length;
  while (end > 0 && isBlankRow(grid.rows[end - 1])) end -= 1;
  return grid.rows.slice(placeOf(grid, headerRow + 1), end);
}

/** Place of the first row with this number or a higher one; rows stand in the order of their numbers. */
function placeOf({ rows }: Grid, number: number): number {
  let [low, high] = [0, rows.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rows[middle].number < number) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Cells of one column in these rows, trimmed, blanks left out. */
export function filledCells(rows: readonly GridRow[], index: number): string[] {
  const filled: string[] = [];
  for (const { cells } of rows) {
    const cell = cells[index];
    if (cell !== undefined && !isBlank(cell)) filled.push(trimmed(cell));
  }
  return filled;
}
