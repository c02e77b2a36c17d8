import type { LoadFigures, ModuleFigures } from '../assessment.ts';
import type { Assignment, Module, ModuleType } from '../design.ts';
import { type DesignIndex, groupIndexOf, groupKey, grouped, typeOf, wiringOf } from '../design-index.ts';
import { NOMINAL_V } from '../wiring/network.ts';
import { type LimitOf, type Load, type LoadSum, sumLoads, worstSetOf, worstSum } from './load-sum.ts';
import { HIGHEST_UNSTATED_V, highestSupplyV } from '../wiring/supply-voltage.ts';

/** What an output channel carries, A. */
export interface ChannelLoad {
  readonly amps: number;
  /** When the motor starts; null where only a pulse input is driven. */
  readonly peakA: number | null;
}

/** Loads of groups and modules with their sums kept, so that another k is a look-up. */
export interface HardwareLoads {
  readonly groups: ReadonlyMap<string, LoadFigures>;
  readonly modules: ReadonlyMap<string, ModuleFigures>;
  /** Output groups and modules that limit something. */
  readonly rated: readonly RatedSum[];
}

type AmpsOf = (dispenserId: string) => number | null;

/** A group or module with its loads and what it may carry, A. */
export interface RatedSum {
  readonly loads: readonly Load[];
  readonly sum: LoadSum;
  readonly ratingA: number;
}

/**
 * Load on the output channel of a dispenser: two-core the motor's current with its starting peak,
 * four-core the current of the pulse input.
 *
 * @param runA largest current through the motor as the network says; null where it is in none
 * @returns null while type or wiring is unknown, or the device takes no pulse from an output
 */
export function channelLoad(index: DesignIndex, dispenserId: string, runA: number | null): ChannelLoad | null {
  const dispenser = index.dispensers.get(dispenserId);
  const type = dispenser && typeOf(index, dispenser);
  if (!dispenser || !type) return null;
  const wiring = wiringOf(index, dispenser);
  if (wiring === 'two-core') return { amps: runA ?? type.runA, peakA: type.peakA };
  if (wiring === 'four-core' && type.controlInputA !== null) return { amps: type.controlInputA, peakA: null };
  return null;
}

/**
 * Smallest current on the output channel while it is on, A: with constant power through the motor that at
 * the supply's highest voltage and no drop, else the one current there is.
 */
export function leastChannelA(index: DesignIndex, dispenserId: string, amps: number): number {
  const dispenser = index.dispensers.get(dispenserId);
  const type = dispenser && typeOf(index, dispenser);
  if (!type || type.load !== 'constant-power' || wiringOf(index, dispenser) !== 'two-core') return amps;
  const circuit = dispenser.circuitId === null ? undefined : index.circuits.get(dispenser.circuitId);
  const supply = circuit && index.supplies.get(circuit.supplyId);
  const highest = supply ? highestSupplyV(supply, index.supplyTypes.get(supply.typeId)) : HIGHEST_UNSTATED_V;
  return Math.min(amps, (type.runA * NOMINAL_V) / highest);
}

/**
 * Loads of every group and module: the worst case under the limits is, for each circuit, the k largest
 * channel loads in that group. Inputs carry none; their channels are counted all the same.
 *
 * @param ampsOf load of a dispenser's channel under the limits, A
 * @param allOnOf the same with all on
 */
export function hardwareLoads(index: DesignIndex, ampsOf: AmpsOf, allOnOf: AmpsOf, limitOf: LimitOf): HardwareLoads {
  const groups = new Map<string, LoadFigures>();
  const modules = new Map<string, ModuleFigures>();
  const rated: RatedSum[] = [];
  for (const module of index.design.modules) {
    const type = index.moduleTypes.get(module.typeId);
    if (!type) continue;
    const onModule = index.assignmentsByModule.get(module.id) ?? [];
    const place = (assignments: readonly Assignment[], ratingA: number | null, channels: number): LoadFigures => {
      const loads = loadsOf(index, assignments, type, ampsOf);
      const sum = sumLoads(loads);
      if (ratingA !== null && loads.length > 0) rated.push({ loads, sum, ratingA });
      const allOnA = loadsOf(index, assignments, type, allOnOf).reduce((all, { amps }) => all + Math.max(0, amps), 0);
      const used = new Set(assignments.map((a) => a.channel)).size;
      return { worstA: worstSum(sum, limitOf), allOnA, ratingA, worstSet: worstSetOf(sum, limitOf), used, channels };
    };
    groupFigures(module, type, onModule, place, groups);
    const whole = place(onModule, type.moduleA, type.channels);
    modules.set(module.id, { ...whole, free: Math.max(0, type.channels - whole.used) });
  }
  return { groups, modules, rated };
}

function groupFigures(
  module: Module, type: ModuleType, assignments: readonly Assignment[],
  place: (assignments: readonly Assignment[], ratingA: number | null, channels: number) => LoadFigures, groups: Map<string, LoadFigures>,
): void {
  const byGroup = grouped(assignments, (a) => String(groupIndexOf(type, a.channel)));
  const perGroup = Math.max(1, type.channelsPerGroup);
  for (let g = 0; g * perGroup < type.channels; g++) {
    const channels = Math.min(perGroup, type.channels - g * perGroup);
    groups.set(groupKey(module.id, g), place(byGroup.get(String(g)) ?? [], type.groupA, channels));
  }
}

function loadsOf(index: DesignIndex, assignments: readonly Assignment[], type: ModuleType, ampsOf: AmpsOf): Load[] {
  const loads: Load[] = [];
  if (type.kind !== 'output') return loads;
  for (const { dispenserId, purpose } of assignments) {
    const amps = purpose === 'control' ? ampsOf(dispenserId) : null;
    const circuitId = index.dispensers.get(dispenserId)?.circuitId ?? null;
    if (amps !== null) loads.push({ id: dispenserId, circuitId, amps });
  }
  return loads;
}
