import type { CircuitFigures, LaneFigures, SupplyFigures } from './assessment.ts';
import type { Circuit, Dispenser, DispenserType, Wiring } from './design.ts';
import type { DesignIndex } from './design-index.ts';
import type { HardwareLoads } from './hardware/loads.ts';
import type { LimitOf } from './hardware/load-sum.ts';
import type { CircuitSolution, LaneVoltages } from './wiring/lane-voltages.ts';
import type { ShortCircuit } from './wiring/protection.ts';

/** One lane with everything that its checks read. */
export interface LaneContext {
  readonly index: DesignIndex;
  readonly dispenser: Dispenser;
  readonly tag: string;
  readonly type: DispenserType | null;
  readonly wiring: Wiring | null;
  readonly circuit: Circuit | null;
  readonly circuitFigures: CircuitFigures | null;
  readonly voltages: LaneVoltages | null;
  readonly figures: LaneFigures;
}

/** One circuit with everything that its checks read. */
export interface CircuitContext {
  readonly index: DesignIndex;
  readonly circuit: Circuit;
  readonly solution: CircuitSolution;
  readonly figures: CircuitFigures;
  readonly short: ShortCircuit;
}

/** The electrical figures of a whole design. */
export interface Electrics {
  readonly index: DesignIndex;
  readonly limitOf: LimitOf;
  readonly hardware: HardwareLoads;
  readonly circuits: ReadonlyMap<string, CircuitContext>;
  readonly supplies: ReadonlyMap<string, SupplyFigures>;
  /** By dispenser id. */
  readonly voltages: ReadonlyMap<string, LaneVoltages>;
}
