import { isBlankRow, trimmed, type GridRow } from './grid.ts';
import { normalHeading } from './heading-text.ts';
import type { SkipReason } from './plan.ts';

const TOTALS =
  /^((grand |sub ?)?totals?|sum|summe|zwischensumme|gesamt|gesamtsumme|totaal|subtotaal|som|total general|totaux|somme|suma|subtotal)$/;

/**
 * Why a row below the headings is no data: it is blank, repeats the headings (as printed lists do on each
 * page), or adds up the rows above.
 *
 * @param tagIndex index of the column that holds the tag
 * @returns null when the row is data
 */
export function skipReason(row: GridRow, headings: GridRow, tagIndex: number): SkipReason | null {
  if (isBlankRow(row)) return 'blank';
  if (repeats(row, headings)) return 'repeated-heading';
  return isTotals(row, tagIndex) ? 'totals' : null;
}

function repeats(row: GridRow, headings: GridRow): boolean {
  const same = (cell: string, i: number): boolean =>
    trimmed(cell) === '' || normalHeading(cell) === normalHeading(headings.cells[i] ?? '');
  return row.cells.every(same) && row.cells.filter((cell) => trimmed(cell) !== '').length > 1;
}

/** The first thing it says is "total", and it has no tag but that. */
function isTotals(row: GridRow, tagIndex: number): boolean {
  const first = row.cells.findIndex((cell) => trimmed(cell) !== '');
  const tagged = trimmed(row.cells[tagIndex] ?? '') !== '' && first !== tagIndex;
  return !tagged && TOTALS.test(normalHeading(row.cells[first]));
}
