import type { DischargeMethod, Wiring } from '#calc';

/** How far a lane is; its drawing says it by shape. */
export type LaneState = 'unmapped' | 'mapped' | 'wired' | 'checked' | 'signed' | 'stale';

/** The stretches of a lane that can be in states of their own. */
export type LaneSegment = 'output' | 'cable' | 'dispenser' | 'point' | 'status';

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
  /** Left out: by pulses. On its own clock it has no output, and a clock stands in its capsule. */
  readonly method?: DischargeMethod;
  /** Left out: there is a plan where there is an interval. Without one its capsule is empty and no grease flows. */
  readonly planned?: boolean;
  /** With its worst set the circuit has no working point. */
  readonly collapsed?: boolean;
  /** Of a stale lane: where a value moved since it was signed; left out: the cable. */
  readonly moved?: readonly LaneSegment[];
  /** Stale in the draft only: its delta is hollow until the revision is issued. */
  readonly aboutTo?: boolean;
}

/** States that come from the design and the wiring, the farthest first. */
export const LANE_STATES: readonly LaneState[] = ['wired', 'mapped', 'unmapped'];
/** Every state, the farthest first. */
export const ALL_LANE_STATES: readonly LaneState[] = ['stale', 'signed', 'checked', ...LANE_STATES];
export const LANE_STATE_WORDS: Readonly<Record<LaneState, string>> = {
  unmapped: 'Unmapped', mapped: 'Mapped', wired: 'Wired', checked: 'Checked', signed: 'Signed', stale: 'Stale',
};

export const isBelowMinimum = (lane: LaneView): boolean => lane.worstV !== null && lane.minV !== null && lane.worstV < lane.minV;

export const isTimed = (lane: LaneView): boolean => lane.method === 'timed';

export const isPlanned = (lane: LaneView): boolean => lane.planned ?? lane.intervalMs !== null;

/** The state of each stretch: a stale lane keeps its signature where nothing moved; without a plan no grease flows. */
export function segmentStates(lane: LaneView): Readonly<Record<LaneSegment, LaneState>> {
  const moved = lane.state === 'stale' ? (lane.moved ?? ['cable']) : [];
  const of = (segment: LaneSegment, state: LaneState): LaneState => (moved.includes(segment) ? 'stale' : state === 'stale' ? 'signed' : state);
  return {
    output: of('output', lane.state), cable: of('cable', lane.state), dispenser: of('dispenser', lane.state),
    point: isPlanned(lane) ? of('point', lane.state) : 'unmapped', status: of('status', lane.statusState),
  };
}
