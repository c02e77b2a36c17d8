import type { Wiring } from '#calc';
import type { LaneState } from './lane-view';

/** A lane's loop diagram and voltage profile: plain values, made by the lane's page from design and assessment. */
export interface LoopView {
  readonly tag: string;
  readonly wiring: Wiring;
  readonly state: LaneState;
  readonly supply: LoopSupply;
  /** null while unmapped. A module's name and the direct address of the channel. */
  readonly output: LoopChannel | null;
  /** null for two-core and while unmapped. */
  readonly status: LoopChannel | null;
  /** Junction boxes on the way, from the cabinet on; empty: its own cable begins at the cabinet. */
  readonly boxes: readonly LoopBox[];
  readonly cable: LoopCable;
  readonly dispenser: LoopDispenser;
  readonly point: LoopPoint;
  /** null while voltages cannot be computed. */
  readonly profile: LoopProfile | null;
}

export interface LoopSupply {
  /** The cabinet's location, `+K1`. */
  readonly cabinet: string;
  /** Designation of the supply and the voltage set, `-T1`, 24.5. */
  readonly name: string | null;
  readonly setV: number | null;
  /** Circuit, and its protection's rating and characteristic, `4 A, B`. */
  readonly circuit: string | null;
  readonly protection: string | null;
  /** Its check fails: drawn in brick. */
  readonly protectionFails: boolean;
}

export interface LoopChannel {
  readonly module: string;
  readonly address: string;
}

/** A junction box with the trunk that leads to it. */
export interface LoopBox {
  readonly location: string;
  readonly cableTag: string;
  readonly lengthM: number;
  readonly powerMm2: number;
  readonly signalMm2: number;
}

/** The dispenser's own cable. */
export interface LoopCable {
  readonly tag: string | null;
  readonly lengthM: number | null;
  readonly sectionMm2: number | null;
}

export interface LoopDispenser {
  /** Designation, `=T1.GL1-GP11`, or its type's name where there is none. */
  readonly name: string;
  readonly doseUl: number | null;
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
  readonly worstV: number;
  readonly aloneV: number;
}

export interface LoopProfile {
  /** Supply, cabinet's terminals, boxes in the order of `boxes`, device; the supply may be left out. */
  readonly stations: readonly ProfileStation[];
  readonly minV: number | null;
  /** What the worst set is, `worst set of 3: LP11, LP12, LP13`. */
  readonly worstSet: string;
  /** Lowest voltage with every dispenser of the circuit on, V, and how many these are. */
  readonly allOnV: number | null;
  readonly allOnCount: number;
}

/** What the diagram has a place for: from the cabinet's terminals on, one for each box, and the device. */
export function shownStations(loop: LoopView): readonly ProfileStation[] {
  const stations = loop.profile?.stations ?? [];
  return stations.length === loop.boxes.length + 3 ? stations.slice(1) : stations;
}
