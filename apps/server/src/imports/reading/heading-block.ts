import { isBlank, rowNumbered, trimmed, type Grid, type GridRow } from './grid.ts';
import { fieldsNamed, groupNamed } from './field-groups.ts';
import { headingParts, normalHeading } from './heading-text.ts';

/** Cells of a sheet that are shown as one; rows are its numbers, columns count from 0, both ends belong to it. */
export interface MergedCells {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

/** The headings of a table, by column index. */
export interface Headings {
  /** What stands over several columns, `Cable` over `Tag` and `Length m`; empty: nothing does. */
  readonly groups: readonly string[];
  /** The heading of the column itself. */
  readonly leaves: readonly string[];
  /** The rows as they stand, the upper one first where there are two; a printed list repeats them on each page. */
  readonly rows: readonly (readonly string[])[];
}

const NO_HEADINGS: Headings = { groups: [], leaves: [], rows: [] };

/**
 * Reads the headings of a table: the row that names the columns and, where the row above it holds group
 * headings or headings merged downwards, that row too. Whether it does is told by the sheet's merged
 * cells, or without them by how its cells stand over those below.
 *
 * @param headerRow number of the row that names the columns
 * @param merges the merged cells of a sheet; a CSV has none
 */
export function headingsAt(grid: Grid, headerRow: number, merges: readonly MergedCells[]): Headings {
  const lower = rowNumbered(grid, headerRow);
  if (!lower) return NO_HEADINGS;
  const upper = rowNumbered(grid, headerRow - 1);
  const here = merges.filter(({ top, bottom }) => top <= headerRow - 1 && bottom >= headerRow - 1);
  if (!upper || !isUpperRow(upper, lower, here)) return oneRow(lower);
  const spread = here.length > 0 ? groupsByMerges(upper, here) : groupsBySpreading(upper, lower);
  return twoRows(upper, lower, spread);
}

/** The heading as people see it: `Cable / Tag`. */
export function headingText({ groups, leaves }: Headings, index: number): string {
  return groups[index] ? `${groups[index]} / ${leaves[index]}` : leaves[index];
}

function oneRow({ cells }: GridRow): Headings {
  const leaves = cells.map(oneLine);
  return { groups: leaves.map(() => ''), leaves, rows: [cells] };
}

/** A group heading repeats on its columns; what stands over a blank cell is the column's own heading. */
function twoRows(upper: GridRow, lower: GridRow, spread: readonly string[]): Headings {
  const width = Math.max(lower.cells.length, upper.cells.findLastIndex((cell) => !isBlank(cell)) + 1);
  const groups: string[] = [];
  const leaves: string[] = [];
  for (let i = 0; i < width; i += 1) {
    const leaf = oneLine(lower.cells[i] ?? '');
    const own = oneLine(upper.cells[i] ?? '');
    const over = leaf === own ? '' : (spread[i] ?? '');
    leaves.push(leaf === '' ? own : leaf);
    groups.push(leaf === '' ? '' : over);
  }
  return { groups, leaves, rows: [upper.cells, lower.cells] };
}

function oneLine(cell: string): string {
  return trimmed(cell).replace(/\s+/g, ' ');
}

/** Title lines, dates and revision boxes above a table are no group headings. */
function isUpperRow(upper: GridRow, lower: GridRow, merges: readonly MergedCells[]): boolean {
  const filled = filledPlaces(upper);
  if (filled.length === 0 || filled.some((i) => /^[\d\s.,:/-]+$/.test(upper.cells[i]))) return false;
  const below = filledPlaces(lower);
  if (below.length < 2) return false;
  if (merges.some(({ top, bottom }) => top === upper.number && bottom === lower.number)) return true;
  const last = Math.max(...below);
  const groups = merges.filter(({ top, bottom, left, right }) => top === bottom && left < right && right - left < last - below[0]);
  return groups.length > 0 || (merges.length === 0 && standsAsGroups(filled, upper, below, lower));
}

/** A known group heading, columns of one name to be told apart, or a column that has its heading above only. */
function standsAsGroups(filled: readonly number[], upper: GridRow, below: readonly number[], lower: GridRow): boolean {
  const all = new Set([...filled, ...below]).size;
  if (filled.length < 2 || filled.length === all) return false;
  const names = below.map((i) => normalHeading(lower.cells[i]));
  const overBlank = filled.filter((i) => isBlank(lower.cells[i] ?? ''));
  return (
    new Set(names).size < names.length ||
    filled.some((i) => groupNamed(normalHeading(upper.cells[i])) !== undefined) ||
    (overBlank.length < filled.length && overBlank.some((i) => fieldsNamed(headingParts(upper.cells[i]).name).size > 0))
  );
}

function filledPlaces({ cells }: GridRow): number[] {
  return cells.flatMap((cell, i) => (isBlank(cell) ? [] : [i]));
}

function groupsByMerges(upper: GridRow, merges: readonly MergedCells[]): string[] {
  const groups = upper.cells.map(oneLine);
  for (const { top, left, right } of merges) {
    const text = top === upper.number ? oneLine(upper.cells[left] ?? '') : '';
    for (let i = left; i <= right && i < groups.length; i += 1) groups[i] = text;
  }
  return groups;
}

/** To the right until the next heading above, or until a column has its heading above only. */
function groupsBySpreading(upper: GridRow, lower: GridRow): string[] {
  let group = '';
  return lower.cells.map((cell, i) => {
    const own = oneLine(upper.cells[i] ?? '');
    if (own !== '') group = isBlank(cell) ? '' : own;
    return group;
  });
}
