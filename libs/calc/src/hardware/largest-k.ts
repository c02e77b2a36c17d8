import type { SolvedSupply } from '../wiring/supply-network.ts';
import { solveVoltages } from '../wiring/worst-case.ts';
import { circuitLoads, standingA } from './circuit-load.ts';
import { type LimitOf, sumLoads, worstSum } from './load-sum.ts';
import type { RatedSum } from './loads.ts';
import type { SupplyLoad } from './supply-load.ts';

/** What a limit k of one circuit is tried against; the other circuits keep theirs. */
export interface LimitTrial {
  readonly solved: SolvedSupply;
  /** Place of the circuit on its supply. */
  readonly at: number;
  /** Groups and modules with lanes of this circuit. */
  readonly rated: readonly RatedSum[];
  readonly supplyLoad: SupplyLoad;
  /** Load that the supply may carry before the margin, A. */
  readonly supplyMayA: number;
  readonly limitOf: LimitOf;
}

const TOLERANCE = 1e-9;

/**
 * Largest k of a circuit with which its voltages, its protection, the groups and modules of its lanes
 * and its supply all pass; each grows with k, so halving finds it.
 *
 * @returns 0 where even one is too many, null for a circuit without dispensers
 */
export function largestPassingK(trial: LimitTrial): number | null {
  const n = trial.solved.circuits[trial.at].network.ids.length;
  if (n === 0) return null;
  const loadsPass = loadCheck(trial);
  const passes = (k: number): boolean => loadsPass(k) && voltagesPass(trial, k);
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

function loadCheck({ solved, at, rated, supplyLoad, supplyMayA, limitOf }: LimitTrial): (k: number) => boolean {
  const solution = solved.circuits[at];
  const { circuit } = solution.network;
  const own = sumLoads(circuitLoads(solution));
  const standing = standingA(solution);
  return (k) => {
    const limits = withLimit(limitOf, circuit.id, k);
    if (standing + worstSum(own, limits) > circuit.protectionA + TOLERANCE) return false;
    if (supplyLoad.standingA + worstSum(supplyLoad.sum, limits) > supplyMayA + TOLERANCE) return false;
    return rated.every(({ sum, ratingA }) => worstSum(sum, limits) <= ratingA + TOLERANCE);
  };
}

function withLimit(limitOf: LimitOf, circuitId: string, k: number): LimitOf {
  return (id) => (id === circuitId ? k : limitOf(id));
}

function voltagesPass({ solved, at }: LimitTrial, k: number): boolean {
  const { worstCase, circuits } = solved;
  const { network } = circuits[at];
  const { runV, idleV, collapsed } = solveVoltages({
    ...worstCase,
    limits: worstCase.limits.map((limit, c) => (c === at ? k : limit)),
    only: at,
  })[at];
  if (collapsed) return false;
  for (let i = 0; i < runV.length; i++) {
    if (!network.known[i]) continue;
    if (runV[i] < network.minV[i] - TOLERANCE) return false;
    if (network.fourCore[i] && idleV[i] < network.minV[i] - TOLERANCE) return false;
  }
  return true;
}
