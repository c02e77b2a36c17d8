import type { Design } from '#calc';
import { readCells } from './cell-reading.ts';
import { checkTag, checkValues } from './checks.ts';
import { ChoiceReader } from './choices.ts';
import { countRows } from './counts.ts';
import { DesignIndex } from './design-index.ts';
import { grantChannels } from './grant-channels.ts';
import { isBlank, rowNumbered, rowsBelow, type GridRow } from './grid.ts';
import { ImportRefusal } from './import-refusal.ts';
import { isOtherSignal, joinSignals } from './join-signals.ts';
import { mappedColumns } from './mapped-columns.ts';
import type { ImportPlan, PlannedRow, SkipReason } from './plan.ts';
import { plannedRow, skippedRow } from './planned-row.ts';
import type { FileReading } from './read-file.ts';
import { RowReading, type ReadingContext } from './row-reading.ts';
import { RowSkipper } from './skipped-rows.ts';
import type { SheetPart } from './take-sheets.ts';

const PROGRESS_ROWS = 1_000;

/**
 * Says row by row what an import would do, without doing any of it. The same file, settings and design
 * always give the same plan; the plan of a file that has been imported says "same" for every sound row.
 *
 * @param reading the file with its settings, as suggested or as a person set them
 * @param design the project as it is now
 * @param onProgress told now and then how many rows of how many have been looked at
 * @throws {ImportRefusal} for settings that fit no import: no tag column, a field twice, no rows
 */
export function interpretFile(reading: FileReading, design: Design, onProgress?: (done: number, total: number) => void): ImportPlan {
  const rows = rowsOfFile(reading.parts);
  const context = contextOf(reading, design);
  const read = readRows(rows, context, onProgress);
  const readings: RowReading[] = [];
  for (const { reading: each } of read) if (each) readings.push(each);
  if (context.columnOf.has('signalType')) joinSignals(readings);
  else holdDoubledTags(readings);
  const kept = readings.filter(({ joined }) => !joined);
  for (const each of kept) checkRow(each);
  grantChannels(kept.filter(({ held }) => !held), context.index);
  const planned = plannedRows(read);
  return { ownExport: reading.ownExport, rows: planned, counts: countRows(planned, design.points.length) };
}

/** In the order of the file; a row that another has taken in has no line of its own. */
function plannedRows(read: readonly RowOfFile[]): PlannedRow[] {
  const planned: PlannedRow[] = [];
  for (const { row, part, why, reading } of read) {
    if (!reading) planned.push(skippedRow(row, part.sheet, why!));
    else if (!reading.joined) planned.push(plannedRow(reading));
  }
  return planned;
}

interface PartRows {
  readonly part: SheetPart;
  readonly rows: readonly GridRow[];
}

function rowsOfFile(parts: readonly SheetPart[]): PartRows[] {
  for (const { grid, headerRow, sheet } of parts) {
    if (rowNumbered(grid, headerRow)) continue;
    throw new ImportRefusal(
      'header-row-outside',
      'There is no such heading row',
      `${sheet === null ? 'The file' : `Sheet “${sheet}”`} has no row ${headerRow}.`,
      'Choose the row that holds the headings.',
    );
  }
  const all = parts.map((part) => ({ part, rows: rowsBelow(part.grid, part.headerRow) }));
  if (all.some(({ rows }) => rows.length > 0)) return all;
  throw new ImportRefusal(
    'no-rows',
    'There are no rows to import',
    `Nothing stands below the heading row ${parts[0].headerRow}.`,
    'Choose the row that holds the headings, or another file.',
  );
}

function contextOf({ settings, parts, ownExport, format }: FileReading, design: Design): ReadingContext {
  const columns = mappedColumns(settings.mapping, parts[0].headings.leaves.length);
  const index = DesignIndex.of(design);
  return {
    columns,
    columnOf: new Map(columns.map((each) => [each.field.key, each])),
    decimal: settings.decimal,
    typedNumbers: format === 'workbook',
    choices: new ChoiceReader(index, settings.valueMapping),
    index,
    ownExport,
    severalSheets: parts.length > 1,
  };
}

interface RowOfFile {
  readonly part: SheetPart;
  readonly row: GridRow;
  readonly why: SkipReason | null;
  /** Null: the row is skipped. */
  readonly reading: RowReading | null;
}

function readRows(all: readonly PartRows[], context: ReadingContext, onProgress?: (done: number, total: number) => void): RowOfFile[] {
  const total = all.reduce((sum, { rows }) => sum + rows.length, 0);
  const tagIndex = context.columnOf.get('tag')!.index;
  const isKnown = (tag: string): boolean => context.index.pointByTag.has(tag);
  const read: RowOfFile[] = [];
  for (const { part, rows } of all) {
    const skipper = new RowSkipper(part.headings, tagIndex, isKnown);
    for (const row of rows) {
      read.push(readRow(row, part, skipper, context));
      if (read.length % PROGRESS_ROWS === 0) onProgress?.(read.length, total);
    }
  }
  onProgress?.(total, total);
  return read;
}

function readRow(row: GridRow, part: SheetPart, skipper: RowSkipper, context: ReadingContext): RowOfFile {
  const why = skipper.reason(row);
  if (why !== null) return { part, row, why, reading: null };
  const reading = new RowReading(row, part.sheet, context);
  readCells(reading);
  if (isOtherSignal(reading)) return { part, row, why: 'other-signal', reading: null };
  checkTag(reading);
  refuseSurplusCells(reading, part.headings.leaves.length);
  return { part, row, why: null, reading };
}

function refuseSurplusCells(reading: RowReading, headings: number): void {
  const { cells } = reading.row;
  if (cells.length <= headings || cells.slice(headings).every(isBlank)) return;
  reading.error(null, {
    code: 'too-many-cells',
    message: `The row has ${cells.length} cells, the heading row ${headings}: its cells may stand under the wrong headings.`,
    remedy: 'Put a text that contains the delimiter into quotation marks, or give the last column a heading.',
  });
}

function holdDoubledTags(readings: readonly RowReading[]): void {
  const first = new Map<string, RowReading>();
  for (const reading of readings) {
    const { tag } = reading.values;
    if (tag === null) continue;
    const seen = first.get(tag);
    if (seen === undefined) first.set(tag, reading);
    else {
      reading.error('tag', {
        code: 'tag-doubled',
        message: `The tag ${tag} is on ${seen.place} already.`,
        remedy: 'Give this point a tag of its own, or delete the row.',
      });
    }
  }
}

/** Values are checked once all rows of a point have said theirs. */
function checkRow(reading: RowReading): void {
  reading.findPoint();
  checkValues(reading);
  reading.findChannels();
}
