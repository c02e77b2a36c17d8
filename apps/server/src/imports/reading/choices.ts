import type { Design, Wiring } from '#calc';
import { nameKey, type DesignIndex } from './design-index.ts';
import { fieldOf, type FieldKey } from './fields.ts';
import { meansBlank } from './numbers.ts';
import type { Fault, ValueMapping } from './plan.ts';
import { signalTypeOf, SIGNAL_TYPES } from './signal-types.ts';

/** Fields whose cells name something that the project or the catalogue has. */
export type ChoiceKey = 'wiring' | 'dispenserType' | 'controller' | 'circuit' | 'grease' | 'junctionBox' | 'signalType';

/** In the order in which values tell a column of unknown heading. */
export const CHOICES: readonly ChoiceKey[] = [
  'wiring',
  'dispenserType',
  'controller',
  'circuit',
  'grease',
  'junctionBox',
  'signalType',
];

/** Other words for the two wiring schemes, in the five languages of the headings. */
const WIRING_WORDS: Readonly<Record<Wiring, RegExp>> = {
  'two-core':
    /^(two|2|zwei|twee|deux|dos)[- ]?(core|cores|wire|wires|adrig|ader|adern|leiter|aderig|aders|draads|fils|conducteurs|hilos|conductores)$/,
  'four-core':
    /^(four|4|vier|quatre|cuatro)[- ]?(core|cores|wire|wires|adrig|ader|adern|leiter|aderig|aders|draads|fils|conducteurs|hilos|conductores)$/,
};

/** What a text of a choice column is read as: a value, blank on purpose, or nothing that is known. */
export type ChoiceReading = { readonly value: string } | 'blank' | 'unknown';

/** Reads the texts of choice columns; each different text is looked up once. */
export class ChoiceReader {
  private readonly readings = new Map<ChoiceKey, Map<string, ChoiceReading>>();

  /** @param mapped what a person said that texts stand for; it comes before the names themselves */
  constructor(
    private readonly index: DesignIndex,
    private readonly mapped: ValueMapping | undefined,
  ) {}

  read(key: ChoiceKey, text: string): ChoiceReading {
    let known = this.readings.get(key);
    if (!known) this.readings.set(key, (known = new Map<string, ChoiceReading>()));
    let reading = known.get(text);
    if (reading === undefined) known.set(text, (reading = this.lookUp(key, text)));
    return reading;
  }

  private lookUp(key: ChoiceKey, text: string): ChoiceReading {
    const chosen = mappedValue(this.mapped?.[key], text);
    if (chosen === null) return 'blank';
    const value = knownValue(key, chosen ?? text, this.index);
    if (value !== null) return { value };
    return meansBlank(text) ? 'blank' : 'unknown';
  }
}

/** What a person said that the text stands for; null: leave it blank; undefined: nothing. */
export function mappedValue(values: Readonly<Record<string, string | null>> | undefined, text: string): string | null | undefined {
  if (!values) return undefined;
  const key = nameKey(text);
  const hit = Object.keys(values).find((each) => nameKey(each) === key);
  return hit === undefined ? undefined : values[hit];
}

/** The value that a text names in this project, by its name there; null when there is none. */
export function knownValue(key: ChoiceKey, text: string, index: DesignIndex): string | null {
  switch (key) {
    case 'wiring': return wiringOf(text);
    case 'signalType': return signalTypeOf(text);
    case 'dispenserType': return index.typeNamed(text)?.name ?? null;
    case 'controller': return index.controllerNamed(text)?.name ?? null;
    case 'circuit': return index.circuitNamed(text)?.name ?? null;
    case 'grease': return index.greaseNamed(text)?.name ?? null;
    case 'junctionBox': return index.boxNamed(text)?.location ?? null;
  }
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
    signalType: () => SIGNAL_TYPES,
  };
  return [...new Set(options[key]())];
}

export function isChoice(key: FieldKey): key is ChoiceKey {
  return (CHOICES as readonly FieldKey[]).includes(key);
}

const UNKNOWN: Readonly<Record<ChoiceKey, Fault['code']>> = {
  wiring: 'wiring-unknown',
  dispenserType: 'type-unknown',
  controller: 'controller-unknown',
  circuit: 'circuit-unknown',
  grease: 'grease-unknown',
  junctionBox: 'box-unknown',
  signalType: 'signal-type-unknown',
};

/** What to say of a text that names nothing known. */
export function unknownChoice(key: ChoiceKey, text: string, index: DesignIndex): Fault {
  const places: Readonly<Record<ChoiceKey, string>> = {
    wiring: `“${text}” is neither two-core nor four-core.`,
    dispenserType: `The catalogue has no dispenser type “${text}”.`,
    controller: `The project has no controller “${text}”. Output and status of this row stay open too.`,
    circuit: `The project has no circuit “${text}”.`,
    grease: `The catalogue has no grease “${text}”.`,
    junctionBox: `The project has no junction box “${text}”.`,
    signalType: `“${text}” says neither output nor input.`,
  };
  return { code: UNKNOWN[key], message: places[key], remedy: remedyFor(key, optionsOf(key, index.design)) };
}

function remedyFor(key: ChoiceKey, options: readonly string[]): string {
  if (options.length === 0) return `Add it to the project first, or leave the column out.`;
  const shown = options.slice(0, 6).join(' · ');
  return `Choose what the text stands for: ${shown}${options.length > 6 ? ' …' : ''}. Or correct the ${fieldOf(key).label.toLowerCase()} in the list.`;
}
