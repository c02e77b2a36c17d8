import type { Wiring } from '#calc';

/** How far a lane is; its drawing says it by shape. */
export type LaneState = 'unmapped' | 'mapped' | 'wired';

/** What a lane's line needs: plain values, nothing looked up. */
export interface LaneView {
  readonly tag: string;
  readonly state: LaneState;
  /** The status signal's own part; it may still be open while the output is mapped. */
  readonly statusState: LaneState;
  /** null while the type is not chosen: drawn without a status line. */
  readonly wiring: Wiring | null;
  /** Direct addresses; null while unmapped. */
  readonly output: string | null;
  readonly status: string | null;
  /** Where its own cable begins: a box's or cabinet's location, `+JB3`. */
  readonly from: string | null;
  /** Whole run from the cabinet, m, and its own cable's section, mm². */
  readonly lengthM: number | null;
  readonly sectionMm2: number | null;
  /** Lowest voltage at the dispenser with the worst permitted set, V. */
  readonly worstV: number | null;
  /** Lowest voltage at which it works, V. */
  readonly minV: number | null;
  /** Operating time between pulses, ms; null: on its own clock, or not known. */
  readonly intervalMs: number | null;
}

export const LANE_STATES: readonly LaneState[] = ['wired', 'mapped', 'unmapped'];
export const LANE_STATE_WORDS: Readonly<Record<LaneState, string>> = { unmapped: 'Unmapped', mapped: 'Mapped', wired: 'Wired' };

export const isBelowMinimum = (lane: LaneView): boolean => lane.worstV !== null && lane.minV !== null && lane.worstV < lane.minV;
