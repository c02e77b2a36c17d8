import type { Design, Purpose } from '#calc';
import { nameOf } from './addresses.ts';
import { hasGuardMark } from './apostrophe-guard.ts';
import { refusedClaims, type Refusal } from './channel-claims.ts';
import { countRows } from './counts.ts';
import { addressOf, blankValues, DesignIndex } from './design-index.ts';
import { fieldOf } from './fields.ts';
import { columnIndex, rowNumbered, rowsBelow, type Grid, type GridRow } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';
import type { FieldChange, ImportPlan, ImportSettings, ImportValues, Mapping, PlannedRow, SkipReason } from './plan.ts';
import { checkValues } from './checks.ts';
import { RowReading, setSignal, SIGNAL_KEYS, SUBJECTS, type MappedColumn, type ReadingContext } from './row-reading.ts';
import { skipReason } from './skipped-rows.ts';

/**
 * Says row by row what an import would do, without doing any of it. The same grid, settings and design
 * always give the same plan; the plan of a file that has been imported says "same" for every sound row.
 *
 * @param grid the file's rows
 * @param settings headings, mapping and decimal sign, as suggested or as a person set them
 * @param design the project as it is now
 * @throws {ImportRefusal} for settings that fit no import: no tag column, a field twice, no rows
 */
export function interpretGrid(grid: Grid, settings: ImportSettings, design: Design): ImportPlan {
  const headings = headingRow(grid, settings.headerRow);
  const columns = mappedColumns(settings.mapping, headings);
  const ownExport = hasGuardMark(headings.cells);
  const context: ReadingContext = { settings, columns, index: new DesignIndex(design), ownExport };
  const rows = planRows(rowsBelow(grid, settings.headerRow), headings, context);
  return { ownExport, rows, counts: countRows(rows, design.points.length) };
}

function headingRow(grid: Grid, number: number): GridRow {
  const row = rowNumbered(grid, number);
  if (!row) {
    throw new ImportRefusal(
      'header-row-outside',
      'There is no such heading row',
      `The file has no row ${number}.`,
      'Choose the row that holds the headings.',
    );
  }
  if (rowsBelow(grid, number).length === 0) {
    throw new ImportRefusal(
      'no-rows',
      'There are no rows to import',
      `Nothing stands below the heading row ${number}.`,
      'Choose the row that holds the headings, or another file.',
    );
  }
  return row;
}

function mappedColumns(mapping: Mapping, headings: GridRow): MappedColumn[] {
  const columns = Object.entries(mapping).map(([letter, key]) => ({
    index: columnIndex(letter),
    letter,
    field: fieldOf(key),
  }));
  refuseBadMapping(columns, headings);
  return columns.sort((a, b) => a.index - b.index);
}

function refuseBadMapping(columns: readonly MappedColumn[], headings: GridRow): void {
  const outside = columns.find(({ index }) => index < 0 || index >= headings.cells.length);
  if (outside) {
    throw new ImportRefusal(
      'column-outside',
      'There is no such column',
      `The file has no column ${outside.letter}.`,
      'Choose the columns again.',
    );
  }
  const twice = columns.find(({ field }, i) => columns.slice(0, i).some((each) => each.field.key === field.key));
  if (twice) {
    throw new ImportRefusal(
      'field-twice',
      'Two columns for one thing',
      `More than one column is mapped to “${twice.field.label}”.`,
      'Leave out all but one of them.',
    );
  }
  if (!columns.some(({ field }) => field.key === 'tag')) {
    throw new ImportRefusal(
      'tag-unmapped',
      'No column holds the tag',
      'Points are told apart by their tag.',
      'Choose the column with the tags.',
    );
  }
}

interface RowOfFile {
  readonly row: GridRow;
  readonly why: SkipReason | null;
  readonly reading: RowReading | null;
}

function planRows(rows: readonly GridRow[], headings: GridRow, context: ReadingContext): PlannedRow[] {
  const tagIndex = context.columns.find(({ field }) => field.key === 'tag')!.index;
  const read = rows.map((row): RowOfFile => {
    const why = skipReason(row, headings, tagIndex);
    return { row, why, reading: why === null ? readRow(row, headings, context) : null };
  });
  const readings = read.flatMap(({ reading }) => reading ?? []);
  holdDoubledTags(readings);
  grantChannels(
    readings.filter((each) => !each.held),
    context.index,
  );
  return read.map(({ row, why, reading }) => (reading ? plannedRow(reading) : skippedRow(row, why!)));
}

function readRow(row: GridRow, headings: GridRow, context: ReadingContext): RowReading {
  const reading = new RowReading(row, context);
  reading.readCells();
  checkValues(reading, context.index);
  reading.findChannels();
  if (row.cells.slice(headings.cells.length).some((cell) => cell.trim() !== '')) {
    reading.error(null, {
      code: 'too-many-cells',
      message: `The row has ${row.cells.length} cells, the heading row ${headings.cells.length}: its cells may stand under the wrong headings.`,
      remedy: 'Put a text that contains the delimiter into quotation marks, or give the last column a heading.',
    });
  }
  return reading;
}

function holdDoubledTags(readings: readonly RowReading[]): void {
  const first = new Map<string, number>();
  for (const reading of readings) {
    const { tag } = reading.values;
    if (tag === null) continue;
    const seen = first.get(tag);
    if (seen === undefined) first.set(tag, reading.row.number);
    else {
      reading.error('tag', {
        code: 'tag-doubled',
        message: `The tag ${tag} is on row ${seen} already.`,
        remedy: 'Give this point a tag of its own, or delete the row.',
      });
    }
  }
}

function grantChannels(readings: readonly RowReading[], index: DesignIndex): void {
  for (const refusal of refusedClaims(readings, index)) reportTaken(refusal);
  for (const reading of readings) {
    keepControllerTogether(reading, index);
    for (const purpose of ['control', 'status'] as const) {
      const granted = reading.wants[purpose];
      if (granted)
        setSignal(
          reading.values,
          purpose,
          granted.module.name,
          granted.channel,
          addressOf(granted.module, granted.channel),
        );
    }
  }
}

function reportTaken({ reading, purpose, holder }: Refusal): void {
  const wanted = reading.wants[purpose]!;
  const keys = SIGNAL_KEYS[purpose];
  const address = addressOf(wanted.module, wanted.channel);
  reading.dropSignal(purpose);
  reading.warn(
    SUBJECTS[purpose],
    {
      code: purpose === 'control' ? 'output-taken' : 'input-taken',
      message: `${reading.controller!.name} ${address} (${nameOf(wanted)}) is taken by ${holder}.`,
      remedy: 'Choose another channel, or assign one after the import.',
    },
    reading.filled(keys.address) ? keys.address : keys.channel,
  );
}

/** A point cannot change its controller while a channel of the old one stays assigned to it. */
function keepControllerTogether(reading: RowReading, index: DesignIndex): void {
  const dispenser = reading.point ? index.dispenserByPoint.get(reading.point.id) : undefined;
  const left = (['control', 'status'] as const).some((purpose: Purpose) => {
    const assigned = index.assignmentOf(dispenser, purpose);
    const stays = assigned && !reading.wants[purpose];
    return (
      stays &&
      reading.controller !== null &&
      index.moduleById.get(assigned.moduleId)?.controllerId !== reading.controller.id
    );
  });
  if (!left) return;
  reading.dropSignal('control');
  reading.dropSignal('status');
  reading.values.controller = null;
  reading.warn('controller', {
    code: 'controller-contradiction',
    message: `The point has a channel of ${reading.existing.controller ?? 'another controller'} that the list does not replace. Its channels stay as they are.`,
    remedy: 'Give output and status of the new controller in the list, or take the channels off the point first.',
  });
}

function plannedRow(reading: RowReading): PlannedRow {
  const { row, values, point, held } = reading;
  const changes = held || !point ? [] : changesBetween(reading.existing, values);
  return {
    row: row.number,
    line: row.line,
    action: held ? 'hold' : !point ? 'create' : changes.length > 0 ? 'update' : 'same',
    why: null,
    pointId: point?.id ?? null,
    values,
    changes,
    problems: [...reading.problems].sort((a, b) => columnIndex(a.column ?? 'A') - columnIndex(b.column ?? 'A')),
    notes: held ? [] : reading.notes,
  };
}

function skippedRow(row: GridRow, why: SkipReason): PlannedRow {
  return {
    row: row.number,
    line: row.line,
    action: 'skip',
    why,
    pointId: null,
    values: blankValues(),
    changes: [],
    problems: [],
    notes: [],
  };
}

/** What the file says and the project does not; a blank cell says nothing and changes nothing. */
function changesBetween(old: ImportValues, values: ImportValues): FieldChange[] {
  return (Object.keys(values) as (keyof ImportValues)[]).flatMap((field) => {
    const to = values[field];
    const from = old[field];
    return to === null || alike(from, to) ? [] : [{ field, from, to }];
  });
}

/** Line ends inside a text and blanks around it are no change: spreadsheet programs rewrite both. */
function alike(from: string | number | null, to: string | number): boolean {
  const plain = (value: string | number | null): string | number | null =>
    typeof value === 'string' ? value.replace(/\r\n?/g, '\n').trim() : value;
  return plain(from) === plain(to);
}
