import { dateText, type ShownTime } from './date-text.ts';
import { formatSections, type FormatSection, type FormatToken } from './format-code.ts';
import { plainNumber } from './plain-number.ts';

/**
 * How cells of a number format show what they hold. Numbers keep all their digits, whatever the format rounds
 * or groups: a list is about values. What the format says of their meaning is kept: dates and times,
 * percentages, leading noughts, and words such as a unit or the beginning of a tag.
 */
export interface NumberFormat {
  readonly number: (value: number) => string;
  readonly text: (text: string) => string;
}

export const GENERAL: NumberFormat = { number: plainNumber, text: (text) => text };

/** Signs that a section for negative numbers writes itself; the sign of the value is kept anyway. */
const SIGNS_OF_SECTION = /[-()+]/g;

/**
 * The way a format code shows numbers and texts.
 *
 * @param code a number format as the file has it
 * @param from1904 whether dates count from 1904
 */
export function numberFormat(code: string, from1904: boolean): NumberFormat {
  if (/^(general|@)?$/i.test(code)) return GENERAL;
  const sections = formatSections(code);
  const textAt = sections.length > 3 ? 3 : sections.findIndex(({ tokens }) => isFor(tokens, 'cellText'));
  const renderers = sections
    .filter((_, i) => i !== textAt)
    .map((section, i) => numberRenderer(section, i > 0, from1904));
  return {
    number: (value) => rendererFor(value, renderers).render(value),
    text: textRenderer(sections[textAt]?.tokens ?? []),
  };
}

interface Renderer {
  readonly holds: FormatSection['holds'];
  readonly render: (value: number) => string;
}

const PLAIN: Renderer = { holds: null, render: plainNumber };

/** Sections stand for positive, negative and zero, unless conditions say which they are for. */
function rendererFor(value: number, renderers: readonly Renderer[]): Renderer {
  const [first = PLAIN, second = first, third = first] = renderers;
  if (renderers.some(({ holds }) => holds)) {
    return renderers.find(({ holds }) => !holds || holds(value)) ?? PLAIN;
  }
  return value > 0 ? first : value < 0 ? second : third;
}

function numberRenderer({ tokens, holds }: FormatSection, later: boolean, from1904: boolean): Renderer {
  const shown = shownTime(tokens);
  if (shown) return { holds, render: (value) => dateText(value, shown, from1904) ?? plainNumber(value) };
  if (!isPatternOfDigits(tokens)) return { holds, render: plainNumber };
  const factor = isFor(tokens, 'percent') ? 100 : 1;
  return { holds, render: (value) => patternText(plainNumber(value * factor), tokens, later) };
}

/** Numbers in powers, fractions or thousands are shown as plain numbers, and so are those that a section hides. */
function isPatternOfDigits(tokens: readonly FormatToken[]): boolean {
  if (isFor(tokens, 'exponent') || isFor(tokens, 'fraction') || isFor(tokens, 'cellText')) return false;
  const lastDigit = tokens.findLastIndex(({ kind }) => kind === 'digit' || kind === 'general');
  return lastDigit >= 0 && tokens[lastDigit + 1]?.kind !== 'comma';
}

/** Puts the digits of a number into a section's places, its own decimals behind them, and keeps the words around. */
function patternText(plain: string, tokens: readonly FormatToken[], later: boolean): string {
  const [sign, digits] = plain.startsWith('-') ? ['-', plain.slice(1)] : ['', plain];
  const [whole, fraction] = digits.split('.');
  const decimals = fraction === undefined ? '' : `.${fraction}`;
  const point = tokens.findIndex(({ kind }) => kind === 'point');
  const lastPlace = tokens.findLastIndex(({ kind }) => kind === 'digit' || kind === 'general');
  const wholeEnd = point < 0 ? lastPlace + 1 : point;
  const front = placed(whole, tokens.slice(0, wholeEnd), later);
  return sign + front + decimals + wordsOf(tokens.slice(wholeEnd), later);
}

/** From the right, one digit to a place; the first place takes all that are left. */
function placed(whole: string, tokens: readonly FormatToken[], later: boolean): string {
  const first = tokens.findIndex(({ kind }) => kind === 'digit' || kind === 'general');
  if (first < 0) return wordsOf(tokens, later) + whole;
  let left = whole;
  let text = '';
  for (let i = tokens.length - 1; i >= 0; i -= 1) {
    const token = tokens[i];
    const taken = i === first ? left : isPlace(token) ? left.slice(-1) : '';
    if (isPlace(token)) left = left.slice(0, left.length - taken.length);
    text = (isPlace(token) ? taken || (noughtOf(token) && '0') : wordsOf([token], later)) + text;
  }
  return text;
}

function isPlace({ kind }: FormatToken): boolean {
  return kind === 'digit' || kind === 'general';
}

function noughtOf(token: FormatToken): string {
  return token.kind === 'digit' && token.text === '0' ? '0' : '';
}

function wordsOf(tokens: readonly FormatToken[], later: boolean): string {
  const words = tokens.map((token) => (token.kind === 'literal' ? token.text : token.kind === 'percent' ? '%' : ''));
  return later ? words.join('').replace(SIGNS_OF_SECTION, '') : words.join('');
}

function textRenderer(tokens: readonly FormatToken[]): NumberFormat['text'] {
  const at = tokens.findIndex(({ kind }) => kind === 'cellText');
  if (at < 0) return GENERAL.text;
  const [before, after] = [wordsOf(tokens.slice(0, at), false), wordsOf(tokens.slice(at + 1), false)];
  return (text) => (text === '' ? '' : before + text + after);
}

/** What a section shows of a point in time, or null when it is not for one. */
function shownTime(tokens: readonly FormatToken[]): ShownTime | null {
  const runs = tokens.flatMap((token) => (token.kind === 'date' || token.kind === 'elapsed' ? [token] : []));
  if (runs.length === 0) return null;
  const letters = runs.map(({ text }, i) => (text[0] === 'm' && isMinutes(runs, i) ? 'min' : text[0]));
  const has = (...wanted: string[]): boolean => wanted.some((letter) => letters.includes(letter));
  const elapsed = runs.find(({ kind }) => kind === 'elapsed')?.text[0] as ShownTime['elapsed'] | undefined;
  return { date: has('y', 'd', 'm'), time: has('h', 's', 'min', 'a'), seconds: has('s'), elapsed: elapsed ?? null };
}

/** An `m` is a month, unless it follows hours, stands before seconds or is counted. */
function isMinutes(runs: readonly { readonly kind: string; readonly text: string }[], i: number): boolean {
  return runs[i].kind === 'elapsed' || runs[i - 1]?.text[0] === 'h' || runs[i + 1]?.text[0] === 's';
}

function isFor(tokens: readonly FormatToken[], kind: FormatToken['kind']): boolean {
  return tokens.some((token) => token.kind === kind);
}
