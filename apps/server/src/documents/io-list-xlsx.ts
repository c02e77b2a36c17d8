import type { IoColumn, IoList } from '#documents';
import exceljs from 'exceljs';
import { sheetNames } from './sheet-names.ts';
import { writeSummary } from './io-list-xlsx-summary.ts';
import { bookStyles, pageOf, type SheetWriter } from './xlsx-page.ts';

/** Row of the headings in a cabinet's sheet: above it stands one line that says what the sheet is. */
export const HEADING_ROW = 2;

/**
 * Writes the I/O list as a workbook: a summary and one sheet a cabinet, whose table can be imported.
 * Numbers are numbers; texts are strings with the text format, so that a designation such as =T1.GL1
 * never becomes a formula. The stream knows no back-pressure, therefore it writes to a file.
 *
 * @param path where the file is made; overwritten
 */
export async function writeIoListXlsx(list: IoList, path: string): Promise<void> {
  const book = new exceljs.stream.xlsx.WorkbookWriter({ filename: path, useStyles: true, useSharedStrings: true });
  book.creator = 'Lanewright';
  book.created = new Date(`${list.date}T00:00:00Z`);
  const names = sheetNames(['Summary', ...list.sheets.map(({ cabinet }) => cabinet ?? 'No cabinet')]);
  writeSummary(book.addWorksheet(names[0], pageOf(list, {})), list);
  list.sheets.forEach((sheet, i) => {
    const options = pageOf(list, { titleRows: HEADING_ROW });
    const title = sheet.cabinet === null ? 'I/O list, points without a cabinet' : `I/O list, cabinet ${sheet.cabinet}`;
    writeCabinet(book.addWorksheet(names[i + 1], options), list, [title, sheet.description].filter(Boolean).join(': '), sheet.rows);
  });
  await book.commit();
}

function writeCabinet(sheet: SheetWriter, list: IoList, title: string, rows: IoList['rows']): void {
  const { columns } = list;
  const styles = columns.map(cellStyle);
  sheet.columns = columns.map(({ width }, i) => ({ width, style: styles[i] }));
  const line = sheet.addRow([`${title} · ${list.project} · ${list.state} · ${list.date}`]);
  line.getCell(1).style = bookStyles.title;
  line.commit();
  const headings = sheet.addRow(columns.map(({ heading }) => heading));
  columns.forEach((column, i) => (headings.getCell(i + 1).style = column.importable ? bookStyles.heading : bookStyles.derivedHeading));
  headings.height = 32;
  headings.commit();
  sheet.autoFilter = { from: { row: HEADING_ROW, column: 1 }, to: { row: HEADING_ROW + rows.length, column: columns.length } };
  for (const row of rows) writeRow(sheet, row, styles);
  sheet.commit();
}

/**
 * Blank cells are left out: the column's style holds there. The others get the column's very style object, which
 * the writer knows again; it would look at a copy for each cell anew.
 */
function writeRow(sheet: SheetWriter, cells: IoList['rows'][number], styles: readonly Partial<exceljs.Style>[]): void {
  const row = sheet.addRow([]);
  cells.forEach((value, i) => {
    if (value === null) return;
    const cell = row.getCell(i + 1);
    cell.value = value;
    cell.style = styles[i];
  });
  row.commit();
}

/** "@" is the text format: a designation that somebody edits stays a text. */
function cellStyle({ kind, decimals }: IoColumn): Partial<exceljs.Style> {
  const numFmt = kind === 'text' ? '@' : kind === 'integer' ? '0' : decimals === null ? 'General' : `0.${'0'.repeat(decimals)}`;
  return { numFmt, font: bookStyles.font, alignment: { vertical: 'top', horizontal: kind === 'text' ? 'left' : 'right' } };
}
