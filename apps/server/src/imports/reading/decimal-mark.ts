import { fieldOf } from './fields.ts';
import { columnIndex, filledCells, type DecimalMark, type GridRow } from './grid.ts';
import { foldFullWidth } from './numbers.ts';
import type { Mapping } from './plan.ts';

/**
 * Finds the decimal sign of a file from the cells of its number columns. A sign with three digits behind
 * it may part a group, so it counts only where it cannot: after a 0, after four digits, or last of two
 * kinds.
 *
 * @param delimiter a semicolon hints at a decimal comma where no number tells
 */
export function detectDecimalMark(rows: readonly GridRow[], mapping: Mapping, delimiter: string): DecimalMark {
  const votes: Record<DecimalMark, number> = { '.': 0, ',': 0 };
  for (const [letter, key] of Object.entries(mapping)) {
    if (!['number', 'volume'].includes(fieldOf(key).kind)) continue;
    for (const cell of filledCells(rows, columnIndex(letter))) {
      const mark = decimalMarkOf(foldFullWidth(cell));
      if (mark) votes[mark] += 1;
    }
  }
  if (votes['.'] === votes[',']) return delimiter === ';' ? ',' : '.';
  return votes[','] > votes['.'] ? ',' : '.';
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
