import type { ImportPreview, ImportRow } from '#contract';

/** A field that the file fills, as a column of the rows. */
export interface RowField {
  readonly key: string;
  readonly label: string;
  /** Null: its values are texts. */
  readonly unit: string | null;
  /** The column of the file. */
  readonly column: string;
  /** Width on the screen, px. */
  readonly width: number;
}

const LEADING = ['tag', 'description'];
const NUMBERS: ReadonlySet<string> = new Set(['outputChannel', 'statusChannel']);
const WIDE: Readonly<Record<string, number>> = {
  function: 130, location: 130, product: 110, machine: 190, grease: 190, dispenserType: 240, wiring: 90, controller: 90,
  outputModule: 100, statusModule: 100, outputAddress: 100, statusAddress: 100, junctionBox: 110, cableTag: 100, circuit: 80, remarks: 220,
};

/** In a list of signals one column holds outputs and status inputs: each row's kind says which, and they stand apart here. */
const OF_SIGNALS: Readonly<Record<string, readonly string[]>> = {
  signalType: [], module: ['outputModule', 'statusModule'], channel: ['outputChannel', 'statusChannel'], address: ['outputAddress', 'statusAddress'],
};

/** The column of the file that holds the tags. */
export const tagColumnOf = ({ columns }: ImportPreview): string | null => columns.find(({ field }) => field === 'tag')?.column ?? null;

/** The fields of a preview that stand behind tag and description, in the order of the menus. */
export function rowFieldsOf({ columns, fields }: ImportPreview): readonly RowField[] {
  const given = new Map<string, string>();
  for (const { field, column } of columns) for (const key of field === null ? [] : (OF_SIGNALS[field] ?? [field])) given.set(key, column);
  return fields.flatMap(({ key, label }) => {
    const column = given.get(key);
    if (column === undefined || LEADING.includes(key)) return [];
    const [name, unit] = label.split(', ');
    const number = unit !== undefined || NUMBERS.has(key);
    return [{ key, column, label: name, unit: unit ?? (number ? '' : null), width: WIDE[key] ?? (number ? 84 : 120) }];
  });
}

/** The value behind a field: volumes are kept in whole microlitres. */
const valueKeyOf = (field: string): string => field.replace(/^demandCm3Per/, 'demandUlPer').replace(/Cm3$/, 'Ul');

const plain = (key: string, value: string | number | null): string =>
  value === null ? '' : typeof value === 'number' && /Ul($|Per)/.test(key) ? String(value / 1000) : String(value);

/** Whether a problem is this cell's: by its field, by its output or status input as a whole, or by its column. */
function isOf({ field, column: at }: ImportRow['problems'][number], key: string, column: string | null): boolean {
  if (field === 'output' || field === 'status') return key.startsWith(field) && at === column;
  return field === key || (at !== null && at === column);
}

/** The cell as a person reads it: the value understood, or the text at fault. */
export function cellText(row: ImportRow, field: string, column: string | null): string {
  const fault = row.problems.find((problem) => isOf(problem, field, column));
  if (fault?.cell) return fault.cell;
  const key = valueKeyOf(field);
  return plain(key, row.values[key] ?? null);
}

export const isFaulty = (row: ImportRow, field: string, column: string | null): boolean => row.problems.some((problem) => isOf(problem, field, column));

/** What the field holds now where the row changes it; null where it does not. */
export function oldText(row: ImportRow, field: string): string | null {
  const key = valueKeyOf(field);
  const change = row.changes.find((c) => c.field === key);
  return change ? plain(key, change.from) || 'blank' : null;
}

/** A change in words: label, old and new. */
export interface ChangeText {
  readonly label: string;
  readonly from: string;
  readonly to: string;
}

export const changesOf = (row: ImportRow, fields: ImportPreview['fields']): readonly ChangeText[] =>
  row.changes.map(({ field, from, to }) => ({
    label: fields.find(({ key }) => valueKeyOf(key) === field)?.label ?? field, from: plain(field, from) || 'blank', to: plain(field, to) || 'blank',
  }));

/** `9`, `9, 10` where several rows of the file make the point, `9 to 14` where they stand in a run. As a spreadsheet writes them. */
export function rowNumbers({ row, rows }: Pick<ImportRow, 'row' | 'rows'>): string {
  if (rows.length < 2) return String(row);
  const run = rows.every((each, i) => i === 0 || each === rows[i - 1] + 1);
  return run && rows.length > 2 ? `${rows[0]} to ${rows[rows.length - 1]}` : rows.join(', ');
}

const SKIPS: ReadonlyMap<string, string> = new Map([['blank', 'A blank row'], ['repeated-heading', 'The headings again'], ['totals', 'A row of totals'], ['other-signal', 'No signal of a dispenser']]);

/** The first thing to say of a row: its problem, a note, what changes, or why it is skipped. Empty: nothing. */
export function remarkOf(row: ImportRow, fields: ImportPreview['fields']): string {
  const said = row.problems[0] ?? row.notes[0];
  if (said) return said.message;
  const [change] = changesOf(row, fields);
  if (change) return `${change.label.split(', ')[0].replace(/ [=+-]$/, '')}: ${change.from} to ${change.to}`;
  return row.why === null ? '' : (SKIPS.get(row.why) ?? row.why);
}

/** How many things the remark leaves unsaid. */
export function unsaid({ problems, notes, changes }: ImportRow): number {
  const said = problems.length + notes.length;
  return Math.max(0, (said > 0 ? said : changes.length) - 1);
}

/** Whether there is more to a row than its cells show. */
export const hasDetails = (row: ImportRow): boolean => row.problems.length > 0 || row.notes.length > 0 || row.changes.length > 0;
