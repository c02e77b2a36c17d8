/** What was typed, read: a value (null: blank), or the reason why it cannot be. */
export type Typed<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: string };

export const accepted = <T>(value: T): Typed<T> => ({ ok: true, value });
export const refused = (reason: string): Typed<never> => ({ ok: false, reason });

/** Units that may stand behind a number that is typed or pasted. */
const UNIT = /\s*(cm³|cm3|h|mm²|mm2|mm|m|rpm|g|d|%)$/i;
const GROUPED = /^[1-9]\d{0,2}(,\d{3})+(\.\d+)?$/;

/** A number as people write it: decimal point or comma, `1,250` grouped in threes. Null for what is none. */
export function numberOf(text: string): number | null {
  const bare = text.replace(/[\s\u00a0\u2009]+/g, ' ').trim().replace(UNIT, '').replace(/ /g, '').replace('−', '-');
  const plain = GROUPED.test(bare) ? bare.replaceAll(',', '') : bare.replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}

/** A number above 0 and at most `max`, or blank. */
export function positive(text: string, max: number, unit = ''): Typed<number | null> {
  if (text.trim() === '') return accepted(null);
  const value = numberOf(text);
  if (value === null) return refused(`“${text.trim()}” is not a number.`);
  const most = unit ? `${max.toLocaleString('en')} ${unit}` : max.toLocaleString('en');
  return value > 0 && value <= max ? accepted(value) : refused(`Enter more than 0 and at most ${most}.`);
}

/** A volume in cm³, answered in whole µL, or blank. */
export function volumeUl(text: string, maxUl: number): Typed<number | null> {
  const typed = positive(text, maxUl / 1000, 'cm³');
  if (!typed.ok || typed.value === null) return typed;
  const ul = Math.round(typed.value * 1000);
  return ul > 0 ? accepted(ul) : refused('Enter at least 0.001 cm³.');
}

/** A text of at most `max` characters without outer blanks, or null for blank. */
export function words(text: string, max: number): Typed<string | null> {
  const bare = text.trim();
  return bare.length > max ? refused(`At most ${max} characters; these are ${bare.length}.`) : accepted(bare === '' ? null : bare);
}

/** A number as a field shows it for editing: no grouping, no unit. */
export const editable = (value: number | null): string => (value === null ? '' : String(value));

/** µL in cm³ for editing. */
export const editableVolume = (ul: number | null): string => (ul === null ? '' : String(ul / 1000));
