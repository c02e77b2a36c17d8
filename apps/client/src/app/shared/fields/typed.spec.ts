import { describe, expect, it } from 'vitest';
import { numberOf, numberOrNone, numberText, numberWithin, positive, timeZoneOf, volumeText, volumeUl, words } from './typed';

describe('numberOf', () => {
  it.each([
    ['0.3', 0.3], ['0,3', 0.3], ['1,250', 1250], ['1,250.5', 1250.5], ['0,250', 0.25], ['160 cm³', 160], ['18\u2009h', 18], ['.5', 0.5],
    ['24.5 V', 24.5], ['−40 °C', -40], ['0,02 Ω', 0.02], ['10A', 10], ['3 years', 3],
  ])('reads %s as %d', (text, value) => expect(numberOf(text)).toBe(value));
  it.each(['abc', '1.2.3', '1e3', '', '12 ft', '5 kA'])('does not read "%s"', (text) => expect(numberOf(text)).toBeNull());
});

describe('typed values', () => {
  it('takes blank for not decided yet', () => expect(positive('  ', 24)).toEqual({ ok: true, value: null }));
  it('says the limit that was missed', () => {
    expect(positive('25', 24, 'h')).toEqual({ ok: false, reason: 'Enter more than 0 and at most 24 h.' });
    expect(positive('0', 24)).toMatchObject({ ok: false });
  });
  it('answers volumes in whole microlitres', () => expect(volumeUl('0.3', 1e6)).toEqual({ ok: true, value: 300 }));
  it('refuses a volume that rounds to nothing', () => expect(volumeUl('0.0001', 1e6)).toMatchObject({ ok: false }));
  it('trims words and counts them', () => {
    expect(words(' a ', 5)).toEqual({ ok: true, value: 'a' });
    expect(words('abcdef', 5)).toMatchObject({ ok: false, reason: 'At most 5 characters; these are 6.' });
    expect(words(' ', 5)).toEqual({ ok: true, value: null });
  });
  it('are shown for editing without grouping and unit', () => {
    expect([numberText(1250.5), numberText(null), volumeText(300), volumeText(null)]).toEqual(['1250.5', '', '0.3', '']);
  });
});

describe('what is typed', () => {
  it('is a number with point or comma, with or without its unit', () => {
    const read = numberWithin({ min: 0, max: 10 });
    expect(read(' 1,5 mm² ')).toEqual({ ok: true, value: 1.5 });
    expect(read('24.5 V').ok).toBe(false);
    expect(read('')).toEqual({ ok: false, reason: 'Enter a number.' });
    expect(read('abc')).toEqual({ ok: false, reason: '“abc” is not a number.' });
  });

  it('keeps to its bounds', () => {
    expect(numberWithin({ min: 0, max: 5, above: true })('0')).toEqual({ ok: false, reason: 'Enter more than 0 and at most 5.' });
    expect(numberWithin({ min: -40, max: 90 })('-50')).toEqual({ ok: false, reason: 'Enter −40 to 90.' });
    expect(numberOrNone({ min: 1, max: 9, whole: true })('2.5')).toEqual({ ok: false, reason: 'Enter a whole number.' });
    expect(numberOrNone({ min: 1, max: 9 })(' ')).toEqual({ ok: true, value: null });
  });

  it('names a time zone that exists', () => {
    expect(timeZoneOf('Europe/Amsterdam').ok).toBe(true);
    expect(timeZoneOf('Nowhere/Town').ok).toBe(false);
  });
});
