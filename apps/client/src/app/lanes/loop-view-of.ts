import { type Assessment, type Circuit, type Design, type Dispenser, type DispenserType, type LaneFigures, type Point, type Wiring, wiringBy } from '#calc';
import type { LoopBox, LoopChannel, LoopProfile, LoopSupply, LoopView } from '../shared/lane/loop-view';

/** What belongs to one lane, looked up once. */
export interface LaneRows {
  readonly dispenser: Dispenser;
  readonly point: Point;
  readonly type: DispenserType | null;
  readonly wiring: Wiring | null;
  readonly circuit: Circuit | null;
  readonly figures: LaneFigures | null;
}

export function laneRowsOf(design: Design, assessment: Assessment, dispenserId: string): LaneRows | null {
  const dispenser = design.dispensers.find((d) => d.id === dispenserId);
  const point = design.points.find((p) => p.id === dispenser?.pointId);
  if (!dispenser || !point) return null;
  const type = design.dispenserTypes.find((t) => t.id === dispenser.typeId) ?? null;
  return {
    dispenser, point, type,
    wiring: wiringBy(dispenser, type),
    circuit: design.circuits.find((c) => c.id === dispenser.circuitId) ?? null,
    figures: assessment.lanes.get(dispenserId) ?? null,
  };
}

/** The loop diagram of a lane; null while its wiring is not chosen. */
export function loopViewOf(design: Design, assessment: Assessment, rows: LaneRows): LoopView | null {
  const { dispenser, point, type, figures } = rows;
  const wiring = rows.wiring;
  if (!wiring) return null;
  const output = channelOf(design, dispenser.id, 'control', figures?.outputAddress);
  const status = channelOf(design, dispenser.id, 'status', figures?.statusAddress);
  return {
    tag: point.tag, wiring, output, status,
    state: (dispenser.method === 'timed' ? status : output) ? 'mapped' : 'unmapped',
    supply: supplyOf(design, assessment, rows),
    boxes: boxesOf(design, dispenser.nodeId),
    cable: { tag: dispenser.cableTag, lengthM: dispenser.cableLengthM, sectionMm2: dispenser.crossSectionMm2 },
    dispenser: {
      name: [point.function, point.product].filter(Boolean).join('') || (type?.name ?? ''),
      doseUl: dispenser.doseUl, runA: type?.runA ?? null, runMs: figures?.plan?.runMs ?? null, idleA: type?.idleA ?? null,
      cartridgeUl: dispenser.cartridgeUl, pins: type?.pins ?? {},
    },
    point: { tag: point.tag, description: point.description, demandUlPer1000h: assessment.points.get(point.id)?.demandUlPer1000h ?? null },
    profile: profileOf(design, rows),
  };
}

function channelOf(design: Design, dispenserId: string, purpose: 'control' | 'status', address: string | null | undefined): LoopChannel | null {
  const assignment = design.assignments.find((a) => a.dispenserId === dispenserId && a.purpose === purpose);
  const module = design.modules.find((m) => m.id === assignment?.moduleId);
  return module && address ? { module: module.name, address } : null;
}

function supplyOf(design: Design, assessment: Assessment, { circuit, dispenser }: LaneRows): LoopSupply {
  const supply = design.supplies.find((s) => s.id === circuit?.supplyId);
  const controller = design.controllers.find((c) => c.id === dispenser.controllerId);
  const cabinet = design.cabinets.find((c) => c.id === (supply?.cabinetId ?? controller?.cabinetId));
  return {
    cabinet: cabinet?.location ?? 'no cabinet',
    name: supply?.name ?? null, setV: supply?.setV ?? null,
    circuit: circuit?.name ?? null, protection: circuit && protectionText(circuit),
    protectionFails: assessment.findings.some((f) => f.severity === 'error' && f.code.startsWith('PR') && f.subject.id === circuit?.id),
  };
}

/** Rating and characteristic, as it stands on the device. */
export const protectionText = (circuit: Circuit): string => {
  const kinds: Readonly<Record<Circuit['protection'], string>> = {
    'breaker-B': 'breaker B', 'breaker-C': 'breaker C', electronic: 'electronic', fuse: 'fuse',
  };
  return `${circuit.protectionA} A, ${kinds[circuit.protection]}`;
};

/** Boxes from the cabinet to the one where the lane's own cable begins. */
function boxesOf(design: Design, nodeId: string | null): readonly LoopBox[] {
  const nodes = new Map(design.cableNodes.map((n) => [n.id, n]));
  const path: LoopBox[] = [];
  for (let node = nodes.get(nodeId ?? ''); node && path.length < nodes.size; node = nodes.get(node.parentId ?? '')) path.unshift(node);
  return path;
}

function profileOf(design: Design, { dispenser, figures }: LaneRows): LoopProfile | null {
  if (!figures?.worst || figures.profile.length === 0) return null;
  const points = new Map(design.points.map((p) => [p.id, p.tag]));
  const tags = new Map(design.dispensers.map((d) => [d.id, points.get(d.pointId) ?? '']));
  const set = figures.worst.worstSet.map((id) => tags.get(id) ?? '');
  const shown = set.length > 4 ? `${set.slice(0, 4).join(', ')} and ${set.length - 4} more` : set.join(', ');
  return {
    stations: figures.profile, minV: figures.minV,
    worstSet: set.length === 1 ? 'running alone' : `worst set of ${set.length}: ${shown}`,
    allOnV: figures.allOn?.volts ?? null,
    allOnCount: design.dispensers.filter((d) => d.circuitId === dispenser.circuitId).length,
  };
}
