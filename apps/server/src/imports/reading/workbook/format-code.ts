/** A piece of one section of a number format. */
export type FormatToken =
  | { readonly kind: 'literal'; readonly text: string }
  /** A place for a digit; `0` shows a nought where the number has none. */
  | { readonly kind: 'digit'; readonly text: string }
  /** A run of one letter of a date or time, in lower case. */
  | { readonly kind: 'date'; readonly text: string }
  /** A counted duration: `h`, `m` or `s`. */
  | { readonly kind: 'elapsed'; readonly text: string }
  | { readonly kind: 'general' | 'point' | 'comma' | 'percent' | 'exponent' | 'fraction' | 'cellText' };

/** A section of a number format with the numbers it is for. */
export interface FormatSection {
  readonly tokens: readonly FormatToken[];
  /** A condition such as `[<100]`; null where the section's place decides. */
  readonly holds: ((value: number) => boolean) | null;
}

interface Rule {
  readonly pattern: RegExp;
  readonly make: (text: string) => readonly FormatToken[];
}

const literal = (text: string): FormatToken[] => (text === '' ? [] : [{ kind: 'literal', text }]);

/** The first rule that fits at a place is taken; spaces of a sign's width and fillers show nothing. */
const RULES: readonly Rule[] = [
  { pattern: /"([^"]*)"?/y, make: (text) => literal(text.replaceAll('"', '')) },
  { pattern: /\\./sy, make: (text) => literal(text.slice(1)) },
  { pattern: /[_*]./sy, make: () => [] },
  { pattern: /\[(h+|m+|s+)\]/iy, make: (text) => [{ kind: 'elapsed', text: text[1].toLowerCase() }] },
  { pattern: /\[\$[^\]]*\]/y, make: (text) => literal(text.slice(2, -1).replace(/-[^-]*$/, '')) },
  { pattern: /\[[^\]]*\]/y, make: () => [] },
  { pattern: /general/iy, make: () => [{ kind: 'general' }] },
  { pattern: /am\/pm|a\/p/iy, make: () => [{ kind: 'date', text: 'a' }] },
  { pattern: /e[+-]/iy, make: () => [{ kind: 'exponent' }] },
  { pattern: /y+|m+|d+|h+|s+/iy, make: (text) => [{ kind: 'date', text: text.toLowerCase() }] },
  { pattern: /[0#?]/y, make: (text) => [{ kind: 'digit', text }] },
  { pattern: /\./y, make: () => [{ kind: 'point' }] },
  { pattern: /,/y, make: () => [{ kind: 'comma' }] },
  { pattern: /%/y, make: () => [{ kind: 'percent' }] },
  { pattern: /\//y, make: () => [{ kind: 'fraction' }] },
  { pattern: /@/y, make: () => [{ kind: 'cellText' }] },
  { pattern: /[^]/uy, make: literal },
];

/** Reads a number format (ECMA-376 part 1, 18.8.31) into its sections. */
export function formatSections(code: string): readonly FormatSection[] {
  return splitSections(code).map((section) => ({ tokens: tokensOf(section), holds: conditionOf(section) }));
}

/** Sections end at a semicolon that is neither quoted nor escaped. */
function splitSections(code: string): string[] {
  const sections: string[] = [''];
  for (const [piece] of code.matchAll(/"[^"]*"?|\\[^]|[_*][^]|[^]/g)) {
    if (piece === ';') sections.push('');
    else sections[sections.length - 1] += piece;
  }
  return sections;
}

function tokensOf(section: string): readonly FormatToken[] {
  const tokens: FormatToken[] = [];
  for (let at = 0; at < section.length;) {
    const { tokens: found, length } = tokenAt(section, at);
    tokens.push(...found);
    at += length;
  }
  return tokens;
}

function tokenAt(section: string, at: number): { tokens: readonly FormatToken[]; length: number } {
  for (const { pattern, make } of RULES) {
    pattern.lastIndex = at;
    const text = pattern.exec(section)?.[0];
    if (text) return { tokens: make(text), length: text.length };
  }
  return { tokens: [], length: 1 };
}

const COMPARISONS: Readonly<Record<string, (a: number, b: number) => boolean>> = {
  '<': (a, b) => a < b,
  '<=': (a, b) => a <= b,
  '>': (a, b) => a > b,
  '>=': (a, b) => a >= b,
  '=': (a, b) => a === b,
  '<>': (a, b) => a !== b,
};

function conditionOf(section: string): FormatSection['holds'] {
  const [, sign, bound] = /\[(<=|>=|<>|<|>|=)\s*(-?\d+(?:\.\d+)?)\]/.exec(section) ?? [];
  if (sign === undefined) return null;
  return (value) => COMPARISONS[sign](value, Number(bound));
}
