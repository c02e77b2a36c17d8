import type { CircuitFigures } from '../assessment.ts';
import { total } from '../wiring/currents.ts';
import type { CircuitSolution, LaneVoltages } from '../wiring/lane-voltages.ts';
import type { ShortCircuit } from '../wiring/protection.ts';
import { type Load, NO_LIMIT, sumLoads, worstSetOf, worstSum } from './load-sum.ts';

/** Run increments of a circuit's lanes, for sums under limits. */
export function circuitLoads({ network, worst }: CircuitSolution): Load[] {
  return network.ids.map((id, i) => ({ id, circuitId: network.circuit.id, amps: worst.currents.addedReturn[i] }));
}

/** What always flows in a circuit: idling lanes and all on their own clock, A. */
export function standingA({ worst }: CircuitSolution): number {
  return total(worst.currents.alwaysReturn);
}

/** Figures of one circuit; `largestPassingK` is worked out once everything else is known. */
export function circuitFigures(
  solution: CircuitSolution, lanes: readonly LaneVoltages[], short: ShortCircuit, tripA: number | null, largestPassingK: number | null,
): CircuitFigures {
  const { network, limit } = solution;
  const limitOf = () => limit;
  const sum = sumLoads(circuitLoads(solution));
  const standing = standingA(solution);
  let lowest = -1;
  lanes.forEach((lane, i) => {
    if (lane.worst && (lowest < 0 || lane.worst.volts < lanes[lowest].worst!.volts)) lowest = i;
  });
  return {
    dispensers: network.ids.length,
    concurrencyLimit: network.circuit.concurrencyLimit,
    standingA: standing,
    worstA: standing + worstSum(sum, limitOf),
    allOnA: standing + worstSum(sum, NO_LIMIT),
    ratingA: network.circuit.protectionA,
    worstSet: worstSetOf(sum, limitOf),
    lowestV: lowest < 0 ? null : lanes[lowest].worst!.volts,
    lowestAt: lowest < 0 ? null : network.ids[lowest],
    shortCircuitA: short.amps,
    shortCircuitAt: short.at,
    tripA,
    largestPassingK,
  };
}
