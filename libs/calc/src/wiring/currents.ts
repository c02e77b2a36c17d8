import type { CircuitNetwork } from './network.ts';

/** Currents of a circuit's lanes as columns, A: what always flows, and what running adds. */
export interface Currents {
  /** Over the shared +24 V conductor of the trunk. */
  readonly alwaysOut: Float64Array;
  /** Over the shared 0 V conductor, and so through protection and supply. */
  readonly alwaysReturn: Float64Array;
  readonly addedOut: Float64Array;
  readonly addedReturn: Float64Array;
  /** Through protection and supply: what running adds, with the pulse input's current whichever conductor it takes. */
  readonly addedSupply: Float64Array;
}

/** Constant currents ask for none. */
const NO_VOLTAGES = new Float64Array(0);

export function noCurrents(size: number): Currents {
  return {
    alwaysOut: new Float64Array(size),
    alwaysReturn: new Float64Array(size),
    addedOut: new Float64Array(size),
    addedReturn: new Float64Array(size),
    addedSupply: new Float64Array(size),
  };
}

/**
 * Fills the currents that flow at the given device voltages, V: constant loads as stated, constant
 * power as I = P/V. Lanes on their own clock always flow in full where `timedRun` holds. The current of
 * the pulse input returns on 0 V with a sourcing output and comes over +24 V with a sinking one.
 */
export function fillCurrents(network: CircuitNetwork, runV: Float64Array, idleV: Float64Array, timedRun: boolean, into: Currents): void {
  const { fourCore, loads } = network;
  for (let i = 0; i < fourCore.length; i++) {
    const idleA = loads.constantPower[i] ? loads.idle[i] / idleV[i] : loads.idle[i];
    const runA = loads.constantPower[i] ? loads.run[i] / runV[i] : loads.run[i];
    const alwaysRuns = loads.timed[i] === 1 && timedRun;
    const always = alwaysRuns ? Math.max(runA, idleA) : idleA;
    const added = alwaysRuns ? 0 : runA - idleA;
    into.alwaysOut[i] = fourCore[i] ? always : 0;
    into.alwaysReturn[i] = always;
    into.addedOut[i] = fourCore[i] ? added + (loads.pulseOnPlus[i] ? loads.controlA[i] : 0) : 0;
    into.addedReturn[i] = added + (loads.pulseOnPlus[i] ? 0 : loads.controlA[i]);
    into.addedSupply[i] = added + loads.controlA[i];
  }
}

/**
 * The currents of a circuit that has no constant power on it: they hang on no voltage, so every way of
 * looking at the circuit shares them.
 */
export function fixedCurrents(network: CircuitNetwork, timedRun: boolean): Currents {
  const key = timedRun ? 'timed' : 'resting';
  const kept = network.fixedCurrents[key];
  if (kept) return kept;
  const currents = noCurrents(network.ids.length);
  fillCurrents(network, NO_VOLTAGES, NO_VOLTAGES, timedRun, currents);
  network.fixedCurrents[key] = currents;
  return currents;
}

/** Current through the motor of lane i while it runs, A. */
export function motorRunA(network: CircuitNetwork, currents: Currents, i: number): number {
  return currents.alwaysReturn[i] + currents.addedSupply[i] - network.loads.controlA[i];
}

/** Sum of a column. */
export function total(column: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < column.length; i++) sum += column[i];
  return sum;
}
