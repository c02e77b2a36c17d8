/**
 * Exact rational arithmetic on whole numbers, so that no volume or count ever passes through a binary
 * fraction: a decimal input such as 16.5 h enters as 165/10.
 */
export interface Rational {
  readonly num: bigint;
  /** Always positive. */
  readonly den: bigint;
}

/** A fraction from two whole numbers; not reduced, since the chains here are short. */
export function ratio(num: bigint, den: bigint): Rational {
  if (den === 0n) throw new RangeError('A fraction needs a denominator other than 0.');
  return den < 0n ? { num: -num, den: -den } : { num, den };
}

/**
 * The decimal that a person typed, exactly: the shortest decimal that names the number is taken.
 *
 * @throws {RangeError} when the value is not finite
 */
export function exact(value: number): Rational {
  if (Number.isSafeInteger(value)) return { num: BigInt(value), den: 1n };
  if (!Number.isFinite(value)) throw new RangeError(`Not a finite number: ${value}`);
  const [mantissa, exponent = '0'] = String(value).split('e');
  const [whole, fraction = ''] = mantissa.split('.');
  const digits = BigInt(whole + fraction);
  const places = fraction.length - Number(exponent);
  return places > 0 ? ratio(digits, 10n ** BigInt(places)) : ratio(digits * 10n ** BigInt(-places), 1n);
}

/** Product of any number of fractions. */
export function times(...factors: readonly Rational[]): Rational {
  return factors.reduce((a, b) => ({ num: a.num * b.num, den: a.den * b.den }), ONE);
}

/** @throws {RangeError} when the divisor is 0 */
export function over(dividend: Rational, divisor: Rational): Rational {
  return ratio(dividend.num * divisor.den, dividend.den * divisor.num);
}

export function minus(a: Rational, b: Rational): Rational {
  return { num: a.num * b.den - b.num * a.den, den: a.den * b.den };
}

/** Largest whole number that is not above the fraction. */
export function floorOf({ num, den }: Rational): bigint {
  const quotient = num / den;
  return num % den < 0n ? quotient - 1n : quotient;
}

/** Smallest whole number that is not below the fraction. */
export function ceilOf({ num, den }: Rational): bigint {
  return -floorOf({ num: -num, den });
}

/** The fraction as the nearest number, for figures that are shown or compared, never counted with. */
export function toNumber({ num, den }: Rational): number {
  const whole = num / den;
  const rest = num % den;
  return Number(whole) + Number((rest * FINE) / den) / Number(FINE);
}

/**
 * Square root, exact where it is a fraction, else the upper neighbour at 24 decimals.
 *
 * @param value not negative
 */
export function sqrtUp({ num, den }: Rational): Rational {
  // √(n/d) = √(n·d)/d, scaled so that the whole-number root keeps 24 decimals.
  const radicand = num * den * ROOT_SCALE * ROOT_SCALE;
  const root = floorRoot(radicand);
  return ratio(root * root === radicand ? root : root + 1n, den * ROOT_SCALE);
}

/** Newton's method on whole numbers, from just above the root; it falls until it meets it. */
function floorRoot(value: bigint): bigint {
  if (value < 2n) return value;
  const estimate = Math.sqrt(Number(value)) * (1 + 1e-12);
  let root = Number.isFinite(estimate) ? BigInt(Math.ceil(estimate)) : value;
  for (;;) {
    const next = (root + value / root) >> 1n;
    if (next >= root) return root;
    root = next;
  }
}

const ONE: Rational = { num: 1n, den: 1n };
const FINE = 10n ** 18n;
const ROOT_SCALE = 10n ** 24n;
