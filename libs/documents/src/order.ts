/**
 * Compares names as people count them: DO2 before DO10. Case does not count; no locale, so that a list
 * has the same order on every machine.
 */
export function naturalCompare(a: string, b: string): number {
  // Most neighbours in a list share cabinet, controller and module.
  if (a === b) return 0;
  const [left, right] = [partsOf(a), partsOf(b)];
  for (let i = 0; i < Math.min(left.length, right.length); i++) {
    const order = compareParts(left[i], right[i]);
    if (order !== 0) return order;
  }
  return left.length - right.length || compareTexts(a, b);
}

const partsOf = (text: string): string[] => text.toLowerCase().match(/\d+|\D+/g) ?? [];

function compareParts(a: string, b: string): number {
  const numbers = /^\d/.test(a) && /^\d/.test(b);
  return numbers ? Number(a) - Number(b) : compareTexts(a, b);
}

function compareTexts(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
