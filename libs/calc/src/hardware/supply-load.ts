import type { SupplyFigures } from '../assessment.ts';
import type { SupplyType } from '../design.ts';
import type { SolvedSupply } from '../wiring/supply-network.ts';
import { allOnA, circuitLoads, standingA } from './circuit-load.ts';
import { type LimitOf, type LoadSum, sumLoads, worstSum } from './load-sum.ts';

/**
 * Rating at a temperature, A: above `deratingFromC` it falls by the stated part of itself for each
 * kelvin, never under 0. A redundant pair counts as one, since one must carry all when the other fails.
 */
export function deratedA(type: SupplyType, temperatureC: number): number {
  const kelvins = Math.max(0, temperatureC - type.deratingFromC);
  return type.ratedA * Math.max(0, 1 - (kelvins * type.deratingPercentPerK) / 100);
}

export interface SupplyLoad {
  /** Other standing load, idling dispensers and all on their own clock, A. */
  readonly standingA: number;
  /** Run increments of each circuit on it, and of all. */
  readonly circuitSums: readonly LoadSum[];
  readonly sum: LoadSum;
  /** Largest current of one dispenser on it, A; 0: none. */
  readonly largestA: number;
  /** With all on, A. */
  readonly allOnA: number;
  /** A circuit on it has no working point: the currents are too low. */
  readonly collapsed: boolean;
}

/** Gathers the load of a supply from its solved circuits. */
export function supplyLoad({ rows: { supply }, circuits }: SolvedSupply): SupplyLoad {
  const circuitSums = circuits.map(({ network, worst }) => sumLoads(circuitLoads(network, worst.currents)));
  let largestA = 0;
  for (const { worst: { currents: { alwaysReturn, addedSupply } } } of circuits) {
    for (let i = 0; i < alwaysReturn.length; i++) largestA = Math.max(largestA, alwaysReturn[i] + addedSupply[i]);
  }
  return {
    standingA: circuits.reduce((sum, { worst }) => sum + standingA(worst.currents), supply.otherLoadA),
    circuitSums,
    sum: { parts: circuitSums.flatMap(({ parts }) => parts) },
    largestA,
    allOnA: circuits.reduce((sum, solution) => sum + allOnA(solution), supply.otherLoadA),
    collapsed: circuits.some(({ worst }) => worst.collapsed),
  };
}

/**
 * Budget of a supply: (standing + timed + worst sum of run increments under the limits) × (1 + margin)
 * against the rating at the cabinet's temperature, with what is left in A and in dispensers.
 */
export function supplyFigures(load: SupplyLoad, ratingA: number, lowestV: number, marginPercent: number, limitOf: LimitOf): SupplyFigures {
  const worstA = load.standingA + worstSum(load.sum, limitOf);
  const demandA = worstA * (1 + marginPercent / 100);
  const headroomA = ratingA - demandA;
  const oneMoreA = load.largestA * (1 + marginPercent / 100);
  return {
    standingA: load.standingA,
    worstA,
    allOnA: load.allOnA,
    demandA,
    ratingA,
    headroomA,
    headroomDispensers: oneMoreA > 0 && !load.collapsed ? Math.max(0, Math.floor(headroomA / oneMoreA + 1e-9)) : null,
    lowestV,
  };
}
