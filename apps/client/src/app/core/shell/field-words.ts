import { formatNumber, formatVolume, NOTHING, withUnit } from '#calc';

/** Endings of field names and the unit that they stand for. */
const UNITS: readonly (readonly [RegExp, string])[] = [
  [/Mm2$/, 'mm²'], [/Mm$/, 'mm'], [/Rpm$/, '1/min'], [/Ohm$/, 'Ω'], [/Percent$/, '%'], [/Ms$/, 'ms'], [/LengthM$|^lengthM$/, 'm'], [/A$/, 'A'], [/V$/, 'V'], [/C$/, '°C'],
];

/** A row's field in words: `crossSectionMm2` is read "Cross section". */
export function fieldName(field: string): string {
  const bare = field === 'lengthM' ? 'length' : field.replace(/(Ul|Mm2|Mm|Rpm|Ohm|Percent|Ms|Id)$/, '').replace(/(Length)M$/, '$1').replace(/([a-z])[AVC]$/, '$1');
  const words = bare.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** A row's value in words, with the unit that its field's name carries. */
export function fieldValue(field: string, value: unknown): string {
  if (value === null || value === undefined || value === '') return NOTHING;
  if (typeof value === 'number') {
    if (field.endsWith('Ul')) return formatVolume(value);
    const unit = UNITS.find(([ending]) => ending.test(field))?.[1];
    return unit ? withUnit(formatNumber(value), unit) : formatNumber(value);
  }
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return typeof value === 'string' ? value : JSON.stringify(value);
}
