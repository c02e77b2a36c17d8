import { motorRunA } from '../wiring/currents.ts';
import type { CircuitNetwork } from '../wiring/network.ts';
import type { SolvedSupply } from '../wiring/supply-network.ts';
import type { CircuitVoltages } from '../wiring/worst-case.ts';
import { circuitLoads, standingA } from './circuit-load.ts';
import { type LimitOf, sumLoads, worstSum } from './load-sum.ts';
import type { RatedSum } from './loads.ts';
import type { SupplyLoad } from './supply-load.ts';

/** What a limit k of one circuit is tried against; the other circuits keep theirs. */
export interface LimitTrial {
  readonly solved: SolvedSupply;
  /** Place of the circuit on its supply. */
  readonly at: number;
  /** Groups and modules that limit something, by the circuits whose lanes load them. */
  readonly rated: ReadonlyMap<string, readonly RatedSum[]>;
  readonly load: SupplyLoad;
  /** Load that the supply may carry before the margin, A. */
  readonly supplyMayA: number;
  readonly limitOf: LimitOf;
}

/** Tolerance against binary noise, V and A. */
export const TOLERANCE = 1e-9;

/** Something that does not pass with a k that is tried. */
export interface Fault {
  readonly key: string;
  /** On the circuit itself, in a group or module of its lanes, or on its supply. */
  readonly own: boolean;
}

/** Lanes whose voltage is under their minimum, by place; a four-core lane may fail running, idle, or both, each a fault of its own. */
export function failingLanes({ known, fourCore, minV }: CircuitNetwork, { runV, idleV }: CircuitVoltages): { readonly lane: number; readonly idle: boolean }[] {
  const failing: { lane: number; idle: boolean }[] = [];
  for (let lane = 0; lane < runV.length; lane++) {
    if (!known[lane]) continue;
    if (runV[lane] < minV[lane] - TOLERANCE) failing.push({ lane, idle: false });
    if (fourCore[lane] && idleV[lane] < minV[lane] - TOLERANCE) failing.push({ lane, idle: true });
  }
  return failing;
}

/** Finds all that does not pass on a supply solved with a k, the loads taken from the currents so solved. */
export function faultFinder(trial: LimitTrial): (voltages: readonly CircuitVoltages[], k: number) => Fault[] {
  const { solved: { rows: { supply }, circuits }, at, supplyMayA } = trial;
  const networks = circuits.map(({ network }) => network);
  const { circuit } = networks[at];
  const places = placesOf(trial, networks);
  return (voltages, k) => {
    const limits: LimitOf = (id) => (id === circuit.id ? k : trial.limitOf(id));
    const faults: Fault[] = [];
    let supplyA = supply.otherLoadA;
    networks.forEach((network, c) => {
      const { currents, collapsed } = voltages[c];
      const amps = standingA(currents) + worstSum(sumLoads(circuitLoads(network, currents)), limits);
      supplyA += amps;
      const fault = (what: string): number => faults.push({ key: `${what} ${c}`, own: c === at });
      if (collapsed) fault('collapse');
      else for (const { lane, idle } of failingLanes(network, voltages[c])) fault(`lane ${lane} ${idle ? 'idle' : 'running'}`);
      if (amps > network.circuit.protectionA + TOLERANCE) fault('protection');
    });
    if (supplyA > supplyMayA + TOLERANCE) faults.push({ key: 'supply', own: true });
    const motors = motorCurrents(networks, voltages);
    places.forEach(({ loads, sum, ratingA }, i) => {
      const now = sumLoads(loads.map((load) => ({ ...load, amps: motors.get(load.id) ?? load.amps })));
      if (worstSum(now, limits) > ratingA + TOLERANCE) faults.push({ key: `place ${i}`, own: sum.parts.some((part) => part.circuitId === circuit.id) });
    });
    return faults;
  };
}

/** Every rated group and module with a lane of a circuit on the supply, each once. */
function placesOf({ rated }: LimitTrial, networks: readonly CircuitNetwork[]): RatedSum[] {
  return [...new Set(networks.flatMap(({ circuit }) => rated.get(circuit.id) ?? []))];
}

/** Currents of the motors that outputs drive directly, by dispenser; a four-core lane loads its output with its pulse input alone. */
function motorCurrents(networks: readonly CircuitNetwork[], voltages: readonly CircuitVoltages[]): Map<string, number> {
  const amps = new Map<string, number>();
  networks.forEach((network, c) => {
    network.ids.forEach((id, i) => {
      if (!network.fourCore[i]) amps.set(id, motorRunA(network, voltages[c].currents, i));
    });
  });
  return amps;
}
