import type {
  Assignment,
  CableNode,
  Circuit,
  Controller,
  Design,
  Dispenser,
  DispenserType,
  Grease,
  Module,
  ModuleType,
  Point,
  Purpose,
} from '#calc';
import { valuesOfPoint } from './design-values.ts';
import type { ImportValues } from './plan.ts';

/** A module with the type that says how many channels it has and of which kind. */
export interface TypedModule extends Module {
  readonly type: ModuleType;
}

/** Names as they are compared: outer blanks and case do not count, nor the width of letters. */
export function nameKey(name: string): string {
  return name.normalize('NFKC').trim().toLowerCase();
}

/** The direct address of a channel (IEC 61131-3), for instance %QX4.3. */
export function addressOf(module: TypedModule, channel: number): string {
  const byte = module.baseByte + Math.floor(channel / 8);
  return `%${module.type.kind === 'output' ? 'Q' : 'I'}X${byte}.${channel % 8}`;
}

interface Rack {
  readonly modules: TypedModule[];
  readonly byName: NameMap<TypedModule>;
  readonly byByte: Record<ModuleType['kind'], Map<number, TypedModule>>;
}

const KEPT = new WeakMap<Design, DesignIndex>();

/** A design by the names that a list uses. Built once for an import; the design is not changed. */
export class DesignIndex {
  readonly pointByTag: ReadonlyMap<string, Point>;
  readonly dispenserByPoint: ReadonlyMap<string, Dispenser>;
  readonly moduleById: ReadonlyMap<string, TypedModule>;
  readonly typeById: ReadonlyMap<string, DispenserType>;
  readonly controllerById: ReadonlyMap<string, Controller>;
  readonly circuitById: ReadonlyMap<string, Circuit>;
  readonly greaseById: ReadonlyMap<string, Grease>;
  readonly boxById: ReadonlyMap<string, CableNode>;
  private readonly assignments: Readonly<Record<Purpose, Map<string, Assignment>>> = { control: new Map(), status: new Map() };
  private readonly types: NameMap<DispenserType>;
  private readonly controllers: NameMap<Controller>;
  private readonly circuits: NameMap<Circuit>;
  private readonly greases: NameMap<Grease>;
  private readonly boxes: NameMap<CableNode>;
  private readonly racks = new Map<string, Rack>();

  constructor(readonly design: Design) {
    this.pointByTag = new Map(design.points.map((point) => [point.tag, point]));
    this.dispenserByPoint = new Map(design.dispensers.map((each) => [each.pointId, each]));
    for (const each of design.assignments) this.assignments[each.purpose].set(each.dispenserId, each);
    this.typeById = byId(design.dispenserTypes);
    this.controllerById = byId(design.controllers);
    this.circuitById = byId(design.circuits);
    this.greaseById = byId(design.greases);
    this.boxById = byId(design.cableNodes);
    const byVersion = [...design.dispenserTypes].sort((a, b) => b.typeVersion - a.typeVersion);
    this.types = new NameMap(byVersion, ({ name }) => name);
    this.controllers = new NameMap(design.controllers, ({ name }) => name);
    this.circuits = new NameMap(design.circuits, ({ name }) => name);
    this.greases = new NameMap(design.greases, ({ name }) => name);
    this.boxes = new NameMap(design.cableNodes, ({ location }) => location);
    const moduleTypes = byId(design.moduleTypes);
    this.moduleById = byId(design.modules.map((each) => ({ ...each, type: moduleTypes.get(each.typeId)! })));
    for (const each of this.moduleById.values()) this.mount(each);
  }

  /** The index of this very design, made once. */
  static of(design: Design): DesignIndex {
    let index = KEPT.get(design);
    if (!index) KEPT.set(design, (index = new DesignIndex(design)));
    return index;
  }

  /** The dispenser type of this name; of several versions the newest. */
  typeNamed(name: string): DispenserType | undefined {
    return this.types.get(name);
  }

  controllerNamed(name: string): Controller | undefined {
    return this.controllers.get(name);
  }

  circuitNamed(name: string): Circuit | undefined {
    return this.circuits.get(name);
  }

  greaseNamed(name: string): Grease | undefined {
    return this.greases.get(name);
  }

  /** The junction box at this location. */
  boxNamed(location: string): CableNode | undefined {
    return this.boxes.get(location);
  }

  modulesOf(controller: Controller): readonly TypedModule[] {
    return this.racks.get(controller.id)?.modules ?? [];
  }

  /** The module of this name in a controller. */
  moduleNamed(controllerId: string, name: string): TypedModule | undefined {
    return this.racks.get(controllerId)?.byName.get(name);
  }

  /** The module of a controller whose channels cover this byte. */
  moduleAt(controllerId: string, kind: ModuleType['kind'], byte: number): TypedModule | undefined {
    return this.racks.get(controllerId)?.byByte[kind].get(byte);
  }

  assignmentOf(dispenser: Dispenser | undefined, purpose: Purpose): Assignment | undefined {
    return dispenser && this.assignments[purpose].get(dispenser.id);
  }

  /** What the design says of a point, in the words of an import: to compare, and to export. */
  valuesOf(point: Point): ImportValues {
    return valuesOfPoint(point, this);
  }

  private mount(module: TypedModule): void {
    let rack = this.racks.get(module.controllerId);
    if (!rack) {
      rack = { modules: [], byName: new NameMap<TypedModule>([], ({ name }) => name), byByte: { output: new Map(), input: new Map() } };
      this.racks.set(module.controllerId, rack);
    }
    rack.modules.push(module);
    rack.byName.add(module);
    const bytes = rack.byByte[module.type.kind];
    for (let i = 0; i < Math.ceil(module.type.channels / 8); i += 1) {
      if (!bytes.has(module.baseByte + i)) bytes.set(module.baseByte + i, module);
    }
  }
}

/** Rows by name. A name as it stands goes before the same in other case; the first row of each name counts. */
class NameMap<T> {
  private readonly exact = new Map<string, T>();
  private readonly folded = new Map<string, T>();

  constructor(rows: readonly T[], private readonly nameOf: (row: T) => string) {
    for (const row of rows) this.add(row);
  }

  add(row: T): void {
    const name = this.nameOf(row);
    const key = nameKey(name);
    if (!this.exact.has(name)) this.exact.set(name, row);
    if (!this.folded.has(key)) this.folded.set(key, row);
  }

  get(name: string): T | undefined {
    return this.exact.get(name) ?? this.folded.get(nameKey(name));
  }
}

function byId<T extends { readonly id: string }>(rows: readonly T[]): Map<string, T> {
  return new Map(rows.map((row) => [row.id, row]));
}
