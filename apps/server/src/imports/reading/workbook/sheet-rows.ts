import { LIMITS, type Grid, type GridRow } from '../grid.ts';
import { cellTooLong, tooManyColumns, tooManyRows } from './refusals.ts';

/** Gathers the cells of a sheet into a grid. Cells with nothing but blanks count for nothing beyond a limit. */
export class SheetRows {
  /** Cells by row number and column; holes where the file has none. */
  private readonly rows: (string[] | undefined)[] = [];

  /**
   * @param sheet name of the sheet, for refusals
   * @param rowsLeft how many rows the sheets before this one left of the limit
   */
  constructor(
    private readonly sheet: string,
    private readonly rowsLeft: number,
  ) {}

  /** @throws {ImportRefusal} when the cell lies beyond a limit or is too long */
  set(row: number, column: number, text: string): void {
    const isBeyond = row > this.rowsLeft || column >= LIMITS.columns;
    if (isBeyond && text.trim() === '') return;
    if (row > this.rowsLeft) throw tooManyRows(this.sheet, row);
    if (column >= LIMITS.columns) throw tooManyColumns(this.sheet, row);
    if (text.length > LIMITS.cellLength) throw cellTooLong(this.sheet, row, column);
    const cells = (this.rows[row] ??= []);
    while (cells.length < column) cells.push('');
    cells[column] = text;
  }

  /**
   * Rows 1 to the last with content, each as wide as the widest. Rows that the file leaves out are there too,
   * since a person counts them.
   */
  grid(): Grid {
    const last = this.rows.findLastIndex((cells) => cells?.some((cell) => cell.trim() !== ''));
    const kept = this.rows.slice(0, last + 1);
    const width = kept.reduce((widest, cells) => Math.max(widest, cells?.length ?? 0), 0);
    const blank = Array.from({ length: width }, () => '');
    const rows: GridRow[] = [];
    for (let number = 1; number <= last; number += 1)
      rows.push({ number, line: number, cells: padded(kept[number], blank) });
    return { rows };
  }
}

function padded(cells: string[] | undefined, blank: readonly string[]): readonly string[] {
  if (!cells) return blank;
  for (let i = cells.length; i < blank.length; i += 1) cells.push('');
  return cells;
}
