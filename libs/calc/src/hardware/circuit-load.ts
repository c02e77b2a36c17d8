import type { CircuitFigures } from '../assessment.ts';
import { type Currents, total } from '../wiring/currents.ts';
import type { CircuitSolution, LaneColumns } from '../wiring/lane-voltages.ts';
import type { CircuitNetwork } from '../wiring/network.ts';
import type { ShortCircuit } from '../wiring/protection.ts';
import { type Load, type LoadSum, worstSetOf, worstSum } from './load-sum.ts';

/** Run increments of a circuit's lanes through protection and supply, for sums under limits. */
export function circuitLoads({ ids, circuit }: CircuitNetwork, currents: Currents): Load[] {
  return ids.map((id, i) => ({ id, circuitId: circuit.id, amps: currents.addedSupply[i] }));
}

/** What always flows in a circuit: idling lanes and all on their own clock, A. */
export function standingA(currents: Currents): number {
  return total(currents.alwaysReturn);
}

/**
 * Current of a circuit with all on, A, at the voltages that all on leave. Where they leave none it is
 * the largest that is known: the true one is larger.
 */
export function allOnA({ allOn, worst }: CircuitSolution): number {
  const all = everyLaneA(allOn.currents);
  return allOn.collapsed ? Math.max(all, everyLaneA(worst.currents)) : all;
}

function everyLaneA(currents: Currents): number {
  return currents.addedSupply.reduce((sum, amps) => sum + Math.max(0, amps), standingA(currents));
}

/** Figures of one circuit from the sum of its lanes' run increments; `largestPassingK` is worked out once everything else is known. */
export function circuitFigures(
  solution: CircuitSolution, sum: LoadSum, { worst }: LaneColumns, short: ShortCircuit, tripA: number | null, largestPassingK: number | null,
): CircuitFigures {
  const { network, limit } = solution;
  const limitOf = () => limit;
  const standing = standingA(solution.worst.currents);
  let lowest = -1;
  worst.forEach((figure, i) => {
    if (figure && (lowest < 0 || figure.volts < worst[lowest]!.volts)) lowest = i;
  });
  return {
    dispensers: network.ids.length,
    concurrencyLimit: network.circuit.concurrencyLimit,
    standingA: standing,
    worstA: standing + worstSum(sum, limitOf),
    allOnA: allOnA(solution),
    ratingA: network.circuit.protectionA,
    worstSet: worstSetOf(sum, limitOf),
    lowestV: lowest < 0 ? null : worst[lowest]!.volts,
    lowestAt: lowest < 0 ? null : network.ids[lowest],
    shortCircuitA: short.amps,
    shortCircuitAt: short.at,
    tripA,
    largestPassingK,
  };
}
