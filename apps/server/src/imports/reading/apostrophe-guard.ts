import type { DecimalMark } from './grid.ts';

/**
 * The guard against formulas in a CSV. A spreadsheet program runs a text that begins with `=`, `+`, `-` or
 * `@`, and reference designations begin with just these. Our own CSV therefore puts an apostrophe before
 * such a text and says so by a last column of its own, without content, whose heading is `GUARD_MARK`.
 * Only a file with that heading loses the apostrophes again: in any other file an apostrophe belongs to
 * the text. Numbers in number columns are never guarded, so that -0.5 stays a number.
 */
export const GUARD_MARK = "Lanewright text guard '";

/**
 * What a spreadsheet program may run: a sign of a formula (also in full width), with or without blanks
 * before it, or a control character that such programs skip. Apostrophes before it are the guard's own
 * business: guarding them too keeps "guard" and "belongs to the text" apart.
 */
const RUNS = String.raw`(?:[\s\u0000\uFEFF]*[=+\-@＝＋－＠]|[\t\r\n\u0000])`;
const APOSTROPHE = 39;
const NEEDS_GUARD = new RegExp(`^'*${RUNS}`, 'u');
const HAS_GUARD = new RegExp(`^'+${RUNS}`, 'u');

/** The text as our CSV writes it: with an apostrophe before it where a spreadsheet would run it. */
export function guardText(text: string): string {
  return NEEDS_GUARD.test(text) ? `'${text}` : text;
}

/** Takes the guard off again; the inverse of `guardText` for every text. */
export function unguardText(text: string): string {
  return text.charCodeAt(0) === APOSTROPHE && HAS_GUARD.test(text) ? text.slice(1) : text;
}

const DECIMAL_WORDS: Readonly<Record<DecimalMark, string>> = { '.': 'decimal point', ',': 'decimal comma' };

/**
 * Headings of our own CSV: the list's headings and, last, the mark that says its texts are guarded.
 *
 * @param decimal the decimal sign of its numbers, which the mark then names too: 12,345 alone does not tell
 */
export function markHeadings(headings: readonly string[], decimal: DecimalMark): string[] {
  return [...headings, `${GUARD_MARK}, ${DECIMAL_WORDS[decimal]}`];
}

/** Whether these heading cells carry the mark of our own CSV. */
export function hasGuardMark(headings: readonly string[]): boolean {
  return headings.some((heading) => heading.trim().startsWith(GUARD_MARK));
}

/** The decimal sign that the mark names; null: it names none, or there is no mark. */
export function markedDecimal(headings: readonly string[]): DecimalMark | null {
  const mark = headings.find((heading) => heading.trim().startsWith(GUARD_MARK)) ?? '';
  return (['.', ','] as const).find((each) => mark.trim().endsWith(DECIMAL_WORDS[each])) ?? null;
}
