import { type Currents, fillCurrents, fixedCurrents, motorRunA, noCurrents, total } from './currents.ts';
import { largestPositive } from './largest.ts';
import type { CircuitNetwork } from './network.ts';
import { BOTH, othersV, type StationView, type Upstream, viewStation, ZERO_ONLY } from './station-view.ts';

/** All circuits of one supply, and under which conditions they are looked at. */
export interface SupplyCase {
  readonly networks: readonly CircuitNetwork[];
  /** Voltage of the supply, V. */
  readonly volts: number;
  /** Supply and wiring up to its terminals, Ω. */
  readonly internalOhm: number;
  /** Other standing load of the supply, A. */
  readonly otherLoadA: number;
  /** Most that may run at once, for each network; Infinity: all; 0: each lane alone. */
  readonly limits: readonly number[];
  /** Whether lanes on their own clock count as running. */
  readonly timedRun: boolean;
}

export interface CircuitVoltages {
  /** Lowest voltage at each device while it runs, V; negative or meaningless where collapsed. */
  readonly runV: Float64Array;
  /** Lowest voltage at each device while it idles, V. */
  readonly idleV: Float64Array;
  /** Largest current that each lane can take under these conditions. */
  readonly currents: Currents;
  readonly upstream: Upstream;
  /** No working point: constant-power loads pull the voltage down without limit. */
  readonly collapsed: boolean;
  /** False: a bound that no permitted set can go below, where more than one set is permitted. */
  readonly exact: boolean;
}

const CONVERGED_V = 1e-10;
const MAX_ROUNDS = 2000;

/**
 * Lowest voltage of every lane of a supply, exact over all permitted sets: of the run increments, the
 * lane itself and the k − 1 others with the largest positive ΔI·R_shared while it runs, the k largest
 * others while it idles; idle and timed loads always. Circuits that meet in the supply's internal
 * resistance each contribute their own k largest.
 *
 * Constant power: starts from the no-drop voltage everywhere, takes I = P/V, finds each lane's worst
 * drop, lowers V and repeats. The sequence falls to a limit that no permitted set can go below; it is
 * exact where only one set is possible. A voltage that falls to nothing, or does not come to rest, is
 * reported as collapsed.
 *
 * Time: O(stations × lanes × log k) for each circuit and round.
 */
export function solveVoltages(supply: SupplyCase): CircuitVoltages[] {
  const states = supply.networks.map((network) => newState(network, supply.volts, supply.timedRun));
  const iterate = states.some((state) => state.hasConstantPower);
  for (let round = 0; round < MAX_ROUNDS; round++) {
    for (const state of states) if (state.hasConstantPower) fillCurrents(state.network, state.runV, state.idleV, supply.timedRun, state.currents);
    const moved = lowerVoltages(supply, states);
    if (!iterate || moved < CONVERGED_V) return states.map((state, c) => resultOf(supply, state, c, state.fell));
    // Circuits without a common resistance stand and fall alone.
    if (states.every((state) => state.fell || !state.hasConstantPower)) break;
    if (supply.internalOhm > 0 && states.some((state) => state.fell)) break;
  }
  return states.map((state, c) => resultOf(supply, state, c, supply.internalOhm > 0 || (state.hasConstantPower && state.moved >= CONVERGED_V) || state.fell));
}

interface State {
  readonly network: CircuitNetwork;
  readonly hasConstantPower: boolean;
  readonly runV: Float64Array;
  readonly idleV: Float64Array;
  readonly currents: Currents;
  upstream: Upstream;
  moved: number;
  fell: boolean;
}

function newState(network: CircuitNetwork, volts: number, timedRun: boolean): State {
  const n = network.ids.length;
  return {
    network,
    hasConstantPower: network.hasConstantPower,
    runV: network.outputDropV.map((drop) => volts - drop),
    idleV: new Float64Array(n).fill(volts),
    currents: network.hasConstantPower ? noCurrents(n) : fixedCurrents(network, timedRun),
    upstream: { sharedOhm: 0, otherDropV: 0 },
    moved: 0,
    fell: false,
  };
}

/** One round: every lane's worst drop with the present currents; the largest change of a voltage, V. */
function lowerVoltages(supply: SupplyCase, states: readonly State[]): number {
  const amps = states.map(({ currents }, c) => worstSupplyA(currents, supply.limits[c]));
  const allA = supply.otherLoadA + amps.reduce((sum, a) => sum + a, 0);
  let moved = 0;
  states.forEach((state, c) => {
    if (state.fell) return;
    state.upstream = {
      sharedOhm: supply.internalOhm + state.network.circuit.protectionOhm,
      otherDropV: supply.internalOhm === 0 ? 0 : supply.internalOhm * (allA - amps[c]),
    };
    state.moved = lowerCircuit(state, supply.volts, supply.limits[c]);
    if (state.fell) return;
    moved = Math.max(moved, state.moved);
  });
  return moved;
}

/** Largest current that a circuit can draw from its supply, A. */
function worstSupplyA(currents: Currents, limit: number): number {
  let sum = total(currents.alwaysReturn);
  for (const i of largestPositive(currents.addedSupply, limit)) sum += currents.addedSupply[i];
  return sum;
}

function lowerCircuit(state: State, volts: number, limit: number): number {
  const { network, currents, upstream } = state;
  let moved = 0;
  for (const { station, fourCore, lanes } of network.groups) {
    const at = viewStation(network, currents, station, fourCore ? BOTH : ZERO_ONLY, limit, upstream);
    for (const t of lanes) moved = Math.max(moved, lowerLane(state, at, t, volts, limit));
  }
  return moved;
}

function lowerLane(state: State, at: StationView, t: number, volts: number, limit: number): number {
  const { network, currents, runV, idleV } = state;
  const run = volts - runningDropV(network, at, t, limit) - ownRunDropV(network, currents, t);
  const idle = volts - at.alwaysV - othersV(at, t, limit) - ownIdleDropV(network, currents, t);
  const moved = Math.max(Math.abs(run - runV[t]), Math.abs(idle - idleV[t]));
  runV[t] = run;
  idleV[t] = idle;
  if (network.loads.constantPower[t] && !(run > 0 && idle > 0)) state.fell = true;
  return moved;
}

/** Worst drop at the station while lane t runs, V: a lane on its own clock takes no place in k. */
export function runningDropV({ loads }: CircuitNetwork, at: StationView, t: number, limit: number): number {
  return at.alwaysV + at.addedV[t] + othersV(at, t, othersBeside(loads.timed[t] === 1, limit));
}

/** How many others may run beside a running lane. */
export function othersBeside(timed: boolean, limit: number): number {
  return timed ? limit : Math.max(0, limit - 1);
}

/** Drop on the lane's own conductors and in its output while it runs, V. */
export function ownRunDropV(network: CircuitNetwork, currents: Currents, t: number): number {
  const motorA = motorRunA(network, currents, t);
  const own = network.ownOhm[t];
  // The pulse input's current takes one of the two cores, whichever its polarity.
  if (network.fourCore[t]) return own * (2 * motorA + network.loads.controlA[t]);
  return network.outputDropV[t] + (network.tree.signalOhm[network.station[t]] + 2 * own) * motorA;
}

/**
 * Whether every lane of a circuit without constant power keeps its minimum with another limit; what lies
 * before the circuit stays as it is.
 *
 * @param toleranceV under the minimum, V
 */
export function keepsVoltages(network: CircuitNetwork, upstream: Upstream, volts: number, limit: number, toleranceV: number): boolean {
  const { known, minV } = network;
  const currents = fixedCurrents(network, true);
  for (const { station, fourCore, lanes } of network.groups) {
    const at = viewStation(network, currents, station, fourCore ? BOTH : ZERO_ONLY, limit, upstream);
    for (const t of lanes) {
      if (!known[t]) continue;
      const least = minV[t] - toleranceV;
      if (volts - runningDropV(network, at, t, limit) - ownRunDropV(network, currents, t) < least) return false;
      if (fourCore && volts - at.alwaysV - othersV(at, t, limit) - ownIdleDropV(network, currents, t) < least) return false;
    }
  }
  return true;
}

function ownIdleDropV(network: CircuitNetwork, currents: Currents, t: number): number {
  return network.fourCore[t] ? 2 * network.ownOhm[t] * currents.alwaysReturn[t] : 0;
}

function resultOf(supply: SupplyCase, state: State, c: number, collapsed: boolean): CircuitVoltages {
  const { runV, idleV, currents, upstream, hasConstantPower, network } = state;
  // Without a working point the loads are stated as at the no-drop voltage.
  if (collapsed && hasConstantPower) fillCurrents(network, network.outputDropV.map((drop) => supply.volts - drop), new Float64Array(runV.length).fill(supply.volts), supply.timedRun, currents);
  const coupled = supply.internalOhm > 0 && supply.networks.some((n) => n.hasConstantPower);
  const oneSet = supply.limits.every((k, i) => (coupled || i === c ? k >= supply.networks[i].ids.length : true));
  return { runV, idleV, currents, upstream, collapsed, exact: (!hasConstantPower && !coupled) || oneSet };
}
