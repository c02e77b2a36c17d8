import { hasGuardMark } from './apostrophe-guard.ts';
import { HEADER_SEARCH_ROWS, isBlank, trimmed, type Grid, type GridRow } from './grid.ts';
import { headingsAt, type MergedCells } from './heading-block.ts';
import { matchByName, type Found } from './name-match.ts';

/** Where the headings of a table stand, and how sure that is. */
export interface HeaderRow {
  /** Number of the row that names the columns. */
  readonly number: number;
  /** How many different fields its headings name; 0: it only looks like headings. */
  readonly named: number;
}

/**
 * Finds the row with the headings: the one that, with group headings above it, names most fields; where
 * none names any, the first row with nearly as many filled cells as the widest and no number among them.
 * Title lines above are passed.
 *
 * @returns the first row with content when nothing looks like headings; null for a grid without content
 */
export function findHeaderRow(grid: Grid, merges: readonly MergedCells[] = []): HeaderRow | null {
  const rows = grid.rows.slice(0, HEADER_SEARCH_ROWS).filter((row) => filled(row) > 0);
  if (rows.length === 0) return null;
  const scored = rows.map(({ number }): HeaderRow => ({ number, named: fieldsAt(grid, number, merges) }));
  const marked = rows.findIndex((row) => hasGuardMark(row.cells));
  if (marked >= 0) return scored[marked];
  const best = scored.reduce((a, b) => (b.named > a.named ? b : a));
  if (best.named >= 2) return best;
  const widest = Math.max(...grid.rows.slice(0, 200).map(filled));
  const likely = rows.findIndex((row) => filled(row) >= widest * 0.7 && !row.cells.some((cell) => /^[\d.,]+$/.test(trimmed(cell))));
  return likely >= 0 ? scored[likely] : best.named > 0 ? best : scored[0];
}

function fieldsAt(grid: Grid, number: number, merges: readonly MergedCells[]): number {
  const { groups, leaves, rows } = headingsAt(grid, number, merges);
  const found: Found = new Map();
  matchByName({ groups, leaves: leaves.map((leaf) => (leaf.length <= 80 ? leaf : '')), rows }, found);
  return found.size;
}

function filled(row: GridRow): number {
  return row.cells.filter((cell) => !isBlank(cell)).length;
}
