import type { CircuitFigures, LaneFigures, SupplyFigures } from './assessment.ts';
import type { Lane } from './lane-rows.ts';
import type { CircuitSolution, LaneColumns } from './wiring/lane-voltages.ts';
import type { ShortCircuit } from './wiring/protection.ts';
import type { CircuitRows, SolvedSupply } from './wiring/supply-network.ts';

/** One lane with everything that its checks read. */
export interface LaneContext {
  readonly rows: Lane;
  /** Null without a circuit, or where the circuit's supply is not there. */
  readonly circuit: CircuitContext | null;
  /** Place in the circuit's columns. */
  readonly column: number;
  readonly figures: LaneFigures;
}

/** One circuit with everything that its checks read. */
export interface CircuitContext {
  readonly supply: SolvedSupply;
  readonly rows: CircuitRows;
  readonly solution: CircuitSolution;
  readonly lanes: LaneColumns;
  readonly figures: CircuitFigures;
  readonly short: ShortCircuit;
}

/** One supply with everything that its checks read. */
export interface SupplyContext {
  readonly solved: SolvedSupply;
  readonly figures: SupplyFigures;
  readonly circuits: readonly CircuitContext[];
}
