import type { CableNode, Circuit, Dispenser } from '../design.ts';
import { type Lane, laneWiring } from '../lane-rows.ts';
import { type BoxTree, buildBoxTree } from './box-tree.ts';
import { ohmPerMetre } from './conductor.ts';
import type { Currents } from './currents.ts';
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
  /** All columns below follow this order. */
  readonly lanes: readonly Lane[];
  /** Their dispensers' ids. */
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
  /** Lanes by the station where their own cable begins, four-core and two-core apart. */
  readonly groups: readonly StationGroup[];
  readonly hasConstantPower: boolean;
  /** Currents of a circuit without constant power, with and without the lanes on their own clock, once somebody has asked for them. */
  readonly fixedCurrents: { timed: Currents | null; resting: Currents | null };
}

/** Lanes that see the same drop before their own cables. */
export interface StationGroup {
  readonly station: number;
  readonly fourCore: boolean;
  readonly lanes: readonly number[];
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
export function buildNetwork(circuit: Circuit, nodes: readonly CableNode[], lanes: readonly Lane[], temperatureC: number): CircuitNetwork {
  const columns = emptyColumns(circuit, buildBoxTree(nodes, temperatureC), lanes);
  lanes.forEach((lane, i) => {
    placeLane(columns, lane, i, temperatureC);
    loadLane(columns, lane, i);
  });
  const hasConstantPower = columns.loads.constantPower.includes(1);
  return { ...columns, groups: stationGroups(columns), hasConstantPower, fixedCurrents: { timed: null, resting: null } };
}

type Columns = Omit<CircuitNetwork, 'groups' | 'hasConstantPower' | 'fixedCurrents'>;

function emptyColumns(circuit: Circuit, tree: BoxTree, lanes: readonly Lane[]): Columns {
  const n = lanes.length;
  return {
    circuit,
    tree,
    lanes,
    ids: lanes.map((lane) => lane.dispenser.id),
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

function placeLane(network: Columns, lane: Lane, i: number, temperatureC: number): void {
  const { tree } = network;
  const { dispenser } = lane;
  const station = dispenser.nodeId === null ? 0 : tree.stationOf.get(dispenser.nodeId);
  const ohm = ownCoreOhm(dispenser, temperatureC);
  network.station[i] = station ?? 0;
  network.ownOhm[i] = ohm ?? 0;
  network.ownMetres[i] = dispenser.cableLengthM ?? 0;
  network.known[i] =
    station !== undefined && tree.known[station] && ohm !== null && dispenser.typeId !== null && laneWiring(lane) ? 1 : 0;
}

function loadLane({ loads, fourCore, minV, outputDropV, known }: Columns, lane: Lane, i: number): void {
  const { type, dispenser } = lane;
  if (!type) {
    known[i] = 0;
    return;
  }
  const fixedPower = type.load === 'constant-power';
  const factor = fixedPower ? NOMINAL_V : 1;
  fourCore[i] = laneWiring(lane) === 'four-core' ? 1 : 0;
  loads.constantPower[i] = fixedPower ? 1 : 0;
  loads.timed[i] = dispenser.method === 'timed' ? 1 : 0;
  loads.idle[i] = fourCore[i] ? type.idleA * factor : 0;
  loads.run[i] = type.runA * factor;
  loads.controlA[i] = fourCore[i] && !loads.timed[i] ? (type.controlInputA ?? 0) : 0;
  minV[i] = type.minV;
  const output = lane.output?.type;
  loads.pulseOnPlus[i] = pulsePolarity(type, output) === 'sinking' ? 1 : 0;
  if (!fourCore[i]) outputDropV[i] = output?.dropV ?? 0;
}

function stationGroups({ station, fourCore, tree }: Columns): StationGroup[] {
  const groups: (StationGroup & { lanes: number[] })[] = [];
  // Two places a station: two-core, four-core.
  const at = new Int32Array(2 * tree.parent.length).fill(-1);
  for (let i = 0; i < station.length; i++) {
    const key = 2 * station[i] + fourCore[i];
    if (at[key] < 0) at[key] = groups.push({ station: station[i], fourCore: fourCore[i] === 1, lanes: [] }) - 1;
    groups[at[key]].lanes.push(i);
  }
  return groups;
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
