import type { Design, Dispenser, Purpose } from '../design.ts';
import { type DesignIndex, indexDesign, typeOf, wiringOf } from '../design-index.ts';
import { type LimitOf, sumLoads, worstSum } from '../hardware/load-sum.ts';
import { limitOfCircuit } from '../wiring/supply-network.ts';
import { neededInputA, outputFits, statusFitsInput } from '../wiring/signals.ts';
import { wantsControl, wantsStatus } from './mapping-findings.ts';
import { type GroupSlots, type ModuleSlots, moduleSlots, occupy, type PlannedLoad, plannedLoad } from './slots.ts';
import { channelCounts, type Kind } from './spare.ts';

export interface Proposed {
  readonly dispenserId: string;
  readonly moduleId: string;
  readonly channel: number;
  readonly purpose: Purpose;
}

export interface Unplaced {
  readonly dispenserId: string;
  readonly purpose: Purpose;
  /** Why, as a sentence that says what to do. */
  readonly reason: string;
}

export interface AutoAssignment {
  readonly proposed: readonly Proposed[];
  readonly unplaced: readonly Unplaced[];
}

/**
 * Proposes an output, and an input where the device gives a status signal, for every dispenser that
 * lacks one. It respects polarity, channel, group and module ratings under the limits, the circuit that
 * feeds the group, the controller and the spare policy; fills groups that have neighbours of the same
 * box first; takes a relay only where nothing else is left; gives no output to a dispenser on its own
 * clock; and never moves what is mapped. The same design always gives the same proposal.
 *
 * @param dispenserIds only these; left out: all
 */
export function autoAssign(design: Design, dispenserIds?: readonly string[]): AutoAssignment {
  const index = indexDesign(design);
  const wanted = dispenserIds && new Set(dispenserIds);
  const lanes = design.dispensers.filter((d) => !wanted || wanted.has(d.id)).sort(neighbourOrder(index));
  const plan = newPlan(index);
  for (const purpose of ['control', 'status'] as const) {
    for (const dispenser of lanes) if (lacks(index, dispenser, purpose)) placeOne(plan, dispenser, purpose);
  }
  return { proposed: plan.proposed, unplaced: plan.unplaced };
}

interface Plan {
  readonly index: DesignIndex;
  readonly modules: readonly ModuleSlots[];
  /** Channels that may still be given out, by `${kind}/${cabinetId}`. */
  readonly allowance: Map<string, number>;
  readonly limitOf: LimitOf;
  readonly proposed: Proposed[];
  readonly unplaced: Unplaced[];
}

function newPlan(index: DesignIndex): Plan {
  return {
    index,
    modules: moduleSlots(index),
    allowance: new Map(channelCounts(index).map((c) => [`${c.kind}/${c.cabinetId}`, c.channels - c.spare - c.used])),
    limitOf: (id) => limitOfCircuit((id === null ? null : index.circuits.get(id)?.concurrencyLimit) ?? null),
    proposed: [],
    unplaced: [],
  };
}

function lacks(index: DesignIndex, dispenser: Dispenser, purpose: Purpose): boolean {
  if (purpose === 'control') return wantsControl(dispenser) && !index.control.has(dispenser.id);
  return wantsStatus(index, dispenser) && !index.status.has(dispenser.id);
}

/** What stands in the way, the last one the least: the reason told is the furthest that any channel got. */
const REASONS = [
  'Its controller has no module of this kind: add one',
  'No module there has the polarity that the device wants: add one that has',
  'The outputs there that fit leak more than the device takes as off: add a module with less leakage',
  'No channel there is rated for its load: add a module with a higher rating',
  'The inputs there take more current than its status output delivers: add a module that takes less',
  'The groups there are fed by other circuits: feed one from its circuit',
  'No channel is free: add a module',
  'The group or module would be over its rating: set a smaller k, or add a module',
  'Only spare channels are left: add a module, or lower the spare policy',
] as const;
const [NO_MODULE, POLARITY, LEAKAGE, CHANNEL_RATING, INPUT_CURRENT, FEED, NO_FREE, RATING, SPARE] = REASONS.keys();

interface Candidate {
  readonly slots: ModuleSlots;
  readonly group: GroupSlots;
  /** Lower is better. */
  readonly rank: number;
}

function placeOne(plan: Plan, dispenser: Dispenser, purpose: Purpose): void {
  const { index } = plan;
  if (!typeOf(index, dispenser) || !wiringOf(index, dispenser)) {
    plan.unplaced.push({ dispenserId: dispenser.id, purpose, reason: 'Its type or wiring is not chosen: choose it first' });
    return;
  }
  let furthest: number = NO_MODULE;
  let best: Candidate | null = null;
  const load = purpose === 'control' ? plannedLoad(index, dispenser.id) : null;
  for (const slots of plan.modules) {
    if (best?.rank === 0) break;
    if (!reaches(index, dispenser, slots, purpose)) continue;
    for (const group of slots.groups) {
      const stop = obstacle(plan, dispenser, load, purpose, slots, group);
      if (stop !== null) {
        furthest = Math.max(furthest, stop);
        continue;
      }
      const rank = rankOf(dispenser, slots, group);
      if (!best || rank < best.rank) best = { slots, group, rank };
    }
  }
  if (best) take(plan, dispenser, purpose, best);
  else plan.unplaced.push({ dispenserId: dispenser.id, purpose, reason: REASONS[furthest] });
}

function take(plan: Plan, dispenser: Dispenser, purpose: Purpose, { slots, group }: Candidate): void {
  const channel = group.free[0];
  const proposed = { dispenserId: dispenser.id, moduleId: slots.module.id, channel, purpose };
  occupy(plan.index, slots, proposed);
  plan.proposed.push(proposed);
  const key = `${slots.type.kind}/${slots.cabinetId}`;
  plan.allowance.set(key, (plan.allowance.get(key) ?? 0) - 1);
}

/** Modules of its controller; without one, those in the cabinet of its circuit's supply. */
function reaches(index: DesignIndex, dispenser: Dispenser, slots: ModuleSlots, purpose: Purpose): boolean {
  const kind: Kind = purpose === 'control' ? 'output' : 'input';
  if (slots.type.kind !== kind) return false;
  if (dispenser.controllerId !== null) return slots.module.controllerId === dispenser.controllerId;
  const circuit = dispenser.circuitId === null ? undefined : index.circuits.get(dispenser.circuitId);
  return circuit !== undefined && index.supplies.get(circuit.supplyId)?.cabinetId === slots.cabinetId;
}

/** The first thing that keeps a dispenser off a group; null: nothing. */
function obstacle(plan: Plan, dispenser: Dispenser, load: PlannedLoad | null, purpose: Purpose, slots: ModuleSlots, group: GroupSlots): number | null {
  const allowed = (plan.allowance.get(`${slots.type.kind}/${slots.cabinetId}`) ?? 0) > 0;
  return (
    (purpose === 'control' ? outputObstacle(plan, dispenser, load, slots, group) : inputObstacle(plan.index, dispenser, slots, group)) ??
    (allowed ? null : SPARE)
  );
}

function outputObstacle({ index, limitOf }: Plan, dispenser: Dispenser, load: PlannedLoad | null, { type, loads }: ModuleSlots, group: GroupSlots): number | null {
  const device = typeOf(index, dispenser)!;
  if (!outputFits(type, device.controlPolarity)) return POLARITY;
  if (type.leakageA > device.offStateA + 1e-12) return LEAKAGE;
  if (load && !channelStands(type, load)) return CHANNEL_RATING;
  const foreign = group.circuitId !== null && dispenser.circuitId !== null && group.circuitId !== dispenser.circuitId;
  if (foreign) return FEED;
  if (group.free.length === 0) return NO_FREE;
  const over = (ratingA: number | null, present: typeof loads): boolean =>
    ratingA !== null && load !== null && worstSum(sumLoads([...present, load]), limitOf) > ratingA + 1e-9;
  return over(type.groupA, group.loads) || over(type.moduleA, loads) ? RATING : null;
}

function channelStands(type: ModuleSlots['type'], { amps, peakA, leastA }: PlannedLoad): boolean {
  if (type.channelA !== null && amps > type.channelA + 1e-9) return false;
  if (type.channelPeakA !== null && peakA !== null && peakA > type.channelPeakA + 1e-9) return false;
  return type.minLoadA === null || leastA >= type.minLoadA - 1e-9;
}

function inputObstacle(index: DesignIndex, dispenser: Dispenser, { type }: ModuleSlots, group: GroupSlots): number | null {
  const status = typeOf(index, dispenser)?.status;
  if (status && !statusFitsInput(status.polarity, type.polarity)) return POLARITY;
  if (status && status.maxA < neededInputA(type) - 1e-12) return INPUT_CURRENT;
  return group.free.length === 0 ? NO_FREE : null;
}

/** Transistors before relays, its own feeder before none, neighbours before strangers; then the order of the rack. */
function rankOf(dispenser: Dispenser, { type }: ModuleSlots, group: GroupSlots): number {
  const relay = type.technology === 'relay' ? 4 : 0;
  const unfed = type.kind === 'output' && !group.fed ? 2 : 0;
  return relay + unfed + (group.boxes.has(dispenser.nodeId) ? 0 : 1);
}

/** Circuit by circuit, box by box, tag by tag, numbers in tags by value: neighbours come one after the other. */
function neighbourOrder(index: DesignIndex): (a: Dispenser, b: Dispenser) => number {
  const keys = new Map<string, string>();
  for (const d of index.design.dispensers) {
    const circuit = d.circuitId === null ? '' : (index.circuits.get(d.circuitId)?.name ?? '');
    const box = d.nodeId === null ? '' : (index.nodes.get(d.nodeId)?.location ?? '');
    const tag = index.points.get(d.pointId)?.tag ?? '';
    keys.set(d.id, [circuit, box, tag].map(padNumbers).join('\u0000') + `\u0000${d.id}`);
  }
  return (a, b) => (keys.get(a.id)! < keys.get(b.id)! ? -1 : 1);
}

function padNumbers(text: string): string {
  return text.replace(/\d+/g, (digits) => digits.padStart(9, '0'));
}

