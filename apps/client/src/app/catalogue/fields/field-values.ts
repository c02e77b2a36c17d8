import { formatNumber, NOTHING, withUnit } from '#calc';
import { type Entry, type Field, fieldsOf, type KindView, type NumberField } from './field';

/** What a form holds of one field. */
export type FieldValue = string | readonly string[];
export type FormValue = Readonly<Record<string, FieldValue>>;

/** The field's value in a row, down its path. */
export function valueAt(row: Readonly<Record<string, unknown>>, key: string): unknown {
  return key.split('.').reduce<unknown>((at, part) => (at as Readonly<Record<string, unknown>> | null | undefined)?.[part], row);
}

/** Stored → shown; decimal places that only binary fractions make are cut off. */
export const shown = (stored: number, field: NumberField): number => clean(stored / (field.scale ?? 1));

/** Shown → stored. */
export const stored = (figure: number, field: NumberField): number => clean(figure * (field.scale ?? 1));

const clean = (value: number): number => Number(value.toPrecision(12));

/** A figure as typed, with a decimal point or comma; null where it is none. */
export function typedNumber(text: string): number | null {
  const plain = text.trim().replace(/[\s\u2009]/g, '').replace('−', '-').replace(',', '.');
  return /^-?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}

/** The parts of a list as typed: figures by semicolons or blanks, texts by commas, semicolons or blanks. */
export const typedList = (text: string, field: Field): readonly string[] =>
  text.split(field.kind === 'number' ? /[;\s]+/ : /[;,\s]+/).filter(Boolean);

/** A row's field in words with its unit, for reading. */
export function fieldText(field: Field, row: Entry): string {
  if (field.kind === 'choice' && field.group) return valueAt(row, field.group) ? 'yes' : 'no';
  const value = valueAt(row, field.key);
  if (value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0)) return field.empty ?? NOTHING;
  if (field.kind === 'number') {
    const figures = (Array.isArray(value) ? value : [value]).map((one) => formatNumber(shown(Number(one), field)));
    return field.unit ? withUnit(figures.join(', '), field.unit) : figures.join(', ');
  }
  if (field.kind === 'choice') return field.choices.find((choice) => choice.value === words(value))?.label ?? words(value);
  return words(value);
}

/** A value as it stands in the row; of several, parted by commas. */
export const words = (value: unknown): string => (Array.isArray(value) ? value.map(words).join(', ') : typeof value === 'string' ? value : JSON.stringify(value));

/** What a form starts with: a row's values, or for a new type nothing but the first of each choice. */
export function formValueOf(view: KindView, row: Entry | null): Record<string, FieldValue> {
  return { name: row?.name ?? '', ...Object.fromEntries(fieldsOf(view).map((field) => [field.key, row ? fieldValueOf(field, row) : emptyOf(field)])) };
}

const emptyOf = (field: Field): FieldValue => (field.kind === 'choice' ? (field.choices[0]?.value ?? '') : field.kind === 'choices' ? [] : '');

function fieldValueOf(field: Field, row: Entry): FieldValue {
  const value = valueAt(row, field.key);
  if (field.kind === 'choice') {
    if (field.group) return valueAt(row, field.group) ? 'yes' : 'no';
    // A value that is not offered belongs to a field that is not asked for this row.
    return field.choices.find((choice) => choice.value === words(value))?.value ?? emptyOf(field);
  }
  if (value === null || value === undefined) return emptyOf(field);
  if (field.kind === 'number') {
    return (Array.isArray(value) ? value : [value]).map((one) => String(shown(Number(one), field))).join('; ');
  }
  return field.kind === 'choices' ? (value as readonly string[]) : words(value);
}

/** Whether a field is asked while the others have these values; one that hangs on a field not asked is not. */
export function isAsked(view: KindView, field: Field, values: FormValue): boolean {
  const { only } = field;
  if (!only) return true;
  const on = fieldsOf(view).find((other) => other.key === only.key);
  return only.is.includes(String(values[only.key])) && (!on || isAsked(view, on, values));
}

/**
 * The body that the API takes: figures scaled to what is stored, null for what was left empty, and for
 * fields that are not asked what their kind then has. The form must be valid.
 */
export function bodyOf(view: KindView, values: FormValue, id: string): Record<string, unknown> {
  const body: Record<string, unknown> = { id, name: String(values['name']).trim(), ...structuredClone(view.blank) };
  for (const field of fieldsOf(view)) {
    if (field.kind === 'choice' && field.group) continue;
    const asked = isAsked(view, field, values);
    put(body, field.key, asked ? storedOf(field, values[field.key] ?? '') : (field.otherwise ?? null), asked);
  }
  return body;
}

function put(body: Record<string, unknown>, key: string, value: unknown, asked: boolean): void {
  const [group = key, inner] = key.split('.');
  if (inner === undefined) body[key] = value;
  else if (asked && value !== null) body[group] = { ...(body[group] as object | null), [inner]: value };
}

function storedOf(field: Field, value: FieldValue): unknown {
  if (typeof value !== 'string') return [...value];
  if ((field.kind === 'number' || field.kind === 'text') && field.list) {
    const parts = typedList(value, field);
    return field.kind === 'text' ? parts : [...new Set(parts.map((part) => stored(typedNumber(part) ?? NaN, field)))].sort((a, b) => a - b);
  }
  const text = value.trim();
  if (text === '' && field.optional) return null;
  if (field.kind === 'number') return stored(typedNumber(text) ?? NaN, field);
  return field.kind === 'choice' && field.number ? Number(text) : text;
}
