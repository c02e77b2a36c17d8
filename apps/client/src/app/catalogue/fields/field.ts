import type { Catalogue } from '#contract';

export type Kind = keyof Catalogue;
/** A type of any kind, read by the keys of its fields. */
export type Entry = Readonly<Record<string, unknown>> & { readonly id: string; readonly name: string; readonly typeVersion?: number };

export interface Choice {
  readonly value: string;
  readonly label: string;
}

interface FieldBase {
  /** Path in the row, `runA` or `status.maxA`. */
  readonly key: string;
  readonly label: string;
  /** What it is, in a few words. */
  readonly hint: string;
  /** What it means when nothing stands here, `not stated`; left out: an en dash. */
  readonly empty?: string;
  /** How it is typed, said only in the form. */
  readonly typed?: string;
  /** May be left empty; the row then has null, or lacks the key inside a group that may lack it. */
  readonly optional?: true;
  /** Asked only while another field has one of these values. */
  readonly only?: { readonly key: string; readonly is: readonly string[] };
  /** What the row has where the field is not asked; left out: null. */
  readonly otherwise?: unknown;
}

/** One number, or with `list` several. Limits are in the unit shown. */
export interface NumberField extends FieldBase {
  readonly kind: 'number';
  readonly unit?: string;
  /** Stored = shown × scale: 1000 for µL shown in cm³. */
  readonly scale?: number;
  /** The stored number is whole. */
  readonly whole?: true;
  readonly min?: number;
  /** Must be more than this. */
  readonly above?: number;
  readonly max: number;
  readonly list?: { readonly least: number; readonly most: number };
}

export interface ChoiceField extends FieldBase {
  readonly kind: 'choice';
  readonly choices: readonly Choice[];
  /** The row stores a number. */
  readonly number?: true;
  /** Not in the row: told by whether the row has this group, and `yes` or `no`. */
  readonly group?: string;
}

export interface ChoicesField extends FieldBase {
  readonly kind: 'choices';
  readonly choices: readonly Choice[];
}

export interface TextField extends FieldBase {
  readonly kind: 'text';
  readonly max: number;
  /** Several texts, parted by commas. */
  readonly list?: { readonly least: number; readonly most: number };
}

export type Field = NumberField | ChoiceField | ChoicesField | TextField;

export interface FieldGroup {
  readonly title: string;
  readonly fields: readonly Field[];
}

/** Two fields that must agree; the words stand at the first one. */
export interface Rule {
  readonly key: string;
  readonly words: string;
  readonly holds: (row: Readonly<Record<string, unknown>>) => boolean;
}

export interface KindView {
  readonly kind: Kind;
  /** Last part of the API's path. */
  readonly path: string;
  /** In the row of kinds, `Cables`. */
  readonly label: string;
  /** One of them, `cable type`. */
  readonly one: string;
  readonly versioned: boolean;
  /** Keys of the fields in the table, and the heads that are shorter than the labels. */
  readonly columns: readonly { readonly key: string; readonly head: string }[];
  readonly groups: readonly FieldGroup[];
  readonly rules: readonly Rule[];
  /** Groups of a row that may be empty, and what they then are. */
  readonly blank: Readonly<Record<string, unknown>>;
}

/** Every field of a kind, in the order of its groups. */
export const fieldsOf = (view: KindView): readonly Field[] => view.groups.flatMap((group) => group.fields);

/** Choices whose label is the value itself. */
export const sameWords = (values: readonly string[]): readonly Choice[] => values.map((value) => ({ value, label: value }));

export const POLARITIES: readonly Choice[] = [{ value: 'sourcing', label: 'sourcing, switches +24 V' }, { value: 'sinking', label: 'sinking, switches 0 V' }];

/** Volumes are stored in µL and shown in cm³. */
export const VOLUME = { kind: 'number', unit: 'cm³', scale: 1000, whole: true } as const;
/** Times are stored in ms and shown in s. */
export const SECONDS = { kind: 'number', unit: 's', scale: 1000, whole: true } as const;
export const AMPS = { kind: 'number', unit: 'A' } as const;
/** Small currents: stored in A, shown in mA. */
export const MILLIAMPS = { kind: 'number', unit: 'mA', scale: 0.001 } as const;
export const VOLTS = { kind: 'number', unit: 'V' } as const;
