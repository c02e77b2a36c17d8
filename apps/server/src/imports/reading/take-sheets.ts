import { type Grid, rowsBelow } from './grid.ts';
import { findHeaderRow } from './header-row.ts';
import { headingsAt, headingText, type Headings, type MergedCells } from './heading-block.ts';
import { ImportRefusal } from './import-refusal.ts';
import { headingKey } from './remembered.ts';

/** A table of a file: a sheet of a workbook, or all of a CSV. */
export interface Table {
  /** Null: the file is a CSV. */
  readonly name: string | null;
  readonly hidden: boolean;
  readonly grid: Grid;
  readonly merges: readonly MergedCells[];
}

/** A table that is taken, with its own headings. */
export interface SheetPart {
  readonly sheet: string | null;
  readonly grid: Grid;
  /** Number of the row that names the columns. */
  readonly headerRow: number;
  readonly headings: Headings;
}

/** A sheet of the file and whether it is taken. */
export interface SheetChoice {
  readonly name: string;
  /** Rows below its headings. */
  readonly rows: number;
  readonly taken: boolean;
  /** Its headings are those of the sheets taken. */
  readonly alike: boolean;
}

export interface TakenSheets {
  readonly parts: readonly SheetPart[];
  /** Empty for a CSV. */
  readonly sheets: readonly SheetChoice[];
}

interface Chosen {
  readonly headerRow?: number;
  readonly sheets?: readonly string[];
}

interface Headed {
  readonly table: Table;
  readonly detected: number;
  readonly named: number;
  readonly rows: number;
}

/**
 * Takes the tables that are imported together: those that a person named, else the one whose headings
 * name most fields and every visible one with the same headings. The heading row that a person chose is
 * that of the first table taken; another has its own where its headings stand elsewhere.
 *
 * @throws {ImportRefusal} when a named sheet is not there or unlike the others, or nothing has content
 */
export function takeSheets(tables: readonly Table[], chosen: Chosen): TakenSheets {
  const headed = tables.map(headedTable);
  const first = firstTaken(headed, chosen.sheets);
  const headerRow = chosen.headerRow ?? first.detected;
  const headings = headingsAt(first.table.grid, headerRow, first.table.merges);
  const wanted = signature(headings);
  const all = headed.map((each) => {
    const part = each === first ? partOf(each, headerRow) : alikePart(each, [headerRow, each.detected], wanted);
    return { each, part, taken: isTaken(each.table, part !== null, chosen.sheets) };
  });
  refuseUnlike(all.filter(({ part, taken }) => taken && part === null).map(({ each }) => each.table));
  return {
    parts: all.flatMap(({ part, taken }) => (taken && part ? [part] : [])),
    sheets: all.flatMap(({ each, part, taken }) => choiceOf(each, part, taken)),
  };
}

function headedTable(table: Table): Headed {
  const header = findHeaderRow(table.grid, table.merges);
  const detected = header?.number ?? 1;
  return { table, detected, named: header?.named ?? -1, rows: rowsBelow(table.grid, detected).length };
}

function firstTaken(headed: readonly Headed[], names: readonly string[] | undefined): Headed {
  const missing = names?.find((name) => !headed.some(({ table }) => table.name === name));
  if (missing !== undefined) {
    throw new ImportRefusal('sheet-unknown', 'There is no such sheet', `The workbook has no sheet “${missing}”.`, 'Choose the sheets again.');
  }
  const open = headed.filter(({ table }) => (names ? names.includes(table.name ?? '') : !table.hidden));
  const best = (open.length > 0 ? open : headed).reduce((a, b) => (better(b, a) ? b : a));
  if (best.named >= 0) return best;
  throw new ImportRefusal('no-rows', 'There are no rows to import', 'The sheet has no content.', 'Check that the list was saved, or choose another sheet.');
}

/** More fields named, or where none is, more rows. */
function better(a: Headed, b: Headed): boolean {
  return a.named > b.named || (a.named === b.named && a.rows > b.rows);
}

function partOf({ table }: Headed, headerRow: number): SheetPart {
  return { sheet: table.name, grid: table.grid, headerRow, headings: headingsAt(table.grid, headerRow, table.merges) };
}

function alikePart(headed: Headed, rows: readonly number[], wanted: string): SheetPart | null {
  if (wanted === '') return null;
  return rows.map((row) => partOf(headed, row)).find(({ headings }) => signature(headings) === wanted) ?? null;
}

/** Headings as they are compared; columns without any at the end do not count. */
function signature(headings: Headings): string {
  return headings.leaves.map((_, i) => headingKey(headingText(headings, i))).join('\n').trimEnd();
}

function isTaken({ name, hidden }: Table, alike: boolean, names: readonly string[] | undefined): boolean {
  return names ? names.includes(name ?? '') : alike && !hidden;
}

function refuseUnlike([table]: readonly Table[]): void {
  if (!table) return;
  throw new ImportRefusal(
    'sheets-unlike',
    'The sheets have different headings',
    `The headings of sheet “${table.name}” are not those of the others.`,
    'Import it by itself, or give it the same headings in the same columns.',
  );
}

function choiceOf({ table, detected }: Headed, part: SheetPart | null, taken: boolean): SheetChoice[] {
  if (table.name === null) return [];
  const { grid, name } = table;
  return [{ name, rows: rowsBelow(grid, part?.headerRow ?? detected).length, taken, alike: part !== null }];
}
