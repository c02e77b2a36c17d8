import { formatNumber, formatVolume, NOTHING, withUnit } from '#calc';

/** Endings of field names and the unit that they stand for. */
const UNITS: readonly (readonly [RegExp, string])[] = [
  [/Mm2$/, 'mm²'], [/Mm$/, 'mm'], [/Rpm$/, '1/min'], [/Ohm$/, 'Ω'], [/Percent$/, '%'], [/Ms$/, 'ms'], [/LengthM$|^lengthM$/, 'm'], [/A$/, 'A'], [/V$/, 'V'], [/C$/, '°C'],
];

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
