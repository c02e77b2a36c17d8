import type { Cabinet, CableNode, Circuit, Project, Supply, SupplyType } from '../design.ts';
import { type Lane, sameItems } from '../lane-rows.ts';
import { lowestSupplyV } from './supply-voltage.ts';
import { type CircuitSolution, type LaneColumns, laneColumns } from './lane-voltages.ts';
import { buildNetwork, type CircuitNetwork } from './network.ts';
import { solveVoltages, type SupplyCase } from './worst-case.ts';

/** The rows that a circuit's figures and findings read. */
export interface CircuitRows {
  readonly circuit: Circuit;
  readonly nodes: readonly CableNode[];
  /** The box that each of `nodes` hangs on, wherever it belongs; null: none, or one that is not there. */
  readonly parents: readonly (CableNode | null)[];
  readonly lanes: readonly Lane[];
}

/** The rows that a supply's figures and findings read. */
export interface SupplyRows {
  readonly project: Project;
  readonly supply: Supply;
  readonly type: SupplyType | undefined;
  readonly cabinet: Cabinet | undefined;
  readonly circuits: readonly CircuitRows[];
}

/** Whether two states of a supply have the same rows, and so the same figures. */
export function sameSupply(a: SupplyRows, b: SupplyRows): boolean {
  return (
    a.project === b.project && a.supply === b.supply && a.type === b.type && a.cabinet === b.cabinet && a.circuits.length === b.circuits.length &&
    a.circuits.every((rows, c) => sameCircuit(rows, b.circuits[c]))
  );
}

function sameCircuit(a: CircuitRows, b: CircuitRows): boolean {
  return a.circuit === b.circuit && sameItems(a.nodes, b.nodes) && sameItems(a.parents, b.parents) && sameItems(a.lanes, b.lanes);
}

/** A supply with the networks of all its circuits, solved. */
export interface SolvedSupply {
  readonly rows: SupplyRows;
  readonly lowestV: number;
  /** The case at the lowest voltage under the limits: solve it again with other limits. */
  readonly worstCase: SupplyCase;
  readonly circuits: readonly CircuitSolution[];
  /** By circuit. */
  readonly lanes: readonly LaneColumns[];
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
export function solveSupply(rows: SupplyRows): SolvedSupply {
  const { supply, project } = rows;
  const lowestV = lowestSupplyV(supply, rows.type);
  const networks = rows.circuits.map(({ circuit, nodes, lanes }) => buildNetwork(circuit, nodes, lanes, project.voltageTempC));
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
  const circuits = networks.map((network, c) => ({
    network,
    supplyName: supply.name,
    lowestV,
    setV: supply.setV,
    limit: worstCase.limits[c],
    worst: worst[c],
    allOn: allOn[c],
    alone: alone[c],
  }));
  return { rows, lowestV, worstCase, circuits, lanes: circuits.map(laneColumns) };
}

function unlimited(networks: readonly CircuitNetwork[], limits: readonly number[]): boolean {
  return networks.every((network, c) => limits[c] >= network.ids.length);
}
