import type { Design } from '#calc';
import { hasGuardMark, markedDecimal } from './apostrophe-guard.ts';
import { readCsv } from './csv-grid.ts';
import { decodeText, type Encoding } from './decode.ts';
import { detectDecimalMark } from './decimal-mark.ts';
import type { Delimiter } from './delimiter.ts';
import { DesignIndex } from './design-index.ts';
import { columnIndex, rowsBelow, type DecimalMark, type GridRow } from './grid.ts';
import type { ImportSettings, Mapping } from './plan.ts';
import type { Remembered } from './remembered.ts';
import { mappingOf, suggestMapping, type ColumnSuggestion } from './suggest-mapping.ts';
import { RowSkipper } from './skipped-rows.ts';
import { suggestValues, valueMappingOf, type ValueSuggestion } from './suggest-values.ts';
import { takeSheets, type SheetChoice, type SheetPart, type Table } from './take-sheets.ts';
import { isWorkbook, readWorkbook } from './workbook/index.ts';

/** What a person corrected; everything left out is detected. */
export interface ChosenSettings {
  readonly encoding?: Encoding;
  readonly delimiter?: Delimiter;
  readonly decimal?: DecimalMark;
  /** Number of the lowest row of the headings, in the first sheet taken. */
  readonly headerRow?: number;
  /** Names of the sheets that are taken together. */
  readonly sheets?: readonly string[];
  readonly mapping?: Mapping;
  readonly valueMapping?: ImportSettings['valueMapping'];
}

/** A file as read, with the settings that stand for it now: chosen ones, else suggested ones. */
export interface FileReading {
  readonly format: 'csv' | 'workbook';
  /** Null: a workbook. */
  readonly encoding: Encoding | null;
  readonly delimiter: Delimiter | null;
  /** It is our own CSV, whose guarded texts lose the apostrophe again. */
  readonly ownExport: boolean;
  /** Every sheet of a workbook; a CSV has none. */
  readonly sheets: readonly SheetChoice[];
  /** Formulas in the sheets taken that were saved without their result: their cells are read as blank. */
  readonly formulasWithoutValue: number;
  /** Suggestions for every column, also where a mapping was chosen. */
  readonly columns: readonly ColumnSuggestion[];
  /** Texts of the choice columns and what each is read as. */
  readonly values: readonly ValueSuggestion[];
  readonly settings: ImportSettings;
  /** What is read, each part with its own heading row. */
  readonly parts: readonly SheetPart[];
}

/** Rows whose values are looked at for suggestions. */
const SAMPLE_ROWS = 500;

/**
 * Reads an uploaded list, a CSV or a workbook by its content, and finds its settings: encoding, delimiter,
 * sheets, headings, mapping, decimal sign, and what texts stand for.
 *
 * @param bytes the whole file
 * @param chosen what a person set instead
 * @param design the project it is imported into
 * @param remembered what earlier imports of the organisation said of such headings and texts
 * @param onProgress told now and then how many rows have been read
 * @throws {ImportRefusal} when the file cannot be read
 */
export async function readFile(
  bytes: Uint8Array,
  chosen: ChosenSettings,
  design: Design,
  remembered: Remembered,
  onProgress?: (rows: number) => void,
): Promise<FileReading> {
  const file = isWorkbook(bytes) ? await readTables(bytes, onProgress) : csvTable(bytes, chosen, onProgress);
  const { parts, sheets } = takeSheets(file.tables, chosen);
  const rows = parts.map(({ grid, headerRow }) => rowsBelow(grid, headerRow));
  const { headings, headerRow } = parts[0];
  const columns = suggestMapping(headings, sampleOf(rows), design, remembered);
  const mapping = chosen.mapping ?? mappingOf(columns);
  const index = DesignIndex.of(design);
  const data = parts.map((part, i) => dataRows(part, rows[i], mapping, index));
  const values = suggestValues(data, mapping, index, remembered);
  const valueMapping = valueMappingOf(values, chosen.valueMapping);
  const decimal = chosen.decimal ?? markedDecimal(headings.leaves) ?? detectDecimalMark(data, mapping, file.delimiter);
  return {
    ...{ format: file.format, encoding: file.encoding, delimiter: file.delimiter },
    ...{ sheets, columns, values, parts, formulasWithoutValue: formulasIn(file, parts) },
    ownExport: hasGuardMark(headings.leaves),
    settings: { decimal, headerRow, mapping, ...(valueMapping && { valueMapping }) },
  };
}

/** Totals and repeated headings are no values to choose for. */
function dataRows({ headings }: SheetPart, rows: readonly GridRow[], mapping: Mapping, index: DesignIndex): GridRow[] {
  const tag = Object.entries(mapping).find(([, key]) => key === 'tag')?.[0] ?? '';
  const skipper = new RowSkipper(headings, columnIndex(tag), (each) => index.pointByTag.has(each));
  return rows.filter((row) => skipper.reason(row) === null);
}

interface TablesOfFile extends Pick<FileReading, 'format' | 'encoding' | 'delimiter'> {
  readonly tables: readonly (Table & { readonly formulasWithoutValue: number })[];
}

async function readTables(bytes: Uint8Array, onProgress?: (rows: number) => void): Promise<TablesOfFile> {
  const { sheets } = await readWorkbook(bytes, onProgress && { onProgress });
  return { format: 'workbook', encoding: null, delimiter: null, tables: sheets };
}

function csvTable(bytes: Uint8Array, chosen: ChosenSettings, onProgress?: (rows: number) => void): TablesOfFile {
  const { text, encoding } = decodeText(bytes, chosen.encoding);
  const { grid, delimiter } = readCsv(text, chosen.delimiter, onProgress);
  return { format: 'csv', encoding, delimiter, tables: [{ name: null, hidden: false, grid, merges: [], formulasWithoutValue: 0 }] };
}

function formulasIn({ tables }: TablesOfFile, parts: readonly SheetPart[]): number {
  const taken = new Set(parts.map(({ sheet }) => sheet));
  return tables.reduce((sum, each) => sum + (taken.has(each.name) ? each.formulasWithoutValue : 0), 0);
}

/** The first rows of the sheets together. */
function sampleOf(parts: readonly (readonly GridRow[])[]): GridRow[] {
  const sample: GridRow[] = [];
  for (const rows of parts) sample.push(...rows.slice(0, SAMPLE_ROWS - sample.length));
  return sample;
}
