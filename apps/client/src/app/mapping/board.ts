import { type Assignment, type CableNode, type Controller, type Design, type Dispenser, groupKey, type Module, type ModuleType, type Point, type Purpose, wiringBy } from '#calc';

/** A module with all that says where it stands. */
export interface RackModule {
  readonly module: Module;
  readonly type: ModuleType;
  readonly controller: Controller;
}

export interface CabinetModules {
  readonly cabinet: Design['cabinets'][number];
  readonly modules: readonly RackModule[];
}

export interface Occupant {
  readonly dispenser: Dispenser;
  readonly point: Point;
}

/** The design as the mapping reads it: who is where, what is free, what each lacks. Built once for each state. */
export interface Board {
  readonly design: Design;
  readonly cabinets: readonly CabinetModules[];
  /** In order of cabinet, controller and place on the rack: the order in which channels are filled. */
  readonly modules: readonly RackModule[];
  readonly moduleOf: ReadonlyMap<string, RackModule>;
  /** By `channelKey`. */
  readonly taken: ReadonlyMap<string, Assignment>;
  /** By `heldKey`. */
  readonly held: ReadonlyMap<string, Assignment>;
  readonly occupants: ReadonlyMap<string, Occupant>;
  /** Names of circuits and controllers, by id. */
  readonly circuits: ReadonlyMap<string, string>;
  readonly controllers: ReadonlyMap<string, string>;
  readonly boxes: ReadonlyMap<string, CableNode>;
  /** The circuit that feeds a group, by `groupKey`. */
  readonly feeds: ReadonlyMap<string, string | null>;
}

export const channelKey = (moduleId: string, channel: number): string => `${moduleId}:${channel}`;
export const heldKey = (purpose: Purpose, dispenserId: string): string => `${purpose}/${dispenserId}`;

/** One pass over each collection, for projects of thousands. */
export function boardOf(design: Design): Board {
  const cabinets = modulesByCabinet(design);
  const modules = cabinets.flatMap((entry) => entry.modules);
  const points = new Map(design.points.map((p) => [p.id, p]));
  const occupants = new Map<string, Occupant>();
  for (const dispenser of design.dispensers) {
    const point = points.get(dispenser.pointId);
    if (point) occupants.set(dispenser.id, occupantOf(dispenser, point));
  }
  return {
    design, cabinets, modules, occupants,
    moduleOf: new Map(modules.map((m) => [m.module.id, m])),
    taken: new Map(design.assignments.map((a) => [channelKey(a.moduleId, a.channel), a])),
    held: new Map(design.assignments.map((a) => [heldKey(a.purpose, a.dispenserId), a])),
    circuits: new Map(design.circuits.map((c) => [c.id, c.name])),
    controllers: new Map(design.controllers.map((c) => [c.id, c.name])),
    boxes: new Map(design.cableNodes.map((n) => [n.id, n])),
    feeds: new Map(design.moduleGroups.map((g) => [groupKey(g.moduleId, g.groupIndex), g.circuitId])),
  };
}

/** Cabinets in order of their location, each with its modules from the left. */
export function modulesByCabinet(design: Design): readonly CabinetModules[] {
  const types = new Map(design.moduleTypes.map((t) => [t.id, t]));
  const byController = new Map<string, Module[]>(design.controllers.map((c) => [c.id, []]));
  for (const module of design.modules) byController.get(module.controllerId)?.push(module);
  return [...design.cabinets].sort((a, b) => a.location.localeCompare(b.location)).map((cabinet) => ({
    cabinet,
    modules: design.controllers.filter((c) => c.cabinetId === cabinet.id).sort((a, b) => a.name.localeCompare(b.name))
      .flatMap((controller) => (byController.get(controller.id) ?? []).sort((a, b) => a.slot - b.slot)
        .flatMap((module) => {
          const type = types.get(module.typeId);
          return type ? [{ module, type, controller }] : [];
        })),
  }));
}

/** Which of its signals a dispenser still lacks. A timed dispenser has no output, a two-core one no status signal. */
export function missingPurposes(board: Board, dispenser: Dispenser, types: ReadonlyMap<string, Design['dispenserTypes'][number]>): readonly Purpose[] {
  const wanted: Purpose[] = [];
  if (dispenser.method === 'pulse' && !board.held.has(heldKey('control', dispenser.id))) wanted.push('control');
  const type = types.get(dispenser.typeId ?? '') ?? null;
  if (wiringBy(dispenser, type) === 'four-core' && !board.held.has(heldKey('status', dispenser.id))) wanted.push('status');
  return wanted;
}

export const dispenserTypesOf = (design: Design): ReadonlyMap<string, Design['dispenserTypes'][number]> =>
  new Map(design.dispenserTypes.map((t) => [t.id, t]));

export const tagOf = (board: Board, dispenserId: string): string => board.occupants.get(dispenserId)?.point.tag ?? '';

/** The same object as long as both rows are the same, so that what is drawn from it can stay. */
function occupantOf(dispenser: Dispenser, point: Point): Occupant {
  const known = KNOWN.get(dispenser);
  if (known?.point === point) return known;
  const made = { dispenser, point };
  KNOWN.set(dispenser, made);
  return made;
}

const KNOWN = new WeakMap<Dispenser, Occupant>();
