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

interface Holder {
  readonly pointId: string | null;
  readonly name: string;
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
  const moving = new Set(
    readings.flatMap((reading) =>
      PURPOSES.filter((each) => moves(reading, each, index)).map((each) => useOf(reading, each)),
    ),
  );
  for (;;) {
    const refused = allot(readings, standing(moving, index));
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
function standing(moving: ReadonlySet<string>, index: DesignIndex): Map<string, Holder> {
  const pointOf = new Map(index.design.dispensers.map((each) => [each.id, each.pointId]));
  const tagOf = new Map(index.design.points.map((each) => [each.id, each.tag]));
  const kept = index.design.assignments.filter(
    (each) => !moving.has(`${pointOf.get(each.dispenserId)} ${each.purpose}`),
  );
  return new Map(
    kept.map((each) => {
      const pointId = pointOf.get(each.dispenserId) ?? null;
      return [
        `${each.moduleId} ${each.channel}`,
        { pointId, name: `point ${(pointId && tagOf.get(pointId)) ?? 'without tag'} of the project` },
      ];
    }),
  );
}

function allot(readings: readonly RowReading[], taken: Map<string, Holder>): Refusal[] {
  const refused: Refusal[] = [];
  for (const reading of readings) {
    for (const purpose of PURPOSES) {
      const wanted = reading.wants[purpose];
      if (!wanted) continue;
      const holder = taken.get(keyOf(wanted));
      const mine = reading.point !== null && holder?.pointId === reading.point.id;
      if (holder && !mine) {
        refused.push({ reading, purpose, holder: holder.name });
      } else {
        taken.set(keyOf(wanted), { pointId: reading.point?.id ?? null, name: `row ${reading.row.number}` });
      }
    }
  }
  return refused;
}
