import type { Assessment, Assignment, Cabinet, Circuit, CableNode, Controller, Design, Dispenser, DispenserType, Finding, Grease, LaneFigures, Module, ModuleType, Point } from '#calc';
import { naturalCompare } from './order.ts';

/** A channel that a dispenser's signal is mapped to. */
export interface MappedChannel {
  readonly module: Module;
  readonly channel: number;
  readonly address: string | null;
}

/** One point with everything that its line in a list may say. */
export interface Lane {
  readonly point: Point;
  readonly dispenser: Dispenser | null;
  readonly type: DispenserType | null;
  readonly grease: Grease | null;
  readonly circuit: Circuit | null;
  readonly box: CableNode | null;
  readonly controller: Controller | null;
  readonly cabinet: Cabinet | null;
  readonly output: MappedChannel | null;
  readonly status: MappedChannel | null;
  readonly demandUlPer1000h: number | null;
  readonly figures: LaneFigures | null;
  readonly findings: readonly Finding[];
}

/** The hardware of a design by id, and what is mapped to each module. */
export interface Hardware {
  readonly cabinets: ReadonlyMap<string, Cabinet>;
  readonly controllers: ReadonlyMap<string, Controller>;
  readonly modules: ReadonlyMap<string, Module>;
  readonly moduleTypes: ReadonlyMap<string, ModuleType>;
}

/** Every point of a design as a lane, in the order of the list: by cabinet, controller, module and channel; then what is unmapped, by tag. */
export function lanesInOrder(design: Design, assessment: Assessment): Lane[] {
  const hardware = hardwareOf(design);
  const find = finder(design, hardware, assessment);
  return design.points.map(find).sort(compareLanes);
}

/** The hardware of a design by id. */
export function hardwareOf(design: Design): Hardware {
  return {
    cabinets: byId(design.cabinets),
    controllers: byId(design.controllers),
    modules: byId(design.modules),
    moduleTypes: byId(design.moduleTypes),
  };
}

function finder(design: Design, hardware: Hardware, assessment: Assessment): (point: Point) => Lane {
  const types = byId(design.dispenserTypes);
  const greases = byId(design.greases);
  const circuits = byId(design.circuits);
  const boxes = byId(design.cableNodes);
  const dispensers = new Map(design.dispensers.map((each) => [each.pointId, each]));
  const signals = new Map(design.assignments.map((each) => [`${each.dispenserId} ${each.purpose}`, each]));
  return (point) => {
    const dispenser = dispensers.get(point.id) ?? null;
    const figures = (dispenser && assessment.lanes.get(dispenser.id)) ?? null;
    const mapped = (purpose: Assignment['purpose'], address: string | null) =>
      dispenser ? channelOf(signals.get(`${dispenser.id} ${purpose}`), hardware, address) : null;
    const output = mapped('control', figures?.outputAddress ?? null);
    const status = mapped('status', figures?.statusAddress ?? null);
    // Where it is mapped goes before where it belongs: module names and addresses are the controller's own.
    const controller = lookUp(hardware.controllers, (output ?? status)?.module.controllerId ?? dispenser?.controllerId);
    return {
      point, dispenser, controller, output, status, figures,
      type: lookUp(types, dispenser?.typeId),
      grease: lookUp(greases, point.greaseId),
      circuit: lookUp(circuits, dispenser?.circuitId),
      box: lookUp(boxes, dispenser?.nodeId),
      cabinet: lookUp(hardware.cabinets, controller?.cabinetId),
      demandUlPer1000h: assessment.points.get(point.id)?.demandUlPer1000h ?? null,
      findings: (dispenser && assessment.findingsByLane.get(dispenser.id)) ?? [],
    };
  };
}

function channelOf(assignment: Assignment | undefined, { modules }: Hardware, address: string | null): MappedChannel | null {
  const module = assignment && modules.get(assignment.moduleId);
  return module ? { module, channel: assignment.channel, address } : null;
}

function compareLanes(a: Lane, b: Lane): number {
  return (
    compareNames(a.cabinet?.location, b.cabinet?.location) ||
    compareNames(a.controller?.name, b.controller?.name) ||
    compareChannels(a.output, b.output) ||
    compareChannels(a.status, b.status) ||
    naturalCompare(a.point.tag, b.point.tag)
  );
}

/** What has no name comes last. */
function compareNames(a: string | undefined, b: string | undefined): number {
  if (a === undefined || b === undefined) return Number(a === undefined) - Number(b === undefined);
  return naturalCompare(a, b);
}

function compareChannels(a: MappedChannel | null, b: MappedChannel | null): number {
  if (!a || !b) return Number(!a) - Number(!b);
  return a.module.slot - b.module.slot || naturalCompare(a.module.name, b.module.name) || a.channel - b.channel;
}

function lookUp<T>(rows: ReadonlyMap<string, T>, id: string | null | undefined): T | null {
  return (id && rows.get(id)) || null;
}

function byId<T extends { readonly id: string }>(rows: readonly T[]): Map<string, T> {
  return new Map(rows.map((row) => [row.id, row]));
}
