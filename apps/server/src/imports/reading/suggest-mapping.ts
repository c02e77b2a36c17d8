import type { Design } from '#calc';
import { GUARD_MARK } from './apostrophe-guard.ts';
import { nameKey } from './design-index.ts';
import { FIELDS, type Field, type FieldKey } from './fields.ts';
import { columnLetter, filledCells, rowNumbered, rowsBelow, trimmed, type Grid, type GridRow } from './grid.ts';
import { headingParts, type HeadingParts } from './heading-text.ts';
import type { Mapping } from './plan.ts';
import { CHOICES, optionsOf, type ChoiceKey } from './values.ts';

/** A column of the file with the field that it seems to hold. */
export interface ColumnSuggestion {
  readonly column: string;
  readonly heading: string;
  /** The first different values, up to three. */
  readonly samples: readonly string[];
  /** Null: leave it out. */
  readonly field: FieldKey | null;
  /** What the suggestion rests on. */
  readonly reason: 'by name' | 'by values' | null;
}

/** Rows whose values are looked at. */
const SAMPLE_ROWS = 500;

/**
 * Suggests for each column of a file the field that it holds, by its heading and, where that says
 * nothing, by its values. Each field is suggested once at most.
 *
 * @param headerRow number of the row with the headings
 * @param design the project, whose names (types, controllers, circuits) tell columns by their values
 */
export function suggestMapping(grid: Grid, headerRow: number, design: Design): ColumnSuggestion[] {
  const headings = rowNumbered(grid, headerRow)?.cells ?? [];
  const rows = rowsBelow(grid, headerRow).slice(0, SAMPLE_ROWS);
  const found = byName(headings);
  const named = new Set(found.keys());
  byValues(headings, rows, design, found);
  return headings.map((heading, i) => ({
    column: columnLetter(i),
    heading: trimmed(heading),
    samples: [...new Set(filledCells(rows, i))].slice(0, 3),
    field: found.get(i) ?? null,
    reason: !found.has(i) ? null : named.has(i) ? 'by name' : 'by values',
  }));
}

/** The mapping that the suggestions amount to. */
export function mappingOf(suggestions: readonly ColumnSuggestion[]): Mapping {
  return Object.fromEntries(suggestions.flatMap(({ column, field }) => (field === null ? [] : [[column, field]])));
}

type Found = Map<number, FieldKey>;

interface Candidate {
  readonly index: number;
  readonly field: Field;
  readonly score: number;
}

/** The best matches first, each column and each field once. */
function byName(headings: readonly string[]): Found {
  const candidates: Candidate[] = headings.flatMap((heading, index) => {
    if (trimmed(heading) === GUARD_MARK) return [];
    const parts = headingParts(heading);
    return FIELDS.map((field) => ({ index, field, score: nameScore(parts, field) })).filter(({ score }) => score > 0);
  });
  candidates.sort((a, b) => b.score - a.score || a.index - b.index);
  const found: Found = new Map();
  const used = new Set<FieldKey>();
  for (const { index, field } of candidates) {
    if (found.has(index) || used.has(field.key)) continue;
    found.set(index, field.key);
    used.add(field.key);
  }
  return found;
}

/**
 * How well a heading names a field; 0: not at all. A unit that is not the field's own rules it out, since
 * its numbers would be misread; earlier synonyms are the more telling ones.
 */
function nameScore({ name, unit, symbol }: HeadingParts, field: Field): number {
  if (unit !== null && !field.units.includes(unit)) return 0;
  if (unit === null && field.unitNeeded) return 0;
  const place = field.names.indexOf(name);
  const bySymbol = field.symbol !== null && symbol === field.symbol;
  if (place < 0 && !(name === '' && bySymbol)) return 0;
  const unitScore = unit !== null ? 20 : field.unit === null ? 15 : 0;
  return 100 + unitScore + (bySymbol ? 5 : 0) - Math.max(0, place) / 100;
}

/** Shapes by which a column is known whatever its heading says: nearly all of its cells have it. */
const SHAPES: readonly (readonly [FieldKey, RegExp])[] = [
  ['outputAddress', /^%QX?\d+\.\d+$/i],
  ['statusAddress', /^%IX?\d+\.\d+$/i],
  ['wiring', /^(two|four|2|4)[- ]?(core|wire|adrig|ader|aderig|draads|fils|hilos)$/i],
  ['function', /^=[^=+-]+$/],
  ['location', /^\+[^=+-]+$/],
  ['cableTag', /^-W[\w.]+$/],
  ['product', /^-[^=+-]+$/],
];

const NEARLY_ALL = 0.8;

function byValues(headings: readonly string[], rows: readonly GridRow[], design: Design, found: Found): void {
  const used = new Set(found.values());
  const known = CHOICES.map((key): readonly [ChoiceKey, Set<string>] => [
    key,
    new Set(optionsOf(key, design).map(nameKey)),
  ]);
  headings.forEach((heading, index) => {
    if (found.has(index) || trimmed(heading) === GUARD_MARK) return;
    const cells = filledCells(rows, index);
    if (cells.length === 0) return;
    const fits = (test: (cell: string) => boolean): boolean => cells.filter(test).length >= cells.length * NEARLY_ALL;
    const key =
      known.find(([each, names]) => !used.has(each) && fits((cell) => names.has(nameKey(cell))))?.[0] ??
      SHAPES.find(([each, shape]) => !used.has(each) && fits((cell) => shape.test(cell)))?.[0];
    if (key) {
      found.set(index, key);
      used.add(key);
    }
  });
  if (!used.has('tag')) tagByValues(headings, rows, found);
}

/** Tags are short, all different, and hold letters and digits. */
function tagByValues(headings: readonly string[], rows: readonly GridRow[], found: Found): void {
  const index = headings.findIndex((_, i) => {
    const cells = filledCells(rows, i);
    const different = new Set(cells).size === cells.length && cells.length >= rows.length * NEARLY_ALL;
    return (
      !found.has(i) &&
      different &&
      cells.length > 0 &&
      cells.every((cell) => /^(?=.*\d)(?=.*\p{L})\S{2,40}$/u.test(cell))
    );
  });
  if (index >= 0) found.set(index, 'tag');
}
