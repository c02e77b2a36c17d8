import { assess, type Assessment, type Assignment, type Design, groupIndexOf, groupKey } from '#calc';
import { type Board, tagOf } from '../board';
import type { Doable } from './drop-plan';
import { moduleLabel } from './drop-rules';

/** A worst load before and after, A. */
export interface LoadChange {
  readonly key: string;
  readonly label: string;
  readonly beforeA: number;
  readonly afterA: number;
  readonly ratingA: number | null;
}

/** The worst loads of the groups that a plan touches and of the circuits of those that it moves. */
export interface LoadsAfter {
  readonly groups: readonly LoadChange[];
  readonly circuits: readonly LoadChange[];
  /** The lowest worst-case voltage among the moved that lies under its minimum, with its tag. */
  readonly tooLow: { readonly tag: string; readonly volts: number; readonly minV: number } | null;
}

export const isOver = ({ afterA, ratingA }: LoadChange): boolean => ratingA !== null && afterA > ratingA;

/**
 * What the library says of a plan, on a copy of the design that holds only what these figures depend on: the modules
 * touched, the supplies that feed those on them, and everything on those supplies.
 */
export function loadsAfter(board: Board, before: Assessment, plan: Doable): LoadsAfter {
  const outputs = [...plan.placements, ...plan.freed].filter((p) => p.purpose === 'control');
  if (outputs.length === 0) return { groups: [], circuits: [], tooLow: null };
  const after = assess(neededDesign(board.design, plan));
  const ids = new Set(outputs.map((p) => p.dispenserId));
  const circuitIds = new Set([...ids].flatMap((id) => board.occupants.get(id)?.dispenser.circuitId ?? []));
  return {
    groups: groupsOf(board, plan).flatMap(({ key, label }) => change(key, label, before.groups.get(key), after.groups.get(key))),
    circuits: [...circuitIds].flatMap((id) => change(id, board.circuits.get(id) ?? '', before.circuits.get(id), after.circuits.get(id))),
    tooLow: lowest(board, after, ids),
  };
}

/** The rows that the figures of a plan depend on, as they will be after it. */
export function neededDesign(design: Design, plan: Doable): Design {
  const assignments = withPlan(design.assignments, plan);
  const moduleIds = new Set([...plan.placements, ...plan.freed].map((p) => p.moduleId));
  const onModules = new Set(assignments.filter((a) => moduleIds.has(a.moduleId)).map((a) => a.dispenserId));
  for (const row of plan.freed) onModules.add(row.dispenserId);
  const circuitIds = new Set(design.dispensers.filter((d) => onModules.has(d.id)).map((d) => d.circuitId));
  const supplyIds = new Set(design.circuits.filter((c) => circuitIds.has(c.id)).map((c) => c.supplyId));
  const circuits = design.circuits.filter((c) => supplyIds.has(c.supplyId));
  const needed = new Set(circuits.map((c) => c.id));
  const dispensers = design.dispensers.filter((d) => onModules.has(d.id) || (d.circuitId !== null && needed.has(d.circuitId)));
  const dispenserIds = new Set(dispensers.map((d) => d.id));
  const pointIds = new Set(dispensers.map((d) => d.pointId));
  const kept = assignments.filter((a) => dispenserIds.has(a.dispenserId));
  const modules = new Set([...moduleIds, ...kept.map((a) => a.moduleId)]);
  return {
    ...design, circuits, dispensers, assignments: kept,
    points: design.points.filter((p) => pointIds.has(p.id)),
    modules: design.modules.filter((m) => modules.has(m.id)),
    moduleGroups: design.moduleGroups.filter((g) => modules.has(g.moduleId)),
    supplies: design.supplies.filter((s) => supplyIds.has(s.id)),
    cableNodes: design.cableNodes.filter((n) => needed.has(n.circuitId)),
  };
}

function withPlan(assignments: readonly Assignment[], { freed, placements }: Doable): readonly Assignment[] {
  const gone = new Set(freed.map((row) => row.id));
  return [...assignments.filter((a) => !gone.has(a.id)), ...placements.map((p, i) => ({ ...p, id: `planned-${i}` }))];
}

function groupsOf(board: Board, { placements, freed }: Doable): readonly { readonly key: string; readonly label: string }[] {
  const groups = new Map<string, string>();
  for (const { moduleId, channel, purpose } of [...placements, ...freed]) {
    const rack = board.moduleOf.get(moduleId);
    if (purpose !== 'control' || !rack) continue;
    const index = groupIndexOf(rack.type, channel);
    groups.set(groupKey(moduleId, index), `${moduleLabel(rack)} group ${index + 1}`);
  }
  return [...groups].map(([key, label]) => ({ key, label }));
}

interface Load {
  readonly worstA: number;
  readonly ratingA: number | null;
}

const change = (key: string, label: string, before: Load | undefined, after: Load | undefined): readonly LoadChange[] =>
  after ? [{ key, label, beforeA: before?.worstA ?? 0, afterA: after.worstA, ratingA: after.ratingA }] : [];

function lowest(board: Board, after: Assessment, ids: ReadonlySet<string>): LoadsAfter['tooLow'] {
  let found: LoadsAfter['tooLow'] = null;
  for (const id of ids) {
    const lane = after.lanes.get(id);
    if (!lane?.worst || lane.minV === null || lane.worst.volts >= lane.minV) continue;
    if (!found || lane.worst.volts < found.volts) found = { tag: tagOf(board, id), volts: lane.worst.volts, minV: lane.minV };
  }
  return found;
}
