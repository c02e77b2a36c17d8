import { formatInterval, formatNumber, THIN_SPACE } from '#calc';
import { type Mark, rect, text, unit, type Words } from '../drawing/mark';
import { capsule, type CapsuleSign, outputSquare, ring, run, seal, statusReturn, terminal } from './lane-parts';
import { isBelowMinimum, isPlanned, isTimed, type LaneView, segmentStates } from './lane-view';

/** The sizes in which a lane is drawn; px. */
export const LANE_SIZES = {
  alone: { width: 134, height: 18 },
  inline: { width: 412, height: 24 },
  phone: { width: 358, height: 52 },
  large: { width: 640, height: 64 },
} as const;
export type LaneSize = keyof typeof LANE_SIZES;

/** Where the parts of the line stand in a size, px. */
interface Places {
  readonly y: number;
  /** Left edge and edge length of the output. */
  readonly output: readonly [x: number, edge: number];
  readonly terminal: readonly [x: number, r: number];
  /** Left edge, width, height. */
  readonly capsule: readonly [x: number, width: number, height: number];
  readonly ring: readonly [x: number, r: number];
  readonly seal: readonly [x: number, k: number];
  /** Left edge, height and edge length of the status input. */
  readonly status: readonly [x: number, y: number, edge: number];
  /** Where ticks and a gap stand on the cable; empty: spread. */
  readonly ticks: readonly number[];
  readonly k: number;
}

const PLACES: Readonly<Record<LaneSize, Places>> = {
  alone: { y: 6.5, output: [1, 8], terminal: [22, 2.75], capsule: [88, 16, 11], ring: [116, 4.5], seal: [128, 4.5], status: [1, 15, 5], ticks: [45, 67], k: 0.92 },
  inline: { y: 9.5, output: [59, 9], terminal: [84.5, 3], capsule: [302, 18, 12], ring: [387, 5], seal: [404, 5.5], status: [60, 20.5, 6], ticks: [242], k: 1 },
  phone: { y: 10.5, output: [1, 12], terminal: [84, 4], capsule: [232, 24, 16], ring: [325, 7], seal: [349, 6.5], status: [2, 25.5, 8], ticks: [], k: 1.2 },
  large: { y: 16.5, output: [3, 17], terminal: [124, 4.5], capsule: [396, 36, 24], ring: [576, 10], seal: [622, 10], status: [6, 34.5, 10], ticks: [], k: 1.7 },
};

const drawn = new WeakMap<LaneView, Partial<Record<LaneSize, readonly Mark[]>>>();

/** The lane's marks in a size; the same view gives the same marks, so that a row drawn again costs nothing. */
export function laneShapes(lane: LaneView, size: LaneSize): readonly Mark[] {
  const kept = drawn.get(lane) ?? {};
  if (!drawn.has(lane)) drawn.set(lane, kept);
  return (kept[size] ??= [...lineOf(lane, PLACES[size]), ...FIGURES[size](lane)]);
}

/** The line itself: runs first, then what stands on them. */
function lineOf(lane: LaneView, at: Places): readonly Mark[] {
  const states = segmentStates(lane);
  const { y, k } = at;
  const [right, left, hollow] = [at.output[0] + at.output[1], at.capsule[0] + at.capsule[1], lane.aboutTo];
  const ticks = at.ticks.length > 0 ? { ticks: at.ticks, gapAt: at.ticks.reduce((sum, x) => sum + x, 0) / at.ticks.length } : {};
  return [
    ...(isTimed(lane) ? [] : [run(right, at.terminal[0] - at.terminal[1] + 0.5, y, states.output, { ticks: [], k: k * 0.8, hollow })]),
    run(at.terminal[0] + at.terminal[1] - 0.5, at.capsule[0], y, states.cable, { ...ticks, k, hollow }),
    run(left, at.ring[0] - at.ring[1], y, states.point, { cls: 'grease', ticks: [], k: k * 0.8, hollow }),
    ...(lane.wiring === 'four-core' ? [statusReturn({ x: (at.capsule[0] + left) / 2, y: y + at.capsule[2] / 2 }, at.status[0], at.status[1], at.status[2], states.status)] : []),
    ...(isTimed(lane) ? [] : [outputSquare(at.output[0], y, at.output[1], states.output)]),
    terminal(at.terminal[0], y, at.terminal[1], states.cable === 'stale' ? 'signed' : states.cable),
    capsule(at.capsule[0], y, at.capsule[1], at.capsule[2], states.dispenser, signOf(lane)),
    ring(at.ring[0], y, at.ring[1], states.point), seal(at.seal[0], y, at.seal[1], lane.state),
  ];
}

/** What moves its motor. */
export const signOf = (lane: LaneView): CapsuleSign => (isTimed(lane) ? 'clock' : isPlanned(lane) ? 'pulse' : 'empty');

const FIGURES: Readonly<Record<LaneSize, (lane: LaneView) => readonly Mark[]>> = {
  /** For tables whose columns already hold the figures. */
  alone: () => [],
  /** In fixed places, so that rows align. */
  inline: (lane) => [
    outputName(lane, 0, 13.3),
    ...onLine(118, 'mono', [lane.from ?? '–'], (lane.from ?? '–').length * 6.6 + 6),
    ...onLine(192, '', cable(lane), 52 + 6 * cableFigures(lane).length),
    ...onLine(274, voltsClass(lane), volts(lane), 40),
    ...onLine(351, '', [interval(lane)], 41),
  ],
  /** Beneath the line, in a list on a phone. */
  phone: (lane) => beneath(lane, 46, [0, 84, 164, 244, 358], 'end'),
  /** As on the sign-in page. */
  large: (lane) => beneath(lane, 58, [3, 124, 262, 414, 576], 'middle'),
};

const beneath = (lane: LaneView, y: number, xs: readonly number[], last: 'middle' | 'end'): readonly Mark[] => [
  outputName(lane, xs[0], y), text('mono', xs[1], y, lane.from ?? '', 'middle'), text(lane.state === 'stale' ? 'chg' : '', xs[2], y, cable(lane), 'middle'),
  text(voltsClass(lane), xs[3], y, volts(lane), 'middle'), text('', xs[4], y, interval(lane), last),
];

/** A figure interrupts its line, as on a dimension line. */
const onLine = (x: number, cls: string, words: readonly (string | Words)[], width: number): readonly Mark[] =>
  [rect('gap', x - width / 2, 3, width, 13), text(cls, x, 13.3, words, 'middle')];

function outputName(lane: LaneView, x: number, y: number): Mark {
  if (isTimed(lane)) return text('off', x, y, 'own clock');
  return lane.output === null ? text('off', x, y, 'no output') : text('mono', x, y, lane.output);
}

const cableFigures = (lane: LaneView): string => formatNumber(lane.lengthM, 0) + formatNumber(lane.sectionMm2);

const cable = (lane: LaneView): readonly (string | Words)[] =>
  [formatNumber(lane.lengthM, 0), unit('m\u2002'), formatNumber(lane.sectionMm2), unit('mm²')];

const voltsClass = (lane: LaneView): string => (isBelowMinimum(lane) || lane.collapsed ? 'bad' : '');

/** A voltage that collapses has no figure. */
const volts = (lane: LaneView): readonly (string | Words)[] =>
  lane.collapsed ? ['none'] : [formatNumber(lane.worstV, 1, 'down'), unit('V')];

const interval = (lane: LaneView): string => formatInterval(lane.intervalMs).replaceAll(THIN_SPACE, '\u202f');
