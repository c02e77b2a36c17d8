import type { SolvedSupply } from '../wiring/supply-network.ts';
import { type CircuitVoltages, keepsVoltages, solveVoltages } from '../wiring/worst-case.ts';
import { standingA } from './circuit-load.ts';
import { faultFinder, type LimitTrial, TOLERANCE } from './limit-faults.ts';
import { type LimitOf, worstSum } from './load-sum.ts';

type Passes = (k: number) => boolean;

/**
 * Largest k of a circuit with which its voltages, its protection, the groups and modules of its lanes
 * and its supply all pass, and with which it takes nothing under its minimum or over its rating on the
 * other circuits of the supply. What fails there though none of its lanes runs is not held against it.
 * Each fault only comes with growing k, so halving finds it.
 *
 * @returns 0 where even one is too many, null for a circuit without dispensers
 */
export function largestPassingK(trial: LimitTrial): number | null {
  const n = trial.solved.circuits[trial.at].network.ids.length;
  if (n === 0) return null;
  if (!currentsAreFixed(trial.solved, trial.at)) return largest(n, powerCheck(trial));
  return largest(largest(n, loadCheck(trial)), voltageCheck(trial));
}

/** Largest number up to `most` that passes; 0 where none does. */
function largest(most: number, passes: Passes): number {
  if (most === 0 || passes(most)) return most;
  let good = 0;
  let bad = most;
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (passes(middle)) good = middle;
    else bad = middle;
  }
  return good;
}

/** Whether no current depends on k: no constant power on the circuit, nor on one that shares its supply's resistance. */
function currentsAreFixed({ worstCase: { networks, internalOhm } }: SolvedSupply, at: number): boolean {
  return networks.every(({ hasConstantPower }, c) => (c !== at && internalOhm === 0) || !hasConstantPower);
}

/** Constant current: loads are look-ups, and other circuits only lose what the added current drops in the supply. */
function loadCheck(trial: LimitTrial): Passes {
  const { solved, at, rated, load: supply, supplyMayA, limitOf } = trial;
  const { network, worst } = solved.circuits[at];
  const { circuit } = network;
  const own = supply.circuitSums[at];
  const standing = standingA(worst.currents);
  const places = rated.get(circuit.id) ?? [];
  const spareV = othersSpareV(solved, at, worstSum(own, limitOf));
  return (k) => {
    const limits: LimitOf = (id) => (id === circuit.id ? k : limitOf(id));
    const addedA = worstSum(own, limits);
    if (standing + addedA > circuit.protectionA + TOLERANCE) return false;
    if (supply.standingA + worstSum(supply.sum, limits) > supplyMayA + TOLERANCE) return false;
    if (!places.every(({ sum, ratingA }) => worstSum(sum, limits) <= ratingA + TOLERANCE)) return false;
    return spareV >= solved.worstCase.internalOhm * addedA - TOLERANCE;
  };
}

/** Constant current: the circuit's own voltages; what other circuits drop in the supply does not hang on this k. */
function voltageCheck({ solved, at }: LimitTrial): Passes {
  const { network, worst } = solved.circuits[at];
  return (k) => keepsVoltages(network, worst.upstream, solved.worstCase.volts, k, TOLERANCE);
}

/** What the lanes of other circuits may lose, V, counted from where none of this circuit's lanes runs; lanes too low even then left out. */
function othersSpareV({ circuits, worstCase: { internalOhm } }: SolvedSupply, at: number, addedA: number): number {
  let least = Infinity;
  if (internalOhm === 0) return least;
  circuits.forEach(({ network, worst }, c) => {
    if (c === at) return;
    const { known, fourCore, minV } = network;
    for (let i = 0; i < minV.length; i++) {
      if (!known[i]) continue;
      const runSpare = worst.runV[i] - minV[i] + internalOhm * addedA;
      const idleSpare = fourCore[i] ? worst.idleV[i] - minV[i] + internalOhm * addedA : Infinity;
      if (runSpare >= -TOLERANCE) least = Math.min(least, runSpare);
      if (idleSpare >= -TOLERANCE) least = Math.min(least, idleSpare);
    }
  });
  return least;
}

/** Constant power: every k is solved anew, with the currents that it brings on every circuit it reaches. */
function powerCheck(trial: LimitTrial): Passes {
  const faults = faultFinder(trial);
  const withoutIt = new Set(faults(voltagesWith(trial, 0), 0).map(({ key }) => key));
  return (k) => faults(voltagesWith(trial, k), k).every(({ key, own }) => !own && withoutIt.has(key));
}

/** Every circuit of the supply with another k on this one; those that it cannot reach as they stand. */
function voltagesWith({ solved, at }: LimitTrial, k: number): CircuitVoltages[] {
  const { worstCase, circuits } = solved;
  if (worstCase.internalOhm === 0) {
    const [own] = solveVoltages({ ...worstCase, networks: [worstCase.networks[at]], limits: [k] });
    return circuits.map(({ worst }, c) => (c === at ? own : worst));
  }
  return solveVoltages({ ...worstCase, limits: worstCase.limits.map((limit, c) => (c === at ? k : limit)) });
}
