import { trimmed } from './grid.ts';

/** A heading taken apart: what it names, in which unit, by which symbol. */
export interface HeadingParts {
  /** Small letters and digits, single blanks, without unit and symbol. */
  readonly name: string;
  /** The unit as `normalUnit` writes it, null when none is stated. */
  readonly unit: string | null;
  /** A single letter behind the name or alone, in its own case: d and D are two things. */
  readonly symbol: string | null;
}

const UNIT =
  /^(mm|cm|dm|m|km|ft|in|inch|yd|mm2|qmm|sqmm|cm2|awg|cm3|ccm|cc|ml|l|ul|rpm|1\/min|min-1|[rut]\/min|tr\/min|omw\/min|h|hr|hrs|std|uur|d|d\/week|(?:h|std|u)\/(?:d|day|tag|dag|jour|dia)|(?:cm3|ccm|cc|ml|g|l|oz)\/(?:\d+ ?)?(?:h|kh|d|day|tag|week|month|stroke|pulse)|g|kg|oz|v|a|w|s|ms|min|%|c)$/;

/** Small letters, no accents, raised digits as digits, no blanks: `cm³ / 1,000 h` becomes `cm3/1000h`. */
export function normalUnit(text: string): string {
  return folded(text)
    .replace(/\bper\b|\bpro\b|\bje\b|\bpar\b|\bpor\b/g, '/')
    .replace(/min\s*(?:\^\s*)?[-−]\s*1\b/g, 'min-1')
    .replace(/(\d)[,.'’ \u00a0\u202f](?=\d{3}\b)/g, '$1')
    .replace(/[\s.^]+/g, '');
}

/** Small letters and digits with single blanks; accents and signs gone. */
export function normalHeading(text: string): string {
  return folded(text)
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Takes a heading apart: `Outside dia. D mm` is "outside dia", symbol D, in mm. */
export function headingParts(heading: string): HeadingParts {
  const words = trimmed(heading)
    .split(/[\s()[\]]+/u)
    // "length in m" states a unit, "length in" ends with one: the inch
    .filter((word, i, all) => word !== '' && (word !== 'in' || i === all.length - 1));
  const unit = unitAtEnd(words);
  const rest = unit === null ? words : words.slice(0, words.length - unit.words);
  const symbol = /^[dDBbnLl]$/.test(rest.at(-1) ?? '') ? rest.at(-1)! : null;
  const named = symbol === null ? rest : rest.slice(0, -1);
  return { name: normalHeading(named.join(' ')), unit: unit?.unit ?? null, symbol };
}

/** The longest run of words at the end that is a unit, but never the whole heading of one word. */
function unitAtEnd(words: readonly string[]): { unit: string; words: number } | null {
  for (let count = Math.min(4, words.length - 1); count > 0; count -= 1) {
    const unit = normalUnit(words.slice(-count).join(' ').replace(/^,/, ''));
    // a lone d or D behind a name is the symbol of a diameter, not the day
    if (UNIT.test(unit) && !(count === 1 && /^[dD]$/.test(words.at(-1)!))) return { unit, words: count };
  }
  return null;
}

function folded(text: string): string {
  return text.replace(/ß/g, 'ss').replace(/[øØ]/g, 'o').normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
}
