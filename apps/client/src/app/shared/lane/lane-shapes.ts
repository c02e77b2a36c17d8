import { formatInterval, formatNumber, THIN_SPACE } from '#calc';
import { type Mark, rect, text, unit, type Words } from '../drawing/mark';
import { capsule, outputSquare, ring, run, signaturePlace, statusReturn, terminal } from './lane-parts';
import { isBelowMinimum, type LaneView } from './lane-view';

/** The sizes in which a lane is drawn; px. */
export const LANE_SIZES = {
  alone: { width: 134, height: 18 },
  inline: { width: 412, height: 24 },
  phone: { width: 358, height: 52 },
  large: { width: 640, height: 64 },
} as const;
export type LaneSize = keyof typeof LANE_SIZES;

export function laneShapes(lane: LaneView, size: LaneSize): readonly Mark[] {
  return DRAWN[size](lane);
}

const DRAWN: Readonly<Record<LaneSize, (lane: LaneView) => readonly Mark[]>> = { alone, inline, phone, large };

const hasStatus = (lane: LaneView): boolean => lane.wiring === 'four-core';

/** The line by itself, for tables whose columns already hold the figures. */
function alone(lane: LaneView): readonly Mark[] {
  const [y, s] = [6.5, lane.state];
  return [
    run(9, 20, y, s), run(24, 88, y, s), run(104, 112, y, s, 'grease'),
    ...(hasStatus(lane) ? [statusReturn({ x: 96, y: 11 }, 1, 15, 5, lane.statusState)] : []),
    outputSquare(1, 6, 8, s), terminal(22, y, 2.75, s), capsule(88, 6, 16, 11, s), ring(116, y, 4.5, s), signaturePlace(128, y, 4.5),
  ];
}

/** With its figures in fixed places, so that rows align. */
function inline(lane: LaneView): readonly Mark[] {
  const [y, s] = [9.5, lane.state];
  return [
    outputName(lane, 0, 13.3),
    run(68, 82, y, s), run(87, 302, y, s), run(320, 382, y, s, 'grease'),
    ...(hasStatus(lane) ? [statusReturn({ x: 311, y: 15 }, 60, 20.5, 6, lane.statusState)] : []),
    outputSquare(59, y, 9, s), terminal(84.5, y, 3, s), capsule(302, y, 18, 12, s), ring(387, y, 5, s), signaturePlace(404, y, 5.5),
    ...onLine(118, 'mono', [lane.from ?? '–'], (lane.from ?? '–').length * 6.6 + 6),
    ...onLine(192, '', cable(lane), 52 + 6 * cableFigures(lane).length),
    ...onLine(274, isBelowMinimum(lane) ? 'bad' : '', volts(lane), 40),
    ...onLine(351, '', [interval(lane)], 41),
  ];
}

/** A row of a list on a phone, figures beneath. */
function phone(lane: LaneView): readonly Mark[] {
  const [y, s] = [10.5, lane.state];
  return [
    run(13, 81, y, s), run(87, 232, y, s), run(256, 318, y, s, 'grease'),
    ...(hasStatus(lane) ? [statusReturn({ x: 244, y: 18 }, 2, 25.5, 8, lane.statusState)] : []),
    outputSquare(1, y, 12, s), terminal(84, y, 4, s), capsule(232, y, 24, 16, s), ring(325, y, 7, s), signaturePlace(349, y, 6.5),
    outputName(lane, 0, 46), text('mono', 84, 46, lane.from ?? '', 'middle'), text('', 164, 46, cable(lane), 'middle'),
    text(isBelowMinimum(lane) ? 'bad' : '', 244, 46, volts(lane), 'middle'), text('', 358, 46, interval(lane), 'end'),
  ];
}

/** As large as on the sign-in page. */
function large(lane: LaneView): readonly Mark[] {
  const [y, s] = [16.5, lane.state];
  return [
    run(20, 120, y, s), run(127, 396, y, s), run(432, 566, y, s, 'grease'),
    ...(hasStatus(lane) ? [statusReturn({ x: 414, y: 29 }, 6, 34.5, 10, lane.statusState)] : []),
    outputSquare(3, y, 17, s), terminal(124, y, 4.5, s), capsule(396, y, 36, 24, s), ring(576, y, 10, s), signaturePlace(622, y, 10),
    outputName(lane, 3, 58), text('mono', 124, 58, lane.from ?? '', 'middle'), text('', 262, 58, cable(lane), 'middle'),
    text(isBelowMinimum(lane) ? 'bad' : '', 414, 58, volts(lane), 'middle'), text('', 576, 58, interval(lane), 'middle'),
  ];
}

/** A figure interrupts its line, as on a dimension line. */
const onLine = (x: number, cls: string, words: readonly (string | Words)[], width: number): readonly Mark[] =>
  [rect('gap', x - width / 2, 3, width, 13), text(cls, x, 13.3, words, 'middle')];

const outputName = (lane: LaneView, x: number, y: number): Mark =>
  lane.output === null ? text('off', x, y, 'no output') : text('mono', x, y, lane.output);

const cableFigures = (lane: LaneView): string => formatNumber(lane.lengthM, 0) + formatNumber(lane.sectionMm2);

const cable = (lane: LaneView): readonly (string | Words)[] =>
  [formatNumber(lane.lengthM, 0), unit('m\u2002'), formatNumber(lane.sectionMm2), unit('mm²')];

const volts = (lane: LaneView): readonly (string | Words)[] => [formatNumber(lane.worstV, 1, 'down'), unit('V')];

const interval = (lane: LaneView): string => formatInterval(lane.intervalMs).replaceAll(THIN_SPACE, '\u202f');

/** The line in words, for those who listen. */
export function laneWords(lane: LaneView): string {
  if (lane.state === 'unmapped') return `${lane.tag}: not mapped`;
  return [
    `${lane.tag}: output ${lane.output ?? 'none'}`,
    ...(hasStatus(lane) ? [`status ${lane.status ?? 'not mapped'}`] : []),
    ...(lane.lengthM === null ? [] : [`cable ${formatNumber(lane.lengthM, 0)} m`]),
    ...(lane.worstV === null ? [] : [`${formatNumber(lane.worstV, 1, 'down')} V at the dispenser${isBelowMinimum(lane) ? ', too low' : ''}`]),
    ...(lane.intervalMs === null ? [] : [`a pulse every ${formatInterval(lane.intervalMs)}`]),
    lane.state,
  ].join(', ');
}
