import { assess, type Design } from '#calc';
import { build } from 'esbuild';
import { execFile } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { generateDesign } from '../../db/seed/generate/generate-design.ts';
import { type Bench, type BenchResult, interleaved, skipped } from './harness.ts';
import { DEMAND_COLUMN, writeSpreadsheet } from './spreadsheet.ts';

const LANES = 10_000;
const ROUNDS = 3;
const SOFFICE = ['/usr/bin/soffice', '/usr/local/bin/soffice'].find((path) => existsSync(path));
const measure = { name: `Whole process over ${LANES} lanes against a spreadsheet`, unit: '× as fast', limit: 5, bound: 'at least' } as const;
const run = promisify(execFile);

/** Both from nothing to a file of results: a spreadsheet program that recalculates its sheet, and Node that assesses the design. */
async function wholeProcess(): Promise<BenchResult> {
  if (!SOFFICE) return skipped(measure, 'LibreOffice (soffice) is not installed, and nothing else here recalculates a workbook');
  const folder = mkdtempSync(join(tmpdir(), 'lanewright-spreadsheet-'));
  try {
    const [book, sheet, input, output, script] = ['lanes.xlsx', 'lanes.csv', 'design.json', 'results.json', 'whole-process.mjs'].map((name) => join(folder, name));
    const design = generateDesign({ lanes: LANES, seed: 1 });
    await writeSpreadsheet(design, book);
    writeFileSync(input, JSON.stringify(design));
    await build({ entryPoints: [join(import.meta.dirname, 'whole-process.ts')], bundle: true, platform: 'node', format: 'esm', outfile: script, logLevel: 'error' });
    const profile = `-env:UserInstallation=file://${join(folder, 'profile')}`;
    const floor = () => run(SOFFICE, [profile, '--headless', '--convert-to', 'csv', '--outdir', folder, book]);
    const subject = () => run(process.execPath, [script, input, output]);
    await floor();
    checkDemands(readFileSync(sheet, 'utf8'), demandsByTag(design));
    return await interleaved({ ...measure, rounds: ROUNDS, floor, subject });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function demandsByTag(design: Design): Map<string, number | null> {
  const { points } = assess(design);
  return new Map(design.points.map(({ id, tag }) => [tag, points.get(id)?.demandUlPer1000h ?? null]));
}

/** A sheet that was not recalculated would be fast and wrong. */
function checkDemands(csv: string, demands: ReadonlyMap<string, number | null>): void {
  const rows = csv.trim().split('\n').slice(1).map((line) => line.split(','));
  const wrong = rows.filter((row) => {
    const demand = demands.get(row[0]);
    return demand !== null && demand !== undefined && Math.abs(Number(row[DEMAND_COLUMN]) - demand) > 1;
  });
  if (rows.length === LANES && wrong.length === 0) return;
  throw new Error(`The spreadsheet gave ${rows.length} rows, ${wrong.length} with another demand, for instance ${wrong[0]?.join(',')}`);
}

export const benches: readonly Bench[] = [wholeProcess];
