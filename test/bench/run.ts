/**
 * Runs the benches of every *.bench.ts beside this file, one after the other, on a throw-away cluster.
 * Run by `npm run bench`; `--only TEXT` takes those whose file or name holds the text, `--json FILE` writes
 * the results. Ends with 0 once all ran, limit kept or not, and with 1 where one broke.
 */
import { readdirSync, writeFileSync } from 'node:fs';
import { stderr, stdout } from 'node:process';
import { parseArgs } from 'node:util';
import { startCluster } from '../../apps/launcher/cluster.mjs';
import { closeBenchServer } from './bench-server.ts';
import type { Bench, BenchResult } from './harness.ts';
import { tableOf } from './results-table.ts';

interface Found {
  /** File and function, for instance `exports.bench.ts csvExport`. */
  readonly label: string;
  readonly bench: Bench;
}

async function findBenches(only: string): Promise<Found[]> {
  const files = readdirSync(import.meta.dirname).filter((name) => name.endsWith('.bench.ts')).sort();
  const found: Found[] = [];
  for (const file of files) {
    const { benches } = (await import(`./${file}`)) as { readonly benches: readonly Bench[] };
    found.push(...benches.map((bench, i) => ({ label: `${file} ${bench.name || i + 1}`, bench })));
  }
  return found.filter(({ label }) => label.toLowerCase().includes(only.toLowerCase()));
}

interface Outcome {
  readonly results: BenchResult[];
  readonly broken: number;
}

async function runAll(found: readonly Found[]): Promise<Outcome> {
  const results: BenchResult[] = [];
  let broken = 0;
  for (const { label, bench } of found) {
    stderr.write(`  … ${label}\n`);
    try {
      results.push(...[await bench()].flat());
    } catch (error) {
      broken++;
      stderr.write(`  ✗ ${label} broke: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    }
  }
  return { results, broken };
}

async function main(): Promise<number> {
  const { only = '', json } = parseArgs({ options: { only: { type: 'string' }, json: { type: 'string' } } }).values;
  const found = await findBenches(only);
  if (found.length === 0) throw new Error(`No bench is named “${only}”.`);
  const cluster = await startCluster({ durable: false });
  process.env['BENCH_ADMIN_URL'] = cluster.adminUrl;
  try {
    const { results, broken } = await runAll(found);
    stdout.write(`\n${tableOf(results)}\n`);
    if (json !== undefined) writeFileSync(json, `${JSON.stringify(results, null, 2)}\n`);
    if (broken > 0) stdout.write(`${broken} of ${found.length} benches broke; see above.\n`);
    return broken > 0 ? 1 : 0;
  } finally {
    await closeBenchServer();
    await cluster.stop();
  }
}

process.exitCode = await main().catch((error: unknown) => {
  stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  return 1;
});
