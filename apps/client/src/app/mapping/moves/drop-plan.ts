import type { Assignment, Purpose } from '#calc';
import type { RowChange } from '#contract';
import { v7 as newId } from 'uuid';
import { type Board, channelKey, tagOf } from '../board';
import type { Proposal } from '../mapping-rows';
import { type Place, type Refused, placesFor, refusal, statusPlaces, willingFor } from './drop-rules';
import type { Cargo, DropTarget } from './drop-target';

/** What a drop would do, or why it is refused. Nothing changes before its changes are applied as one change set. */
export type DropPlan = Doable | Refused;

export interface Doable {
  readonly kind: 'place' | 'move' | 'swap' | 'unmap';
  /** Channels given, the carried signal first, in order; then status inputs that follow. */
  readonly placements: readonly Proposal[];
  /** Rows that go: what was held before, or is unmapped. */
  readonly freed: readonly Assignment[];
  /** The two that change places. */
  readonly swapped: readonly [string, string] | null;
  /** Why some of the carried stay where they are. */
  readonly leftOut: readonly string[];
  /** What the history calls it. */
  readonly summary: string;
}

/**
 * Works out a drop.
 *
 * @param withStatus whether status inputs follow: those that lack one get the next free inputs of the same controller
 * in the same order, a swap swaps both inputs, unmapping an output unmaps the input too
 */
export function planDrop(board: Board, cargo: Cargo, target: DropTarget, withStatus: boolean): DropPlan {
  if (cargo.dispenserIds.length === 0) return refusal('Nothing is selected.');
  if (target.kind === 'unmapped') return planUnmapping(board, cargo, withStatus);
  if (target.kind === 'channel' && cargo.purpose !== null && cargo.dispenserIds.length === 1) {
    const there = board.taken.get(channelKey(target.moduleId, target.channel));
    if (there && there.purpose === cargo.purpose && there.dispenserId !== cargo.dispenserIds[0]) {
      return planSwap(board, cargo.dispenserIds[0], there.dispenserId, cargo.purpose, withStatus);
    }
  }
  return planPlacing(board, cargo, target, withStatus);
}

/** Two mapped dispensers change places: both rows go, then both come. */
export function planSwap(board: Board, a: string, b: string, purpose: Purpose, withStatus: boolean): DropPlan {
  const purposes: readonly Purpose[] = withStatus && purpose === 'control' && board.held.has(`status/${a}`) && board.held.has(`status/${b}`)
    ? ['control', 'status'] : [purpose];
  const placements: Proposal[] = [];
  const freed: Assignment[] = [];
  for (const each of purposes) {
    const [mine, theirs] = [board.held.get(`${each}/${a}`), board.held.get(`${each}/${b}`)];
    if (!mine || !theirs) return refusal(`Only two mapped dispensers can be swapped; ${tagOf(board, mine ? b : a)} has no channel.`);
    for (const [dispenserId, to] of [[a, theirs], [b, mine]] as const) {
      const willing = willingFor(board, { dispenserIds: [dispenserId], purpose: each }, to.moduleId);
      if (willing.kind === 'refused') return willing;
      placements.push({ dispenserId, moduleId: to.moduleId, channel: to.channel, purpose: each });
    }
    freed.push(mine, theirs);
  }
  return { kind: 'swap', placements, freed, swapped: [a, b], leftOut: [], summary: `Swap of ${tagOf(board, a)} and ${tagOf(board, b)}` };
}

/** Frees channels of either kind; with outputs, their status inputs too where those follow. */
export function planFreeing(board: Board, rows: readonly Assignment[], withStatus: boolean): DropPlan {
  const status = withStatus ? rows.filter((row) => row.purpose === 'control').flatMap((row) => board.held.get(`status/${row.dispenserId}`) ?? []) : [];
  const freed = [...new Set([...rows, ...status])];
  if (freed.length === 0) return refusal('These are not mapped.');
  return { kind: 'unmap', placements: [], freed, swapped: null, leftOut: [], summary: `Unmapping of ${named(board, freed.map((row) => row.dispenserId))}` };
}

function planUnmapping(board: Board, { dispenserIds, purpose }: Cargo, withStatus: boolean): DropPlan {
  return planFreeing(board, purpose === null ? [] : dispenserIds.flatMap((id) => board.held.get(`${purpose}/${id}`) ?? []), withStatus);
}

function planPlacing(board: Board, cargo: Cargo, target: Exclude<DropTarget, { kind: 'unmapped' }>, withStatus: boolean): DropPlan {
  const willing = willingFor(board, cargo, target.moduleId);
  if (willing.kind === 'refused') return willing;
  const { dispenserIds, purpose, leftOut } = willing;
  const places = placesFor(board, target, { dispenserIds, purpose });
  if (places.kind === 'refused') return places;
  const main = proposals(dispenserIds, places.places, purpose);
  const moving = main.filter((p) => !isThere(board, p));
  if (moving.length === 0) return refusal(dispenserIds.length === 1 ? 'It is there already.' : 'They are there already.');
  const status = withStatus && purpose === 'control' ? statusPlaces(board, dispenserIds, target.moduleId) : { kind: 'places' as const, dispenserIds: [], places: [] };
  if (status.kind === 'refused') return status;
  const freed = moving.flatMap((p) => board.held.get(`${purpose}/${p.dispenserId}`) ?? []);
  return {
    kind: cargo.purpose === null ? 'place' : 'move', freed, swapped: null, leftOut,
    placements: [...moving, ...proposals(status.dispenserIds, status.places, 'status')],
    summary: `${cargo.purpose === null ? 'Mapping' : 'Move'} of ${named(board, moving.map((p) => p.dispenserId))}`,
  };
}

/** Rows deleted, then rows created: a channel is free before it is given anew. */
export const changesOf = (plan: Doable): readonly RowChange[] => [
  ...plan.freed.map((row): RowChange => ({ collection: 'assignments', op: 'delete', id: row.id })),
  ...plan.placements.map((values): RowChange => ({ collection: 'assignments', op: 'create', id: newId(), values: { ...values } })),
];

const proposals = (dispenserIds: readonly string[], places: readonly Place[], purpose: Purpose): readonly Proposal[] =>
  dispenserIds.map((dispenserId, i) => ({ dispenserId, ...places[i], purpose }));

function isThere(board: Board, { dispenserId, purpose, moduleId, channel }: Proposal): boolean {
  const now = board.held.get(`${purpose}/${dispenserId}`);
  return now?.moduleId === moduleId && now.channel === channel;
}

function named(board: Board, dispenserIds: readonly string[]): string {
  const ids = [...new Set(dispenserIds)];
  return ids.length === 1 ? tagOf(board, ids[0]) : `${ids.length} dispensers`;
}
