import type {
  Assignment, Cabinet, CableNode, Circuit, Collection, Controller, Design, Dispenser, DispenserType, Grease, Module, ModuleGroup,
  ModuleType, Point, Supply, SupplyType,
} from './design.ts';

/** A design with its rows by id and by what they belong to; read by every check. */
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
  /** Assignments of a signal that an earlier one has mapped already. */
  readonly repeatedSignals: readonly Assignment[];
  readonly groupsByModule: ReadonlyMap<string, readonly ModuleGroup[]>;
  /** Designation of each point that has a product aspect of its own, in the order of the points; else empty. */
  readonly pointDesignations: readonly string[];
  /** Ids of points with a dispenser, and of those with several. */
  readonly pointsInUse: { readonly any: ReadonlySet<string>; readonly several: ReadonlySet<string> };
}

/** Key of a group of a module, `${moduleId}/${groupIndex}`. */
export function groupKey(moduleId: string, groupIndex: number): string {
  return `${moduleId}/${groupIndex}`;
}

/**
 * The index of a design. Each table is made when it is first asked for, in one pass over its collection.
 *
 * @param previous index of an earlier state of the design: tables of collections that are still the same array are taken over
 */
export function indexDesign(design: Design, previous: DesignIndex | null = null): DesignIndex {
  return new RowTables(design, previous instanceof RowTables ? previous : null);
}

interface Table {
  readonly collection: Collection;
  readonly rows: readonly unknown[];
  readonly value: unknown;
}

class RowTables implements DesignIndex {
  private readonly tables = new Map<string, Table>();

  constructor(readonly design: Design, previous: RowTables | null) {
    if (!previous) return;
    for (const [name, table] of previous.tables) if (design[table.collection] === table.rows) this.tables.set(name, table);
    const { dispensers, assignments } = design;
    const byModule = previous.tables.get('assignmentsByModule');
    if (byModule && !this.tables.has('assignmentsByModule')) {
      const value = regrouped(byModule.value as DesignIndex['assignmentsByModule'], previous.design.assignments, assignments);
      if (value) this.tables.set('assignmentsByModule', { collection: 'assignments', rows: assignments, value });
    }
    const inUse = previous.tables.get('pointsInUse');
    if (inUse && sameColumn(dispensers, previous.design.dispensers, (row) => row.pointId)) this.tables.set('pointsInUse', { ...inUse, rows: dispensers });
  }

  get dispenserTypes() { return this.table('dispenserTypes', 'dispenserTypes', byId<DispenserType>); }
  get moduleTypes() { return this.table('moduleTypes', 'moduleTypes', byId<ModuleType>); }
  get supplyTypes() { return this.table('supplyTypes', 'supplyTypes', byId<SupplyType>); }
  get greases() { return this.table('greases', 'greases', byId<Grease>); }
  get points() { return this.table('points', 'points', byId<Point>); }
  get dispensers() { return this.table('dispensers', 'dispensers', byId<Dispenser>); }
  get cabinets() { return this.table('cabinets', 'cabinets', byId<Cabinet>); }
  get controllers() { return this.table('controllers', 'controllers', byId<Controller>); }
  get modules() { return this.table('modules', 'modules', byId<Module>); }
  get supplies() { return this.table('supplies', 'supplies', byId<Supply>); }
  get circuits() { return this.table('circuits', 'circuits', byId<Circuit>); }
  get nodes() { return this.table('nodes', 'cableNodes', byId<CableNode>); }
  get groups() { return this.table('groups', 'moduleGroups', (rows) => new Map(rows.map((g) => [groupKey(g.moduleId, g.groupIndex), g]))); }
  get groupsByModule() { return this.table('groupsByModule', 'moduleGroups', (rows) => grouped(rows, (g) => g.moduleId)); }
  get pointsInUse() { return this.table('pointsInUse', 'dispensers', pointsInUse); }
  get pointDesignations() { return this.table('pointDesignations', 'points', (rows) => rows.map(pointDesignation)); }
  get dispensersByPoint() { return this.table('dispensersByPoint', 'dispensers', (rows) => grouped(rows, (d) => d.pointId)); }
  get dispensersByCircuit() { return this.table('dispensersByCircuit', 'dispensers', (rows) => grouped(rows, (d) => d.circuitId)); }
  get nodesByCircuit() { return this.table('nodesByCircuit', 'cableNodes', (rows) => grouped(rows, (n) => n.circuitId)); }
  get circuitsBySupply() { return this.table('circuitsBySupply', 'circuits', (rows) => grouped(rows, (c) => c.supplyId)); }
  get assignmentsByModule() { return this.table('assignmentsByModule', 'assignments', (rows) => grouped(rows, (a) => a.moduleId)); }
  get control() { return this.signals.control; }
  get status() { return this.signals.status; }
  get repeatedSignals() { return this.signals.repeated; }
  private get signals() { return this.table('signals', 'assignments', signalsOf); }

  private table<C extends Collection, T>(name: string, collection: C, build: (rows: Design[C]) => T): T {
    const kept = this.tables.get(name);
    if (kept) return kept.value as T;
    const rows = this.design[collection];
    const value = build(rows);
    this.tables.set(name, { collection, rows, value });
    return value;
  }
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

/** First assignment of each dispenser and purpose, and the later ones of the same. */
function signalsOf(assignments: readonly Assignment[]) {
  const control = new Map<string, Assignment>();
  const status = new Map<string, Assignment>();
  const tableOf = ({ purpose }: Assignment): Map<string, Assignment> => (purpose === 'control' ? control : status);
  // From the end, so that the first of several is the one that stays.
  for (let i = assignments.length - 1; i >= 0; i--) tableOf(assignments[i]).set(assignments[i].dispenserId, assignments[i]);
  const all = control.size + status.size === assignments.length;
  return { control, status, repeated: all ? [] : assignments.filter((row) => tableOf(row).get(row.dispenserId) !== row) };
}

/** Groups by module after an edit that replaced rows in their places: other modules keep their lists. Null where rows came or went. */
function regrouped(before: DesignIndex['assignmentsByModule'], from: readonly Assignment[], to: readonly Assignment[]): DesignIndex['assignmentsByModule'] | null {
  if (from.length !== to.length) return null;
  const touched = new Set<string>();
  for (let i = 0; i < to.length; i++) if (from[i] !== to[i]) touched.add(from[i].moduleId).add(to[i].moduleId);
  const groups = new Map(before);
  for (const id of touched) groups.delete(id);
  for (const [id, rows] of grouped(to, ({ moduleId }) => (touched.has(moduleId) ? moduleId : null))) groups.set(id, rows);
  return groups;
}

/** Designation of a point; empty without a product aspect of its own: function and location are shared by many. */
export function pointDesignation({ function: aspect, location, product }: Point): string {
  return product ? `${aspect ?? ''}${location ?? ''}${product}` : '';
}

function sameColumn<T>(a: readonly T[], b: readonly T[], of: (row: T) => string): boolean {
  return a.length === b.length && a.every((row, i) => row === b[i] || of(row) === of(b[i]));
}

/** Points with a dispenser, and those with more than one. */
function pointsInUse(dispensers: readonly Dispenser[]): DesignIndex['pointsInUse'] {
  const any = new Set<string>();
  const several = new Set<string>();
  for (const { pointId } of dispensers) {
    const before = any.size;
    any.add(pointId);
    if (any.size === before) several.add(pointId);
  }
  return { any, several };
}
