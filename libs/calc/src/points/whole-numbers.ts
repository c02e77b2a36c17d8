import { ratio, toNumber } from './exact.ts';

/**
 * Whole-number arithmetic without big numbers wherever the double's 53 bits hold every step: the same
 * answers as the exact fractions of `exact.ts`, which take over where they do not.
 */

/** ⌊a·b ÷ c⌋ of whole numbers, a and b from 0, c above 0. */
export function floorOfProduct(a: number, b: number, c: number): number {
  const product = a * b;
  if (product <= Number.MAX_SAFE_INTEGER) return (product - (product % c)) / c;
  return Number((BigInt(a) * BigInt(b)) / BigInt(c));
}

/** a·b ÷ c of whole numbers, a and b from 0, c above 0, as the nearest number. */
export function productOver(a: number, b: number, c: number): number {
  const product = a * b;
  return product <= Number.MAX_SAFE_INTEGER ? product / c : toNumber(ratio(BigInt(a) * BigInt(b), BigInt(c)));
}

/**
 * Share of the value within which a double's rounding errors may have put a chain of a dozen products and
 * quotients on the wrong side of a whole number; far more than they add up to.
 */
const DOUBT = 1e-11;

/** The value rounded up to a whole number; null where it lies so near one that only exact arithmetic can tell, or is not above 0. */
export function certainCeil(value: number): number | null {
  const up = Math.ceil(value);
  const doubt = value * DOUBT;
  return value > 0 && up <= 1e12 && up - value > doubt && value - (up - 1) > doubt ? up : null;
}

/** A value as typed, over the power of ten that makes it whole: 16.5 is 165 over 10; null beyond three decimals or so many digits. */
export function decimalOf(value: number): { readonly num: number; readonly den: number } | null {
  for (let den = 1; den <= 1000; den *= 10) {
    const num = Math.round(value * den);
    if (Math.abs(num) < 1e12 && num / den === value) return { num, den };
  }
  return null;
}
