import { circle, group, type Mark, path, rect, round } from '../drawing/mark';
import type { LaneState } from './lane-view';

/** A straight run of the line, in the style of its state: dotted, thin or heavy. */
export function run(x1: number, x2: number, y: number, state: LaneState, cls = ''): Mark {
  const from = state === 'unmapped' ? x1 + 1 : x1;
  return group(`st-${state} ${cls}`, path(`seg ${STROKES[state]}`, `M${round(from)} ${round(y)}H${round(x2)}`));
}

const STROKES: Readonly<Record<LaneState, string>> = { unmapped: 'dotted', mapped: 'thin', wired: 'heavy' };

/** The output channel: a square, dashed while open, full once wired. */
export const outputSquare = (x: number, y: number, edge: number, state: LaneState): Mark =>
  group(`st-${state}`, rect(`node ${FILLS[state]}`, x, y - edge / 2, edge, edge));

const FILLS: Readonly<Record<LaneState, string>> = { unmapped: 'open', mapped: '', wired: 'solid' };

/** A terminal: a small circle on the line. */
export const terminal = (x: number, y: number, r: number, state: LaneState): Mark => group(`st-${state}`, circle('term', x, y, r));

/** The dispenser: a capsule with the pulse in it. */
export function capsule(x: number, y: number, width: number, height: number, state: LaneState): Mark {
  const [w, h] = [width * 0.61, height / 2];
  const left = x + (width - w) / 2;
  const pulse = `M${round(left)} ${round(y + h / 2)}h${round(w * 0.27)}v${round(-h)}h${round(w * 0.46)}v${round(h)}h${round(w * 0.27)}`;
  return group(`st-${state}`, rect('node', x, y - height / 2, width, height, round(height / 4)), path('pulse', pulse));
}

/** The point: a bearing ring in amber. */
export const ring = (x: number, y: number, r: number, state: LaneState): Mark =>
  group(`st-${state} grease`, circle('node', x, y, r), circle('head', x, y, r / 3));

/** The status signal: thinner, below, back to a small square with an arrowhead. */
export function statusReturn(from: { readonly x: number; readonly y: number }, toX: number, y: number, edge: number, state: LaneState): Mark {
  const tip = toX + edge + 1;
  const head = edge * 0.95;
  return group(
    `st-${state} status`,
    path(`seg back ${state === 'unmapped' ? 'dotted' : ''}`, `M${round(from.x)} ${round(from.y)}V${round(y)}H${round(tip + head)}`),
    path('head', `M${round(tip)} ${round(y)}l${round(head)} ${round(-head / 2)}v${round(head)}z`),
    rect(`node ${state === 'unmapped' ? 'open' : ''}`, toX, y - edge / 2, edge, edge),
  );
}

/** The place where a signature will stand. */
export const signaturePlace = (x: number, y: number, k: number): Mark =>
  path('seal place', `M${round(x)} ${round(y - k)}L${round(x + k)} ${round(y)}L${round(x)} ${round(y + k)}L${round(x - k)} ${round(y)}Z`);
