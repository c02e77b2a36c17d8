import type { BenchResult } from './harness.ts';

/** The results as a text table with a line that sums them up. */
export function tableOf(results: readonly BenchResult[]): string {
  const rows = [['', 'bench', 'value', 'limit', ''], ...results.map(lineOf)];
  const widths = rows[0].map((_, i) => Math.max(...rows.map((row) => row[i].length)));
  const lines = rows.map((row) => row.map((cell, i) => (i === 2 || i === 3 ? cell.padStart(widths[i]) : cell.padEnd(widths[i]))).join('  ').trimEnd());
  const count = (pass: boolean | null) => results.filter((each) => each.pass === pass).length;
  return [...lines, '', `${count(true)} within their limits, ${count(false)} missed, ${count(null)} skipped`].join('\n');
}

function lineOf({ name, value, unit, limit, bound, pass, note = '' }: BenchResult): string[] {
  const mark = pass === null ? '–' : pass ? '✓' : '✗';
  return [mark, name, value === null ? '–' : `${figure(value)} ${unit}`, `${bound === 'at most' ? '≤' : '≥'} ${limit}`, pass === false ? `missed: ${note}` : note];
}

/** Three figures that count. */
const figure = (value: number): string => (Math.abs(value) >= 100 ? value.toFixed(0) : value.toPrecision(3));
