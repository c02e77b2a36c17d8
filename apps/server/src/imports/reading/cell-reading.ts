import { unguardText } from './apostrophe-guard.ts';
import { isChoice, unknownChoice } from './choices.ts';
import type { Field } from './fields.ts';
import { trimmed } from './grid.ts';
import { foldFullWidth, meansBlank, plainNumber, readNumber } from './numbers.ts';
import type { Fault, NoteCode } from './plan.ts';
import type { MappedColumn, OwnSignal, RowReading } from './row-reading.ts';

const NOTE_TEXTS: Readonly<Record<NoteCode, string>> = {
  'read-as-blank': 'Read as blank.',
  'grouping-removed': 'The sign that parts groups of three digits is left out.',
  'unit-removed': 'The unit is left out; it is the one of the column.',
  'full-width-folded': 'Full-width digits are read as plain ones.',
  'spaces-removed': 'No-break spaces around the value are left out.',
};

/** Reads every mapped cell of a row into its values. */
export function readCells(reading: RowReading): void {
  const { columns, ownExport } = reading.context;
  const { cells } = reading.row;
  for (const column of columns) {
    const cell = cells[column.index];
    if (cell === undefined || cell === '') continue;
    const whole = ownExport ? unguardText(cell) : cell;
    const text = trimmed(whole);
    if (text.length < whole.length && hasOuterNoBreakSpace(whole)) note(reading, column, 'spaces-removed');
    if (text !== '') readText(reading, column, text);
  }
}

function readText(reading: RowReading, column: MappedColumn, text: string): void {
  switch (column.field.kind) {
    case 'text': return set(reading, column.field, text);
    case 'choice': return readChoiceCell(reading, column, text);
    case 'module':
    case 'address': return readName(reading, column, text);
    default: return readNumberCell(reading, column, text);
  }
}

function readName(reading: RowReading, column: MappedColumn, text: string): void {
  const plain = foldFullWidth(text);
  if (plain !== text) note(reading, column, 'full-width-folded');
  if (meansBlank(plain)) note(reading, column, 'read-as-blank');
  else set(reading, column.field, plain);
}

function readChoiceCell(reading: RowReading, column: MappedColumn, text: string): void {
  const { choices, index } = reading.context;
  const { key } = column.field;
  if (!isChoice(key)) return;
  const read = choices.read(key, text);
  if (read === 'blank') note(reading, column, 'read-as-blank');
  else if (read === 'unknown') fail(reading, column.field, unknownChoice(key, text, index));
  else set(reading, column.field, read.value);
}

function readNumberCell(reading: RowReading, column: MappedColumn, text: string): void {
  const { decimal, typedNumbers } = reading.context;
  let value: number | null = plainNumber(text, typedNumbers ? '.' : decimal);
  if (Number.isNaN(value)) {
    const read = readNumber(text, decimal, column.field.units);
    if (read.fault) return fail(reading, column.field, read.fault);
    for (const code of read.notes) note(reading, column, code);
    value = read.value;
  }
  if (value === null) return;
  if (column.field.kind === 'volume') setVolume(reading, column.field, text, value);
  else set(reading, column.field, value);
}

function setVolume(reading: RowReading, field: Field, text: string, cm3: number): void {
  const microlitres = Math.round(cm3 * 1000);
  if (Math.abs(cm3 * 1000 - microlitres) < 1e-6) return set(reading, field, microlitres);
  fail(reading, field, {
    code: field.key === 'doseCm3' ? 'dose-step' : 'volume-too-fine',
    message: `${text} cm³ is no whole number of microlitres.`,
    remedy: 'Round it to three decimals.',
  });
}

/** A row whose signal is not known cannot be read at all; any other value at fault stays blank. */
function fail(reading: RowReading, { key, value }: Field, fault: Fault): void {
  reading.markFaulty(key);
  if (key === 'signalType') reading.error(value, fault);
  else reading.warn(value, fault);
}

function set(reading: RowReading, { value }: Field, content: string | number): void {
  if (isOwn(value)) (reading.own ??= noSignal())[value] = content;
  else (reading.values as Record<string, string | number | null>)[value] = content;
}

function isOwn(value: Field['value']): value is keyof OwnSignal {
  return value === 'signalType' || value === 'module' || value === 'channel' || value === 'address';
}

function noSignal(): OwnSignal {
  return { signalType: null, module: null, channel: null, address: null };
}

function note(reading: RowReading, column: MappedColumn, code: NoteCode): void {
  reading.note({ code, field: column.field.value, column: column.letter, cell: reading.cell(column), message: NOTE_TEXTS[code] });
}

function hasOuterNoBreakSpace(cell: string): boolean {
  return /^\s*[\u00a0\u202f\u2007]|[\u00a0\u202f\u2007]\s*$/u.test(cell);
}
