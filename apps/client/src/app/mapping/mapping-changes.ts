import { type Design, type Dispenser, type Purpose, wiringBy } from '#calc';
import type { RowChange } from '#contract';
import { v7 as newId } from 'uuid';
import { type ChannelRow, channelKey, type GroupSection, type Proposal } from './mapping-rows';

/** Puts a dispenser on a channel; what it held before for the same purpose is given free in the same change set. */
export function assignChange(design: Design, dispenserId: string, row: ChannelRow): readonly RowChange[] {
  const before = design.assignments.find((a) => a.dispenserId === dispenserId && a.purpose === row.purpose);
  const removed: readonly RowChange[] = before ? [{ collection: 'assignments', op: 'delete', id: before.id }] : [];
  return [...removed, createAssignment({ dispenserId, moduleId: row.module.id, channel: row.channel, purpose: row.purpose })];
}

export function unassignChanges(design: Design, keys: ReadonlySet<string>): readonly RowChange[] {
  return design.assignments
    .filter((a) => keys.has(channelKey(a.moduleId, a.channel)))
    .map((a) => ({ collection: 'assignments', op: 'delete', id: a.id }));
}

export const proposalChanges = (proposals: readonly Proposal[]): readonly RowChange[] => proposals.map(createAssignment);

/** Dispensers, in order, on the free channels from one channel on; those that find no channel are left out. */
export function fillFrom(sections: readonly GroupSection[], from: ChannelRow, dispenserIds: readonly string[]): readonly Proposal[] {
  const free = sections.flatMap((s) => s.channels).filter((r) => r.purpose === from.purpose && !r.occupant);
  const start = free.findIndex((r) => r.key === from.key);
  if (start < 0) return [];
  return dispenserIds.slice(0, free.length - start).map((dispenserId, i) => {
    const row = free[start + i];
    return { dispenserId, moduleId: row.module.id, channel: row.channel, purpose: row.purpose };
  });
}

/** Which of its signals a dispenser still lacks. A timed dispenser has no output, a two-core one no status signal. */
export function missingPurposes(design: Design, dispenser: Dispenser): readonly Purpose[] {
  const has = (purpose: Purpose) => design.assignments.some((a) => a.dispenserId === dispenser.id && a.purpose === purpose);
  const wanted: Purpose[] = [];
  if (dispenser.method === 'pulse' && !has('control')) wanted.push('control');
  const type = design.dispenserTypes.find((t) => t.id === dispenser.typeId) ?? null;
  if (wiringBy(dispenser, type) === 'four-core' && !has('status')) wanted.push('status');
  return wanted;
}

const createAssignment = (values: Proposal): RowChange => ({ collection: 'assignments', op: 'create', id: newId(), values: { ...values } });
