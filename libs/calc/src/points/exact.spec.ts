import { describe, expect, it } from 'vitest';
import { ceilOf, exact, floorOf, minus, over, ratio, sqrtUp, times, toNumber } from './exact.ts';

describe('exact', () => {
  it.each([
    [16.5, 165n, 10n], [0.1, 1n, 10n], [-0.25, -25n, 100n], [1e21, 10n ** 21n, 1n], [1.5e-7, 15n, 10n ** 8n],
  ])('takes %s as the decimal that was typed', (value, num, den) => {
    expect(exact(value)).toEqual({ num, den });
  });

  it('refuses what is not finite', () => {
    expect(() => exact(Number.NaN)).toThrow(RangeError);
  });
});

describe('arithmetic', () => {
  it('adds no binary fraction: 0.3 × 3 − 0.9 is 0', () => {
    expect(minus(times(exact(0.3), exact(3)), exact(0.9)).num).toBe(0n);
  });

  it('rounds down and up also below 0', () => {
    expect([floorOf(ratio(-7n, 2n)), ceilOf(ratio(-7n, 2n)), floorOf(ratio(7n, 2n)), ceilOf(ratio(7n, 2n)), ceilOf(ratio(6n, 2n))])
      .toEqual([-4n, -3n, 3n, 4n, 3n]);
  });

  it('keeps the denominator positive when dividing by a negative', () => {
    expect(floorOf(over(exact(1), exact(-2)))).toBe(-1n);
  });

  it('refuses a division by 0', () => {
    expect(() => over(exact(1), exact(0))).toThrow(RangeError);
  });

  it('turns a fraction into the nearest number', () => {
    expect(toNumber(ratio(1n, 3n))).toBeCloseTo(1 / 3, 15);
  });
});

describe('sqrtUp', () => {
  it('is exact where the root is a fraction', () => {
    const root = sqrtUp(exact(6.25));
    expect(root.num * 10n).toBe(root.den * 25n);
  });

  it('is the upper neighbour elsewhere', () => {
    const root = sqrtUp(exact(45));
    expect(root.num * root.num > 45n * root.den * root.den).toBe(true);
    expect(toNumber(root)).toBeCloseTo(Math.sqrt(45), 14);
  });

  it('of 0 is 0', () => {
    expect(sqrtUp(exact(0)).num).toBe(0n);
  });
});
