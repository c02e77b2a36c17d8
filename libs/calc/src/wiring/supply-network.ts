import type { Supply } from '../design.ts';
import type { DesignIndex } from '../design-index.ts';
import { lowestSupplyV } from './supply-voltage.ts';
import type { CircuitSolution } from './lane-voltages.ts';
import { buildNetwork, type CircuitNetwork } from './network.ts';
import { solveVoltages, type SupplyCase } from './worst-case.ts';

/** A supply with the networks of all its circuits, solved. */
export interface SolvedSupply {
  readonly supply: Supply;
  readonly lowestV: number;
  /** The case at the lowest voltage under the limits: solve it again with other limits. */
  readonly worstCase: SupplyCase;
  readonly circuits: readonly CircuitSolution[];
}

/** The limit of a circuit as a number: null means all. */
export function limitOfCircuit(concurrencyLimit: number | null): number {
  return concurrencyLimit ?? Infinity;
}

/**
 * Solves every circuit of a supply in three ways: at the lowest voltage with the worst permitted set,
 * at the lowest voltage with all on, and each lane alone at the voltage set (the others idle, their own
 * clocks at rest: what a meter should read).
 */
export function solveSupply(index: DesignIndex, supply: Supply): SolvedSupply {
  const circuits = index.circuitsBySupply.get(supply.id) ?? [];
  const lowestV = lowestSupplyV(supply, index.supplyTypes.get(supply.typeId));
  const networks = circuits.map((circuit) => buildNetwork(index, circuit, index.design.project.voltageTempC));
  const worstCase: SupplyCase = {
    networks,
    volts: lowestV,
    internalOhm: supply.internalOhm,
    otherLoadA: supply.otherLoadA,
    limits: networks.map(({ circuit }) => limitOfCircuit(circuit.concurrencyLimit)),
    timedRun: true,
  };
  const worst = solveVoltages(worstCase);
  const allOn = unlimited(networks, worstCase.limits) ? worst : solveVoltages({ ...worstCase, limits: networks.map(() => Infinity) });
  const alone = solveVoltages({ ...worstCase, volts: supply.setV, limits: networks.map(() => 0), timedRun: false });
  return {
    supply,
    lowestV,
    worstCase,
    circuits: networks.map((network, c) => ({
      network,
      supplyName: supply.name,
      lowestV,
      setV: supply.setV,
      limit: worstCase.limits[c],
      worst: worst[c],
      allOn: allOn[c],
      alone: alone[c],
    })),
  };
}

function unlimited(networks: readonly CircuitNetwork[], limits: readonly number[]): boolean {
  return networks.every((network, c) => limits[c] >= network.ids.length);
}
