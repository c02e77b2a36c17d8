import type { Design, Wiring } from '#calc';
import { nameKey, type DesignIndex } from './design-index.ts';
import { fieldOf, type FieldKey } from './fields.ts';
import { columnIndex, filledCells, type GridRow } from './grid.ts';
import { meansBlank } from './numbers.ts';
import type { Fault, Mapping, ValueMapping } from './plan.ts';

/** Fields whose cells name something that the project or the catalogue has. */
export type ChoiceKey = 'wiring' | 'dispenserType' | 'controller' | 'circuit' | 'grease' | 'junctionBox';

export const CHOICES: readonly ChoiceKey[] = [
  'wiring',
  'dispenserType',
  'controller',
  'circuit',
  'grease',
  'junctionBox',
];

/** Other words for the two wiring schemes, in the five languages of the headings. */
const WIRING_WORDS: Readonly<Record<Wiring, RegExp>> = {
  'two-core':
    /^(two|2|zwei|twee|deux|dos)[- ]?(core|cores|wire|wires|adrig|ader|adern|leiter|aderig|aders|draads|fils|conducteurs|hilos|conductores)$/,
  'four-core':
    /^(four|4|vier|quatre|cuatro)[- ]?(core|cores|wire|wires|adrig|ader|adern|leiter|aderig|aders|draads|fils|conducteurs|hilos|conductores)$/,
};

/** A text of a choice column that occurs in the file, and what it would be read as. */
export interface ValueSuggestion {
  readonly field: ChoiceKey;
  readonly text: string;
  readonly rows: number;
  /** The value of the project; null when none is known and a person has to choose. */
  readonly value: string | null;
}

/**
 * Reads a choice: what the person mapped comes first, then the name itself, then known other words.
 *
 * @returns the value by its name in the project, or null
 */
export function readChoice(
  key: ChoiceKey,
  text: string,
  mapped: ValueMapping | undefined,
  index: DesignIndex,
): string | null {
  const chosen = mappedValue(mapped?.[key], text);
  return chosen === null ? null : knownValue(key, chosen ?? text, index);
}

/** Whether the person said that this text leaves the value blank. */
export function isMappedToBlank(key: ChoiceKey, text: string, mapped: ValueMapping | undefined): boolean {
  return mappedValue(mapped?.[key], text) === null;
}

function mappedValue(
  values: Readonly<Record<string, string | null>> | undefined,
  text: string,
): string | null | undefined {
  if (!values) return undefined;
  const hit = Object.keys(values).find((each) => nameKey(each) === nameKey(text));
  return hit === undefined ? undefined : values[hit];
}

function knownValue(key: ChoiceKey, text: string, index: DesignIndex): string | null {
  const known: Readonly<Record<ChoiceKey, () => string | null | undefined>> = {
    wiring: () => wiringOf(text),
    dispenserType: () => index.typeNamed(text)?.name,
    controller: () => index.controllerNamed(text)?.name,
    circuit: () => index.circuitNamed(text)?.name,
    grease: () => index.greaseNamed(text)?.name,
    junctionBox: () => index.boxNamed(text)?.location,
  };
  return known[key]() ?? null;
}

function wiringOf(text: string): Wiring | null {
  const word = nameKey(text).replace(/[\s‐‑–]+/g, '-');
  if (WIRING_WORDS['two-core'].test(word)) return 'two-core';
  return WIRING_WORDS['four-core'].test(word) ? 'four-core' : null;
}

/** The values that a choice may take in this project, by name. */
export function optionsOf(key: ChoiceKey, design: Design): string[] {
  const options: Readonly<Record<ChoiceKey, () => readonly string[]>> = {
    wiring: () => ['two-core', 'four-core'],
    dispenserType: () => design.dispenserTypes.map((each) => each.name),
    controller: () => design.controllers.map((each) => each.name),
    circuit: () => design.circuits.map((each) => each.name),
    grease: () => design.greases.map((each) => each.name),
    junctionBox: () => design.cableNodes.map((each) => each.location),
  };
  return [...new Set(options[key]())];
}

/** The texts of the mapped choice columns with what each would be read as, commonest first. */
export function suggestValues(rows: readonly GridRow[], mapping: Mapping, index: DesignIndex): ValueSuggestion[] {
  return Object.entries(mapping).flatMap(([letter, key]) =>
    isChoice(key) ? suggestionsOf(key, rows, letter, index) : [],
  );
}

function suggestionsOf(
  field: ChoiceKey,
  rows: readonly GridRow[],
  letter: string,
  index: DesignIndex,
): ValueSuggestion[] {
  const tally = new Map<string, number>();
  for (const text of filledCells(rows, columnIndex(letter))) {
    if (!meansBlank(text)) tally.set(text, (tally.get(text) ?? 0) + 1);
  }
  return [...tally]
    .sort(([, a], [, b]) => b - a)
    .map(([text, count]) => ({ field, text, rows: count, value: knownValue(field, text, index) }));
}

export function isChoice(key: FieldKey): key is ChoiceKey {
  return (CHOICES as readonly FieldKey[]).includes(key);
}

/** What to say of a text that names nothing known. */
export function unknownChoice(key: ChoiceKey, text: string, index: DesignIndex): Fault {
  const codes = {
    wiring: 'wiring-unknown',
    dispenserType: 'type-unknown',
    controller: 'controller-unknown',
    circuit: 'circuit-unknown',
    grease: 'grease-unknown',
    junctionBox: 'box-unknown',
  } as const;
  const places = {
    wiring: '“' + text + '” is neither two-core nor four-core.',
    dispenserType: `The catalogue has no dispenser type “${text}”.`,
    controller: `The project has no controller “${text}”. Output and status of this row stay open too.`,
    circuit: `The project has no circuit “${text}”.`,
    grease: `The catalogue has no grease “${text}”.`,
    junctionBox: `The project has no junction box “${text}”.`,
  } as const;
  return { code: codes[key], message: places[key], remedy: remedyFor(key, optionsOf(key, index.design)) };
}

function remedyFor(key: ChoiceKey, options: readonly string[]): string {
  if (options.length === 0) return `Add it to the project first, or leave the column out.`;
  const shown = options.slice(0, 6).join(' · ');
  return `Choose what the text stands for: ${shown}${options.length > 6 ? ' …' : ''}. Or correct the ${fieldOf(key).label.toLowerCase()} in the list.`;
}
