/**
 * The input of every computation: a project's design as plain rows, the same rows that the database
 * holds and the API carries. Volumes are whole microlitres (0.1 cm³ = 100 µL), times whole milliseconds,
 * electrical quantities SI numbers with the unit in the name. `null` means "not decided yet": a blank is
 * a finding with its consequence, never a guess.
 */
export interface Design {
  readonly project: Project;
  readonly dispenserTypes: readonly DispenserType[];
  readonly moduleTypes: readonly ModuleType[];
  readonly cableTypes: readonly CableType[];
  readonly supplyTypes: readonly SupplyType[];
  readonly greases: readonly Grease[];
  readonly points: readonly Point[];
  readonly dispensers: readonly Dispenser[];
  readonly cabinets: readonly Cabinet[];
  readonly controllers: readonly Controller[];
  readonly modules: readonly Module[];
  readonly moduleGroups: readonly ModuleGroup[];
  readonly supplies: readonly Supply[];
  readonly circuits: readonly Circuit[];
  readonly cableNodes: readonly CableNode[];
  readonly assignments: readonly Assignment[];
}

export type Uuid = string;

/** Names of the collections of a design, which are also the names of the API's resources. */
export type Collection = Exclude<keyof Design, 'project'>;

export type Wiring = 'two-core' | 'four-core';
export type Polarity = 'sourcing' | 'sinking';
export type DischargeMethod = 'pulse' | 'timed';
export type DemandWay = 'bearing' | 'stated' | 'practice';
export type StatedPer = '1000h' | '100h' | 'running-day' | 'week' | 'month';
export type RankBy = 'fewest-changes' | 'smallest-dose' | 'least-over';
export type Zone = '0' | '1' | '2' | '20' | '21' | '22' | 'none';
export type ProtectionLevel = 'Ga' | 'Gb' | 'Gc' | 'Da' | 'Db' | 'Dc';
export type ConductorClass = 2 | 5;
export type Purpose = 'control' | 'status';
/** IEC 61131-2 types of digital inputs. */
export type InputType = 1 | 2 | 3;

/** A project with its policies: the defaults that a user may change, none of them hidden in the code. */
export interface Project {
  readonly id: Uuid;
  readonly name: string;
  readonly description: string;
  /** IANA name, for instance Europe/Amsterdam. */
  readonly timeZone: string;
  /** Conductor temperature for voltage figures, °C. */
  readonly voltageTempC: number;
  /** Conductor temperature for the smallest short-circuit current, °C. */
  readonly tripTempC: number;
  /** Part of the channels of each kind that stays free, %. */
  readonly sparePercent: number;
  /** Margin on top of the worst load of a supply, %. */
  readonly supplyMarginPercent: number;
  /** Longest time that a cartridge may stay, days. */
  readonly maxCartridgeDays: number;
  /** Shortest worthwhile life of a cartridge, days. */
  readonly minCartridgeDays: number;
  /** Over-greasing that rounding may cost, %. */
  readonly maxOverGreasingPercent: number;
  /** Years that a relay contact must last. */
  readonly relayLifeYears: number;
  /** Whole slots to which intervals are rounded down, ms; null: no schedule, milliseconds stand. */
  readonly slotMs: number | null;
  /** Factor from the AC band of a breaker's magnetic release to direct current. */
  readonly breakerDcFactor: number;
  readonly rankBy: RankBy;
  /** The unit in which demand is shown. */
  readonly demandPer: '1000h' | '100h' | 'running-day' | 'week';
}

/** A dispenser type of the catalogue; a version never changes, a project names the version it uses. */
export interface DispenserType {
  readonly id: Uuid;
  readonly name: string;
  readonly typeVersion: number;
  readonly wiring: Wiring;
  /** Cartridges that fit, nominal volume, µL, ascending. */
  readonly cartridgesUl: readonly number[];
  /** What stays in an "empty" cartridge, µL. */
  readonly residualUl: number;
  readonly doseMinUl: number;
  readonly doseMaxUl: number;
  readonly doseStepUl: number;
  /** Run time of the motor for one dose step, ms. */
  readonly runMsPerStep: number;
  /** Rest that the motor needs after a run, ms. */
  readonly recoveryMs: number;
  /** Width of the pulse that the output gives, ms; null: the run itself (two-core). */
  readonly triggerMs: number | null;
  /** Discharge periods for timed discharge, months; empty: pulse only. */
  readonly timedMonths: readonly number[];
  readonly load: 'constant-current' | 'constant-power';
  /** Current while the motor runs, A (constant current), at 24 V for constant power. */
  readonly runA: number;
  /** Peak when the motor starts, A. */
  readonly peakA: number;
  /** Standing current, A; 0 for two-core. */
  readonly idleA: number;
  /** Lowest voltage at the device at which it works, V. */
  readonly minV: number;
  /** Current into the pulse input, A; null for two-core. */
  readonly controlInputA: number | null;
  /** Voltage between pulse input and 0 V that the device takes for "on" for certain, V; null for two-core. */
  readonly controlOnV: number | null;
  /** Current into the pulse input (two-core: through the motor) up to which the device stays off for certain, A. */
  readonly offStateA: number;
  /** Polarity of the output that it wants. */
  readonly controlPolarity: Polarity;
  /** Status output: polarity, current it can deliver, voltage it loses, leakage when off. Null: no status signal. */
  readonly status: StatusOutput | null;
  /** Pin numbers of the device's plug: part of the type's data, none built in. */
  readonly pins: Readonly<Partial<Record<'supply' | 'pulse' | 'zero' | 'status', string>>>;
  /** Equipment protection levels that the type is certified for; empty: none known. */
  readonly protectionLevels: readonly ProtectionLevel[];
  readonly maxSurfaceC: number | null;
}

export interface StatusOutput {
  readonly polarity: Polarity;
  readonly maxA: number;
  readonly dropV: number;
  readonly leakageA: number;
}

/** A module type: outputs and inputs alike, told apart by `kind`. */
export interface ModuleType {
  readonly id: Uuid;
  readonly name: string;
  readonly typeVersion: number;
  readonly kind: 'output' | 'input';
  readonly technology: 'transistor' | 'relay' | 'input';
  readonly polarity: Polarity;
  readonly channels: number;
  readonly channelsPerGroup: number;
  /** Rating of a channel, a group and the module, A; null: not limited by the type. Inputs: null. */
  readonly channelA: number | null;
  readonly groupA: number | null;
  readonly moduleA: number | null;
  /** Inrush that a channel stands when it switches on, A; null: not stated. */
  readonly channelPeakA: number | null;
  /** Voltage lost in an output that is on, V; off-state leakage, A. */
  readonly dropV: number;
  readonly leakageA: number;
  /** Output that limits its own short-circuit current, A; null: does not. */
  readonly shortCircuitA: number | null;
  /** Relay contacts: least load, A, and rated operations; null for transistors and inputs. */
  readonly minLoadA: number | null;
  readonly ratedOperations: number | null;
  /** Inputs: IEC 61131-2 type and the current an input draws at 24 V, A. */
  readonly inputType: InputType | null;
  readonly inputA: number | null;
}

export interface CableType {
  readonly id: Uuid;
  readonly name: string;
  readonly typeVersion: number;
  readonly crossSectionMm2: number;
  readonly conductorClass: ConductorClass;
  readonly cores: number;
  /** How cores are told apart. */
  readonly coreMarking: 'numbered' | 'coloured';
  /** IEC 60757 codes in core order; empty when numbered. */
  readonly coreColours: readonly string[];
}

export interface SupplyType {
  readonly id: Uuid;
  readonly name: string;
  readonly typeVersion: number;
  readonly ratedA: number;
  /** Above this temperature the rating falls by `deratingPercentPerK` of itself for each kelvin. */
  readonly deratingFromC: number;
  readonly deratingPercentPerK: number;
  /** Regulation tolerance, % of the set voltage; null: not stated, then 24 V − 15 % counts. */
  readonly tolerancePercent: number | null;
  /** Current the supply can deliver into a short circuit, A. */
  readonly shortCircuitA: number;
  readonly extraLowVoltage: 'SELV' | 'PELV';
}

export interface Grease {
  readonly id: Uuid;
  readonly name: string;
  readonly nlgi: string;
  readonly thickener: string;
  readonly densityGPerCm3: number;
}

/** The six correction factors of the interval formula; 1 each means "no correction". */
export interface BearingFactors {
  readonly temperature: number;
  readonly contamination: number;
  readonly moisture: number;
  readonly vibration: number;
  readonly position: number;
  readonly design: number;
}

/** A lubrication point. */
export interface Point {
  readonly id: Uuid;
  readonly tag: string;
  readonly description: string | null;
  /** IEC 81346 aspects with their leading sign. */
  readonly function: string | null;
  readonly location: string | null;
  readonly product: string | null;
  readonly machine: string | null;
  readonly remarks: string | null;
  readonly hoursPerDay: number | null;
  readonly daysPerWeek: number;
  readonly demandWay: DemandWay | null;
  readonly boreMm: number | null;
  readonly outsideMm: number | null;
  readonly widthMm: number | null;
  readonly speedRpm: number | null;
  readonly factors: BearingFactors;
  readonly statedUl: number | null;
  readonly statedPer: StatedPer;
  readonly practiceStrokes: number | null;
  readonly practiceGramsPerStroke: number | null;
  readonly practiceEveryDays: number | null;
  readonly greaseId: Uuid | null;
  readonly zone: Zone | null;
}

/** The dispenser at a point, with the cable of its own; its *lane* is this row's whole chain. */
export interface Dispenser {
  readonly id: Uuid;
  readonly pointId: Uuid;
  readonly typeId: Uuid | null;
  readonly wiring: Wiring | null;
  readonly method: DischargeMethod;
  readonly cartridgeUl: number | null;
  readonly doseUl: number | null;
  /** Timed discharge: the period set, months. */
  readonly periodMonths: number | null;
  /** The controller it belongs to, also before a channel is chosen. */
  readonly controllerId: Uuid | null;
  readonly circuitId: Uuid | null;
  /** Junction box where its own cable begins; null: the cabinet's terminals. */
  readonly nodeId: Uuid | null;
  readonly cableTag: string | null;
  readonly cableLengthM: number | null;
  readonly crossSectionMm2: number | null;
  readonly conductorClass: ConductorClass;
}

export interface Cabinet {
  readonly id: Uuid;
  /** Location designation with its sign, for instance +K1. */
  readonly location: string;
  readonly description: string;
  /** Temperature inside at which supplies are derated, °C. */
  readonly temperatureC: number;
}

export interface Controller {
  readonly id: Uuid;
  readonly cabinetId: Uuid;
  readonly name: string;
}

export interface Module {
  readonly id: Uuid;
  readonly controllerId: Uuid;
  readonly typeId: Uuid;
  readonly name: string;
  /** First byte of its addresses: channel c is byte `baseByte + ⌊c / 8⌋`, bit `c mod 8`. */
  readonly baseByte: number;
  /** Place on the rack, ascending from the left. */
  readonly slot: number;
}

/** A group of an output module with the circuit that feeds it. */
export interface ModuleGroup {
  readonly id: Uuid;
  readonly moduleId: Uuid;
  readonly groupIndex: number;
  readonly circuitId: Uuid | null;
}

export interface Supply {
  readonly id: Uuid;
  readonly cabinetId: Uuid;
  readonly typeId: Uuid;
  /** Designation, for instance -T1. */
  readonly name: string;
  /** Voltage set at its terminals, V. */
  readonly setV: number;
  /** Resistance of supply and internal wiring up to the terminals, Ω, both conductors together. */
  readonly internalOhm: number;
  /** Other standing load on this supply, A. */
  readonly otherLoadA: number;
  /** A second, equal supply carries all when one fails. */
  readonly redundant: boolean;
}

export type Protection = 'breaker-B' | 'breaker-C' | 'electronic' | 'fuse';

/** A protected 24 V feeder with the cable tree behind it. */
export interface Circuit {
  readonly id: Uuid;
  readonly supplyId: Uuid;
  readonly name: string;
  readonly protection: Protection;
  readonly protectionA: number;
  readonly protectionOhm: number;
  /** The most dispensers that may run at once (k); null: all. */
  readonly concurrencyLimit: number | null;
}

/** A junction box with the trunk that leads to it. */
export interface CableNode {
  readonly id: Uuid;
  readonly circuitId: Uuid;
  /** The box before it; null: the circuit's terminals in the cabinet. */
  readonly parentId: Uuid | null;
  /** Location designation of the box, for instance +JB1. */
  readonly location: string;
  readonly cableTag: string;
  readonly lengthM: number;
  /** The power pair (+24 V and 0 V), shared by all behind it. */
  readonly powerMm2: number;
  /** The signal multicore: one core an output, one a status signal. */
  readonly signalMm2: number;
  readonly conductorClass: ConductorClass;
}

/** A dispenser's signal on a channel. Direct addresses derive from it, they are never stored. */
export interface Assignment {
  readonly id: Uuid;
  readonly dispenserId: Uuid;
  readonly moduleId: Uuid;
  /** Counted from 0. */
  readonly channel: number;
  readonly purpose: Purpose;
}

/** What the API adds to a row that people edit. */
export type Versioned<T> = T & { readonly version: number };
