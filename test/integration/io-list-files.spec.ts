import { assess, type Design } from '#calc';
import { ioList } from '#documents';
import { parse } from 'csv-parse/sync';
import exceljs from 'exceljs';
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import readExcelFile from 'read-excel-file/node';
import { text } from 'node:stream/consumers';
import { afterAll, describe, expect, it } from 'vitest';
import { type CsvOptions, ioListCsv } from '../../apps/server/src/documents/io-list-csv.ts';
import { HEADING_ROW, writeIoListXlsx } from '../../apps/server/src/documents/io-list-xlsx.ts';
import { headingOf, interpretFile, isFieldKey, NOTHING_REMEMBERED, readFile } from '../../apps/server/src/imports/reading/index.ts';
import { brackwaterDesign } from '../../db/seed/brackwater.ts';
import { seedIds } from '../../db/seed/seed-ids.ts';

/** Texts that a careless export breaks on. */
const HOSTILE = ['=HYPERLINK("x")', '+1+1', '-2+3', '@SUM(A1)', "'quoted", "'=1", '"24"" hatch"', 'line one\nline two', 'a;b\tc,d', 'Größe Ω 3 × 5'];

const design = withHostileTexts(brackwaterDesign({ catalogue: seedIds('catalogue'), row: seedIds('row') }));
const list = ioList(design, assess(design), '2026-05-04');
const folder = mkdtempSync(join(tmpdir(), 'io-list-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const PLAIN: CsvOptions = { delimiter: ',', decimal: '.', bom: false };
const csvOf = (options: Partial<CsvOptions> = {}) => text(ioListCsv(list, { ...PLAIN, ...options }));
const guarded = list.columns.findIndex(({ key }) => key === 'remarks');

describe('the headings of the I/O list', () => {
  it('are those by which the import finds its fields', () => {
    for (const { key, heading, importable } of list.columns) {
      if (importable) expect(isFieldKey(key) && headingOf(key)).toBe(heading);
    }
  });
});

describe('the I/O list as CSV', () => {
  it('quotes cells as RFC 4180 has it, line ends included', async () => {
    const csv = await csvOf();
    expect(csv).toContain('"line one\nline two"');
    expect(csv).toContain('"""24"""" hatch"""');
    expect(csv.endsWith('\r\n')).toBe(true);
    const records = parse(csv, { record_delimiter: '\r\n' });
    expect(records).toHaveLength(1 + design.points.length);
  });

  it('guards what a spreadsheet would run, and says so in the last heading', async () => {
    const [headings, ...rows] = parse(await csvOf(), { record_delimiter: '\r\n' });
    expect(headings.at(-1)).toBe("Lanewright text guard ', decimal point");
    for (const row of rows) expect(row.filter((cell) => /^[=+\-@]/.test(cell) && !/^-?\d+(\.\d+)?$/.test(cell))).toEqual([]);
    expect(rows.map((row) => row[guarded])).toEqual(expect.arrayContaining([`'=HYPERLINK("x")`, `''=1`, `'quoted`]));
  });

  it.each([
    [{}], [{ bom: true }], [{ delimiter: ';', decimal: ',' }], [{ delimiter: '\t' }], [{ delimiter: ',', decimal: ',' }],
  ] as const)('changes nothing when it is imported again: %j', async (options) => {
    const bytes = new TextEncoder().encode(await csvOf(options));
    const reading = await readFile(bytes, {}, design, NOTHING_REMEMBERED);
    const ignored = reading.columns.filter(({ field, heading }) => field === null && !heading.startsWith('Computed') && !heading.startsWith("Lanewright text guard '"));
    expect(ignored).toEqual([]);
    expect(reading.columns.filter(({ heading, field }) => heading.startsWith('Computed') && field !== null)).toEqual([]);
    const plan = interpretFile(reading, design);
    expect(plan.rows.filter(({ action }) => action !== 'same').map(({ values, changes, problems }) => ({ tag: values.tag, changes, problems }))).toEqual([]);
    expect(plan.counts).toMatchObject({ same: 60, problems: 0 });
  });
});

describe('the I/O list as a workbook', () => {
  it('holds the same cells, numbers as numbers, for another reader', async () => {
    const path = await workbook();
    const sheets = await readExcelFile(path);
    expect(sheets.map(({ sheet }) => sheet)).toEqual(['Summary', '+K1', '+K2']);
    list.sheets.forEach(({ rows }, i) => {
      const [headings, ...cells] = sheets[i + 1].data.slice(HEADING_ROW - 1);
      expect(headings).toEqual(list.columns.map(({ heading }) => heading));
      expect(cells).toEqual(rows.map((row) => [...row]));
    });
    expect(sheets[0].data.flat()).toEqual(expect.arrayContaining(['Draft, not for construction', 'I/O list · Brackwater Terminal', 46]));
  });

  it('has no formula cell, a frozen head, a filter and repeated headings', async () => {
    const book = new exceljs.Workbook();
    await book.xlsx.readFile(await workbook());
    const kinds = new Set<exceljs.ValueType>();
    for (const sheet of book.worksheets) sheet.eachRow((row) => row.eachCell((cell) => kinds.add(cell.type)));
    expect([...kinds].sort()).toEqual([exceljs.ValueType.Number, exceljs.ValueType.String]);
    const sheet = book.getWorksheet('+K1')!;
    expect(sheet.views).toMatchObject([{ state: 'frozen', xSplit: 1, ySplit: HEADING_ROW }]);
    expect(sheet.autoFilter).toMatch(/^A2:/);
    expect(sheet.pageSetup).toMatchObject({ orientation: 'landscape', fitToPage: true, fitToWidth: 1, fitToHeight: 0, printTitlesRow: `1:${HEADING_ROW}` });
    expect(sheet.headerFooter.oddFooter).toContain('Page &P of &N');
    expect(sheet.headerFooter.oddHeader).toContain('Draft, not for construction');
    expect(sheet.getCell(HEADING_ROW + 1, 3).numFmt).toBe('@');
  });
});

const office = programVersion('soffice');

describe.skipIf(office === null)(`a spreadsheet program (${office ?? 'soffice is not installed: skipped'})`, () => {
  it.each(['csv', 'xlsx'] as const)('finds no formula in our %s, and the same texts', async (kind) => {
    const path = kind === 'xlsx' ? await workbook() : join(folder, 'list.csv');
    if (kind === 'csv') writeFileSync(path, await csvOf({ bom: true }));
    const flat = asFlatDocument(path);
    expect(flat).not.toMatch(/table:formula=/);
    const shown = kind === 'csv' ? "'=T1.GL1" : '=T1.GL1';
    expect(flat).toContain(`<text:p>${shown.replace("'", '&apos;')}</text:p>`);
  }, 120_000);
});

let written: Promise<string> | null = null;
function workbook(): Promise<string> {
  const path = join(folder, 'list.xlsx');
  written ??= writeIoListXlsx(list, path).then(() => path);
  return written;
}

/** The sheets as one XML text, as the spreadsheet program understands them. */
function asFlatDocument(path: string): string {
  const filter = path.endsWith('.csv') ? ['--infilter=CSV:44,34,76,1,,0,false,true,false,false,false,-1'] : [];
  execFileSync('soffice', [`-env:UserInstallation=file://${folder}/profile`, '--headless', ...filter, '--convert-to', 'fods', '--outdir', folder, path], { stdio: 'ignore', timeout: 100_000 });
  const made = path.replace(/\.\w+$/, '.fods');
  const flat = readFileSync(made, 'utf8');
  rmSync(made);
  return flat;
}

function programVersion(program: string): string | null {
  try {
    return execFileSync(program, ['--version'], { encoding: 'utf8', timeout: 30_000 }).trim();
  } catch {
    return null;
  }
}

function withHostileTexts(given: Design): Design {
  return { ...given, points: given.points.map((point, i) => (i < HOSTILE.length ? { ...point, remarks: HOSTILE[i] } : point)) };
}
