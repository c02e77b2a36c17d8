import type { Design, Dispenser, DispenserType } from '#calc';
import { ohmPerMetre } from '#calc';

/**
 * A plain model of one circuit for tests, told apart from the product's own way: it walks currents edge
 * by edge through both trees instead of summing shared resistances.
 */
export interface CircuitModel {
  readonly volts: number;
  readonly upstreamOhm: number;
  /** By box id; the terminals are not in it. */
  readonly edges: ReadonlyMap<string, { readonly parent: string | null; readonly powerOhm: number; readonly signalOhm: number }>;
  readonly lanes: readonly ModelLane[];
}

export interface ModelLane {
  readonly id: string;
  readonly box: string | null;
  readonly fourCore: boolean;
  readonly timed: boolean;
  readonly ownOhm: number;
  /** Drop of the output that drives motor or pulse input, V; 0 while unmapped. */
  readonly outputDropV: number;
  readonly controlA: number;
  /** Motor current at a device voltage, A. */
  readonly motorA: (running: boolean, volts: number) => number;
}

/** Model of the design's one circuit at the voltage temperature. */
export function modelOf(design: Design, volts: number): CircuitModel {
  const [supply] = design.supplies;
  const [circuit] = design.circuits;
  const temperatureC = design.project.voltageTempC;
  const edges = new Map(
    design.cableNodes.map((n) => [n.id, {
      parent: n.parentId,
      powerOhm: n.lengthM * ohmPerMetre(n.powerMm2, n.conductorClass, temperatureC),
      signalOhm: n.lengthM * ohmPerMetre(n.signalMm2, n.conductorClass, temperatureC),
    }]),
  );
  const lanes = design.dispensers.map((d) => modelLane(design, d, temperatureC));
  return { volts: volts - supply.otherLoadA * supply.internalOhm, upstreamOhm: supply.internalOhm + circuit.protectionOhm, edges, lanes };
}

function modelLane(design: Design, d: Dispenser, temperatureC: number): ModelLane {
  const type = design.dispenserTypes.find((t) => t.id === d.typeId)!;
  const control = design.assignments.find((a) => a.dispenserId === d.id && a.purpose === 'control');
  const module = design.modules.find((m) => m.id === control?.moduleId);
  const fourCore = d.wiring === 'four-core';
  return {
    id: d.id,
    box: d.nodeId,
    fourCore,
    timed: d.method === 'timed',
    ownOhm: d.cableLengthM! * ohmPerMetre(d.crossSectionMm2!, d.conductorClass, temperatureC),
    outputDropV: design.moduleTypes.find((t) => t.id === module?.typeId)?.dropV ?? 0,
    controlA: fourCore && d.method === 'pulse' ? (type.controlInputA ?? 0) : 0,
    motorA: (running, volts) => motorA(type, fourCore, running, volts),
  };
}

function motorA(type: DispenserType, fourCore: boolean, running: boolean, volts: number): number {
  const amps = running ? type.runA : fourCore ? type.idleA : 0;
  return type.load === 'constant-power' ? (amps * 24) / volts : amps;
}

/** Voltage at every device while just this set runs, and all on their own clock, V; null: no working point. */
export function solveSubset(model: CircuitModel, running: ReadonlySet<string>): Map<string, number> | null {
  let volts = new Map(model.lanes.map((lane) => [lane.id, model.volts]));
  for (let round = 0; round < 5000; round++) {
    const next = onePass(model, running, volts);
    let moved = 0;
    for (const [id, v] of next) {
      if (!(v > 0)) return null;
      moved = Math.max(moved, Math.abs(v - volts.get(id)!));
    }
    volts = next;
    if (moved < 1e-12) return volts;
  }
  return null;
}

function onePass({ volts, upstreamOhm, edges, lanes }: CircuitModel, running: ReadonlySet<string>, at: ReadonlyMap<string, number>): Map<string, number> {
  const plusA = new Map<string, number>();
  const zeroA = new Map<string, number>();
  let allA = 0;
  const flows = lanes.map((lane) => {
    const runs = running.has(lane.id) || lane.timed;
    const motor = lane.motorA(runs, at.get(lane.id)!);
    const back = motor + (runs ? lane.controlA : 0);
    allA += back;
    for (let box = lane.box; box !== null; box = edges.get(box)!.parent) {
      zeroA.set(box, (zeroA.get(box) ?? 0) + back);
      if (lane.fourCore) plusA.set(box, (plusA.get(box) ?? 0) + motor);
    }
    return { lane, motor, back };
  });
  return new Map(flows.map(({ lane, motor, back }) => {
    let drop = allA * upstreamOhm + lane.ownOhm * (motor + back) + (lane.fourCore ? 0 : lane.outputDropV);
    for (let box = lane.box; box !== null; box = edges.get(box)!.parent) {
      const edge = edges.get(box)!;
      drop += (zeroA.get(box) ?? 0) * edge.powerOhm;
      drop += lane.fourCore ? (plusA.get(box) ?? 0) * edge.powerOhm : motor * edge.signalOhm;
    }
    return [lane.id, volts - drop];
  }));
}
