import type { DischargeMethod, Severity, Wiring } from '#calc';
import type { LaneState } from './lane-view';

/** A lane's loop diagram and voltage profile: plain values, made by the lane's page from design and assessment. */
export interface LoopView {
  readonly tag: string;
  readonly wiring: Wiring;
  readonly method: DischargeMethod;
  readonly state: LaneState;
  readonly statusState: LaneState;
  /** Dose or period are known, so that it will run. */
  readonly planned: boolean;
  readonly supply: LoopSupply;
  /** null while unmapped. */
  readonly output: LoopChannel | null;
  /** null for two-core and while unmapped. */
  readonly status: LoopChannel | null;
  /** Junction boxes on the way, from the cabinet on; empty: its own cable begins at the cabinet. */
  readonly boxes: readonly LoopBox[];
  /** Other lanes of the circuit whose own cable begins at the cabinet's terminals. */
  readonly othersAtCabinet: number;
  readonly cable: LoopCable;
  readonly dispenser: LoopDispenser;
  readonly point: LoopPoint;
  /** null while voltages cannot be computed. */
  readonly profile: LoopProfile | null;
  /** The lane's findings, each where it stands. */
  readonly findings: readonly LoopFinding[];
}

export interface LoopSupply {
  /** The cabinet's location, `+K1`. */
  readonly cabinet: string;
  /** Designation of the supply and the voltage set, `-T1`, 24.5. */
  readonly name: string | null;
  readonly setV: number | null;
  /** PELV has its 0 V bonded to earth once. */
  readonly extraLowVoltage: 'SELV' | 'PELV' | null;
  /** Circuit, and its protection's rating and characteristic, `4 A, breaker B`. */
  readonly circuit: string | null;
  readonly protection: string | null;
  /** Worst load of the circuit under its limit, and its rating, A. */
  readonly worstA: number | null;
  readonly ratingA: number | null;
}

export interface LoopChannel {
  readonly module: string;
  /** Counted from 0. */
  readonly channel: number;
  readonly address: string;
  /** What flows while it is on, and what the channel may carry, A; null: not known, not limited. */
  readonly amps: number | null;
  readonly ratingA: number | null;
}

/** A junction box with the trunk that leads to it. */
export interface LoopBox {
  readonly location: string;
  readonly cableTag: string;
  readonly lengthM: number;
  readonly powerMm2: number;
  readonly signalMm2: number;
  /** Other lanes whose own cable begins here. */
  readonly others: number;
  /** Boxes beyond it that are not on the lane's way. */
  readonly onTo: readonly string[];
}

/** The dispenser's own cable. */
export interface LoopCable {
  readonly tag: string | null;
  readonly lengthM: number | null;
  readonly sectionMm2: number | null;
}

export interface LoopDispenser {
  /** Designation in full, `=T1.GL1-GP11`, or its type's name where there is none. */
  readonly name: string;
  /** The same one level deep, as diagram zones show it: `=T1.GL1` and `-GP11`. */
  readonly function: string;
  readonly product: string;
  readonly doseUl: number | null;
  /** On its own clock: months in which it empties its cartridge. */
  readonly periodMonths: number | null;
  readonly runA: number | null;
  readonly runMs: number | null;
  readonly idleA: number | null;
  readonly cartridgeUl: number | null;
  /** Pin numbers of the plug, from the type's data. */
  readonly pins: Readonly<Partial<Record<'supply' | 'pulse' | 'zero' | 'status', string>>>;
}

export interface LoopPoint {
  readonly tag: string;
  readonly description: string | null;
  readonly demandUlPer1000h: number | null;
}

export interface ProfileStation {
  readonly label: string;
  readonly metres: number;
  /** V; null where the circuit has no working point. */
  readonly worstV: number | null;
  readonly aloneV: number | null;
}

export interface LoopProfile {
  /** Supply, cabinet's terminals, boxes in the order of `boxes`, device. */
  readonly stations: readonly ProfileStation[];
  /** Lowest voltage of the supply, V, and temperature of the conductors, °C. */
  readonly lowestV: number | null;
  readonly tempC: number;
  readonly minV: number | null;
  /** What the worst set is, `worst set of 3: LP11, LP12, LP13`. */
  readonly worstSet: string;
  /** Lowest at the device while it idles, V (four-core). */
  readonly idleV: number | null;
  /** Lowest voltage with every dispenser of the circuit on, V, and how many these are. */
  readonly allOnV: number | null;
  readonly allOnCount: number;
  /** With the worst set there is no working point. */
  readonly collapsed: boolean;
}

/** Parts of the diagram at which a finding can stand. */
export type LoopPlace = 'supply' | 'protection' | 'output' | 'status' | 'trunk' | 'cable' | 'dispenser' | 'point';

export interface LoopFinding {
  readonly place: LoopPlace;
  readonly severity: Severity;
  readonly code: string;
  readonly title: string;
}

/** What the diagram has a place for: from the cabinet's terminals on, one for each box, and the device. */
export function shownStations(loop: LoopView): readonly ProfileStation[] {
  const stations = loop.profile?.stations ?? [];
  return stations.length === loop.boxes.length + 3 ? stations.slice(1) : stations;
}

/** The worst voltage at the dispenser is under what it takes, or there is none. */
export function isLow(profile: LoopProfile | null): boolean {
  const worst = profile?.stations.at(-1)?.worstV ?? null;
  return profile !== null && (profile.collapsed || (worst !== null && profile.minV !== null && worst < profile.minV));
}
