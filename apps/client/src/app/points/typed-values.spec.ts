import { describe, expect, it } from 'vitest';
import { numberOf, positive, volumeUl, words } from './typed-values';

describe('numberOf', () => {
  it.each([
    ['0.3', 0.3], ['0,3', 0.3], ['1,250', 1250], ['1,250.5', 1250.5], ['0,250', 0.25], ['160 cm³', 160], ['18\u2009h', 18], ['.5', 0.5],
  ])('reads %s as %d', (text, value) => expect(numberOf(text)).toBe(value));
  it.each(['abc', '1.2.3', '1e3', '', '12 ft'])('does not read "%s"', (text) => expect(numberOf(text)).toBeNull());
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
  });
});
