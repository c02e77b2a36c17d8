/** Beyond this many digits before or behind the point the exponent is kept; no list has such numbers. */
const LONGEST_EXPANSION = 20;

/**
 * A number in decimal digits with a point, as a spreadsheet program shows it in a cell wide enough: fifteen
 * significant digits, which leaves out the noise of binary fractions, and nothing behind the last that counts.
 *
 * @param value any number that a spreadsheet can hold, so below 1e308
 */
export function plainNumber(value: number): string {
  const shortest = String(value);
  // the usual case, told by its length: too short to have noise in it
  return shortest.length <= 15 && !shortest.includes('e') ? shortest : inFull(String(Number(value.toPrecision(15))));
}

function inFull(text: string): string {
  const [, sign, whole, fraction = '', exponent] = /^(-?)(\d)(?:\.(\d+))?e([+-]\d+)$/.exec(text) ?? [];
  if (exponent === undefined) return text;
  const places = Number(exponent);
  if (Math.abs(places) > LONGEST_EXPANSION + 1) return text.toUpperCase();
  const digits = whole + fraction;
  return sign + (places < 0 ? `0.${'0'.repeat(-places - 1)}${digits}` : digits.padEnd(places + 1, '0'));
}
