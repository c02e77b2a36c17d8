import type { DecimalMark } from './grid.ts';
import { normalUnit } from './heading-text.ts';
import type { Fault, NoteCode } from './plan.ts';

/** What a cell of a number column says. Without fault and value it is blank. */
export interface NumberReading {
  readonly value: number | null;
  readonly notes: readonly NoteCode[];
  readonly fault: Fault | null;
}

/** Units that a plant may write though no column is in them; known so that they are named, never dropped. */
const OTHER_UNITS = new Set([
  'mm',
  'cm',
  'dm',
  'm',
  'km',
  'ft',
  'feet',
  'foot',
  'in',
  'inch',
  'inches',
  '"',
  '″',
  "'",
  '′',
  'yd',
  'mil',
  'mm2',
  'cm2',
  'm2',
  'awg',
  'kcmil',
  'cm3',
  'mm3',
  'dm3',
  'ccm',
  'cc',
  'ml',
  'cl',
  'dl',
  'l',
  'ul',
  'μl',
  'gal',
  'floz',
  'g',
  'mg',
  'kg',
  'oz',
  'lb',
  's',
  'ms',
  'min',
  'h',
  'hr',
  'hrs',
  'd',
  'day',
  'days',
  'week',
  'weeks',
  'month',
  'months',
  'y',
  'rpm',
  '1/min',
  'min-1',
  '1/s',
  's-1',
  'rad/s',
  'rps',
  'hz',
  'm/s',
  'v',
  'mv',
  'a',
  'ma',
  'w',
  'kw',
  'bar',
  '%',
  '°',
  '°c',
  'c',
  '°f',
  'f',
  'k',
]);

/** Longer texts are no numbers; it also bounds the search. */
const LONGEST_NUMBER = 60;

const BLANK_WORDS = new Set(['n/a', 'n.a.', '-', '–', '—']);

/** "N/A", "n.a." and a lone dash: a person's way to leave a cell open. */
export function meansBlank(text: string): boolean {
  return BLANK_WORDS.has(text.toLowerCase());
}

/** Full-width digits and signs, as East Asian keyboards give them, in plain form. */
export function foldFullWidth(text: string): string {
  return text.replace(/[\uff01-\uff5e]/g, (each) => String.fromCharCode(each.charCodeAt(0) - 0xfee0));
}

const [ZERO, NINE, MINUS] = [48, 57, 45];
const MARKS: Readonly<Record<DecimalMark, number>> = { '.': 46, ',': 44 };

/**
 * Reads what nearly every number cell holds: digits, at most one decimal sign among them, a minus before
 * them. It is but the short way; `readNumber` gives the same for these.
 *
 * @returns NaN for everything else
 */
export function plainNumber(text: string, decimal: DecimalMark): number {
  if (text.length > LONGEST_NUMBER) return NaN;
  const mark = MARKS[decimal];
  let place = -1;
  for (let i = 0; i < text.length; i += 1) {
    const code = text.charCodeAt(i);
    if (code >= ZERO && code <= NINE) continue;
    if (code === mark && place < 0 && i < text.length - 1) place = i;
    else if (code !== MINUS || i > 0) return NaN;
  }
  return place >= 0 && decimal === ',' ? Number(text.replace(',', '.')) : Number(text);
}

/**
 * Reads a number as plants write them: the file's decimal sign, groups of three parted by the other sign,
 * a blank, a no-break space or an apostrophe, the field's own unit behind it. What is read otherwise than
 * it stands is noted; another unit, or a sign that may mean either, is a fault and never a guess.
 *
 * @param text the cell without outer blanks
 * @param decimal the decimal sign of the file
 * @param units the spellings of the field's own unit, normalised
 */
export function readNumber(text: string, decimal: DecimalMark, units: readonly string[]): NumberReading {
  const plain = foldFullWidth(text);
  const notes: NoteCode[] = plain === text ? [] : ['full-width-folded'];
  if (meansBlank(plain)) return { value: null, notes: [...notes, 'read-as-blank'], fault: null };
  if (plain.length > LONGEST_NUMBER) return faulty(notANumber(text));
  const parts = /^([+\-−–]?)\s*(\d(?:\d|[.,'’]\d|\s(?=\d{3}(?!\d)))*|[.,]\d+)(e[+-]?\d{1,3})?(?!\d)\s*(.*)$/isu.exec(
    plain,
  );
  if (!parts) return faulty(notANumber(text));
  const [, sign, digits, exponent, unit] = parts as unknown as [string, string, string, string | undefined, string];
  const mantissa = readDigits(digits, decimal);
  if (mantissa === null) return faulty(digitsFault(text, digits, decimal));
  if (mantissa.grouped) notes.push('grouping-removed');
  if (unit !== '') {
    if (!units.includes(normalUnit(unit))) return faulty(unitFault(text, unit, units));
    notes.push('unit-removed');
  }
  const size = Number(`${mantissa.plain}${exponent ?? ''}`);
  if (!Number.isFinite(size)) return faulty(notANumber(text));
  return { value: sign === '' || sign === '+' ? size : -size, notes, fault: null };
}

interface Digits {
  /** As `Number` reads it. */
  readonly plain: string;
  readonly grouped: boolean;
}

const UNGROUPED: Readonly<Record<DecimalMark, RegExp>> = { '.': /^\d*(?:\.\d+)?$/, ',': /^\d*(?:,\d+)?$/ };

/** A group never begins with 0: 0,300 in a file with decimal points is no 300. */
const GROUPED: Readonly<Record<DecimalMark, RegExp>> = {
  '.': /^[1-9]\d{0,2}([,'’ \u00a0\u202f\u2007\u2009])\d{3}(?:\1\d{3})*(?:\.\d+)?$/,
  ',': /^[1-9]\d{0,2}([.'’ \u00a0\u202f\u2007\u2009])\d{3}(?:\1\d{3})*(?:,\d+)?$/,
};

function readDigits(digits: string, decimal: DecimalMark): Digits | null {
  if (UNGROUPED[decimal].test(digits)) return { plain: digits.replace(decimal, '.'), grouped: false };
  if (!GROUPED[decimal].test(digits)) return null;
  const [whole, part] = digits.split(decimal) as [string, string | undefined];
  const joined = whole.replace(/\D/g, '');
  return { plain: part === undefined ? joined : `${joined}.${part}`, grouped: true };
}

function faulty(fault: Fault): NumberReading {
  return { value: null, notes: [], fault };
}

function notANumber(text: string): Fault {
  return {
    code: 'not-a-number',
    message: `“${text}” is not a number.`,
    remedy: 'Write digits only, or leave the cell blank.',
  };
}

function digitsFault(text: string, digits: string, decimal: DecimalMark): Fault {
  const other = decimal === '.' ? ',' : '.';
  if (!digits.includes(other)) return notANumber(text);
  const names = { '.': 'point', ',': 'comma' } as const;
  return {
    code: 'not-a-number',
    message: `“${text}” has a ${names[other]}, but the decimal sign of this file is the ${names[decimal]}.`,
    remedy: 'Write the number with the decimal sign of the file, or choose the other sign for the whole file.',
  };
}

function unitFault(text: string, unit: string, units: readonly string[]): Fault {
  if (!OTHER_UNITS.has(normalUnit(unit))) return notANumber(text);
  const own = units[0];
  return own === undefined
    ? { code: 'other-unit', message: `“${text}” has a unit where none belongs.`, remedy: 'Write the number alone.' }
    : {
        code: 'other-unit',
        message: `“${text}” is not in ${own.replace('2', '²').replace('3', '³')}.`,
        remedy: `Convert it to ${own.replace('2', '²').replace('3', '³')}; the column has no other unit.`,
      };
}
