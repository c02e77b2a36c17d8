import type { FieldKey, SignalKey } from './field-keys.ts';
import { FIELD_NAMES } from './field-names.ts';

export type { FieldKey, SignalKey };

/** How a cell of the field is read: `volume` is written in cm³ and kept in whole microlitres. */
export type FieldKind = 'text' | 'number' | 'volume' | 'choice' | 'module' | 'channel' | 'address';

export interface Field {
  readonly key: FieldKey;
  /** The name of the value it fills, the same but for volumes; a row's own signal becomes output or status. */
  readonly value: ValueKey | SignalKey;
  readonly label: string;
  /** The unit of its numbers as a heading shows it; null: it has none. */
  readonly unit: string | null;
  readonly kind: FieldKind;
  /** Spellings of the unit that a cell or a heading may carry, normalised (see `normalUnit`). */
  readonly units: readonly string[];
  /** The letter that stands for it in drawings, for instance d; null: none. */
  readonly symbol: string | null;
  /** A heading without the unit does not say enough to suggest this field. */
  readonly unitNeeded: boolean;
  /** Headings, normalised (see `normalHeading`), in English, German, Dutch, French and Spanish. */
  readonly names: readonly string[];
}

/** The values that a row gives, by name; what they hold is `ImportValues`. */
export type ValueKey =
  | Exclude<FieldKey, SignalKey | 'demandCm3Per100h' | 'demandCm3Per1000h' | 'cartridgeCm3' | 'doseCm3'>
  | 'demandUlPer100h'
  | 'demandUlPer1000h'
  | 'cartridgeUl'
  | 'doseUl';

const MM = ['mm'];
const HOURS = [
  'h',
  'hr',
  'hrs',
  'hour',
  'hours',
  'h/d',
  'h/day',
  'h/tag',
  'std',
  'std/tag',
  'uur',
  'u/dag',
  'h/jour',
  'h/dia',
];
const RPM = ['rpm', '1/min', 'min-1', '/min', 'r/min', 'u/min', 'omw/min', 'tr/min', 't/min'];
const CM3 = ['cm3', 'ccm', 'cc', 'ml'];
const METRES = ['m', 'metre', 'metres', 'meter', 'meters', 'mtr'];
const MM2 = ['mm2', 'qmm', 'sqmm'];
const DAYS = ['d', 'd/week', 'days', 'days/week', 'd/w', 'tage', 'tage/woche', 'dagen', 'jours', 'dias'];
const PER_100H = ['cm3/100h', 'ccm/100h', 'ml/100h', 'cc/100h'];
const PER_1000H = ['cm3/1000h', 'ccm/1000h', 'ml/1000h', 'cc/1000h', 'cm3/kh'];

function field(key: FieldKey, label: string, kind: FieldKind, more: Partial<Field> = {}): Field {
  const plain = { value: key as ValueKey | SignalKey, unit: null, units: [], symbol: null, unitNeeded: false };
  return { ...plain, ...more, key, label, kind, names: FIELD_NAMES[key] };
}

/** Every importable field, in the order in which lists and menus show them. */
export const FIELDS: readonly Field[] = [
  field('tag', 'Tag', 'text'),
  field('description', 'Description', 'text'),
  field('function', 'Function =', 'text'),
  field('location', 'Location +', 'text'),
  field('product', 'Product -', 'text'),
  field('machine', 'Machine', 'text'),
  field('boreMm', 'Bore d', 'number', { unit: 'mm', units: MM, symbol: 'd' }),
  field('outsideMm', 'Outside diameter D', 'number', { unit: 'mm', units: MM, symbol: 'D' }),
  field('widthMm', 'Width B', 'number', { unit: 'mm', units: MM, symbol: 'B' }),
  field('speedRpm', 'Speed', 'number', { unit: 'rpm', units: RPM, symbol: 'n' }),
  field('hoursPerDay', 'Hours per day', 'number', { unit: 'h', units: HOURS }),
  field('daysPerWeek', 'Days per week', 'number', { unit: 'd', units: DAYS }),
  field('demandCm3Per100h', 'Demand', 'volume', {
    value: 'demandUlPer100h',
    unit: 'cm³/100 h',
    units: PER_100H,
    unitNeeded: true,
  }),
  field('demandCm3Per1000h', 'Demand', 'volume', {
    value: 'demandUlPer1000h',
    unit: 'cm³/1000 h',
    units: PER_1000H,
    unitNeeded: true,
  }),
  field('grease', 'Grease', 'choice'),
  field('dispenserType', 'Dispenser type', 'choice'),
  field('cartridgeCm3', 'Cartridge', 'volume', { value: 'cartridgeUl', unit: 'cm³', units: CM3 }),
  field('doseCm3', 'Dose', 'volume', { value: 'doseUl', unit: 'cm³', units: CM3 }),
  field('wiring', 'Wiring', 'choice'),
  field('controller', 'Controller', 'choice'),
  field('outputModule', 'Output module', 'module'),
  field('outputChannel', 'Output channel', 'channel'),
  field('outputAddress', 'Output address', 'address'),
  field('statusModule', 'Status module', 'module'),
  field('statusChannel', 'Status channel', 'channel'),
  field('statusAddress', 'Status address', 'address'),
  field('signalType', 'Signal type', 'choice'),
  field('module', 'Signal module', 'module'),
  field('channel', 'Signal channel', 'channel'),
  field('address', 'Signal address', 'address'),
  field('junctionBox', 'Junction box', 'choice'),
  field('cableTag', 'Cable', 'text'),
  field('cableLengthM', 'Cable length', 'number', { unit: 'm', units: METRES }),
  field('crossSectionMm2', 'Cross-section', 'number', { unit: 'mm²', units: MM2 }),
  field('circuit', 'Circuit', 'choice'),
  field('remarks', 'Remarks', 'text'),
];

const BY_KEY = new Map(FIELDS.map((each) => [each.key, each]));

/** The field of this key. */
export function fieldOf(key: FieldKey): Field {
  return BY_KEY.get(key)!;
}

/** Whether a text names a field. */
export function isFieldKey(text: string): text is FieldKey {
  return BY_KEY.has(text as FieldKey);
}

/** The heading of a field in our own lists: label and unit; the suggestion always finds it again. */
export function headingOf(key: FieldKey): string {
  const { label, unit } = fieldOf(key);
  return unit === null ? label : `${label} ${unit}`;
}
