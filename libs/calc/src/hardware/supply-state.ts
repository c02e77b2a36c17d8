import type { CircuitContext, SupplyContext } from '../assess-context.ts';
import type { Finding } from '../findings.ts';
import { sameItems } from '../lane-rows.ts';
import { protectionFindings } from '../wiring/protection-findings.ts';
import { instantTripA, smallestShortCircuit } from '../wiring/protection.ts';
import type { SolvedSupply } from '../wiring/supply-network.ts';
import { trunkFindings } from '../wiring/voltage-findings.ts';
import { circuitFigures } from './circuit-load.ts';
import { largestPassingK } from './largest-k.ts';
import type { LimitOf } from './load-sum.ts';
import type { RatedSum } from './loads.ts';
import { supplyFindings } from './supply-findings.ts';
import { deratedA, supplyFigures, supplyLoad } from './supply-load.ts';

/** A supply with its circuits, their figures and findings. */
export interface SupplyState {
  readonly context: SupplyContext;
  /** The groups and modules that its circuits' limits were tried against, circuit by circuit. */
  readonly rated: readonly (readonly RatedSum[])[];
  readonly findings: readonly Finding[];
}

/** Figures and findings of a solved supply; taken over from the state before where it and the places its lanes load are the same. */
export function supplyState(solved: SolvedSupply, ratedByCircuit: ReadonlyMap<string, readonly RatedSum[]>, limitOf: LimitOf, before: SupplyState | undefined): SupplyState {
  const rated = solved.circuits.map(({ network }) => ratedByCircuit.get(network.circuit.id) ?? []);
  if (before && before.context.solved === solved && rated.every((places, c) => sameItems(places, before.rated[c]))) return before;
  const context = supplyContext(solved, ratedByCircuit, limitOf);
  const findings = [...supplyFindings(context), ...context.circuits.flatMap((circuit) => [...protectionFindings(circuit), ...trunkFindings(circuit)])];
  return { context, rated, findings };
}

function supplyContext(solved: SolvedSupply, rated: ReadonlyMap<string, readonly RatedSum[]>, limitOf: LimitOf): SupplyContext {
  const { supply, type, cabinet, project } = solved.rows;
  const load = supplyLoad(solved);
  const ratingA = type ? deratedA(type, cabinet?.temperatureC ?? 0) : 0;
  const supplyMayA = ratingA / (1 + project.supplyMarginPercent / 100);
  const circuits = solved.circuits.map((solution, at): CircuitContext => {
    const { circuit } = solution.network;
    const short = smallestShortCircuit(project, solution.network, solved.lowestV, supply.internalOhm, type);
    const largest = largestPassingK({ solved, at, rated, load, supplyMayA, limitOf });
    const tripA = instantTripA(circuit, project.breakerDcFactor);
    const figures = circuitFigures(solution, load.circuitSums[at], solved.lanes[at], short, tripA, largest);
    return { supply: solved, rows: solved.rows.circuits[at], solution, lanes: solved.lanes[at], figures, short };
  });
  return { solved, figures: supplyFigures(load, ratingA, solved.lowestV, project.supplyMarginPercent, limitOf), circuits };
}
