import { assess } from '#calc';
import { IO_COLUMNS, ioList } from '#documents';
import { stringify } from 'csv-stringify';
import exceljs from 'exceljs';
import { createWriteStream } from 'node:fs';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { generateDesign } from '../../db/seed/generate/generate-design.ts';

/** A column of the import files: where it goes in the database, and under which key the I/O list has it. */
interface ImportField {
  readonly key: string;
  readonly table: 'points' | 'dispensers';
  /** Of the table; for dispensers of the temporary table, whose values are turned into rows. */
  readonly column: string;
  readonly type: 'text' | 'float8';
}

const point = (key: string, column: string, type: ImportField['type'] = 'text'): ImportField => ({ key, table: 'points', column, type });
const dispenser = (key: string, column: string): ImportField => ({ key, table: 'dispensers', column, type: 'text' });

/** Fourteen columns that the import knows by the I/O list's headings. */
export const IMPORT_FIELDS: readonly ImportField[] = [
  point('tag', 'tag'), point('description', 'description'), point('function', 'function'), point('location', 'location'), point('product', 'product'), point('machine', 'machine'),
  dispenser('dispenserType', 'type_name'), dispenser('cartridgeCm3', 'cartridge_cm3'), dispenser('doseCm3', 'dose_cm3'),
  point('boreMm', 'bore_mm', 'float8'), point('outsideMm', 'outside_mm', 'float8'), point('widthMm', 'width_mm', 'float8'), point('speedRpm', 'speed_rpm', 'float8'),
  point('hoursPerDay', 'hours_per_day', 'float8'),
];

/** Heading row and rows of a generated plant's points with their dispensers, cells in the order of `IMPORT_FIELDS`. */
export function importRows(lanes: number): (string | number | null)[][] {
  const design = generateDesign({ lanes, seed: 1 });
  const { rows } = ioList(design, assess(design), '2026-05-04');
  const places = IMPORT_FIELDS.map(({ key }) => IO_COLUMNS.findIndex((column) => column.key === key));
  return [places.map((place) => IO_COLUMNS[place].heading), ...rows.map((row) => places.map((place) => row[place]))];
}

/** Writes them as CSV. @param path overwritten */
export const writeCsv = (rows: readonly (string | number | null)[][], path: string): Promise<void> =>
  pipeline(Readable.from(rows), stringify({ record_delimiter: '\r\n' }), createWriteStream(path));

/** Writes them as a workbook of one sheet. @param path overwritten */
export async function writeXlsx(rows: readonly (string | number | null)[][], path: string): Promise<void> {
  const book = new exceljs.stream.xlsx.WorkbookWriter({ filename: path, useSharedStrings: true });
  const sheet = book.addWorksheet('Points');
  for (const row of rows) sheet.addRow(row.map((cell) => cell ?? undefined)).commit();
  await book.commit();
}
