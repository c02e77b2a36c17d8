import type { IoCell, IoColumn, IoList } from '#documents';
import { stringify } from 'csv-stringify';
import { pipeline, Readable } from 'node:stream';
import { guardText, markHeadings } from '../imports/reading/index.ts';

export interface CsvOptions {
  readonly delimiter: ',' | ';' | '\t';
  readonly decimal: '.' | ',';
  /** Byte order mark, by which some spreadsheet programs tell UTF-8. */
  readonly bom: boolean;
}

/**
 * The I/O list as CSV (RFC 4180, UTF-8): one heading row, one row a point, and nothing else, so that the
 * file can be imported as it is. Texts that a spreadsheet would run carry the apostrophe guard, which the
 * last heading announces; numbers have no grouping.
 */
export function ioListCsv(list: IoList, { delimiter, decimal, bom }: CsvOptions): Readable {
  const writer = stringify({
    delimiter, bom, record_delimiter: '\r\n', escape_formulas: false,
    // Without it a lone line feed inside a text would pass unquoted.
    quoted_match: /[\r\n]/,
  });
  // Joined both ways: a row that fails ends the writer with its error, a reader who leaves ends the rows.
  return pipeline(Readable.from(records(list, decimal)), writer, () => undefined);
}

function* records({ columns, rows }: IoList, decimal: CsvOptions['decimal']): Generator<string[]> {
  yield markHeadings(columns.map(({ heading }) => heading), decimal);
  for (const row of rows) yield [...row.map((cell, i) => cellText(cell, columns[i], decimal)), ''];
}

function cellText(cell: IoCell, { decimals }: IoColumn, decimal: CsvOptions['decimal']): string {
  if (cell === null) return '';
  if (typeof cell === 'string') return guardText(cell);
  const text = decimals === null ? plainNumber(cell) : cell.toFixed(decimals);
  return decimal === ',' ? text.replace('.', ',') : text;
}

/** Without an exponent, which not every program reads. */
function plainNumber(value: number): string {
  const text = String(value);
  return text.includes('e') ? value.toFixed(12).replace(/\.?0+$/, '') : text;
}
