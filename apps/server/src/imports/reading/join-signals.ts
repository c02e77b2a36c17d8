import type { Purpose } from '#calc';
import { VALUE_KEYS } from './import-values.ts';
import type { DraftValues, ImportValues } from './plan.ts';
import { OWN_PARTS, placed, SIGNAL_KEYS, SUBJECTS, type RowReading } from './row-reading.ts';
import { PURPOSE_OF, type SignalType } from './signal-types.ts';

/** Whether the row stands for a signal that no dispenser has, and therefore for no point. */
export function isOtherSignal({ held, own }: RowReading): boolean {
  return !held && own !== null && own.signalType === ('no signal of a dispenser' satisfies SignalType);
}

/**
 * Makes points of rows that are signals: rows with one tag are one point, whatever their order. The row of
 * the output gives the output, that of the status signal the status input; all else may stand in any of
 * them. What two rows say differently stays blank. A row that cannot join is held back by itself.
 *
 * @param readings rows of data in the order of the file, cells read; those that join another are marked
 */
export function joinSignals(readings: readonly RowReading[]): void {
  const points = new Map<string, SignalPoint>();
  for (const reading of readings) {
    takeOwnSignal(reading);
    const { tag } = reading.values;
    if (reading.held || tag === null) continue;
    const point = points.get(tag);
    if (point) point.join(reading);
    else points.set(tag, new SignalPoint(reading));
  }
}

/** The row's own module, channel and address are the point's output or status input. */
function takeOwnSignal(reading: RowReading): void {
  const { own } = reading;
  if (!own || reading.held) return;
  const purpose = own.signalType === null ? null : PURPOSE_OF[own.signalType as SignalType];
  if (purpose === null) return refuseNameless(reading);
  reading.signalRow = { ...reading.signalRow, [purpose]: reading };
  for (const part of OWN_PARTS) takePart(reading, purpose, part);
}

function refuseNameless(reading: RowReading): void {
  reading.error('signalType', {
    code: 'signal-type-missing',
    message: 'The row has a channel, but does not say whether it is an output or an input.',
    remedy: 'Write the type of the signal, or leave module, channel and address blank.',
  });
}

function takePart(reading: RowReading, purpose: Purpose, part: (typeof OWN_PARTS)[number]): void {
  const key = SIGNAL_KEYS[purpose][part];
  const said = reading.values[key];
  const content = reading.own![part];
  if (reading.isFaulty(part)) reading.markFaulty(key);
  if (content === null || content === said) return;
  if (said === null) return put(reading.values, key, content);
  reading.markFaulty(key);
  reading.warn(SUBJECTS[purpose], {
    code: 'address-contradiction',
    message: `The row says ${content} for its own signal and ${said} for the ${SUBJECTS[purpose]}.`,
    remedy: 'Correct the one that is wrong, or leave one of the columns out.',
  }, key);
}

/** The rows of one point, gathered in the first of them. */
class SignalPoint {
  /** The row that each value comes from, where that is not the first. */
  private readonly sources = new Map<keyof ImportValues, RowReading>();
  private readonly differing = new Set<keyof ImportValues>();

  constructor(private readonly first: RowReading) {}

  /** Takes a row in, or holds it back when its signal is there already. */
  join(reading: RowReading): void {
    const purpose = (['control', 'status'] as const).find((each) => reading.signalRow[each]);
    const before = purpose && this.first.signalRow[purpose];
    if (before) return refuseDoubled(reading, purpose, before);
    this.gather(reading);
    if (purpose) this.first.signalRow = { ...this.first.signalRow, [purpose]: reading };
    for (const key of VALUE_KEYS) this.take(key, reading);
    for (const key of reading.faultyFields) this.first.markFaulty(key);
  }

  private gather(reading: RowReading): void {
    const { first } = this;
    if (!first.rows) {
      first.rows = [first];
      first.problems = first.problems.map((each) => placed(each, first));
      first.notes = first.notes.map((each) => placed(each, first));
    }
    first.rows.push(reading);
    reading.joined = true;
    for (const problem of reading.problems) first.keep(placed(problem, reading));
    for (const note of reading.notes) first.note(placed(note, reading));
  }

  private take(key: keyof ImportValues, reading: RowReading): void {
    const { values } = this.first;
    const content = reading.values[key];
    if (content === null || content === values[key] || this.differing.has(key)) return;
    if (values[key] !== null) return this.differ(key, reading);
    put(values, key, content);
    this.sources.set(key, reading);
  }

  private differ(key: keyof ImportValues, reading: RowReading): void {
    const { first } = this;
    const source = this.sources.get(key) ?? first;
    const column = first.context.columns.find(({ field }) => field.value === key);
    const said = (row: RowReading): string => (column ? row.cell(column).trim() : String(row.values[key]));
    const also = key === 'controller' ? ' Output and status stay open too.' : '';
    this.differing.add(key);
    first.keep({
      code: 'rows-differ',
      message: `The rows of this point differ: ${source.place} says “${said(source)}”, ${reading.place} “${said(reading)}”.${also}`,
      remedy: 'Write the same in both rows, or leave it blank in one of them.',
      severity: 'warning',
      field: key,
      column: column?.letter ?? null,
      cell: column ? reading.cell(column) : null,
    });
    put(first.values, key, null);
    if (key === 'controller') first.markFaulty(key);
  }
}

function refuseDoubled(reading: RowReading, purpose: Purpose, before: RowReading): void {
  const name = purpose === 'control' ? 'control output' : 'status input';
  reading.error('signalType', {
    code: 'signal-doubled',
    message: `The ${name} of ${reading.values.tag} is on ${before.place} already.`,
    remedy: 'Delete the row, or give it the tag of the point that it belongs to.',
  });
}

function put(values: DraftValues, key: keyof ImportValues, content: string | number | null): void {
  (values as Record<string, string | number | null>)[key] = content;
}
