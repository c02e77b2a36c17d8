/** What was typed, read: a value, or the reason why it cannot be. */
export type Typed<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: string };

/** Reads what was typed in a field. */
export type Read<T> = (text: string) => Typed<T>;

interface Bounds {
  readonly min: number;
  readonly max: number;
  /** The smallest value itself is too small. */
  readonly above?: boolean;
  readonly whole?: boolean;
}

/** Reads a number within bounds; decimal point or comma, a unit behind it is let pass. */
export function numberWithin(bounds: Bounds): Read<number> {
  return (text) => {
    const value = numberOf(text);
    if (value === null) return refused(text.trim() === '' ? 'Enter a number.' : `“${text.trim()}” is not a number.`);
    if (bounds.whole && !Number.isInteger(value)) return refused('Enter a whole number.');
    return within(value, bounds) ? { ok: true, value } : refused(`Enter ${range(bounds)}.`);
  };
}

/** The same, where blank says that nothing is set. */
export function numberOrNone(bounds: Bounds): Read<number | null> {
  const read = numberWithin(bounds);
  return (text) => (text.trim() === '' ? { ok: true, value: null } : read(text));
}

/** A text of at most `max` characters without outer blanks, not empty. */
export function nameOf(max = 200): Read<string> {
  return (text) => {
    const bare = text.trim();
    if (bare === '') return refused('This cannot stay empty.');
    return bare.length > max ? refused(`At most ${max} characters; these are ${bare.length}.`) : { ok: true, value: bare };
  };
}

/** A text that may be empty. */
export function textOf(max: number): Read<string> {
  return (text) => (text.trim() === '' ? { ok: true, value: '' } : nameOf(max)(text));
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

function numberOf(text: string): number | null {
  const bare = text.replace(/\s+/g, '').replace(/(mm²|mm2|°C|Ω|[a-zA-Z%])+$/, '').replace('−', '-').replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(bare) ? Number(bare) : null;
}

const refused = (reason: string): Typed<never> => ({ ok: false, reason });

const within = (value: number, { min, max, above }: Bounds): boolean => (above ? value > min : value >= min) && value <= max;

const range = ({ min, max, above }: Bounds): string => {
  const most = max.toLocaleString('en');
  return above ? `more than ${min} and at most ${most}` : `${min.toLocaleString('en').replace('-', '−')} to ${most}`;
};
