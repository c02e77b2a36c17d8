import type { Purpose } from '#calc';
import type { Channel } from './addresses.ts';
import type { DesignIndex } from './design-index.ts';
import type { RowReading } from './row-reading.ts';

/** A row that does not get the channel it asks for. */
export interface Refusal {
  readonly reading: RowReading;
  readonly purpose: Purpose;
  /** Who has it, in words: a row of the file or a point of the project. */
  readonly holder: string;
}

/** Who has a channel: a point of the project, and a row of the file where that asks for it. */
interface Holder {
  readonly pointId: string | null;
  readonly reading: RowReading | null;
}

const PURPOSES: readonly Purpose[] = ['control', 'status'];

/**
 * Decides who gets which channel: the first row that asks, unless a point of the project has it. A point
 * that the same file moves elsewhere gives its old channel free, so that two points can be exchanged; one
 * whose move is refused keeps it, which may refuse another row in turn.
 *
 * @param readings the rows that are imported, in the order of the file
 * @returns the refused claims; all others are granted
 */
export function refusedClaims(readings: readonly RowReading[], index: DesignIndex): Refusal[] {
  const asking = readings.filter(({ wants }) => wants.control || wants.status);
  if (asking.length === 0) return [];
  const moving = new Set<string>();
  for (const reading of asking) {
    for (const purpose of PURPOSES) if (moves(reading, purpose, index)) moving.add(useOf(reading, purpose));
  }
  for (;;) {
    const refused = allot(asking, standing(moving, index), index);
    const stuck = refused.map(({ reading, purpose }) => useOf(reading, purpose)).filter((use) => moving.delete(use));
    if (stuck.length === 0) return refused;
  }
}

function useOf(reading: RowReading, purpose: Purpose): string {
  return `${reading.point?.id ?? ''} ${purpose}`;
}

/** Whether the row takes an existing point to another channel than it has. */
function moves(reading: RowReading, purpose: Purpose, index: DesignIndex): boolean {
  const wanted = reading.wants[purpose];
  const current = reading.point && index.assignmentOf(index.dispenserByPoint.get(reading.point.id), purpose);
  return !!wanted && !!current && keyOf(wanted) !== `${current.moduleId} ${current.channel}`;
}

function keyOf({ module, channel }: Channel): string {
  return `${module.id} ${channel}`;
}

/** The channels that points of the project keep. */
function standing(moving: ReadonlySet<string>, { design }: DesignIndex): Map<string, Holder> {
  const pointOf = new Map(design.dispensers.map((each) => [each.id, each.pointId]));
  const taken = new Map<string, Holder>();
  for (const { dispenserId, purpose, moduleId, channel } of design.assignments) {
    const pointId = pointOf.get(dispenserId) ?? null;
    if (!moving.has(`${pointId} ${purpose}`)) taken.set(`${moduleId} ${channel}`, { pointId, reading: null });
  }
  return taken;
}

function allot(readings: readonly RowReading[], taken: Map<string, Holder>, index: DesignIndex): Refusal[] {
  const refused: Refusal[] = [];
  for (const reading of readings) {
    for (const purpose of PURPOSES) {
      const wanted = reading.wants[purpose];
      if (!wanted) continue;
      const key = keyOf(wanted);
      const holder = taken.get(key);
      const mine = reading.point !== null && holder?.pointId === reading.point.id;
      if (holder && !mine) refused.push({ reading, purpose, holder: nameOf(holder, purpose, index) });
      else taken.set(key, { pointId: reading.point?.id ?? null, reading });
    }
  }
  return refused;
}

function nameOf({ pointId, reading }: Holder, purpose: Purpose, { design }: DesignIndex): string {
  if (reading) return (reading.signalRow[purpose] ?? reading).place;
  const tag = design.points.find(({ id }) => id === pointId)?.tag;
  return `point ${tag ?? 'without tag'} of the project`;
}
