import type { LoadFigures, ModuleFigures } from '../assessment.ts';
import type { Assignment, ModuleType } from '../design.ts';
import { groupIndexOf } from '../design-index.ts';
import { type Lane, laneWiring, type ModulePlace } from '../lane-rows.ts';
import { channelLoad } from './channel-load.ts';
import { type LimitOf, type Load, type LoadSum, sumLoads, worstSetOf, worstSum } from './load-sum.ts';

/** The rows that a module's figures and findings read. */
export interface ModuleRows {
  readonly place: ModulePlace;
  readonly assignments: readonly Assignment[];
  /** The lane of each assignment; null: there is none. */
  readonly lanes: readonly (Lane | null)[];
}

/** Loads of a module and its groups with their sums kept, so that another k is a look-up. */
export interface ModuleLoads {
  readonly module: ModuleFigures;
  readonly groups: readonly LoadFigures[];
  /** What each circuit brings to the whole module. */
  readonly loaded: LoadSum['parts'];
  /** Those of module and groups that limit something. */
  readonly rated: readonly RatedSum[];
}

/** A group or module with its loads and what it may carry, A. */
export interface RatedSum {
  readonly loads: readonly Load[];
  readonly sum: LoadSum;
  readonly ratingA: number;
}

/** What the networks say of the lanes' motors, by place in the design; NaN: in no network. */
export interface MotorCurrents {
  readonly runA: Float64Array;
  readonly allOnRunA: Float64Array;
  /** 1 where the network was not taken over from an earlier state. */
  readonly solvedAnew: Uint8Array;
}

/**
 * Loads of a module and its groups: the worst case under the limits is, for each circuit, the k largest
 * channel loads in that group. Inputs carry none; their channels are counted all the same.
 *
 * @param places of the lanes in the design
 */
export function moduleLoads(type: ModuleType, { assignments, lanes }: ModuleRows, places: readonly number[], currents: MotorCurrents, limitOf: LimitOf): ModuleLoads {
  const perGroup = Math.max(1, type.channelsPerGroup);
  const groups: Drawn[] = [];
  for (let first = 0; first < type.channels; first += perGroup) groups.push(nothingDrawn());
  const whole = nothingDrawn();
  for (let i = 0; i < assignments.length; i++) {
    const assignment = assignments[i];
    const group = groups[groupIndexOf(type, assignment.channel)] as Drawn | undefined;
    whole.assignments.push(assignment);
    group?.assignments.push(assignment);
    const lane = lanes[i];
    if (type.kind !== 'output' || assignment.purpose !== 'control' || !lane) continue;
    const wiring = laneWiring(lane);
    const load = channelLoad(lane.type, wiring, numberOrNull(currents.runA[places[i]]));
    const allOn = channelLoad(lane.type, wiring, numberOrNull(currents.allOnRunA[places[i]]));
    if (!load || !allOn) continue;
    const drawn = { id: assignment.dispenserId, circuitId: lane.dispenser.circuitId, amps: load.amps };
    draw(whole, drawn, allOn.amps);
    if (group) draw(group, drawn, allOn.amps);
  }
  const sums = groups.map((group) => sumLoads(group.loads));
  const sum = sumLoads(whole.loads);
  const figures = loadFigures(whole, sum, type.moduleA, type.channels, limitOf);
  return {
    module: { ...figures, free: Math.max(0, type.channels - figures.used) },
    groups: groups.map((group, g) => loadFigures(group, sums[g], type.groupA, Math.min(perGroup, type.channels - g * perGroup), limitOf)),
    loaded: sum.parts,
    rated: [...groups.flatMap(({ loads }, g) => ratedSum(loads, sums[g], type.groupA)), ...ratedSum(whole.loads, sum, type.moduleA)],
  };
}

/** What is drawn from a module or a group of it. */
interface Drawn {
  readonly assignments: Assignment[];
  readonly loads: Load[];
  allOnA: number;
}

function nothingDrawn(): Drawn {
  return { assignments: [], loads: [], allOnA: 0 };
}

function draw(from: Drawn, load: Load, allOnA: number): void {
  from.loads.push(load);
  from.allOnA += Math.max(0, allOnA);
}

function numberOrNull(value: number): number | null {
  return Number.isNaN(value) ? null : value;
}

function loadFigures({ assignments, allOnA }: Drawn, sum: LoadSum, ratingA: number | null, channels: number, limitOf: LimitOf): LoadFigures {
  return { worstA: worstSum(sum, limitOf), allOnA, ratingA, worstSet: worstSetOf(sum, limitOf), used: channelsUsed(assignments), channels };
}

function ratedSum(loads: readonly Load[], sum: LoadSum, ratingA: number | null): RatedSum[] {
  return ratingA === null || loads.length === 0 ? [] : [{ loads, sum, ratingA }];
}

/** How many different channels are in use. */
export function channelsUsed(assignments: readonly Assignment[]): number {
  let mask = 0;
  let used = 0;
  for (const { channel } of assignments) {
    if (!(channel >= 0 && channel < 32)) return new Set(assignments.map((a) => a.channel)).size;
    const bit = 1 << channel;
    if (mask & bit) continue;
    mask |= bit;
    used++;
  }
  return used;
}
