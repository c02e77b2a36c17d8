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
import type { DraftValues, ImportValues } from './plan.ts';

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

/** A design by the names that a list uses. Built once for an import; the design is not changed. */
export class DesignIndex {
  readonly pointByTag: ReadonlyMap<string, Point>;
  readonly dispenserByPoint: ReadonlyMap<string, Dispenser>;
  readonly moduleById: ReadonlyMap<string, TypedModule>;
  private readonly assignmentByUse: ReadonlyMap<string, Assignment>;
  private readonly types: ReadonlyMap<string, DispenserType>;
  private readonly controllers: ReadonlyMap<string, Controller>;
  private readonly circuits: ReadonlyMap<string, Circuit>;
  private readonly greases: ReadonlyMap<string, Grease>;
  private readonly boxes: ReadonlyMap<string, CableNode>;
  private readonly boxById: ReadonlyMap<string, CableNode>;
  private readonly modulesByController = new Map<string, TypedModule[]>();

  constructor(readonly design: Design) {
    const types = new Map(design.moduleTypes.map((type) => [type.id, type]));
    this.pointByTag = new Map(design.points.map((point) => [point.tag, point]));
    this.dispenserByPoint = new Map(design.dispensers.map((each) => [each.pointId, each]));
    this.moduleById = new Map(design.modules.map((each) => [each.id, { ...each, type: types.get(each.typeId)! }]));
    this.assignmentByUse = new Map(design.assignments.map((each) => [`${each.dispenserId} ${each.purpose}`, each]));
    const byVersion = [...design.dispenserTypes].sort((a, b) => b.typeVersion - a.typeVersion);
    this.types = byName(byVersion, ({ name }) => name);
    this.controllers = byName(design.controllers, ({ name }) => name);
    this.circuits = byName(design.circuits, ({ name }) => name);
    this.greases = byName(design.greases, ({ name }) => name);
    this.boxes = byName(design.cableNodes, ({ location }) => location);
    this.boxById = new Map(design.cableNodes.map((each) => [each.id, each]));
    for (const each of this.moduleById.values()) {
      this.modulesByController.set(each.controllerId, [
        ...(this.modulesByController.get(each.controllerId) ?? []),
        each,
      ]);
    }
  }

  /** The dispenser type of this name; of several versions the newest. */
  typeNamed(name: string): DispenserType | undefined {
    return this.types.get(nameKey(name));
  }

  controllerNamed(name: string): Controller | undefined {
    return this.controllers.get(nameKey(name));
  }

  circuitNamed(name: string): Circuit | undefined {
    return this.circuits.get(nameKey(name));
  }

  greaseNamed(name: string): Grease | undefined {
    return this.greases.get(nameKey(name));
  }

  /** The junction box at this location. */
  boxNamed(location: string): CableNode | undefined {
    return this.boxes.get(nameKey(location));
  }

  modulesOf(controller: Controller): readonly TypedModule[] {
    return this.modulesByController.get(controller.id) ?? [];
  }

  assignmentOf(dispenser: Dispenser | undefined, purpose: Purpose): Assignment | undefined {
    return dispenser && this.assignmentByUse.get(`${dispenser.id} ${purpose}`);
  }

  /** What the design says of a point, in the words of an import: to compare, and to export. */
  valuesOf(point: Point): ImportValues {
    const dispenser = this.dispenserByPoint.get(point.id);
    return { ...blankValues(), ...this.pointValues(point), ...(dispenser && this.dispenserValues(dispenser)) };
  }

  private pointValues(point: Point): Partial<DraftValues> {
    const per100h = demandPer100h(point);
    const { tag, description, location, product, machine, remarks, daysPerWeek } = point;
    const { boreMm, outsideMm, widthMm, speedRpm, hoursPerDay } = point;
    return {
      tag,
      description,
      function: point.function,
      location,
      product,
      machine,
      remarks,
      boreMm,
      outsideMm,
      widthMm,
      speedRpm,
      hoursPerDay,
      daysPerWeek,
      demandUlPer100h: per100h,
      demandUlPer1000h: per100h === null ? null : point.statedPer === '1000h' ? point.statedUl : per100h * 10,
      grease: nameById(this.design.greases, point.greaseId),
    };
  }

  private dispenserValues(dispenser: Dispenser): Partial<DraftValues> {
    const { cartridgeUl, doseUl, wiring, cableTag, cableLengthM, crossSectionMm2 } = dispenser;
    const output = this.channelOf(this.assignmentOf(dispenser, 'control'));
    const status = this.channelOf(this.assignmentOf(dispenser, 'status'));
    return {
      cartridgeUl,
      doseUl,
      wiring,
      cableTag,
      cableLengthM,
      crossSectionMm2,
      dispenserType: nameById(this.design.dispenserTypes, dispenser.typeId),
      controller: nameById(this.design.controllers, dispenser.controllerId),
      circuit: nameById(this.design.circuits, dispenser.circuitId),
      junctionBox: (dispenser.nodeId && this.boxById.get(dispenser.nodeId)?.location) ?? null,
      outputModule: output.module,
      outputChannel: output.channel,
      outputAddress: output.address,
      statusModule: status.module,
      statusChannel: status.channel,
      statusAddress: status.address,
    };
  }

  private channelOf(assignment: Assignment | undefined): NamedChannel {
    const module = assignment && this.moduleById.get(assignment.moduleId);
    if (!module) return { module: null, channel: null, address: null };
    return { module: module.name, channel: assignment.channel, address: addressOf(module, assignment.channel) };
  }
}

/** The first row of each name counts. */
function byName<T>(rows: readonly T[], nameOf: (row: T) => string): Map<string, T> {
  return new Map([...rows].reverse().map((row) => [nameKey(nameOf(row)), row]));
}

interface NamedChannel {
  readonly module: string | null;
  readonly channel: number | null;
  readonly address: string | null;
}

function demandPer100h({ statedUl, statedPer }: Point): number | null {
  if (statedUl === null) return null;
  if (statedPer === '100h') return statedUl;
  return statedPer === '1000h' ? statedUl / 10 : null;
}

function nameById(rows: readonly { readonly id: string; readonly name: string }[], id: string | null): string | null {
  return id === null ? null : (rows.find((each) => each.id === id)?.name ?? null);
}

/** Values of which nothing is said yet. */
export function blankValues(): DraftValues {
  return {
    tag: null,
    description: null,
    function: null,
    location: null,
    product: null,
    machine: null,
    boreMm: null,
    outsideMm: null,
    widthMm: null,
    speedRpm: null,
    hoursPerDay: null,
    daysPerWeek: null,
    demandUlPer100h: null,
    demandUlPer1000h: null,
    grease: null,
    dispenserType: null,
    cartridgeUl: null,
    doseUl: null,
    wiring: null,
    controller: null,
    outputModule: null,
    outputChannel: null,
    outputAddress: null,
    statusModule: null,
    statusChannel: null,
    statusAddress: null,
    junctionBox: null,
    cableTag: null,
    cableLengthM: null,
    crossSectionMm2: null,
    circuit: null,
    remarks: null,
  };
}
