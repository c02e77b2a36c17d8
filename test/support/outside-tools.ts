import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Output of a program, or null where it is not installed. */
function outputOf(program: string, args: readonly string[], cwd?: string): string | null {
  try {
    return execFileSync(program, args, { encoding: 'utf8', timeout: 30_000, stdio: ['ignore', 'pipe', 'ignore'], cwd });
  } catch (error) {
    const failure = error as NodeJS.ErrnoException & { stdout?: string };
    if (failure.code === 'ENOENT') return null;
    // The simulator ends with 1 after a control block that asks for no plot, though all went well.
    if (failure.stdout) return failure.stdout;
    throw error;
  }
}

export const hasNgspice = outputOf('ngspice', ['--version']) !== null;
export const hasUnits = outputOf('units', ['--version']) !== null;

/** What the circuit simulator prints for a netlist. */
export function runNgspice(netlist: string): string {
  const folder = mkdtempSync(join(tmpdir(), 'netlist-'));
  try {
    writeFileSync(join(folder, 'circuit.cir'), netlist);
    return outputOf('ngspice', ['-b', 'circuit.cir'], folder) ?? '';
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Figures of the simulator's output by what was printed, such as `v(b)` or `ua`. */
export function printedFigures(output: string): Map<string, number> {
  const figures = new Map<string, number>();
  for (const [, name, value] of output.matchAll(/^(\S+) = (-?\d\.\d+e[+-]\d+)\s*$/gm)) figures.set(name, Number(value));
  return figures;
}

/** Converts with GNU units, terse: `convert('wiregauge(20)', 'mm')`. */
export function convert(from: string, to: string): number {
  return Number(outputOf('units', ['-t', '--digits', '15', from, to]));
}
