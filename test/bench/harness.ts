import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** One measured figure beside its limit. */
export interface BenchResult {
  readonly name: string;
  /** Null where it was skipped. */
  readonly value: number | null;
  /** What the value counts, for instance "× floor", "MB" or "ms". */
  readonly unit: string;
  readonly limit: number;
  /** Which side of the limit is good. */
  readonly bound: 'at most' | 'at least';
  /** Null where it was skipped. */
  readonly pass: boolean | null;
  /** What stands behind the figure, or why it was skipped. */
  readonly note?: string;
}

/** What a `*.bench.ts` file exports as `benches`. */
export type Bench = () => Promise<BenchResult | readonly BenchResult[]>;

/** What a figure is called, what it counts and what it is held against. */
export interface Measure {
  readonly name: string;
  readonly unit: string;
  readonly limit: number;
  /** Left out: at most. */
  readonly bound?: BenchResult['bound'];
}

/** A figure judged against its limit. */
export function resultOf({ name, unit, limit, bound = 'at most' }: Measure, value: number, note?: string): BenchResult {
  const pass = bound === 'at most' ? value <= limit : value >= limit;
  return { name, value, unit, limit, bound, pass, ...(note !== undefined && { note }) };
}

/** A figure that cannot be had here; the reason is shown. */
export function skipped({ name, unit, limit, bound = 'at most' }: Measure, reason: string): BenchResult {
  return { name, value: null, unit, limit, bound, pass: null, note: `skipped: ${reason}` };
}

export interface Interleaved extends Measure {
  /** Timed rounds of each; one more of each goes before, untimed. */
  readonly rounds: number;
  /** What the job costs at the very least. */
  readonly floor: () => unknown;
  /** The product's way of doing the job. */
  readonly subject: () => unknown;
  /** Goes before each run of the subject, untimed. */
  readonly before?: () => unknown;
}

/**
 * Runs floor and subject by turns, so that whatever else the machine does meets both alike, and compares
 * their median times.
 *
 * @returns the quotient median(subject) / median(floor); for a bound "at least" median(floor) / median(subject)
 */
export async function interleaved({ rounds, floor, subject, before, ...measure }: Interleaved): Promise<BenchResult> {
  const floors: number[] = [];
  const subjects: number[] = [];
  await floor();
  await subject();
  for (let round = 0; round < rounds; round++) {
    floors.push(await millisecondsOf(floor));
    await before?.();
    subjects.push(await millisecondsOf(subject));
  }
  const [floorMs, subjectMs] = [median(floors), median(subjects)];
  const note = `${subjectMs.toFixed(1)} ms against ${floorMs.toFixed(1)} ms, median of ${rounds}`;
  return resultOf(measure, measure.bound === 'at least' ? floorMs / subjectMs : subjectMs / floorMs, note);
}

/** Duration of a piece of work, ms. */
export async function millisecondsOf(work: () => unknown): Promise<number> {
  const started = performance.now();
  await work();
  return performance.now() - started;
}

/** The middle value; of an even number the mean of the middle two. @throws {RangeError} of no values */
export function median(values: readonly number[]): number {
  if (values.length === 0) throw new RangeError('No values to take a median of');
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

const REPORTER = new URL('report-peak.mjs', import.meta.url).href;
const IDLE = new URL('idle.ts', import.meta.url).pathname;

/**
 * Runs a TypeScript file in a process of its own and tells the most memory it had resident, above that of
 * a process with the same loader that does nothing.
 *
 * @param script path of the file
 * @returns MB (10⁶ bytes)
 * @throws where the process fails
 */
export async function peakMemory(script: string, args: readonly string[] = [], env: Readonly<Record<string, string>> = {}): Promise<number> {
  const idle = await peakOf(IDLE, [], {});
  return Math.max(0, (await peakOf(script, args, env)) - idle);
}

async function peakOf(script: string, args: readonly string[], env: Readonly<Record<string, string>>): Promise<number> {
  const folder = mkdtempSync(join(tmpdir(), 'lanewright-peak-'));
  const report = join(folder, 'peak');
  try {
    const child = spawn(process.execPath, ['--import', 'tsx', '--import', REPORTER, script, ...args], {
      env: { ...process.env, ...env, PEAK_REPORT: report },
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    const [code] = (await once(child, 'exit')) as [number | null];
    if (code !== 0) throw new Error(`${script} ended with code ${code}`);
    return (Number(readFileSync(report, 'utf8')) * 1024) / 1e6;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
