import type { CircuitContext, Electrics } from './assess-context.ts';
import type { SupplyFigures } from './assessment.ts';
import type { DesignIndex } from './design-index.ts';
import { circuitFigures } from './hardware/circuit-load.ts';
import { largestPassingK } from './hardware/largest-k.ts';
import type { LimitOf } from './hardware/load-sum.ts';
import { channelLoad, type HardwareLoads, hardwareLoads, type RatedSum } from './hardware/loads.ts';
import { deratedA, supplyFigures, supplyLoad } from './hardware/supply-load.ts';
import { type LaneVoltages, laneVoltages } from './wiring/lane-voltages.ts';
import { instantTripA, smallestShortCircuit } from './wiring/protection.ts';
import { limitOfCircuit, type SolvedSupply, solveSupply } from './wiring/supply-network.ts';

/** Solves the electrical side of a design: voltages, loads, circuits, supplies. */
export function solveElectrics(index: DesignIndex): Electrics {
  const limitOf: LimitOf = (id) => limitOfCircuit((id === null ? null : index.circuits.get(id)?.concurrencyLimit) ?? null);
  const solvedSupplies = index.design.supplies.map((supply) => solveSupply(index, supply));
  const lanesOf = new Map<string, LaneVoltages[]>();
  const voltages = new Map<string, LaneVoltages>();
  for (const { circuits } of solvedSupplies) {
    for (const solution of circuits) {
      const lanes = laneVoltages(solution);
      lanesOf.set(solution.network.circuit.id, lanes);
      lanes.forEach((lane, i) => voltages.set(solution.network.ids[i], lane));
    }
  }
  const channelA = (of: 'runA' | 'allOnRunA') => (id: string) => channelLoad(index, id, voltages.get(id)?.[of] ?? null)?.amps ?? null;
  const hardware = hardwareLoads(index, channelA('runA'), channelA('allOnRunA'), limitOf);
  const circuits = new Map<string, CircuitContext>();
  const supplies = new Map<string, SupplyFigures>();
  const rated = ratedByCircuit(hardware);
  for (const solved of solvedSupplies) solveOne(index, solved, lanesOf, rated, limitOf, circuits, supplies);
  return { index, limitOf, hardware, circuits, supplies, voltages };
}

function solveOne(
  index: DesignIndex, solved: SolvedSupply, lanesOf: ReadonlyMap<string, readonly LaneVoltages[]>, rated: ReadonlyMap<string, RatedSum[]>, limitOf: LimitOf,
  circuits: Map<string, CircuitContext>, supplies: Map<string, SupplyFigures>,
): void {
  const { supply } = solved;
  const type = index.supplyTypes.get(supply.typeId);
  const { supplyMarginPercent, breakerDcFactor } = index.design.project;
  const load = supplyLoad(solved);
  const ratingA = type ? deratedA(type, index.cabinets.get(supply.cabinetId)?.temperatureC ?? 0) : 0;
  supplies.set(supply.id, supplyFigures(load, ratingA, solved.lowestV, supplyMarginPercent, limitOf));
  const supplyMayA = ratingA / (1 + supplyMarginPercent / 100);
  solved.circuits.forEach((solution, at) => {
    const { circuit } = solution.network;
    const short = smallestShortCircuit(index, solution.network, solved.lowestV, supply.internalOhm, type);
    const largest = largestPassingK({ solved, at, rated, supplyMayA, limitOf });
    const figures = circuitFigures(solution, lanesOf.get(circuit.id) ?? [], short, instantTripA(circuit, breakerDcFactor), largest);
    circuits.set(circuit.id, { index, circuit, solution, figures, short });
  });
}

/** Groups and modules that limit something, by the circuits whose lanes load them. */
function ratedByCircuit({ rated }: HardwareLoads): Map<string, RatedSum[]> {
  const byCircuit = new Map<string, RatedSum[]>();
  for (const place of rated) {
    for (const circuitId of place.sum.byCircuit.keys()) {
      if (circuitId === null) continue;
      const places = byCircuit.get(circuitId);
      if (places) places.push(place);
      else byCircuit.set(circuitId, [place]);
    }
  }
  return byCircuit;
}
