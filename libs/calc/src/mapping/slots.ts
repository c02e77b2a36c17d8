import type { Assignment, Module, ModuleType } from '../design.ts';
import { type DesignIndex, groupIndexOf, groupKey, wiringBy } from '../design-index.ts';
import { channelLoad, leastChannelA } from '../hardware/channel-load.ts';
import type { Load } from '../hardware/load-sum.ts';
import { NOMINAL_V } from '../wiring/network.ts';

/** A module while channels are being given out. */
export interface ModuleSlots {
  readonly module: Module;
  readonly type: ModuleType;
  readonly cabinetId: string;
  readonly loads: Load[];
  readonly groups: readonly GroupSlots[];
}

/** A group of a module while channels are being given out. */
export interface GroupSlots {
  /** The circuit that feeds it; a group that nobody feeds is claimed by its first lane's circuit. */
  circuitId: string | null;
  readonly fed: boolean;
  /** Free channels, ascending. */
  readonly free: number[];
  readonly loads: Load[];
  /** Junction boxes whose lanes are on the group: where neighbours belong. */
  readonly boxes: Set<string | null>;
}

/** All modules in the order in which they are filled: controller, slot, name; with what is on them now. */
export function moduleSlots(index: DesignIndex): ModuleSlots[] {
  const slots: ModuleSlots[] = [];
  for (const module of [...index.design.modules].sort(byPlace)) {
    const type = index.moduleTypes.get(module.typeId);
    const controller = index.controllers.get(module.controllerId);
    if (!type || !controller) continue;
    const entry = { module, type, cabinetId: controller.cabinetId, loads: [], groups: emptyGroups(index, module, type) };
    for (const assignment of index.assignmentsByModule.get(module.id) ?? []) occupy(index, entry, assignment);
    slots.push(entry);
  }
  return slots;
}

/** Takes a channel of a module for a dispenser. */
export function occupy(index: DesignIndex, slots: ModuleSlots, { dispenserId, channel, purpose }: Pick<Assignment, 'dispenserId' | 'channel' | 'purpose'>): void {
  const group = slots.groups[groupIndexOf(slots.type, channel)];
  if (!group) return;
  const at = group.free.indexOf(channel);
  if (at >= 0) group.free.splice(at, 1);
  const dispenser = index.dispensers.get(dispenserId);
  group.boxes.add(dispenser?.nodeId ?? null);
  group.circuitId ??= dispenser?.circuitId ?? null;
  const load = purpose === 'control' ? plannedLoad(index, dispenserId) : null;
  if (!load || slots.type.kind !== 'output') return;
  group.loads.push(load);
  slots.loads.push(load);
}

/** Load that a dispenser will put on an output, A; with constant power that at its lowest voltage. */
export interface PlannedLoad extends Load {
  readonly peakA: number | null;
  /** Smallest current that it can take, A. */
  readonly leastA: number;
}

/** The load that a dispenser will be on an output; null where it takes no pulse from one. */
export function plannedLoad(index: DesignIndex, dispenserId: string): PlannedLoad | null {
  const dispenser = index.dispensers.get(dispenserId);
  const type = dispenser?.typeId != null ? (index.dispenserTypes.get(dispenser.typeId) ?? null) : null;
  if (!dispenser || !type) return null;
  const wiring = wiringBy(dispenser, type);
  const load = channelLoad(type, wiring, type.load === 'constant-power' && type.minV > 0 ? (type.runA * NOMINAL_V) / type.minV : null);
  if (!load) return null;
  const circuit = dispenser.circuitId === null ? undefined : index.circuits.get(dispenser.circuitId);
  const supply = circuit && index.supplies.get(circuit.supplyId);
  const leastA = leastChannelA(type, wiring, supply ?? null, (supply && index.supplyTypes.get(supply.typeId)) ?? null, load.amps);
  return { id: dispenserId, circuitId: dispenser.circuitId, ...load, leastA };
}

function emptyGroups(index: DesignIndex, module: Module, type: ModuleType): GroupSlots[] {
  const perGroup = Math.max(1, type.channelsPerGroup);
  const groups: GroupSlots[] = [];
  for (let first = 0; first < type.channels; first += perGroup) {
    const circuitId = index.groups.get(groupKey(module.id, groups.length))?.circuitId ?? null;
    const free = Array.from({ length: Math.min(perGroup, type.channels - first) }, (_, i) => first + i);
    groups.push({ circuitId, fed: circuitId !== null, free, loads: [], boxes: new Set() });
  }
  return groups;
}

function byPlace(a: Module, b: Module): number {
  if (a.controllerId !== b.controllerId) return a.controllerId < b.controllerId ? -1 : 1;
  return a.slot - b.slot || (a.name < b.name ? -1 : a.name > b.name ? 1 : 0);
}
