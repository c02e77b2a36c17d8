import { FIELDS } from './fields.ts';
import { hasGuardMark } from './apostrophe-guard.ts';
import { HEADER_SEARCH_ROWS, trimmed, type Grid, type GridRow } from './grid.ts';
import { headingParts } from './heading-text.ts';

const NAMES = new Set(FIELDS.flatMap((field) => field.names));

/**
 * Finds the row with the headings: the one that names most fields; where none names any, the first row
 * with nearly as many filled cells as the widest and no number among them. Title lines above are passed.
 *
 * @returns the row's number; the first row with content when nothing looks like headings
 */
export function detectHeaderRow(grid: Grid): number {
  const rows = grid.rows.slice(0, HEADER_SEARCH_ROWS).filter((row) => filled(row) > 0);
  const marked = rows.find((row) => hasGuardMark(row.cells));
  if (marked) return marked.number;
  const named = rows.map((row) => ({ row, score: fieldsNamed(row) }));
  const best = named.reduce((a, b) => (b.score > a.score ? b : a), named[0]);
  if (best.score >= 2) return best.row.number;
  const widest = Math.max(...grid.rows.slice(0, 200).map(filled));
  const likely = rows.find(
    (row) => filled(row) >= widest * 0.7 && !row.cells.some((cell) => /^[\d.,]+$/.test(trimmed(cell))),
  );
  return (likely ?? (best.score > 0 ? best.row : rows[0])).number;
}

function fieldsNamed(row: GridRow): number {
  return row.cells.filter((cell) => cell.length <= 80 && NAMES.has(headingParts(cell).name)).length;
}

function filled(row: GridRow): number {
  return row.cells.filter((cell) => trimmed(cell) !== '').length;
}
