import { CsvRecords, QuoteNotClosed } from './csv-records.ts';
import { detectDelimiter, type Delimiter } from './delimiter.ts';
import { columnLetter, isBlank, isBlankRow, LIMITS, type Grid, type GridRow } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';

export interface CsvReading {
  readonly grid: Grid;
  readonly delimiter: Delimiter;
}

const PROGRESS_ROWS = 1_000;

/**
 * Reads a CSV text into a grid: quotes, doubled quotes and line ends inside quotes as RFC 4180 has them, a
 * stray quote inside a cell taken as text. Blank records keep their place, so that a row's number is the
 * one a person counts.
 *
 * @param text the decoded file
 * @param chosen the delimiter that a person set; detected without it
 * @param onProgress told every thousand records how many have been read
 * @throws {ImportRefusal} when a quote never closes or a limit is passed
 */
export function readCsv(text: string, chosen?: Delimiter, onProgress?: (rows: number) => void): CsvReading {
  const delimiter = chosen ?? detectDelimiter(text);
  const rows = rowsOf(text, delimiter, onProgress);
  while (rows.length > 0 && isBlankRow(rows[rows.length - 1])) rows.pop();
  refuseBeyondLimits(rows);
  return { grid: { rows }, delimiter };
}

function rowsOf(text: string, delimiter: Delimiter, onProgress?: (rows: number) => void): GridRow[] {
  const records = new CsvRecords(text, delimiter);
  const rows: GridRow[] = [];
  try {
    // blank rows behind the end count for nothing, but they are not read without end
    while (rows.length < 2 * LIMITS.rows) {
      const { line } = records;
      const cells = records.next();
      if (!cells) break;
      rows.push({ number: rows.length + 1, line, cells });
      if (rows.length % PROGRESS_ROWS === 0) onProgress?.(rows.length);
    }
  } catch (error) {
    throw error instanceof QuoteNotClosed ? quoteNotClosed() : error;
  }
  return rows;
}

function quoteNotClosed(): ImportRefusal {
  return new ImportRefusal(
    'quote-not-closed',
    'A quotation mark is never closed',
    'A cell begins with a quotation mark, and the file ends before the mark that closes it.',
    'Look for a cell with a single quotation mark (a length in inches, for instance), double it or take it out, and choose the file again.',
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
    if (row.cells.length > LIMITS.columns) refuseWideRow(row);
    for (const cell of row.cells) if (cell.length > LIMITS.cellLength) refuseLongCell(row);
  }
}

function refuseWideRow(row: GridRow): void {
  if (row.cells.findLastIndex((cell) => !isBlank(cell)) < LIMITS.columns) return;
  throw new ImportRefusal(
    'too-many-columns',
    'The list has too many columns',
    `Row ${row.number} has more than ${LIMITS.columns} columns.`,
    'Delete the columns that no point needs, or check the delimiter.',
  );
}

function refuseLongCell(row: GridRow): never {
  const index = row.cells.findIndex((cell) => cell.length > LIMITS.cellLength);
  throw new ImportRefusal(
    'cell-too-long',
    'A cell is too long',
    `Cell ${columnLetter(index)} of row ${row.number} (line ${row.line}) has more than ${LIMITS.cellLength.toLocaleString('en-GB')} characters.`,
    'Look for a quotation mark that opens there and is not closed, or shorten the text.',
  );
}
