import type { Design } from '#calc';
import { GUARD_MARK } from './apostrophe-guard.ts';
import { CHOICES, optionsOf, type ChoiceKey } from './choices.ts';
import { nameKey } from './design-index.ts';
import { isFieldKey, type FieldKey } from './fields.ts';
import { columnLetter, filledCells, type GridRow } from './grid.ts';
import { headingText, type Headings } from './heading-block.ts';
import { matchByName, type Found } from './name-match.ts';
import type { Mapping } from './plan.ts';
import { columnKeys, type Remembered } from './remembered.ts';

export type SuggestionReason = 'as last time' | 'left out last time' | 'by name' | 'by values';

/** A column of the file with the field that it seems to hold. */
export interface ColumnSuggestion {
  readonly column: string;
  /** With the heading over several columns where there is one: `Cable / Tag`. */
  readonly heading: string;
  /** Under which its field is remembered; empty: the column has no heading. */
  readonly key: string;
  /** The first different values, up to three. */
  readonly samples: readonly string[];
  /** Null: leave it out. */
  readonly field: FieldKey | null;
  /** What the suggestion rests on. */
  readonly reason: SuggestionReason | null;
}

/**
 * Suggests for each column of a table the field that it holds: what it was last time, what its heading
 * says and, where that says nothing, what its values look like. Each field is suggested once at most.
 *
 * @param rows the first rows below the headings; all of them are looked at
 * @param design the project, whose names (types, controllers, circuits) tell columns by their values
 */
export function suggestMapping(headings: Headings, rows: readonly GridRow[], design: Design, remembered: Remembered): ColumnSuggestion[] {
  const keys = columnKeys(headings);
  const { found, reasons } = suggestedFields(headings, keys, rows, design, remembered);
  return keys.map((key, i) => ({
    column: columnLetter(i),
    heading: headingText(headings, i),
    key: isMark(headings, i) ? '' : key,
    samples: [...new Set(filledCells(rows, i))].slice(0, 3),
    field: found.get(i) ?? null,
    reason: reasons.get(i) ?? null,
  }));
}

/** The mapping that the suggestions amount to. */
export function mappingOf(suggestions: readonly ColumnSuggestion[]): Mapping {
  return Object.fromEntries(suggestions.flatMap(({ column, field }) => (field === null ? [] : [[column, field]])));
}

interface Suggested {
  readonly found: Found;
  readonly reasons: Map<number, SuggestionReason>;
}

function suggestedFields(headings: Headings, keys: readonly string[], rows: readonly GridRow[], design: Design, remembered: Remembered): Suggested {
  const found: Found = new Map();
  const reasons = new Map<number, SuggestionReason>();
  const left = recall(keys, remembered, found, reasons);
  const because = (reason: SuggestionReason): void => {
    for (const index of found.keys()) if (!reasons.has(index)) reasons.set(index, reason);
  };
  signalColumn(headings, rows, left, found);
  because('by values');
  matchByName(headings, found, left);
  because('by name');
  byValues(headings, rows, design, left, found);
  because('by values');
  ensureTag(headings, rows, found, reasons);
  dropLoneSignalParts(found, reasons);
  return { found, reasons };
}

/** Takes over what was chosen last time; returns the columns that were left out. */
function recall(keys: readonly string[], { headings }: Remembered, found: Found, reasons: Suggested['reasons']): Set<number> {
  const left = new Set<number>();
  const used = new Set<FieldKey>();
  keys.forEach((key, i) => {
    const field = key === '' ? undefined : headings.get(key);
    if (field === undefined || (field !== null && (!isFieldKey(field) || used.has(field)))) return;
    reasons.set(i, field === null ? 'left out last time' : 'as last time');
    if (field === null) {
      left.add(i);
    } else {
      used.add(field);
      found.set(i, field);
    }
  });
  return left;
}

/** A column of DO and DI under a heading that says something else ("Type", "In/out") tells which signal a row is. */
function signalColumn(headings: Headings, rows: readonly GridRow[], left: ReadonlySet<number>, found: Found): void {
  const named: Found = new Map(found);
  matchByName(headings, named, left);
  if ([...named.values()].includes('signalType')) return;
  const index = headings.leaves.findIndex((_, i) => !found.has(i) && !left.has(i) && nearlyAll(filledCells(rows, i), (cell) => /^D[OIQ]$/i.test(cell)));
  if (index >= 0) found.set(index, 'signalType');
}

/** Without a column that says which signal a row is, a row has no signal of its own. */
function dropLoneSignalParts(found: Found, reasons: Suggested['reasons']): void {
  if ([...found.values()].includes('signalType')) return;
  for (const [index, key] of found) {
    if (key !== 'module' && key !== 'channel' && key !== 'address') continue;
    found.delete(index);
    reasons.delete(index);
  }
}

/** A list needs its tags: a column that was left out while another held them is looked at again. */
function ensureTag(headings: Headings, rows: readonly GridRow[], found: Found, reasons: Suggested['reasons']): void {
  if ([...found.values()].includes('tag')) return;
  const free: Found = new Map(found);
  matchByName(headings, free);
  const named = [...free].find(([, key]) => key === 'tag')?.[0];
  const index = named ?? tagByValues(headings, rows, found);
  if (index < 0) return;
  found.set(index, 'tag');
  reasons.set(index, named === undefined ? 'by values' : 'by name');
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

function nearlyAll(cells: readonly string[], test: (cell: string) => boolean): boolean {
  return cells.length > 0 && cells.filter(test).length >= cells.length * NEARLY_ALL;
}

function byValues(headings: Headings, rows: readonly GridRow[], design: Design, left: ReadonlySet<number>, found: Found): void {
  const used = new Set(found.values());
  const known = CHOICES.map((key): readonly [ChoiceKey, Set<string>] => [key, new Set(optionsOf(key, design).map(nameKey))]);
  headings.leaves.forEach((_, index) => {
    if (found.has(index) || left.has(index) || isMark(headings, index)) return;
    const cells = filledCells(rows, index);
    const key =
      known.find(([each, names]) => !used.has(each) && nearlyAll(cells, (cell) => names.has(nameKey(cell))))?.[0] ??
      SHAPES.find(([each, shape]) => !used.has(each) && nearlyAll(cells, (cell) => shape.test(cell)))?.[0];
    if (key) {
      found.set(index, key);
      used.add(key);
    }
  });
}

/** Tags are short, all different, and hold letters and digits. */
function tagByValues(headings: Headings, rows: readonly GridRow[], found: Found): number {
  return headings.leaves.findIndex((_, i) => {
    if (found.has(i)) return false;
    const cells = filledCells(rows, i);
    const different = new Set(cells).size === cells.length && cells.length >= rows.length * NEARLY_ALL;
    return different && cells.length > 0 && cells.every((cell) => /^(?=.*\d)(?=.*\p{L})\S{2,40}$/u.test(cell));
  });
}

function isMark({ leaves }: Headings, index: number): boolean {
  return leaves[index].startsWith(GUARD_MARK);
}
