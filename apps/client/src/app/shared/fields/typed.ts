/** What was typed, read: a value, or the reason why it cannot be. */
export type Typed<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: string };

/** Reads what was typed in a field. */
export type Read<T> = (text: string) => Typed<T>;

export const accepted = <T>(value: T): Typed<T> => ({ ok: true, value });
export const refused = (reason: string): Typed<never> => ({ ok: false, reason });

/** Bounds of a number, in the unit in which it is typed. */
export interface Bounds {
  readonly min: number;
  readonly max: number;
  /** The smallest value itself is too small. */
  readonly above?: boolean;
  readonly whole?: boolean;
  /** Said behind the bound that was missed. */
  readonly unit?: string;
}

/** Units that may stand behind a number that is typed or pasted. */
const UNIT = /(cm³|cm3|mm²|mm2|mm|m|rpm|h|g|d|s|years?|°?C|Ω|ohm|A|V|%|×)$/i;
const GROUPED = /^[1-9]\d{0,2}(,\d{3})+(\.\d+)?$/;

/** A number as people write it: decimal point or comma, `1,250` grouped in threes. Null for what is none. */
export function numberOf(text: string): number | null {
  const bare = text.replace(/\s+/g, '').replace(UNIT, '').replace('−', '-');
  const plain = GROUPED.test(bare) ? bare.replaceAll(',', '') : bare.replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}

/** Reads a number within bounds. */
export function numberWithin(bounds: Bounds): Read<number> {
  return (text) => {
    const value = numberOf(text);
    if (value === null) return refused(text.trim() === '' ? 'Enter a number.' : `“${text.trim()}” is not a number.`);
    if (bounds.whole && !Number.isInteger(value)) return refused('Enter a whole number.');
    return within(value, bounds) ? accepted(value) : refused(`Enter ${range(bounds)}.`);
  };
}

/** The same, where blank says that nothing is set. */
export function numberOrNone(bounds: Bounds): Read<number | null> {
  const read = numberWithin(bounds);
  return (text) => (text.trim() === '' ? accepted(null) : read(text));
}

/** A number above 0 and at most `max`, or blank. */
export const positive = (text: string, max: number, unit = ''): Typed<number | null> => numberOrNone({ min: 0, max, above: true, unit })(text);

/** A volume in cm³, answered in whole µL, or blank. */
export function volumeUl(text: string, maxUl: number): Typed<number | null> {
  const typed = positive(text, maxUl / 1000, 'cm³');
  if (!typed.ok || typed.value === null) return typed;
  const ul = Math.round(typed.value * 1000);
  return ul > 0 ? accepted(ul) : refused('Enter at least 0.001 cm³.');
}

/** A text of at most `max` characters without outer blanks; it may be empty. */
export const textOf = (max: number): Read<string> => (text) => {
  const bare = text.trim();
  return bare.length > max ? refused(`At most ${max} characters; these are ${bare.length}.`) : accepted(bare);
};

/** The same, not empty. */
export const nameOf = (max = 200): Read<string> => (text) => (text.trim() === '' ? refused('This cannot stay empty.') : textOf(max)(text));

/** The same as `textOf`, with null for blank. */
export function words(text: string, max: number): Typed<string | null> {
  const typed = textOf(max)(text);
  return typed.ok ? accepted(typed.value || null) : typed;
}

/** A time zone that this machine knows by its IANA name. */
export const timeZoneOf: Read<string> = (text) => {
  try {
    new Intl.DateTimeFormat('en', { timeZone: text.trim() });
    return nameOf(64)(text);
  } catch {
    return refused('Enter a time zone by its IANA name, for instance Europe/Amsterdam.');
  }
};

/** A number as a field shows it for editing: no grouping, no unit. */
export const numberText = (value: number | null): string => (value === null ? '' : String(value));

/** µL in cm³ for editing. */
export const volumeText = (ul: number | null): string => (ul === null ? '' : String(ul / 1000));

const within = (value: number, { min, max, above }: Bounds): boolean => (above ? value > min : value >= min) && value <= max;

function range({ min, max, above, unit }: Bounds): string {
  const most = max.toLocaleString('en') + (unit ? ` ${unit}` : '');
  return above ? `more than ${min} and at most ${most}` : `${min.toLocaleString('en').replace('-', '−')} to ${most}`;
}
