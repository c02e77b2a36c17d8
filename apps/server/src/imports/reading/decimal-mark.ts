import { fieldOf } from './fields.ts';
import { columnIndex, trimmed, type DecimalMark, type GridRow } from './grid.ts';
import { foldFullWidth, plainNumber } from './numbers.ts';
import type { Mapping } from './plan.ts';

/** So many numbers that agree settle it; a longer look would change nothing. */
const ENOUGH = 2_000;

const MARK = /[.,．，]/;

type Votes = Record<DecimalMark, number>;

/**
 * Finds the decimal sign of a file from the cells of its number columns. A sign with three digits behind
 * it may part a group, so it counts only where it cannot: after a 0, after four digits, or last of two
 * kinds.
 *
 * @param parts the rows of each table that is read
 * @param delimiter a semicolon hints at a decimal comma where no number tells; null: a workbook, whose
 *   own numbers have a point and say nothing of the numbers that it keeps as texts
 */
export function detectDecimalMark(parts: readonly (readonly GridRow[])[], mapping: Mapping, delimiter: string | null): DecimalMark {
  const votes: Votes = { '.': 0, ',': 0 };
  for (const [letter, key] of Object.entries(mapping)) {
    if (!['number', 'volume'].includes(fieldOf(key).kind)) continue;
    for (const rows of parts) countVotes(rows, columnIndex(letter), delimiter === null, votes);
  }
  if (votes['.'] === votes[',']) return delimiter === ';' ? ',' : '.';
  return votes[','] > votes['.'] ? ',' : '.';
}

function countVotes(rows: readonly GridRow[], index: number, typed: boolean, votes: Votes): void {
  for (const { cells } of rows) {
    const cell = cells[index] ?? '';
    if (!MARK.test(cell) || (typed && !Number.isNaN(plainNumber(trimmed(cell), '.')))) continue;
    const mark = decimalMarkOf(foldFullWidth(trimmed(cell)));
    if (!mark) continue;
    votes[mark] += 1;
    if (votes[mark] > ENOUGH && votes[mark === '.' ? ',' : '.'] === 0) return;
  }
}

function decimalMarkOf(cell: string): DecimalMark | null {
  const both = /^[+\-−]?[\d.,'’\s]*\d([.,])\d+(?!\d)/u.exec(cell.slice(0, 60));
  if (!both) return null;
  const [number] = both;
  const mark = both[1] as DecimalMark;
  const others = number.replaceAll(mark, '').match(/[.,]/);
  if (others) return mark;
  const times = number.split(mark).length - 1;
  const [whole, part] = number.split(mark) as [string, string];
  const maybeGroup = part.length === 3 && /^[+\-−]?[1-9]\d{0,2}$/.test(whole);
  return times === 1 && !maybeGroup ? mark : null;
}
