import { parse } from 'csv-parse/sync';
import ExcelJS from 'exceljs';
import { buffer } from 'node:stream/consumers';
import { PassThrough } from 'node:stream';
import readExcelFile from 'read-excel-file/node';
import { describe, expect, it } from 'vitest';
import { tagListBytes } from '#support/brackwater-setup.ts';
import { readWorkbook } from './index.ts';
import { hasLibreOffice, shownByLibreOffice } from './testing/libreoffice.ts';

type Table = readonly (readonly string[])[];

/** Rows without the blank cells at their ends and the blank rows at the table's, which readers count differently. */
function core(table: Table): Table {
  const rows = table.map((row) => row.slice(0, row.findLastIndex((cell) => cell.trim() !== '') + 1));
  return rows.slice(0, rows.findLastIndex((row) => row.length > 0) + 1);
}

async function ours(bytes: Uint8Array): Promise<ReadonlyMap<string, Table>> {
  const { sheets } = await readWorkbook(bytes);
  return new Map(sheets.map(({ name, grid }) => [name, core(grid.rows.map(({ cells }) => cells))]));
}

/** A workbook in which every value looks the same however it is read, but for what is under test. */
async function generated(): Promise<Buffer> {
  const sink = new PassThrough();
  const writer = new ExcelJS.stream.xlsx.WorkbookWriter({ stream: sink, useStyles: true, useSharedStrings: true });
  const sheet = writer.addWorksheet('List');
  for (let i = 0; i < 400; i += 1) {
    const cells = [
      `GC${i % 7}-L${i}`,
      i / 8,
      i * 1000,
      new Date(Date.UTC(2026, 0, 1 + i, 6, i % 60)),
      i % 3 === 0,
      `=T1, "${i}"`,
    ];
    const row = sheet.addRow(i % 11 === 5 ? [] : [...cells, (i % 50) / 100, i % 13 === 0 ? null : ' ä — µ ', i]);
    row.getCell(4).numFmt = 'yyyy-mm-dd hh:mm';
    row.getCell(7).numFmt = '0%';
    row.getCell(9).numFmt = '"C"000';
    row.commit();
  }
  const bytes = buffer(sink);
  await writer.commit();
  return bytes;
}

/** Their times are off by fractions of a second, as the days they are counted in are. */
function minuteOf(date: Date): string {
  const second = Math.round(date.getTime() / 1000);
  return new Date(second * 1000).toISOString().slice(0, 16).replace('T', ' ').replace(' 00:00', '');
}

/** What read-excel-file gives, in our texts; it knows nothing of percentages and of words in formats. */
function theirText(value: unknown, column: number): string {
  if (value instanceof Date) return minuteOf(value);
  if (typeof value === 'boolean') return value ? 'TRUE' : 'FALSE';
  if (typeof value !== 'number') return typeof value === 'string' ? value : '';
  if (column === 6) return `${Math.round(value * 100)}%`;
  return column === 8 ? `C${String(value).padStart(3, '0')}` : String(value);
}

describe('another reader of workbooks', () => {
  it('sees the same cells in a generated list', async () => {
    const bytes = await generated();
    const [theirs] = await readExcelFile(bytes, { trim: false });
    const table = theirs.data.map((row) => row.map(theirText));
    expect((await ours(bytes)).get('List')).toEqual(core(table));
  });

  it('sees the same cells in the issued signal list', async () => {
    const bytes = Buffer.from(tagListBytes('brackwater-signals.xlsx'));
    const theirs = await readExcelFile(bytes, { trim: false });
    const mine = await ours(bytes);
    for (const { sheet, data } of theirs) {
      expect(mine.get(sheet)).toEqual(core(data.map((row) => row.map((value) => theirText(value, 0)))));
    }
  });
});

describe('a spreadsheet program', () => {
  it.skipIf(!hasLibreOffice)('shows the same cells (needs LibreOffice)', { timeout: 60_000 }, async () => {
    const workbooks = [await generated(), tagListBytes('brackwater-signals.xlsx')];
    const shown = shownByLibreOffice(workbooks);
    for (const [i, bytes] of workbooks.entries()) {
      const theirs = [...shown[i]].map(
        ([name, csv]) => [name, core(parse(csv, { relax_column_count: true }))] as const,
      );
      expect(new Map(theirs)).toEqual(await ours(bytes));
    }
  });
});
