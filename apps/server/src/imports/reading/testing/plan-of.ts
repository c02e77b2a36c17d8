import type { Design } from '#calc';
import { interpretFile, NOTHING_REMEMBERED, readFile, type ChosenSettings, type FileReading, type ImportPlan, type Remembered } from '../index.ts';

/** A file read with the settings that the product suggests, and what its import would do. */
export async function importOf(
  file: string | Uint8Array,
  design: Design,
  chosen: ChosenSettings = {},
  remembered: Remembered = NOTHING_REMEMBERED,
): Promise<{ reading: FileReading; plan: ImportPlan }> {
  const reading = await readFile(typeof file === 'string' ? Buffer.from(file) : file, chosen, design, remembered);
  return { reading, plan: interpretFile(reading, design) };
}

/** What the import of a file would do. */
export async function planOf(file: string | Uint8Array, design: Design, chosen: ChosenSettings = {}): Promise<ImportPlan> {
  return (await importOf(file, design, chosen)).plan;
}

/** Row, field and code of every problem. */
export function problemsOf(plan: ImportPlan): (readonly [number, string | null, string])[] {
  return plan.rows.flatMap(({ row, problems }) => problems.map(({ field, code }) => [row, field, code] as const));
}
