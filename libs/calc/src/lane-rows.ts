import type {
  Assignment, CableNode, Circuit, Controller, Dispenser, DispenserType, Grease, Module, ModuleGroup, ModuleType, Point, Project, Supply,
  SupplyType, Wiring,
} from './design.ts';
import { type DesignIndex, wiringBy } from './design-index.ts';

/** A module with what its checks read beside its channels. */
export interface ModulePlace {
  readonly module: Module;
  readonly type: ModuleType | null;
  readonly controller: Controller | null;
  readonly groups: readonly ModuleGroup[];
  /** The circuit that feeds each of `groups`; null: none, or one that is not there. */
  readonly feeds: readonly (Circuit | null)[];
}

/** A circuit with what feeds it. */
export interface CircuitPlace {
  readonly circuit: Circuit;
  readonly supply: Supply | null;
  readonly supplyType: SupplyType | null;
}

/**
 * The rows that a lane's figures and findings read, and nothing else: two lanes with the same rows have the
 * same figures. A lane none of whose rows has changed stays the same object from one state of a design to the next.
 */
export interface Lane {
  readonly project: Project;
  readonly dispenser: Dispenser;
  readonly point: Point | null;
  /** The point has further dispensers. */
  readonly sharesPoint: boolean;
  readonly grease: Grease | null;
  readonly type: DispenserType | null;
  readonly controller: Controller | null;
  readonly circuit: CircuitPlace | null;
  readonly node: CableNode | null;
  readonly control: Assignment | null;
  readonly output: ModulePlace | null;
  readonly status: Assignment | null;
  readonly input: ModulePlace | null;
}

/** By which people name the lane: the tag of its point. */
export function laneTag({ point, dispenser }: Lane): string {
  return point?.tag ?? dispenser.id;
}

/** How the lane is wired; null while neither row nor type says. */
export function laneWiring({ dispenser, type }: Lane): Wiring | null {
  return wiringBy(dispenser, type);
}

/** The circuit that feeds a group of a module; null: none that is there. */
export function feedOf({ groups, feeds }: ModulePlace, groupIndex: number): Circuit | null {
  for (let i = groups.length - 1; i >= 0; i--) if (groups[i].groupIndex === groupIndex) return feeds[i];
  return null;
}

/** A design's lanes with their rows, and where they stand. */
export interface LaneRows {
  /** In the order of the design's dispensers. */
  readonly lanes: readonly Lane[];
  /** Place of each lane in the state before, where it is still the same object; −1 elsewhere. */
  readonly keptFrom: Int32Array;
  /** Place of a lane by dispenser id. */
  readonly placeOf: ReadonlyMap<string, number>;
  /** Places of the lanes of a circuit, by circuit id. */
  readonly byCircuit: ReadonlyMap<string, readonly number[]>;
  readonly modules: ReadonlyMap<string, ModulePlace>;
  readonly circuits: ReadonlyMap<string, CircuitPlace>;
  /** Where they were found. */
  readonly tables: LaneTables;
}

/**
 * Finds the rows of every lane.
 *
 * @param previous of an earlier state: what has the same rows is taken over as it is
 */
export function laneRows(index: DesignIndex, previous: LaneRows | null): LaneRows {
  const { dispensers } = index.design;
  const modules = modulePlaces(index, previous?.modules);
  const circuits = circuitPlaces(index, previous?.circuits);
  const tables = laneTables(index, modules, circuits);
  const sameTables = previous !== null && TABLES.every((name) => previous.tables[name] === tables[name]);
  const samePlaces = previous !== null && previous.lanes.length === dispensers.length && previous.lanes.every((lane, i) => lane.dispenser.id === dispensers[i].id);
  const keptFrom = new Int32Array(dispensers.length).fill(-1);
  const lanes = new Array<Lane>(dispensers.length);
  for (let i = 0; i < dispensers.length; i++) {
    const from = samePlaces ? i : (previous?.placeOf.get(dispensers[i].id) ?? -1);
    const before = from < 0 ? null : previous!.lanes[from];
    lanes[i] = before && sameTables && sameChain(before, dispensers[i], previous.tables, tables) ? before : findLane(tables, dispensers[i], before);
    if (lanes[i] === before) keptFrom[i] = from;
  }
  return { lanes, keptFrom, placeOf: samePlaces ? previous.placeOf : placesById(dispensers), byCircuit: placesByCircuit(lanes), modules, circuits, tables };
}

function placesById(dispensers: readonly Dispenser[]): Map<string, number> {
  const places = new Map<string, number>();
  for (let i = 0; i < dispensers.length; i++) places.set(dispensers[i].id, i);
  return places;
}

/** The tables in which a lane's rows are found. */
interface LaneTables extends Pick<DesignIndex, 'points' | 'greases' | 'dispenserTypes' | 'controllers' | 'nodes' | 'control' | 'status'> {
  readonly project: Project;
  readonly several: ReadonlySet<string>;
  readonly modules: ReadonlyMap<string, ModulePlace>;
  readonly circuits: ReadonlyMap<string, CircuitPlace>;
}

/** Those that few edits change; while they are the same objects, a lane is looked up in the others alone. */
const TABLES = ['points', 'greases', 'dispenserTypes', 'controllers', 'nodes', 'project', 'several'] as const;

function laneTables(index: DesignIndex, modules: LaneTables['modules'], circuits: LaneTables['circuits']): LaneTables {
  const { points, greases, dispenserTypes, controllers, nodes, control, status, pointsInUse: { several }, design: { project } } = index;
  return { points, greases, dispenserTypes, controllers, nodes, control, status, project, several, modules, circuits };
}

/** Whether a lane's own row, circuit and signals are the same, where all of `TABLES` are. */
function sameChain(lane: Lane, dispenser: Dispenser, before: LaneTables, now: LaneTables): boolean {
  return (
    lane.dispenser === dispenser && (before.control === now.control || lane.control === (now.control.get(dispenser.id) ?? null)) &&
    (before.status === now.status || lane.status === (now.status.get(dispenser.id) ?? null)) &&
    (before.circuits === now.circuits || lane.circuit === found(now.circuits, dispenser.circuitId)) &&
    (before.modules === now.modules || (samePlace(lane.control, lane.output, now) && samePlace(lane.status, lane.input, now)))
  );
}

function samePlace(assignment: Assignment | null, place: ModulePlace | null, { modules }: LaneTables): boolean {
  return place === (assignment && found(modules, assignment.moduleId));
}

/** The lane of a dispenser; the one before where it has the same rows. */
function findLane(tables: LaneTables, dispenser: Dispenser, before: Lane | null): Lane {
  const point = tables.points.get(dispenser.pointId) ?? null;
  const control = tables.control.get(dispenser.id) ?? null;
  const status = tables.status.get(dispenser.id) ?? null;
  const lane: Lane = {
    project: tables.project,
    dispenser,
    point,
    sharesPoint: tables.several.size > 0 && tables.several.has(dispenser.pointId),
    grease: point === null ? null : found(tables.greases, point.greaseId),
    type: found(tables.dispenserTypes, dispenser.typeId),
    controller: found(tables.controllers, dispenser.controllerId),
    circuit: found(tables.circuits, dispenser.circuitId),
    node: found(tables.nodes, dispenser.nodeId),
    control,
    output: control && found(tables.modules, control.moduleId),
    status,
    input: status && found(tables.modules, status.moduleId),
  };
  return before && sameLane(before, lane) ? before : lane;
}

function found<T>(rows: ReadonlyMap<string, T>, id: string | null): T | null {
  return id === null ? null : (rows.get(id) ?? null);
}

function sameLane(a: Lane, b: Lane): boolean {
  return (
    a.dispenser === b.dispenser && a.point === b.point && a.control === b.control && a.status === b.status && a.output === b.output &&
    a.input === b.input && a.circuit === b.circuit && a.node === b.node && a.type === b.type && a.grease === b.grease &&
    a.controller === b.controller && a.sharesPoint === b.sharesPoint && a.project === b.project
  );
}

function placesByCircuit(lanes: readonly Lane[]): Map<string, number[]> {
  const places = new Map<string, number[]>();
  lanes.forEach(({ dispenser: { circuitId } }, i) => {
    if (circuitId === null) return;
    const own = places.get(circuitId);
    if (own) own.push(i);
    else places.set(circuitId, [i]);
  });
  return places;
}

function modulePlaces(index: DesignIndex, previous: ReadonlyMap<string, ModulePlace> | undefined): ReadonlyMap<string, ModulePlace> {
  const { moduleTypes, controllers, groupsByModule, circuits } = index;
  const places = new Map<string, ModulePlace>();
  let changed = false;
  for (const module of index.design.modules) {
    const groups = groupsByModule.get(module.id) ?? NONE;
    const feeds = groups.length === 0 ? NONE : groups.map((group) => found(circuits, group.circuitId));
    const place = { module, type: found(moduleTypes, module.typeId), controller: found(controllers, module.controllerId), groups, feeds };
    const before = previous?.get(module.id);
    const kept = before && sameModule(before, place);
    if (!kept) changed = true;
    places.set(module.id, kept ? before : place);
  }
  return previous && !changed && previous.size === places.size ? previous : places;
}

const NONE: readonly never[] = [];

function sameModule(a: ModulePlace, b: ModulePlace): boolean {
  return a.module === b.module && a.type === b.type && a.controller === b.controller && sameItems(a.groups, b.groups) && sameItems(a.feeds, b.feeds);
}

function circuitPlaces(index: DesignIndex, previous: ReadonlyMap<string, CircuitPlace> | undefined): ReadonlyMap<string, CircuitPlace> {
  const { supplies, supplyTypes } = index;
  const places = new Map<string, CircuitPlace>();
  let changed = false;
  for (const circuit of index.design.circuits) {
    const supply = found(supplies, circuit.supplyId);
    const supplyType = supply && found(supplyTypes, supply.typeId);
    const before = previous?.get(circuit.id);
    const same = before && before.circuit === circuit && before.supply === supply && before.supplyType === supplyType;
    if (!same) changed = true;
    places.set(circuit.id, same ? before : { circuit, supply, supplyType });
  }
  return previous && !changed && previous.size === places.size ? previous : places;
}

/** Whether two lists hold the same objects in the same order. */
export function sameItems(a: readonly unknown[], b: readonly unknown[]): boolean {
  if (a === b) return true;
  if (a.length !== b.length) return false;
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return false;
  return true;
}
