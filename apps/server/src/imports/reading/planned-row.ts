import { columnIndex, type GridRow } from './grid.ts';
import { BLANK_VALUES, VALUE_KEYS } from './import-values.ts';
import type { FieldChange, ImportValues, PlannedRow, Problem, SkipReason } from './plan.ts';
import type { RowReading } from './row-reading.ts';

const NONE: readonly never[] = [];

/** What an import would do with a row that has been read. */
export function plannedRow(reading: RowReading): PlannedRow {
  const { row, values, point, held } = reading;
  const changes = held || !point ? NONE : changesBetween(reading.existing, values);
  return {
    sheet: reading.sheet,
    row: row.number,
    line: row.line,
    rows: reading.rows?.map((each) => each.row.number) ?? [row.number],
    action: held ? 'hold' : !point ? 'create' : changes.length > 0 ? 'update' : 'same',
    why: null,
    pointId: point?.id ?? null,
    values,
    changes,
    problems: inOrder(reading.problems),
    notes: held ? NONE : reading.notes,
  };
}

/** A row that is no data. */
export function skippedRow({ number, line }: GridRow, sheet: string | null, why: SkipReason): PlannedRow {
  const nothing = { pointId: null, values: BLANK_VALUES, changes: NONE, problems: NONE, notes: NONE };
  return { sheet, row: number, line, rows: [number], action: 'skip', why, ...nothing };
}

/** From left to right, as the cells stand. */
function inOrder(problems: readonly Problem[]): readonly Problem[] {
  if (problems.length < 2) return problems;
  return [...problems].sort((a, b) => columnIndex(a.column ?? 'A') - columnIndex(b.column ?? 'A'));
}

/** What the file says and the project does not; a blank cell says nothing and changes nothing. */
function changesBetween(old: ImportValues, values: ImportValues): readonly FieldChange[] {
  let changes: FieldChange[] | null = null;
  for (const field of VALUE_KEYS) {
    const to = values[field];
    if (to !== null && to !== old[field]) (changes ??= []).push({ field, from: old[field], to });
  }
  return changes ?? NONE;
}
