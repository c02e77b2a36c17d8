import { isChoice, knownValue, mappedValue, type ChoiceKey } from './choices.ts';
import type { DesignIndex } from './design-index.ts';
import { columnIndex, isBlank, trimmed, type GridRow } from './grid.ts';
import { meansBlank } from './numbers.ts';
import type { Mapping, ValueMapping } from './plan.ts';
import { textKey, type Remembered } from './remembered.ts';

/** A text of a choice column that occurs in the file, and what it would be read as. */
export interface ValueSuggestion {
  readonly field: ChoiceKey;
  readonly text: string;
  readonly rows: number;
  /** The value of the project; null when none is known, or when it was left blank last time. */
  readonly value: string | null;
  /** Null: nothing is known of the text, and a person has to choose. */
  readonly reason: 'as last time' | 'by name' | null;
}

/**
 * The texts of the mapped choice columns with what each would be read as, commonest first in each column.
 * What a text stood for last time comes first, where the project still has that value.
 */
export function suggestValues(parts: readonly (readonly GridRow[])[], mapping: Mapping, index: DesignIndex, remembered: Remembered): ValueSuggestion[] {
  return Object.entries(mapping).flatMap(([letter, key]) => {
    if (!isChoice(key)) return [];
    const last = remembered.texts.get(key);
    return tally(parts, columnIndex(letter)).map(([text, rows]) => ({ field: key, text, rows, ...suggestion(key, text, last, index) }));
  });
}

/** What texts stand for now: what a person chose, and below that what is remembered of those in the file. */
export function valueMappingOf(suggestions: readonly ValueSuggestion[], chosen: ValueMapping | undefined): ValueMapping | undefined {
  const mapping: Record<string, Record<string, string | null>> = Object.fromEntries(
    Object.entries(chosen ?? {}).map(([field, values]) => [field, { ...values }]),
  );
  for (const { field, text, value, reason } of suggestions) {
    if (reason !== 'as last time' || mappedValue(chosen?.[field], text) !== undefined) continue;
    (mapping[field] ??= {})[text] = value;
  }
  return Object.keys(mapping).length > 0 ? mapping : undefined;
}

function suggestion(key: ChoiceKey, text: string, last: ReadonlyMap<string, string | null> | undefined, index: DesignIndex): Pick<ValueSuggestion, 'value' | 'reason'> {
  const value = last?.get(textKey(text));
  if (value === null) return { value, reason: 'as last time' };
  if (value !== undefined && knownValue(key, value, index) !== null) return { value, reason: 'as last time' };
  const known = knownValue(key, text, index);
  return { value: known, reason: known === null ? null : 'by name' };
}

function tally(parts: readonly (readonly GridRow[])[], column: number): [string, number][] {
  const counts = new Map<string, number>();
  for (const rows of parts) {
    for (const { cells } of rows) {
      const cell = cells[column];
      if (cell !== undefined && !isBlank(cell)) counts.set(cell, (counts.get(cell) ?? 0) + 1);
    }
  }
  const texts = new Map<string, number>();
  for (const [cell, count] of counts) {
    const text = trimmed(cell);
    if (!meansBlank(text)) texts.set(text, (texts.get(text) ?? 0) + count);
  }
  return [...texts].sort(([, a], [, b]) => b - a);
}
