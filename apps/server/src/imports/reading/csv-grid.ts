import { CsvError } from 'csv-parse';
import { parse } from 'csv-parse/sync';
import { detectDelimiter, RECORD_ENDS, type Delimiter } from './delimiter.ts';
import { columnLetter, isBlankRow, LIMITS, type Grid, type GridRow } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';

export interface CsvReading {
  readonly grid: Grid;
  readonly delimiter: Delimiter;
}

/**
 * Reads a CSV text into a grid: quotes, doubled quotes and line ends inside quotes as RFC 4180 has them, a
 * stray quote inside a cell taken as text. Blank records keep their place, so that a row's number is the
 * one a person counts.
 *
 * @param text the decoded file
 * @param chosen the delimiter that a person set; detected without it
 * @throws {ImportRefusal} when a quote never closes or a limit is passed
 */
export function readCsv(text: string, chosen?: Delimiter): CsvReading {
  const delimiter = chosen ?? detectDelimiter(text);
  const rows = recordsOf(text, delimiter);
  const last = rows.findLastIndex((row) => !isBlankRow(row));
  const kept = rows.slice(0, last + 1);
  refuseBeyondLimits(kept);
  return { grid: { rows: kept }, delimiter };
}

interface RawRecord {
  readonly record: string[];
  readonly raw: string;
}

function recordsOf(text: string, delimiter: Delimiter): GridRow[] {
  let line = 1;
  return parseRecords(text, delimiter).map(({ record, raw }, i) => {
    const row = { number: i + 1, line, cells: record };
    // `raw` ends with the record's own line end, save in the last record
    line += raw.match(/\r\n|\n|\r/g)?.length ?? 0;
    return row;
  });
}

function parseRecords(text: string, delimiter: Delimiter): RawRecord[] {
  try {
    return parse(text, {
      delimiter,
      record_delimiter: RECORD_ENDS,
      relax_quotes: true,
      relax_column_count: true,
      raw: true,
      // blank rows behind the end count for nothing, but they are not read without end
      to: 2 * LIMITS.rows,
    }) as unknown as RawRecord[];
  } catch (error) {
    throw error instanceof CsvError ? unreadable(error) : error;
  }
}

function unreadable(error: CsvError): ImportRefusal {
  const { lines } = error as CsvError & { readonly lines?: number };
  if (error.code === 'CSV_QUOTE_NOT_CLOSED') {
    return new ImportRefusal(
      'quote-not-closed',
      'A quotation mark is never closed',
      'A cell begins with a quotation mark, and the file ends before the mark that closes it.',
      'Look for a cell with a single quotation mark (a length in inches, for instance), double it or take it out, and choose the file again.',
    );
  }
  return new ImportRefusal(
    'unreadable',
    'The file cannot be read as CSV',
    lines === undefined ? 'Its records are broken.' : `Reading stopped at line ${lines}.`,
    'Open the file in a spreadsheet program, check that line and save it as CSV (UTF-8).',
  );
}

function refuseBeyondLimits(rows: readonly GridRow[]): void {
  if (rows.length > LIMITS.rows) {
    throw new ImportRefusal(
      'too-many-rows',
      'The list has too many rows',
      `Up to ${LIMITS.rows.toLocaleString('en-GB')} rows can be read at once.`,
      'Split the list, for instance by area, and import the parts one after the other.',
    );
  }
  for (const row of rows) {
    refuseWideRow(row);
    refuseLongCell(row);
  }
}

function refuseWideRow(row: GridRow): void {
  if (row.cells.findLastIndex((cell) => cell.trim() !== '') < LIMITS.columns) return;
  throw new ImportRefusal(
    'too-many-columns',
    'The list has too many columns',
    `Row ${row.number} has more than ${LIMITS.columns} columns.`,
    'Delete the columns that no point needs, or check the delimiter.',
  );
}

function refuseLongCell(row: GridRow): void {
  const index = row.cells.findIndex((cell) => cell.length > LIMITS.cellLength);
  if (index < 0) return;
  throw new ImportRefusal(
    'cell-too-long',
    'A cell is too long',
    `Cell ${columnLetter(index)} of row ${row.number} (line ${row.line}) has more than ${LIMITS.cellLength.toLocaleString('en-GB')} characters.`,
    'Look for a quotation mark that opens there and is not closed, or shorten the text.',
  );
}
