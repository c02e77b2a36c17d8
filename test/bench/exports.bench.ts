import { assess, type Assessment, type Design } from '#calc';
import { ioList, type IoList } from '#documents';
import { stringify } from 'csv-stringify';
import exceljs from 'exceljs';
import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable, Writable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ioListCsv } from '../../apps/server/src/documents/io-list-csv.ts';
import { writeIoListXlsx } from '../../apps/server/src/documents/io-list-xlsx.ts';
import { generateDesign } from '../../db/seed/generate/generate-design.ts';
import { type Bench, type BenchResult, interleaved, peakMemory, resultOf } from './harness.ts';

const DAY = '2026-05-04';
const MOST_MB = 200;
const SIZES = [10_000, 50_000];
const ROUNDS: Readonly<Record<number, number>> = { 10_000: 5, 50_000: 3 };
const folder = mkdtempSync(join(tmpdir(), 'lanewright-exports-'));
process.on('exit', () => rmSync(folder, { recursive: true, force: true }));

interface Assessed {
  readonly design: Design;
  readonly assessment: Assessment;
}

const assessedProject = (lanes: number): Assessed => {
  const design = generateDesign({ lanes, seed: 1 });
  return { design, assessment: assess(design) };
};

const listOf = ({ design, assessment }: Assessed): IoList => ioList(design, assessment, DAY);

/** Takes all and keeps nothing, at its own pace. */
const nowhere = (): Writable => new Writable({ write: (_chunk, _encoding, done) => setImmediate(done) });

/** The bare writer: the cells as they are, no guard, no decimals. */
const bareCsv = ({ columns, rows }: IoList) => () =>
  pipeline(Readable.from([columns.map(({ heading }) => heading), ...rows]), stringify({ record_delimiter: '\r\n' }), nowhere());

/** The bare writer: one sheet with the columns' styles. */
const bareXlsx = ({ columns, rows }: IoList) => async (): Promise<void> => {
  const book = new exceljs.stream.xlsx.WorkbookWriter({ filename: join(folder, 'bare.xlsx'), useStyles: true, useSharedStrings: true });
  const sheet = book.addWorksheet('I/O list');
  sheet.columns = columns.map(({ width, kind, decimals }) => {
    const numFmt = kind === 'text' ? '@' : kind === 'integer' ? '0' : decimals === null ? 'General' : `0.${'0'.repeat(decimals)}`;
    return { width, style: { numFmt, font: { name: 'Arial', size: 9 }, alignment: { vertical: 'top', horizontal: kind === 'text' ? 'left' : 'right' } } };
  });
  for (const row of rows) sheet.addRow([...row]).commit();
  await book.commit();
};

const csv = async (list: IoList): Promise<void> => pipeline(ioListCsv(list, { delimiter: ',', decimal: '.', bom: true }), nowhere());
const xlsx = (list: IoList): Promise<void> => writeIoListXlsx(list, join(folder, 'list.xlsx'));

/** From the list as it is built to its last byte. */
async function exportTimes(): Promise<BenchResult[]> {
  const results: BenchResult[] = [];
  for (const lanes of SIZES) {
    const list = listOf(assessedProject(lanes));
    const measure = { unit: '× bare writer', limit: 1.5, rounds: ROUNDS[lanes] };
    results.push(await interleaved({ ...measure, name: `I/O list of ${lanes} rows as CSV`, floor: bareCsv(list), subject: () => csv(list) }));
    results.push(await interleaved({ ...measure, name: `I/O list of ${lanes} rows as XLSX`, floor: bareXlsx(list), subject: () => xlsx(list) }));
  }
  return results;
}

/** What an export needs on top of the assessed project, in a process of its own each. */
async function exportMemory(): Promise<BenchResult[]> {
  const results: BenchResult[] = [];
  const script = join(import.meta.dirname, 'export-process.ts');
  for (const lanes of SIZES) {
    const path = join(folder, `design-${lanes}.json`);
    writeFileSync(path, JSON.stringify(generateDesign({ lanes, seed: 1 })));
    const assessedMb = await peakMemory(script, ['nothing', path, folder]);
    for (const format of ['csv', 'xlsx'] as const) {
      const mb = await peakMemory(script, [format, path, folder]);
      const note = `${mb.toFixed(0)} MB with the project itself (${(statSync(path).size / 1e6).toFixed(0)} MB as JSON), ${assessedMb.toFixed(0)} MB for that alone`;
      const name = `I/O list of ${lanes} rows as ${format.toUpperCase()}, memory beyond the assessed project`;
      results.push(resultOf({ name, unit: 'MB', limit: MOST_MB }, Math.max(0, mb - assessedMb), note));
    }
  }
  return results;
}

export const benches: readonly Bench[] = [exportTimes, exportMemory];
