import type {
  Assignment, Cabinet, CableNode, Circuit, Controller, Design, Dispenser, DispenserType, Grease, Module, ModuleGroup,
  ModuleType, Point, Purpose, Supply, SupplyType,
} from './design.ts';

/** A design with its rows by id and by what they belong to; built once, read by every check. */
export interface DesignIndex {
  readonly design: Design;
  readonly dispenserTypes: ReadonlyMap<string, DispenserType>;
  readonly moduleTypes: ReadonlyMap<string, ModuleType>;
  readonly supplyTypes: ReadonlyMap<string, SupplyType>;
  readonly greases: ReadonlyMap<string, Grease>;
  readonly points: ReadonlyMap<string, Point>;
  readonly dispensers: ReadonlyMap<string, Dispenser>;
  readonly cabinets: ReadonlyMap<string, Cabinet>;
  readonly controllers: ReadonlyMap<string, Controller>;
  readonly modules: ReadonlyMap<string, Module>;
  readonly supplies: ReadonlyMap<string, Supply>;
  readonly circuits: ReadonlyMap<string, Circuit>;
  readonly nodes: ReadonlyMap<string, CableNode>;
  /** By `groupKey`. */
  readonly groups: ReadonlyMap<string, ModuleGroup>;
  readonly dispensersByPoint: ReadonlyMap<string, readonly Dispenser[]>;
  readonly dispensersByCircuit: ReadonlyMap<string, readonly Dispenser[]>;
  readonly nodesByCircuit: ReadonlyMap<string, readonly CableNode[]>;
  readonly circuitsBySupply: ReadonlyMap<string, readonly Circuit[]>;
  readonly assignmentsByModule: ReadonlyMap<string, readonly Assignment[]>;
  /** The first assignment of each dispenser and purpose. */
  readonly control: ReadonlyMap<string, Assignment>;
  readonly status: ReadonlyMap<string, Assignment>;
}

/** Key of a group of a module, `${moduleId}/${groupIndex}`. */
export function groupKey(moduleId: string, groupIndex: number): string {
  return `${moduleId}/${groupIndex}`;
}

/** Builds the index in one pass over each collection. */
export function indexDesign(design: Design): DesignIndex {
  return {
    design,
    dispenserTypes: byId(design.dispenserTypes),
    moduleTypes: byId(design.moduleTypes),
    supplyTypes: byId(design.supplyTypes),
    greases: byId(design.greases),
    points: byId(design.points),
    dispensers: byId(design.dispensers),
    cabinets: byId(design.cabinets),
    controllers: byId(design.controllers),
    modules: byId(design.modules),
    supplies: byId(design.supplies),
    circuits: byId(design.circuits),
    nodes: byId(design.cableNodes),
    groups: new Map(design.moduleGroups.map((g) => [groupKey(g.moduleId, g.groupIndex), g])),
    dispensersByPoint: grouped(design.dispensers, (d) => d.pointId),
    dispensersByCircuit: grouped(design.dispensers, (d) => d.circuitId),
    nodesByCircuit: grouped(design.cableNodes, (n) => n.circuitId),
    circuitsBySupply: grouped(design.circuits, (c) => c.supplyId),
    assignmentsByModule: grouped(design.assignments, (a) => a.moduleId),
    control: firstByDispenser(design.assignments, 'control'),
    status: firstByDispenser(design.assignments, 'status'),
  };
}

/** The tag of the dispenser's point, by which people name the lane. */
export function tagOf(index: DesignIndex, dispenserId: string): string {
  const dispenser = index.dispensers.get(dispenserId);
  return (dispenser && index.points.get(dispenser.pointId)?.tag) ?? dispenserId;
}

/** The type of a dispenser; null while it is not chosen. */
export function typeOf(index: DesignIndex, dispenser: Dispenser): DispenserType | null {
  return (dispenser.typeId !== null && index.dispenserTypes.get(dispenser.typeId)) || null;
}

/** How a dispenser is wired: as its row says, else as its type is made; null while neither is known. */
export function wiringOf(index: DesignIndex, dispenser: Dispenser): Dispenser['wiring'] {
  return wiringBy(dispenser, typeOf(index, dispenser));
}

/** The same rule where row and type are at hand. */
export function wiringBy(dispenser: Dispenser | null, type: DispenserType | null): Dispenser['wiring'] {
  return dispenser?.wiring ?? type?.wiring ?? null;
}

/** The type of the module that an assignment names; undefined where the row is missing. */
export function moduleTypeOf(index: DesignIndex, moduleId: string): ModuleType | undefined {
  const module = index.modules.get(moduleId);
  return module && index.moduleTypes.get(module.typeId);
}

/** Group index of a channel. */
export function groupIndexOf(type: ModuleType, channel: number): number {
  return Math.floor(channel / Math.max(1, type.channelsPerGroup));
}

/** Groups rows by a key; rows whose key is null are left out. */
export function grouped<T>(rows: readonly T[], keyOf: (row: T) => string | null): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    const key = keyOf(row);
    if (key === null) continue;
    const group = groups.get(key);
    if (group) group.push(row);
    else groups.set(key, [row]);
  }
  return groups;
}

function byId<T extends { readonly id: string }>(rows: readonly T[]): Map<string, T> {
  const map = new Map<string, T>();
  for (const row of rows) map.set(row.id, row);
  return map;
}

function firstByDispenser(assignments: readonly Assignment[], purpose: Purpose): Map<string, Assignment> {
  const map = new Map<string, Assignment>();
  for (const row of assignments) {
    if (row.purpose === purpose && !map.has(row.dispenserId)) map.set(row.dispenserId, row);
  }
  return map;
}
