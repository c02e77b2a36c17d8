import type { SolvedSupply } from '../wiring/supply-network.ts';
import { type CircuitVoltages, solveVoltages } from '../wiring/worst-case.ts';
import { circuitLoads, standingA } from './circuit-load.ts';
import { failingLanes, faultFinder, type LimitTrial, TOLERANCE } from './limit-faults.ts';
import { type LimitOf, sumLoads, worstSum } from './load-sum.ts';
import { supplyLoad } from './supply-load.ts';

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
  const passes = currentsAreFixed(trial.solved, trial.at) ? fixedCheck(trial) : powerCheck(trial);
  if (passes(n)) return n;
  let good = 0;
  let bad = n;
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (passes(middle)) good = middle;
    else bad = middle;
  }
  return good;
}

/** Whether no current depends on k: no constant power on the circuit, nor on one that shares its supply's resistance. */
function currentsAreFixed({ worstCase: { networks, internalOhm } }: SolvedSupply, at: number): boolean {
  return networks.every(({ loads }, c) => (c !== at && internalOhm === 0) || !loads.constantPower.includes(1));
}

/** Constant current: loads are look-ups, and other circuits only lose what the added current drops in the supply. */
function fixedCheck(trial: LimitTrial): Passes {
  const { solved, at, rated, supplyMayA, limitOf } = trial;
  const { network, worst } = solved.circuits[at];
  const { circuit } = network;
  const own = sumLoads(circuitLoads(network, worst.currents));
  const standing = standingA(worst.currents);
  const supply = supplyLoad(solved);
  const places = rated.get(circuit.id) ?? [];
  const spareV = othersSpareV(solved, at, worstSum(own, limitOf));
  return (k) => {
    const limits: LimitOf = (id) => (id === circuit.id ? k : limitOf(id));
    const addedA = worstSum(own, limits);
    if (standing + addedA > circuit.protectionA + TOLERANCE) return false;
    if (supply.standingA + worstSum(supply.sum, limits) > supplyMayA + TOLERANCE) return false;
    if (!places.every(({ sum, ratingA }) => worstSum(sum, limits) <= ratingA + TOLERANCE)) return false;
    if (spareV < solved.worstCase.internalOhm * addedA - TOLERANCE) return false;
    return failingLanes(network, voltagesWith(trial, k)[at]).length === 0;
  };
}

/** What the lanes of other circuits may lose, V, counted from where none of this circuit's lanes runs; lanes too low even then left out. */
function othersSpareV({ circuits, worstCase: { internalOhm } }: SolvedSupply, at: number, addedA: number): number {
  let least = Infinity;
  if (internalOhm === 0) return least;
  circuits.forEach(({ network, worst }, c) => {
    if (c === at) return;
    network.minV.forEach((minV, i) => {
      if (!network.known[i]) return;
      for (const volts of network.fourCore[i] ? [worst.runV[i], worst.idleV[i]] : [worst.runV[i]]) {
        const spare = volts - minV + internalOhm * addedA;
        if (spare >= -TOLERANCE) least = Math.min(least, spare);
      }
    });
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
  return solveVoltages({ ...worstCase, limits: worstCase.limits.map((limit, c) => (c === at ? k : limit)), only: at });
}
