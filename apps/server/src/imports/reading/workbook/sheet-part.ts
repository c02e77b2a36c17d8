import { columnIndex, type Grid } from '../grid.ts';
import { BOUNDS } from './bounds.ts';
import { detached, TextCollector, unescaped } from './cell-text.ts';
import { isoCellText } from './date-text.ts';
import type { NumberFormat } from './number-format.ts';
import { damaged, tooMuchInside } from './refusals.ts';
import { SheetRows } from './sheet-rows.ts';
import type { CellFormats } from './styles-part.ts';
import type { Attributes, XmlHandlers } from './xml.ts';

/** Cells that are shown as one; rows are the sheet's numbers, columns count from 0, both ends belong to it. */
export interface Merge {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

/** What the cells of every sheet refer to. */
export interface SheetContext {
  readonly strings: readonly string[];
  readonly formats: CellFormats;
}

export interface SheetContent {
  readonly grid: Grid;
  readonly merges: readonly Merge[];
  readonly formulasWithoutValue: number;
}

/** Rows and columns that a spreadsheet can have; a place beyond them is no place. */
const LAST_ROW = 1_048_576;
const LAST_COLUMN = 16_383;
/** Larger numbers than a spreadsheet can hold are shown as they are written. */
const LARGEST = 1e306;

/** Reads the cells of one sheet as the parser comes to them. */
export class SheetReader implements XmlHandlers {
  readonly skip: ReadonlySet<string> = new Set(['rPh', 'phoneticPr', 'extLst', 'AlternateContent', 'dataValidations']);
  /** Rows that have been read so far. */
  rowsRead = 0;
  private readonly rows: SheetRows;
  private readonly merges: Merge[] = [];
  private readonly value = new TextCollector();
  private readonly columns = new Map<string, number>();
  private formulasWithoutValue = 0;
  private row = 0;
  private column = -1;
  private cell: Attributes | null = null;
  private hasFormula = false;
  private collecting = false;

  constructor(
    private readonly sheet: string,
    rowsLeft: number,
    private readonly context: SheetContext,
  ) {
    this.rows = new SheetRows(sheet, rowsLeft);
  }

  open(name: string, attributes: Attributes): void {
    if (name === 'c') this.beginCell(attributes);
    else if (name === 'v' || name === 't') this.collecting = this.cell !== null;
    else if (name === 'f') this.hasFormula = true;
    else if (name === 'row') this.beginRow(attributes);
    else if (name === 'mergeCell') this.addMerge(attributes);
  }

  text(text: string): void {
    if (this.collecting) this.value.add(text);
  }

  close(name: string): void {
    if (name === 'c') this.endCell();
    else if (name === 'v' || name === 't') this.collecting = false;
    else if (name === 'row') this.rowsRead += 1;
  }

  content(): SheetContent {
    return { grid: this.rows.grid(), merges: this.merges, formulasWithoutValue: this.formulasWithoutValue };
  }

  /** Rows and cells may leave out their place; then each stands behind the one before. */
  private beginRow({ r }: Attributes): void {
    this.row = r === undefined ? this.row + 1 : Number(r);
    this.column = -1;
    if (!(this.row >= 1 && this.row <= LAST_ROW && Number.isInteger(this.row))) throw this.misplaced();
  }

  private beginCell(attributes: Attributes): void {
    const { r } = attributes;
    this.cell = attributes;
    this.hasFormula = false;
    this.value.clear();
    this.column = r === undefined ? this.column + 1 : this.columnOf(r);
    if (!(this.column >= 0 && this.column <= LAST_COLUMN && this.row >= 1)) throw this.misplaced();
  }

  private endCell(): void {
    if (!this.cell) return;
    const { t = 'n', s } = this.cell;
    const text = this.cellText(t, s, this.value.text);
    if (text === '' && this.hasFormula && t !== 'str') this.formulasWithoutValue += 1;
    if (text !== '') this.rows.set(this.row, this.column, text);
    this.cell = null;
  }

  private cellText(t: string, s: string | undefined, raw: string): string {
    if (t === 'str' || t === 'inlineStr') return this.formatOf(s).text(detached(unescaped(raw)));
    const value = raw.trim();
    if (value === '') return '';
    if (t === 'n') return this.numberText(value, s);
    if (t === 's') return this.formatOf(s).text(this.sharedString(value));
    if (t === 'b') return value === '0' || value === 'false' ? 'FALSE' : 'TRUE';
    return t === 'd' ? isoCellText(value) : detached(value);
  }

  private numberText(raw: string, style: string | undefined): string {
    const value = Number(raw);
    return Math.abs(value) < LARGEST ? this.formatOf(style).number(value) : detached(raw);
  }

  private sharedString(raw: string): string {
    const text = this.context.strings[Number(raw)];
    if (text === undefined) throw damaged(`A text of sheet “${this.sheet}” is missing.`);
    return text;
  }

  private formatOf(style = '0'): NumberFormat {
    return this.context.formats(Number(style));
  }

  private columnOf(ref: string): number {
    const letters = ref.slice(0, lettersIn(ref));
    const column = this.columns.get(letters) ?? columnIndex(letters);
    this.columns.set(letters, column);
    return column;
  }

  private addMerge({ ref = '' }: Attributes): void {
    const [from, to = from] = ref.split(':').map(placeOf);
    const isRange = from.column >= 0 && to.column >= from.column && from.row >= 1 && to.row >= from.row;
    if (!isRange) throw damaged(`A merged range of sheet “${this.sheet}” is no range.`);
    if (this.merges.length === BOUNDS.merges) throw tooMuchInside(`Sheet “${this.sheet}” has too many merged ranges.`);
    this.merges.push({ top: from.row, left: from.column, bottom: to.row, right: to.column });
  }

  private misplaced(): Error {
    return damaged(`A cell of sheet “${this.sheet}” has no place.`);
  }
}

/** Row and column of a reference such as `B12`; column -1 when it is none. */
function placeOf(ref: string): { readonly row: number; readonly column: number } {
  const letters = lettersIn(ref);
  return { row: Number(ref.slice(letters)), column: columnIndex(ref.slice(0, letters)) };
}

function lettersIn(ref: string): number {
  let letters = 0;
  while (ref.charCodeAt(letters) >= 65) letters += 1;
  return letters;
}
