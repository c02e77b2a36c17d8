import type { FieldKey } from './field-keys.ts';
import { FIELD_NAMES } from './field-names.ts';

/** What a heading over several columns speaks of, with the fields that may stand under it. */
export interface FieldGroup {
  /** Normalised as headings are. */
  readonly names: readonly string[];
  readonly fields: readonly FieldKey[];
  /** Short headings that mean another field here than alone: field that they name alone → field under this group. */
  readonly meant: Readonly<Partial<Record<FieldKey, FieldKey>>>;
  /** Short headings that name no field alone. */
  readonly words: Readonly<Record<string, FieldKey>>;
}

const SIGNAL_PARTS = ['module', 'channel', 'address'] as const;
const NUMBERS = ['no', 'nr', 'number', 'nummer', 'numero', 'name', 'naam', 'nom', 'nombre', 'id'];

function words(key: FieldKey, ...texts: readonly string[]): Record<string, FieldKey> {
  return Object.fromEntries(texts.map((each) => [each, key]));
}

/** Group headings in the five languages of the fields' names. */
export const FIELD_GROUPS: readonly FieldGroup[] = [
  {
    names: ['signal', 'signals', 'signale', 'signaal', 'signaux', 'senal', 'io', 'i o', 'e a'],
    fields: ['signalType', ...SIGNAL_PARTS],
    meant: { dispenserType: 'signalType', outputModule: 'module', outputChannel: 'channel', outputAddress: 'address' },
    words: words('signalType', 'type', 'direction', 'kind', 'art', 'richtung', 'soort', 'genre', 'sens', 'clase'),
  },
  {
    names: ['dispenser', 'lubricator', 'device', 'spender', 'schmierstoffgeber', 'gerat', 'smeertoestel', 'distributeur', 'graisseur', 'dosificador', 'lubricador'],
    fields: ['dispenserType', 'wiring', 'cartridgeCm3', 'doseCm3'],
    meant: {},
    words: {},
  },
  {
    names: ['output', 'control output', 'control', 'ausgang', 'uitgang', 'sortie', 'salida', 'do'],
    fields: ['outputModule', 'outputChannel', 'outputAddress', 'controller'],
    meant: { module: 'outputModule', channel: 'outputChannel', address: 'outputAddress' },
    words: words('outputAddress', 'address', 'adresse', 'adres', 'direccion'),
  },
  {
    names: ['status', 'input', 'status input', 'feedback', 'eingang', 'ruckmeldung', 'ingang', 'entree', 'entrada', 'di'],
    fields: ['statusModule', 'statusChannel', 'statusAddress'],
    meant: {
      ...{ module: 'statusModule', channel: 'statusChannel', address: 'statusAddress' },
      ...{ outputModule: 'statusModule', outputChannel: 'statusChannel', outputAddress: 'statusAddress' },
    },
    words: words('statusAddress', 'address', 'adresse', 'adres', 'direccion'),
  },
  {
    names: ['plc', 'controller', 'control system', 'sps', 'steuerung', 'besturing', 'automate', 'api', 'automata'],
    fields: ['controller', ...SIGNAL_PARTS, 'outputModule', 'outputChannel', 'outputAddress', 'statusModule', 'statusChannel', 'statusAddress'],
    meant: {},
    words: words('controller', ...NUMBERS),
  },
  {
    names: ['cable', 'kabel', 'leitung', 'cable electrico', 'cableado'],
    fields: ['cableTag', 'cableLengthM', 'crossSectionMm2', 'circuit', 'junctionBox'],
    meant: { tag: 'cableTag' },
    words: { ...words('cableTag', ...NUMBERS), ...words('crossSectionMm2', 'mm2', 'qmm', 'sqmm'), ...words('cableLengthM', 'm') },
  },
  {
    names: ['bearing', 'lager', 'roulement', 'palier', 'rodamiento', 'cojinete'],
    fields: ['boreMm', 'outsideMm', 'widthMm', 'speedRpm'],
    meant: {},
    words: {},
  },
  {
    names: ['point', 'lubrication point', 'lub point', 'schmierstelle', 'schmierpunkt', 'smeerpunt', 'point de graissage', 'punto de engrase'],
    fields: ['tag', 'description', 'function', 'location', 'product', 'machine', 'remarks', 'grease', 'demandCm3Per100h', 'demandCm3Per1000h'],
    meant: {},
    words: words('tag', ...NUMBERS),
  },
];

const BY_NAME = new Map(FIELD_GROUPS.flatMap((group) => group.names.map((name) => [name, group] as const)));

/** The group that a heading over several columns names, normalised; undefined: it says nothing known. */
export function groupNamed(name: string): FieldGroup | undefined {
  return BY_NAME.get(name);
}

/**
 * Headings that many things have: under a group that speaks of something else they do not mean the
 * field that they name alone.
 */
const COMMON: readonly FieldKey[] = ['tag', 'description', 'dispenserType', 'outputModule', 'outputChannel', 'outputAddress', ...SIGNAL_PARTS, 'product', 'location'];

/** Whether the field, named alone under a group of other things, is probably meant of those. */
export function isCommon(key: FieldKey): boolean {
  return COMMON.includes(key);
}

/** Place of each heading among the names of each field that it may mean. */
const FIELDS_BY_NAME = new Map<string, Map<FieldKey, number>>();
for (const [key, names] of Object.entries(FIELD_NAMES) as [FieldKey, readonly string[]][]) {
  names.forEach((name, place) => {
    const places = FIELDS_BY_NAME.get(name) ?? new Map<FieldKey, number>();
    FIELDS_BY_NAME.set(name, places.has(key) ? places : places.set(key, place));
  });
}

const NONE: ReadonlyMap<FieldKey, number> = new Map();

/** The fields that a normalised heading may name, with its place among their names: the first is the most telling. */
export function fieldsNamed(name: string): ReadonlyMap<FieldKey, number> {
  return FIELDS_BY_NAME.get(name) ?? NONE;
}
