import type { Controller, Point, Purpose } from '#calc';
import { resolveSignal, type Channel, type SignalTexts } from './addresses.ts';
import { unguardText } from './apostrophe-guard.ts';
import { blankValues, type DesignIndex } from './design-index.ts';
import type { Field, FieldKey } from './fields.ts';
import { trimmed, type GridRow } from './grid.ts';
import { foldFullWidth, meansBlank, readNumber } from './numbers.ts';
import type { DraftValues, Fault, ImportSettings, ImportValues, Note, NoteCode, Problem, Subject } from './plan.ts';
import { isChoice, isMappedToBlank, readChoice, unknownChoice } from './values.ts';

/** A column that the mapping uses. */
export interface MappedColumn {
  readonly index: number;
  readonly letter: string;
  readonly field: Field;
}

/** What does not differ from row to row. */
export interface ReadingContext {
  readonly settings: ImportSettings;
  readonly columns: readonly MappedColumn[];
  readonly index: DesignIndex;
  readonly ownExport: boolean;
}

const NOTE_TEXTS: Readonly<Record<NoteCode, string>> = {
  'read-as-blank': 'Read as blank.',
  'grouping-removed': 'The sign that parts groups of three digits is left out.',
  'unit-removed': 'The unit is left out; it is the one of the column.',
  'full-width-folded': 'Full-width digits are read as plain ones.',
  'spaces-removed': 'No-break spaces around the value are left out.',
};

/** A row while it is read: values found so far, and everything noticed on the way. */
export class RowReading {
  readonly values: DraftValues = blankValues();
  readonly problems: Problem[] = [];
  readonly notes: Note[] = [];
  /** The channels it asks for, once they are known to exist. */
  readonly wants: Record<Purpose, Channel | null> = { control: null, status: null };
  point: Point | null = null;
  /** What the project says of the point already. */
  existing: ImportValues = blankValues();
  /** The controller whose channels the row means. */
  controller: Controller | null = null;
  private readonly faulty = new Set<FieldKey>();

  constructor(
    readonly row: GridRow,
    private readonly context: ReadingContext,
  ) {}

  get held(): boolean {
    return this.problems.some((each) => each.severity === 'error');
  }

  /** Reads every mapped cell and finds the point it speaks of. */
  readCells(): void {
    for (const column of this.context.columns) this.readCell(column);
    this.findPoint();
  }

  /** Finds the channels that the checked values ask for. */
  findChannels(): void {
    this.findController();
    this.resolve('control');
    this.resolve('status');
  }

  /** Holds the row back. */
  error(subject: Subject | null, fault: Fault): void {
    this.add('error', subject, fault);
  }

  /** Reports a value that stays blank. `key` names the cell to blame where a value has several. */
  warn(subject: Subject, fault: Fault, key?: FieldKey): void {
    this.add('warning', subject, fault, key);
  }

  /** Whether the column mapped to this field has content in this row. */
  filled(key: FieldKey): boolean {
    const column = this.context.columns.find(({ field }) => field.key === key);
    return column !== undefined && trimmed(this.cell(column)) !== '';
  }

  /** Takes a channel away again. */
  dropSignal(purpose: Purpose): void {
    this.wants[purpose] = null;
    setSignal(this.values, purpose, null, null, null);
  }

  private add(severity: Problem['severity'], subject: Subject | null, fault: Fault, key?: FieldKey): void {
    const column = this.columnFor(subject, key);
    this.problems.push({
      ...fault,
      severity,
      field: subject,
      column: column?.letter ?? null,
      cell: column ? this.cell(column) : null,
    });
  }

  private columnFor(subject: Subject | null, key?: FieldKey): MappedColumn | undefined {
    const { columns } = this.context;
    return columns.find(({ field }) => field.key === key) ?? columns.find(({ field }) => field.value === subject);
  }

  private cell(column: MappedColumn): string {
    return this.row.cells[column.index] ?? '';
  }

  private readCell(column: MappedColumn): void {
    const whole = this.context.ownExport ? unguardText(this.cell(column)) : this.cell(column);
    const text = trimmed(whole);
    const noted: NoteCode[] = hasOuterNoBreakSpace(whole) ? ['spaces-removed'] : [];
    if (text !== '') this.readText(column, text, noted);
    for (const code of noted) {
      this.notes.push({
        code,
        field: column.field.value,
        column: column.letter,
        cell: this.cell(column),
        message: NOTE_TEXTS[code],
      });
    }
  }

  private readText(column: MappedColumn, text: string, noted: NoteCode[]): void {
    const { field } = column;
    if (field.kind === 'text') this.set(field, text);
    else if (field.kind === 'choice') this.readChoiceCell(field, text, noted);
    else if (field.kind === 'module' || field.kind === 'address') this.readName(field, text, noted);
    else this.readNumberCell(field, text, noted);
  }

  private readName(field: Field, text: string, noted: NoteCode[]): void {
    const plain = foldFullWidth(text);
    if (plain !== text) noted.push('full-width-folded');
    if (meansBlank(plain)) noted.push('read-as-blank');
    else this.set(field, plain);
  }

  private readChoiceCell(field: Field, text: string, noted: NoteCode[]): void {
    const { settings, index } = this.context;
    const { key } = field;
    if (!isChoice(key)) return;
    const value = readChoice(key, text, settings.valueMapping, index);
    if (value !== null) this.set(field, value);
    else if (isMappedToBlank(key, text, settings.valueMapping) || meansBlank(text)) noted.push('read-as-blank');
    else this.fail(field, unknownChoice(key, text, index));
  }

  private readNumberCell(field: Field, text: string, noted: NoteCode[]): void {
    const reading = readNumber(text, this.context.settings.decimal, field.units);
    if (reading.fault) return this.fail(field, reading.fault);
    noted.push(...reading.notes);
    if (reading.value === null) return;
    if (field.kind !== 'volume') return this.set(field, reading.value);
    const microlitres = Math.round(reading.value * 1000);
    if (Math.abs(reading.value * 1000 - microlitres) < 1e-6) return this.set(field, microlitres);
    this.fail(field, {
      code: field.key === 'doseCm3' ? 'dose-step' : 'volume-too-fine',
      message: `${text} cm³ is no whole number of microlitres.`,
      remedy: 'Round it to three decimals.',
    });
  }

  private fail(field: Field, fault: Fault): void {
    this.faulty.add(field.key);
    this.warn(field.value, fault);
  }

  private set(field: Field, value: string | number): void {
    (this.values as Record<string, string | number | null>)[field.value] = value;
  }

  private findPoint(): void {
    const { index } = this.context;
    this.point = (this.values.tag !== null && index.pointByTag.get(this.values.tag)) || null;
    if (this.point) this.existing = index.valuesOf(this.point);
  }

  private findController(): void {
    const name = this.values.controller ?? (this.faulty.has('controller') ? null : this.existing.controller);
    this.controller = (name !== null && this.context.index.controllerNamed(name)) || null;
  }

  private resolve(purpose: Purpose): void {
    const keys = SIGNAL_KEYS[purpose];
    const texts = signalOf(this.values, purpose);
    setSignal(this.values, purpose, null, null, null);
    const unread = Object.values(keys).some((key) => this.faulty.has(key));
    const blank = texts.module === null && texts.channel === null && texts.address === null;
    // a part that cannot be read, or a controller that is not known, has been reported already
    if (blank || unread || this.faulty.has('controller')) return;
    const found = resolveSignal(texts, purpose, this.controller, this.context.index);
    if (found.fault) return this.warn(SUBJECTS[purpose], found.fault, keys[found.said]);
    this.wants[purpose] = found.channel;
  }
}

/** How a signal's parts and the whole of it are called. */
export const SIGNAL_KEYS = {
  control: { module: 'outputModule', channel: 'outputChannel', address: 'outputAddress' },
  status: { module: 'statusModule', channel: 'statusChannel', address: 'statusAddress' },
} as const;

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

function hasOuterNoBreakSpace(cell: string): boolean {
  return /^\s*[\u00a0\u202f\u2007]|[\u00a0\u202f\u2007]\s*$/u.test(cell);
}
