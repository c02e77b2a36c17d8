import type { EditableCollection } from '#contract';
import type { Choice } from '../../shared/fields/choice';
import type { Read } from '../../shared/fields/typed';

export type Values = Readonly<Record<string, string>>;

/** One field of a new row. */
export interface NewField {
  readonly field: string;
  readonly label: string;
  /** What it begins with; with the other fields at hand, so that a suggestion follows what is chosen. */
  readonly suggest: (values: Values) => string;
  readonly read: Read<unknown>;
  readonly unit?: string;
  readonly choices?: readonly Choice<string>[];
}

/** What a dialog asks before it makes a row. */
export interface NewRow {
  readonly collection: EditableCollection;
  /** `Add a module to PLC1` */
  readonly title: string;
  readonly fields: readonly NewField[];
  /** What the row holds besides what is asked. */
  readonly fixed: Readonly<Record<string, unknown>>;
}

/** A choice among rows of the catalogue, none taken by itself where there are several. */
export function choiceField(field: string, label: string, choices: readonly Choice<string>[], first = choices.length === 1 ? choices[0].value : ''): NewField {
  const read: Read<string> = (text) => (text === '' ? { ok: false, reason: `Choose the ${label.toLowerCase()}.` } : { ok: true, value: text });
  return { field, label, choices, read, suggest: () => first };
}

/** What was typed, read field by field: the values of the row, or the reasons by field. */
export function readAll(fields: readonly NewField[], typed: Values): { readonly values: Record<string, unknown>; readonly reasons: Record<string, string> } {
  const [values, reasons]: [Record<string, unknown>, Record<string, string>] = [{}, {}];
  for (const { field, read } of fields) {
    const answer = read(typed[field] ?? '');
    if (answer.ok) values[field] = answer.value;
    else reasons[field] = answer.reason;
  }
  return { values, reasons };
}
