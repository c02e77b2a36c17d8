import { formatNumber } from '#calc';
import { type Field, fieldsOf, type KindView, type NumberField, type TextField } from './field';
import { bodyOf, type FieldValue, type FormValue, isAsked, stored, typedList, typedNumber } from './field-values';

/** What is wrong with a field's value, in words; null: nothing. The limits are those of the API. */
export function fieldError(field: Field, value: FieldValue): string | null {
  if (field.kind === 'choices') return null;
  const text = String(value).trim();
  if (field.kind === 'choice') return field.choices.some((choice) => choice.value === text) ? null : 'Choose one.';
  if (field.list) return listError(field, text);
  if (text === '') return field.optional ? null : 'Fill this in.';
  return field.kind === 'number' ? numberError(field, text) : textError(field, text);
}

function listError(field: NumberField | TextField, text: string): string | null {
  const parts = typedList(text, field);
  const { least, most } = field.list ?? { least: 0, most: 0 };
  if (parts.length < least) return 'Fill this in.';
  if (parts.length > most) return `At most ${most} of them.`;
  const errors = parts.map((part) => (field.kind === 'number' ? numberError(field, part) : textError(field, part)));
  return errors.find((error) => error !== null) ?? null;
}

function numberError(field: NumberField, text: string): string | null {
  const figure = typedNumber(text);
  if (figure === null) return 'This is not a number.';
  if (field.above !== undefined && figure <= field.above) return `More than ${inUnit(field.above, field)}.`;
  if (field.min !== undefined && figure < field.min) return `At least ${inUnit(field.min, field)}.`;
  if (figure > field.max) return `At most ${inUnit(field.max, field)}.`;
  if (field.whole && !Number.isInteger(stored(figure, field))) return field.scale ? 'At most three decimals.' : 'A whole number.';
  return null;
}

const textError = (field: TextField, text: string): string | null => (text.length > field.max ? `At most ${field.max} characters.` : null);

const inUnit = (figure: number, field: NumberField): string => (field.unit ? `${formatNumber(figure)} ${field.unit}` : formatNumber(figure));

/** Name of a new type; a name that exists would silently become that type's next version. */
export function nameError(name: string, taken: ReadonlySet<string>, versioned: boolean): string | null {
  const text = name.trim();
  if (text === '') return 'Fill this in.';
  if (text.length > 200) return 'At most 200 characters.';
  if (!taken.has(text)) return null;
  return versioned ? 'A type of this name exists. Pick it in the list and make its new version, or take another name.' : 'A grease of this name exists. Take another name.';
}

/** Everything wrong with a form, by field: each value alone, then the fields that must agree. */
export function formErrors(view: KindView, values: FormValue): ReadonlyMap<string, string> {
  const errors = new Map<string, string>();
  for (const field of fieldsOf(view)) {
    const error = isAsked(view, field, values) ? fieldError(field, values[field.key] ?? '') : null;
    if (error) errors.set(field.key, error);
  }
  if (errors.size > 0) return errors;
  const body = bodyOf(view, values, '');
  for (const rule of view.rules) if (!rule.holds(body)) errors.set(rule.key, rule.words);
  return errors;
}
