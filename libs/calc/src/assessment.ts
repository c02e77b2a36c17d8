import type { Finding } from './findings.ts';

/** Every figure and finding of a project, as `assess(design)` derives them. Unrounded SI unless the name says otherwise. */
export interface Assessment {
  /** By point id. */
  readonly points: ReadonlyMap<string, PointFigures>;
  /** By dispenser id. */
  readonly lanes: ReadonlyMap<string, LaneFigures>;
  /** By `${moduleId}/${groupIndex}`. */
  readonly groups: ReadonlyMap<string, LoadFigures>;
  /** By module id. */
  readonly modules: ReadonlyMap<string, ModuleFigures>;
  readonly circuits: ReadonlyMap<string, CircuitFigures>;
  readonly supplies: ReadonlyMap<string, SupplyFigures>;
  /** Errors first, then warnings, then notes; by code, then by subject label. */
  readonly findings: readonly Finding[];
  /** Findings by dispenser id. */
  readonly findingsByLane: ReadonlyMap<string, readonly Finding[]>;
}

export interface PointFigures {
  /** Demand, whole µL per 1,000 operating hours, rounded up; null when it cannot be known. */
  readonly demandUlPer1000h: number | null;
  /** Why there is no demand, as an instruction; null when there is one. */
  readonly refusal: string | null;
}

export interface PulsePlan {
  /** Exact interval as a fraction of milliseconds: doseUl·3.6·10⁹ / demandUlPer1000h. */
  readonly exactIntervalMs: number;
  /** Operating time between pulses after rounding down, whole ms. */
  readonly intervalMs: number;
  readonly pulsesPerCartridge: number;
  /** Operating time that a cartridge lasts, whole ms. */
  readonly lifeMs: number;
  readonly lifeDays: number;
  readonly changesPerYear: number;
  readonly pulsesPerYear: number;
  /** Grease above the demand, %, against the exact interval. */
  readonly overGreasingPercent: number;
  readonly runMs: number;
  /** Width of the pulse that the output gives, ms. */
  readonly triggerMs: number;
}

/** A dispenser on its own clock. */
export interface TimedPlan {
  readonly usableUl: number;
  readonly periodHours: number;
  /** Discharge, whole µL per 1,000 operating hours, rounded down. */
  readonly dischargeUlPer1000h: number;
  readonly lifeDays: number;
  readonly changesPerYear: number;
  readonly overGreasingPercent: number | null;
}

export interface VoltageFigure {
  /** Lowest voltage at the device, V; null: not computable or collapsed. */
  readonly volts: number;
  /** Dispensers of its circuit running in the set that causes it, this one first (with all on: in no order). */
  readonly worstSet: readonly string[];
  /** True: a sound bound that no permitted set can go below (constant power); absent: exact. */
  readonly bound?: boolean;
}

export interface LaneFigures {
  readonly plan: PulsePlan | null;
  readonly timed: TimedPlan | null;
  /** Direct addresses, `%QX4.3`; null while unmapped. */
  readonly outputAddress: string | null;
  readonly statusAddress: string | null;
  /** `${moduleId}/${groupIndex}` of the output. */
  readonly outputGroup: string | null;
  /** Load on the output channel while it is on, A; null while the type is unknown. */
  readonly channelA: number | null;
  /** Whole run from the cabinet's terminals, m. */
  readonly runLengthM: number | null;
  /** Lowest voltage while it runs with the worst permitted set (k), at the lowest supply. */
  readonly worst: VoltageFigure | null;
  /** The same with every dispenser of the circuit on, since k is kept by software only. */
  readonly allOn: VoltageFigure | null;
  /** Running alone, supply at its set voltage: what a meter should read, V. */
  readonly aloneV: number | null;
  /** Lowest while it idles (four-core); null for two-core. */
  readonly idle: VoltageFigure | null;
  readonly minV: number | null;
  /** The circuit has no working point with this set: constant-power loads collapse the voltage. */
  readonly collapsed: boolean;
  /** Smallest standard cross-section of its own cable that would pass, mm²; null: none would, or not needed to know. */
  readonly smallestPassingMm2: number | null;
  /** Pulse level at the device, V (four-core with an output). */
  readonly pulseLevelV: number | null;
  /** Status level at the input when on, V. */
  readonly statusLevelV: number | null;
  /** Stations for the voltage profile: from the supply's terminals to the device, running, worst set. */
  readonly profile: readonly { readonly label: string; readonly metres: number; readonly worstV: number; readonly aloneV: number }[];
}

export interface LoadFigures {
  /** Worst load under the concurrency limits, A, and with all on. */
  readonly worstA: number;
  readonly allOnA: number;
  readonly ratingA: number | null;
  /** Dispensers in the worst set. */
  readonly worstSet: readonly string[];
  readonly used: number;
  readonly channels: number;
}

export interface ModuleFigures extends LoadFigures {
  readonly free: number;
}

export interface CircuitFigures {
  readonly dispensers: number;
  readonly concurrencyLimit: number | null;
  readonly standingA: number;
  readonly worstA: number;
  readonly allOnA: number;
  readonly ratingA: number;
  readonly worstSet: readonly string[];
  /** Lowest worst-case voltage on the circuit and the dispenser where it stands. */
  readonly lowestV: number | null;
  readonly lowestAt: string | null;
  /** Smallest short-circuit current, A, at the far end, hot, and the farthest dispenser; null without cables. */
  readonly shortCircuitA: number | null;
  readonly shortCircuitAt: string | null;
  /** Current above which the protection certainly trips at once, A; null where the notion does not apply. */
  readonly tripA: number | null;
  /** Largest k with which every voltage, group and supply of this circuit passes; 0: none. */
  readonly largestPassingK: number | null;
}

export interface SupplyFigures {
  readonly standingA: number;
  readonly worstA: number;
  readonly allOnA: number;
  /** worstA with the margin. */
  readonly demandA: number;
  /** Rating at the cabinet's temperature, A. */
  readonly ratingA: number;
  readonly headroomA: number;
  /** How many more dispensers like the largest on it would fit at once. */
  readonly headroomDispensers: number | null;
  readonly lowestV: number;
}

/** A figure that explains itself: what is shown one click away. */
export interface Explanation {
  readonly title: string;
  /** In words and symbols, for instance "1,000 h × dose ÷ demand". */
  readonly formula: string;
  /** The formula with the numbers put in. */
  readonly substituted: string;
  readonly inputs: readonly { readonly name: string; readonly value: string; readonly source: string }[];
  readonly rounding: readonly { readonly step: string; readonly value: string; readonly why: string }[];
  readonly result: string;
  readonly source: string;
  readonly usedBy: readonly string[];
}

/** The figures of a lane that can be explained. */
export type LaneFigureName =
  | 'demand' | 'interval' | 'pulses' | 'life' | 'lifeDays' | 'changes' | 'over'
  | 'worstVoltage' | 'allOnVoltage' | 'aloneVoltage' | 'idleVoltage'
  | 'channelLoad' | 'groupLoad' | 'supplyLoad' | 'pulseLevel' | 'statusLevel';
