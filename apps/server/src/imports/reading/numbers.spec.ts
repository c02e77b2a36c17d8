import { describe, expect, it } from 'vitest';
import { fieldOf, type FieldKey } from './fields.ts';
import type { DecimalMark } from './grid.ts';
import { readNumber } from './numbers.ts';

function read(text: string, decimal: DecimalMark = '.', key: FieldKey = 'cableLengthM'): ReturnType<typeof readNumber> {
  return readNumber(text, decimal, fieldOf(key).units);
}

describe('reading numbers', () => {
  it.each<[string, DecimalMark, number]>([
    ['0', '.', 0],
    ['007', '.', 7],
    ['-35', '.', -35],
    ['−0.5', '.', -0.5],
    ['+2', '.', 2],
    ['.5', '.', 0.5],
    ['1E3', '.', 1000],
    ['95.5', '.', 95.5],
    ['95,5', ',', 95.5],
    ['1234567', ',', 1234567],
  ])('reads %j with decimal sign %s without a note', (text, decimal, value) => {
    expect(read(text, decimal)).toEqual({ value, notes: [], fault: null });
  });

  it.each<[string, DecimalMark, number]>([
    ['1,480', '.', 1480],
    ['1.480', ',', 1480],
    ['1 480', '.', 1480],
    ['1\u00a0480', '.', 1480],
    ['1\u202f480,5', ',', 1480.5],
    ["1'234'567.25", '.', 1234567.25],
    ['12.345.678,9', ',', 12345678.9],
  ])('takes the grouping out of %j with decimal sign %s', (text, decimal, value) => {
    expect(read(text, decimal)).toEqual({ value, notes: ['grouping-removed'], fault: null });
  });

  it.each<[string, FieldKey, number]>([
    ['12 m', 'cableLengthM', 12],
    ['12m', 'cableLengthM', 12],
    ['0.3 cm³', 'doseCm3', 0.3],
    ['1.5 mm²', 'crossSectionMm2', 1.5],
    ['16 h', 'hoursPerDay', 16],
    ['95.5 rpm', 'speedRpm', 95.5],
    ['95.5 1/min', 'speedRpm', 95.5],
    ['4.5 cm³/100 h', 'demandCm3Per100h', 4.5],
    ['39 cm³ / 1,000 h', 'demandCm3Per1000h', 39],
  ])('takes the unit out of %j in %s', (text, key, value) => {
    expect(read(text, '.', key)).toEqual({ value, notes: ['unit-removed'], fault: null });
  });

  it('folds full-width digits', () => {
    expect(read('３６．５')).toEqual({ value: 36.5, notes: ['full-width-folded'], fault: null });
  });

  it.each(['n/a', 'N/A', 'n.a.', '-', '–'])('reads %j as blank', (text) => {
    expect(read(text)).toEqual({ value: null, notes: ['read-as-blank'], fault: null });
  });

  it.each([
    'variable',
    '#REF!',
    '1-2',
    '2x1.5',
    '1.2.3',
    '12,34',
    '1,48',
    '0,300',
    '1,2345',
    'NaN',
    'Infinity',
    '0x10',
    '1 48',
    '9'.repeat(400),
    '=',
  ])('says that %j is not a number', (text) => {
    expect(read(text)).toMatchObject({ value: null, fault: { code: 'not-a-number' } });
  });

  it.each(['40 ft', '40 cm', '40 mm', "40'", '40 km'])('says that %j is in another unit', (text) => {
    expect(read(text)).toMatchObject({ value: null, fault: { code: 'other-unit' } });
  });

  it('names the decimal sign when the other one stands in the number', () => {
    expect(read('0,3').fault?.message).toContain('the decimal sign of this file is the point');
  });
});
