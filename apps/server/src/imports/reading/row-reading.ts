import type { Controller, Point, Purpose } from '#calc';
import { resolveSignal, type Channel, type SignalTexts } from './addresses.ts';
import type { ChoiceReader } from './choices.ts';
import type { DesignIndex } from './design-index.ts';
import type { Field, FieldKey, SignalKey } from './fields.ts';
import { isBlank, type DecimalMark, type GridRow } from './grid.ts';
import { adoptAlike, BLANK_VALUES, blankValues } from './import-values.ts';
import type { DraftValues, Fault, ImportValues, Note, Problem, Subject } from './plan.ts';

/** A column that the mapping uses. */
export interface MappedColumn {
  readonly index: number;
  readonly letter: string;
  readonly field: Field;
}

/** What does not differ from row to row. */
export interface ReadingContext {
  readonly columns: readonly MappedColumn[];
  readonly columnOf: ReadonlyMap<FieldKey, MappedColumn>;
  readonly decimal: DecimalMark;
  /** The file is a workbook: its numbers have a decimal point, whatever the sign in its texts. */
  readonly typedNumbers: boolean;
  readonly choices: ChoiceReader;
  readonly index: DesignIndex;
  readonly ownExport: boolean;
  /** Rows of several sheets are read, so that a row number alone does not say enough. */
  readonly severalSheets: boolean;
}

/** What a row says of the signal that it stands for. */
export type OwnSignal = Record<SignalKey, string | number | null>;

// Most rows have none of these: what is empty is shared, since a list may have a hundred thousand rows.
const NO_PROBLEMS: Problem[] = [];
const NO_NOTES: Note[] = [];
const NOTHING_WANTED = { control: null, status: null };
const NO_SIGNAL_ROWS = { control: null, status: null };

/**
 * A row while it is read: values found so far, and everything noticed on the way. Where each row is a
 * signal, the first row of a point takes in what its other rows say.
 */
export class RowReading {
  readonly values: DraftValues = blankValues();
  problems: readonly Problem[] = NO_PROBLEMS;
  notes: readonly Note[] = NO_NOTES;
  /** Whether an error holds the row back. */
  held = false;
  /** The channels it asks for, once they are known to exist. */
  wants: Readonly<Record<Purpose, Channel | null>> = NOTHING_WANTED;
  point: Point | null = null;
  /** What the project says of the point already. */
  existing: ImportValues = BLANK_VALUES;
  /** The controller whose channels the row means. */
  controller: Controller | null = null;
  /** Null until the row says something of a signal of its own. */
  own: OwnSignal | null = null;
  /** The rows that this point is read from, once another row has joined it; null: this one alone. */
  rows: RowReading[] | null = null;
  /** Whether another row of the same point has taken this one in. */
  joined = false;
  /** The row that stands for the signal of each purpose. */
  signalRow: Readonly<Record<Purpose, RowReading | null>> = NO_SIGNAL_ROWS;
  /** Fields whose cell says something that cannot be read. */
  private faulty: Set<FieldKey> | null = null;

  constructor(
    readonly row: GridRow,
    readonly sheet: string | null,
    readonly context: ReadingContext,
  ) {}

  /** The row as a message names it. */
  get place(): string {
    return this.context.severalSheets ? `row ${this.row.number} of sheet “${this.sheet}”` : `row ${this.row.number}`;
  }

  /** Finds the point that the row speaks of, and takes what the project has where the file says no more. */
  findPoint(): void {
    const { index } = this.context;
    this.point = (this.values.tag !== null && index.pointByTag.get(this.values.tag)) || null;
    if (!this.point) return;
    this.existing = index.valuesOf(this.point);
    adoptAlike(this.values, this.existing);
  }

  /** Finds the channels that the checked values ask for. */
  findChannels(): void {
    const { values } = this;
    const name = values.controller ?? (this.isFaulty('controller') ? null : this.existing.controller);
    this.controller = (name !== null && this.context.index.controllerNamed(name)) || null;
    if (values.outputModule !== null || values.outputChannel !== null || values.outputAddress !== null) this.resolve('control');
    if (values.statusModule !== null || values.statusChannel !== null || values.statusAddress !== null) this.resolve('status');
  }

  /** Holds the row back. */
  error(subject: Subject | null, fault: Fault): void {
    this.held = true;
    this.add('error', subject, fault);
  }

  /** Reports a value that stays blank. `key` names the cell to blame where a value has several. */
  warn(subject: Subject, fault: Fault, key?: FieldKey): void {
    this.add('warning', subject, fault, key);
  }

  note(note: Note): void {
    if (this.notes === NO_NOTES) this.notes = [];
    (this.notes as Note[]).push(note);
  }

  /** Whether the cell of this field says something that cannot be read. */
  isFaulty(key: FieldKey): boolean {
    return this.faulty !== null && this.faulty.has(key);
  }

  markFaulty(key: FieldKey): void {
    (this.faulty ??= new Set()).add(key);
  }

  get faultyFields(): Iterable<FieldKey> {
    return this.faulty ?? [];
  }

  /** Whether the column mapped to this field has content in this row. */
  filled(key: FieldKey): boolean {
    const column = this.columnFor(null, key);
    return column !== undefined && !isBlank(this.sourceOf(column, key).cell(column));
  }

  /** Takes a channel away again. */
  dropSignal(purpose: Purpose): void {
    this.wants = { ...this.wants, [purpose]: null };
    setSignal(this.values, purpose, null, null, null);
  }

  cell({ index }: MappedColumn): string {
    return this.row.cells[index] ?? '';
  }

  /** Takes over a problem as it is. */
  keep(problem: Problem): void {
    if (this.problems === NO_PROBLEMS) this.problems = [];
    (this.problems as Problem[]).push(problem);
  }

  private add(severity: Problem['severity'], subject: Subject | null, fault: Fault, key?: FieldKey): void {
    const column = this.columnFor(subject, key);
    const source = column ? this.sourceOf(column, key) : this;
    this.keep({
      ...(this.rows && column ? placed(fault, source) : fault),
      severity,
      field: subject,
      column: column?.letter ?? null,
      cell: column ? source.cell(column) : null,
    });
  }

  private columnFor(subject: Subject | null, key?: FieldKey): MappedColumn | undefined {
    const { columns, columnOf } = this.context;
    const own = key && OWN_KEYS[key];
    return (key && columnOf.get(key)) ?? (own && columnOf.get(own.key)) ?? columns.find(({ field }) => field.value === subject);
  }

  /** The row of the point whose cell in this column is meant. */
  private sourceOf(column: MappedColumn, key?: FieldKey): RowReading {
    if (!this.rows) return this;
    const own = key && OWN_KEYS[key];
    const byPurpose = own?.key === column.field.key ? this.signalRow[own.purpose] : null;
    return byPurpose ?? this.rows.find((each) => !isBlank(each.cell(column))) ?? this;
  }

  private resolve(purpose: Purpose): void {
    const keys = SIGNAL_KEYS[purpose];
    const texts = signalOf(this.values, purpose);
    setSignal(this.values, purpose, null, null, null);
    // a part that cannot be read, or a controller that is not known, has been reported already
    if (this.isFaulty(keys.module) || this.isFaulty(keys.channel) || this.isFaulty(keys.address)) return;
    if (this.isFaulty('controller') && this.values.controller === null) return;
    const found = resolveSignal(texts, purpose, this.controller, this.context.index);
    if (found.fault) return this.warn(SUBJECTS[purpose], found.fault, keys[found.said]);
    this.wants = { ...this.wants, [purpose]: found.channel };
  }
}

/** Says first which row of a point is meant. */
export function placed<T extends { readonly message: string }>(said: T, { place }: RowReading): T {
  return { ...said, message: `${place[0].toUpperCase()}${place.slice(1)}: ${said.message}` };
}

/** What a row says of where its own signal is. */
export const OWN_PARTS = ['module', 'channel', 'address'] as const;

/** How a signal's parts and the whole of it are called. */
export const SIGNAL_KEYS = {
  control: { module: 'outputModule', channel: 'outputChannel', address: 'outputAddress' },
  status: { module: 'statusModule', channel: 'statusChannel', address: 'statusAddress' },
} as const;

/** The same part where it stands in a row's own signal. */
const OWN_KEYS: Readonly<Partial<Record<FieldKey, { readonly key: SignalKey; readonly purpose: Purpose }>>> = {
  outputModule: { key: 'module', purpose: 'control' },
  outputChannel: { key: 'channel', purpose: 'control' },
  outputAddress: { key: 'address', purpose: 'control' },
  statusModule: { key: 'module', purpose: 'status' },
  statusChannel: { key: 'channel', purpose: 'status' },
  statusAddress: { key: 'address', purpose: 'status' },
};

export const SUBJECTS = { control: 'output', status: 'status' } as const;

function signalOf(values: ImportValues, purpose: Purpose): SignalTexts {
  const keys = SIGNAL_KEYS[purpose];
  return { module: values[keys.module], channel: values[keys.channel], address: values[keys.address] };
}

/** Puts the three values of a signal. */
export function setSignal(
  values: DraftValues,
  purpose: Purpose,
  module: string | null,
  channel: number | null,
  address: string | null,
): void {
  const keys = SIGNAL_KEYS[purpose];
  values[keys.module] = module;
  values[keys.channel] = channel;
  values[keys.address] = address;
}
