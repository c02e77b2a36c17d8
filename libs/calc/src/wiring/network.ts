import type { Circuit, Dispenser } from '../design.ts';
import { type DesignIndex, moduleTypeOf, typeOf, wiringOf } from '../design-index.ts';
import { type BoxTree, buildBoxTree } from './box-tree.ts';
import { ohmPerMetre } from './conductor.ts';
import { pulsePolarity } from './signals.ts';

/**
 * A circuit as two trees. Everybody shares the supply's internal resistance and the protection. A
 * four-core lane takes +24 V from the trunk's power pair and then its own cable's core; a two-core lane
 * goes out on its own core of the signal multicore and its own cable, both unshared, after the output's
 * own voltage drop. Both return over their own cable's core and the shared 0 V of the power pair. Lanes
 * are columns, so that ten thousand cost no objects.
 */
export interface CircuitNetwork {
  readonly circuit: Circuit;
  readonly tree: BoxTree;
  /** Dispenser ids; all columns below follow this order. */
  readonly ids: readonly string[];
  readonly station: Int32Array;
  /** 1: four-core. */
  readonly fourCore: Uint8Array;
  /** One core of the lane's own cable, Ω; 0 where unknown. */
  readonly ownOhm: Float64Array;
  readonly ownMetres: Float64Array;
  /** Voltage lost in the output of a two-core lane, V; 0 for four-core and while unmapped. */
  readonly outputDropV: Float64Array;
  /** 0 where type, wiring, cable or a trunk on the way is unknown: then the lane has no voltage figure. */
  readonly known: Uint8Array;
  readonly minV: Float64Array;
  readonly loads: LaneLoads;
}

/** What the lanes draw, as columns: A for constant current, W for constant power. */
export interface LaneLoads {
  readonly constantPower: Uint8Array;
  /** Runs on its own clock: obeys no limit, counts always as running. */
  readonly timed: Uint8Array;
  readonly idle: Float64Array;
  readonly run: Float64Array;
  /** Through the pulse input while the output is on, A. */
  readonly controlA: Float64Array;
  /** 1: a sinking output draws that current from the device's +24 V; 0: a sourcing one returns it on 0 V. */
  readonly pulseOnPlus: Uint8Array;
}

/** Voltage at which a type's currents are stated. */
export const NOMINAL_V = 24;

/**
 * Builds the network of one circuit at a conductor temperature. Lanes whose type is unknown draw
 * nothing here; lanes with an unknown cable draw their current where their own cable begins.
 *
 * The pulse of a four-core lane (`controlInputA`) is counted with its run, since every run begins with
 * one. A type's run current is taken as the whole current while it runs, its standing current as
 * including what its status output delivers.
 */
export function buildNetwork(index: DesignIndex, circuit: Circuit, temperatureC: number): CircuitNetwork {
  const dispensers = index.dispensersByCircuit.get(circuit.id) ?? [];
  const tree = buildBoxTree(index.nodesByCircuit.get(circuit.id) ?? [], temperatureC);
  const network = emptyNetwork(circuit, tree, dispensers);
  dispensers.forEach((dispenser, i) => {
    placeLane(network, index, dispenser, i, temperatureC);
    loadLane(network, index, dispenser, i);
  });
  return network;
}

function emptyNetwork(circuit: Circuit, tree: BoxTree, dispensers: readonly Dispenser[]): CircuitNetwork {
  const n = dispensers.length;
  return {
    circuit,
    tree,
    ids: dispensers.map((d) => d.id),
    station: new Int32Array(n),
    fourCore: new Uint8Array(n),
    ownOhm: new Float64Array(n),
    ownMetres: new Float64Array(n),
    outputDropV: new Float64Array(n),
    known: new Uint8Array(n),
    minV: new Float64Array(n),
    loads: {
      constantPower: new Uint8Array(n),
      timed: new Uint8Array(n),
      idle: new Float64Array(n),
      run: new Float64Array(n),
      controlA: new Float64Array(n),
      pulseOnPlus: new Uint8Array(n),
    },
  };
}

function placeLane(network: CircuitNetwork, index: DesignIndex, dispenser: Dispenser, i: number, temperatureC: number): void {
  const { tree } = network;
  const station = dispenser.nodeId === null ? 0 : tree.stationOf.get(dispenser.nodeId);
  const ohm = ownCoreOhm(dispenser, temperatureC);
  network.station[i] = station ?? 0;
  network.ownOhm[i] = ohm ?? 0;
  network.ownMetres[i] = dispenser.cableLengthM ?? 0;
  network.known[i] =
    station !== undefined && tree.known[station] && ohm !== null && dispenser.typeId !== null && wiringOf(index, dispenser) ? 1 : 0;
}

function loadLane({ loads, fourCore, minV, outputDropV, known }: CircuitNetwork, index: DesignIndex, dispenser: Dispenser, i: number): void {
  const type = typeOf(index, dispenser);
  if (!type) {
    known[i] = 0;
    return;
  }
  const fixedPower = type.load === 'constant-power';
  const factor = fixedPower ? NOMINAL_V : 1;
  fourCore[i] = wiringOf(index, dispenser) === 'four-core' ? 1 : 0;
  loads.constantPower[i] = fixedPower ? 1 : 0;
  loads.timed[i] = dispenser.method === 'timed' ? 1 : 0;
  loads.idle[i] = fourCore[i] ? type.idleA * factor : 0;
  loads.run[i] = type.runA * factor;
  loads.controlA[i] = fourCore[i] && !loads.timed[i] ? (type.controlInputA ?? 0) : 0;
  minV[i] = type.minV;
  const control = index.control.get(dispenser.id);
  const output = control && moduleTypeOf(index, control.moduleId);
  loads.pulseOnPlus[i] = pulsePolarity(type, output) === 'sinking' ? 1 : 0;
  if (!fourCore[i]) outputDropV[i] = output?.dropV ?? 0;
}

/** One core of the dispenser's own cable, Ω; null while length or section is unknown or not in the tables. */
export function ownCoreOhm(
  dispenser: Pick<Dispenser, 'cableLengthM' | 'crossSectionMm2' | 'conductorClass'>,
  temperatureC: number,
): number | null {
  if (dispenser.cableLengthM === null || dispenser.crossSectionMm2 === null) return null;
  try {
    return dispenser.cableLengthM * ohmPerMetre(dispenser.crossSectionMm2, dispenser.conductorClass, temperatureC);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
