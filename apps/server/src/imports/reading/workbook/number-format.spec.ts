import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runs } from '#support/property-runs.ts';
import { isoCellText } from './date-text.ts';
import { numberFormat } from './number-format.ts';
import { plainNumber } from './plain-number.ts';

const shown = (code: string, value: number, from1904 = false): string => numberFormat(code, from1904).number(value);

describe('plain numbers', () => {
  it.each<[number, string]>([
    [0.1 + 0.2, '0.3'],
    [0.07 * 100, '7'],
    [1.1 * 3, '3.3'],
    [1 / 3, '0.333333333333333'],
    [-0, '0'],
    [-12.5, '-12.5'],
    [123_456_789_012_345_680, '123456789012346000'],
    [1e-7, '0.0000001'],
    [-1.25e-7, '-0.000000125'],
    [1.5e21, '1500000000000000000000'],
    [1e300, '1E+300'],
  ])('%d is %s', (value, text) => {
    expect(plainNumber(value)).toBe(text);
  });

  it('keep every decimal of up to fifteen digits as it was typed', () => {
    const typed = fc.tuple(fc.integer({ min: -999_999_999, max: 999_999_999 }), fc.integer({ min: 0, max: 6 }));
    fc.assert(
      fc.property(typed, ([digits, places]) => {
        const text = (digits / 10 ** places).toFixed(places);
        const trimmed = places === 0 ? text : text.replace(/\.?0+$/, '');
        expect(plainNumber(Number(text))).toBe(trimmed === '-0' ? '0' : trimmed);
      }),
      { numRuns: runs(500) },
    );
  });

  it('are never longer than their digits need', () => {
    const double = fc.double({ noNaN: true, min: -1e307, max: 1e307 });
    fc.assert(
      fc.property(double, (value) => {
        const text = plainNumber(value);
        expect(text).toMatch(/^-?\d+(\.\d*[1-9])?$|E[+-]\d+$/);
        expect(Number(text)).toBe(Number(value.toPrecision(15)) + 0);
      }),
      { numRuns: runs(500) },
    );
  });
});

describe('number formats', () => {
  it.each<[string, number, string]>([
    ['General', 12.5, '12.5'],
    ['@', 7, '7'],
    ['0.00', 18, '18'],
    ['0', 18.5, '18.5'],
    ['#,##0.00', 1234.5, '1234.5'],
    ['0.00E+00', 1234, '1234'],
    ['# ?/?', 0.5, '0.5'],
    ['0.0,"k"', 12_345, '12345'],
    [';;;', 5, '5'],
  ])('%s shows %d with all its digits: %s', (code, value, text) => {
    expect(shown(code, value)).toBe(text);
  });

  it.each<[string, number, string]>([
    ['0%', 0.25, '25%'],
    ['0.0%', 0.125, '12.5%'],
    ['0.00%', 0.07, '7%'],
    ['0%', -0.5, '-50%'],
  ])('%s shows %d as the percentage %s', (code, value, text) => {
    expect(shown(code, value)).toBe(text);
  });

  it.each<[string, number, string]>([
    ['000', 7, '007'],
    ['"GC1-L"00', 1, 'GC1-L01'],
    ['00\\-00', 1203, '12-03'],
    ['0" m"', 18, '18 m'],
    ['0.00\\ "ft"', 18.5, '18.5 ft'],
    ['General" m"', 18.25, '18.25 m'],
    ['#,##0.00\\ [$€-407]', 1234.5, '1234.5 €'],
    ['[<100]0" m";0" mm"', 5, '5 m'],
    ['[<100]0" m";0" mm"', 500, '500 mm'],
  ])('%s keeps what it says around the digits of %d: %s', (code, value, text) => {
    expect(shown(code, value)).toBe(text);
  });

  it.each(['0;[Red]0', '0;(0)', '0;-0', '#,##0_);[Red](#,##0)', '_-* #,##0_-;-* #,##0_-;_-* "-"??_-;_-@_-'])(
    '%s keeps the sign and the nought',
    (code) => {
      expect([5, -5, 0].map((value) => shown(code, value))).toEqual(['5', '-5', '0']);
    },
  );

  it('keep what they say around a text', () => {
    expect(numberFormat('"-W"@', false).text('1101')).toBe('-W1101');
    expect(numberFormat('0;-0;0;@" (text)"', false).text('x')).toBe('x (text)');
    expect(numberFormat(';;;', false).text('kept')).toBe('kept');
  });

  it('are read whatever stands in them', () => {
    const code = fc.string({ unit: fc.constantFrom(...'0#?.,%;@[]"\\_*ymdhsE+-/$<1 aP'), maxLength: 30 });
    fc.assert(
      fc.property(code, fc.double({ noNaN: true, noDefaultInfinity: true }), (text, value) => {
        expect(typeof shown(text, value)).toBe('string');
        expect(typeof numberFormat(text, true).text('x')).toBe('string');
      }),
      { numRuns: runs(1000) },
    );
  });
});

describe('dates and times', () => {
  it.each<[string, number, string]>([
    ['yyyy\\-mm\\-dd', 46_083, '2026-03-02'],
    ['dd/mm/yyyy', 46_082, '2026-03-01'],
    ['d.m.yy;@', 46_082.9, '2026-03-01'],
    ['mmm yyyy', 46_082, '2026-03-01'],
    ['[$-F800]dddd\\,\\ mmmm\\ dd\\,\\ yyyy', 46_082, '2026-03-01'],
    ['yyyy"年"m"月"d"日"', 46_082, '2026-03-01'],
    ['yyyy-mm-dd hh:mm', 46_082 + 14.5 / 24, '2026-03-01 14:30'],
    ['m/d/yy h:mm AM/PM', 46_082 + 14.5 / 24, '2026-03-01 14:30'],
    ['yyyy-mm-dd hh:mm:ss', 46_082.999_999_999, '2026-03-02 00:00:00'],
    ['h:mm AM/PM', 14.5 / 24, '14:30'],
    ['hh:mm:ss', 14.5 / 24, '14:30:00'],
    ['mm:ss', 90 / 86_400, '00:01:30'],
    ['[h]:mm', 1.5, '36:00'],
    ['[mm]:ss', 1.5, '2160:00'],
    ['[s]', 0.5, '43200'],
  ])('%s shows %d as %s', (code, value, text) => {
    expect(shown(code, value)).toBe(text);
  });

  it('follow the calendar of spreadsheets at its beginning and its end', () => {
    const days = [1, 59, 60, 61, 2_958_465].map((day) => shown('yyyy-mm-dd', day));
    expect(days).toEqual(['1900-01-01', '1900-02-28', '1900-02-29', '1900-03-01', '9999-12-31']);
  });

  it('count from 1904 where the workbook does', () => {
    expect([0, 1, 44_620].map((day) => shown('yyyy-mm-dd', day, true))).toEqual([
      '1904-01-01',
      '1904-01-02',
      '2026-03-01',
    ]);
  });

  it.each([-1, 0, 2_958_466, 1e9])('leave %d a number, since it is no date', (value) => {
    expect(shown('yyyy-mm-dd', value)).toBe(String(value));
  });

  it('agree with the calendar for every day', () => {
    fc.assert(
      fc.property(fc.integer({ min: 61, max: 2_958_465 }), (day) => {
        const expected = new Date(Date.UTC(1899, 11, 30) + day * 86_400_000).toISOString().slice(0, 10);
        expect(shown('dd.mm.yyyy', day)).toBe(expected);
      }),
      { numRuns: runs(300) },
    );
  });

  it.each([
    ['2026-03-01', '2026-03-01'],
    ['2026-03-01T00:00:00', '2026-03-01'],
    ['2026-03-01T14:30:00Z', '2026-03-01 14:30'],
    ['2026-03-01T14:30:15.000', '2026-03-01 14:30:15'],
    ['14:30:00', '14:30'],
    ['next week', 'next week'],
  ])('of a date cell: %s is %s', (stored, text) => {
    expect(isoCellText(stored)).toBe(text);
  });
});
