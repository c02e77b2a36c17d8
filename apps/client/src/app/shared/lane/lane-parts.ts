import { circle, group, type Mark, path, rect, round } from '../drawing/mark';
import type { LaneState } from './lane-view';

export interface RunOptions {
  readonly cls?: string;
  /** Where ticks of "checked" stand beside it; left out: every 60 px. */
  readonly ticks?: readonly number[];
  /** Middle of the gap of "stale"; left out: its own middle. */
  readonly gapAt?: number;
  /** Size of ticks and delta. */
  readonly k?: number;
  /** Stale in the draft only. */
  readonly hollow?: boolean;
}

/** A straight run of the line, in the style of its state: dotted, thin, heavy, with ticks beside it, double, with a gap. */
export function run(x1: number, x2: number, y: number, state: LaneState, options: RunOptions = {}): Mark {
  return group(options.cls ? `st-${state} ${options.cls}` : `st-${state}`, ...RUNS[state](x1, x2, y, options));
}

const line = (cls: string, x1: number, x2: number, y: number): Mark => path(`seg ${cls}`, `M${round(x1)} ${round(y)}H${round(x2)}`);

const RUNS: Readonly<Record<LaneState, (x1: number, x2: number, y: number, options: RunOptions) => readonly Mark[]>> = {
  unmapped: (x1, x2, y) => [line('dotted', x1 + 1, x2, y)],
  mapped: (x1, x2, y) => [line('thin', x1, x2, y)],
  wired: (x1, x2, y) => [line('heavy', x1, x2, y)],
  checked: (x1, x2, y, o) => [line('heavy', x1, x2, y), ...(o.ticks ?? spread(x1, x2)).map((x) => tickBeside(x, y - 3.2, o.k))],
  signed: (x1, x2, y) => [line('case', x1, x2, y), line('core', x1, x2, y)],
  stale: (x1, x2, y, { gapAt = (x1 + x2) / 2, k = 1, hollow }) =>
    [line('heavy', x1, gapAt - 4.5 * k, y), line('heavy', gapAt + 4.5 * k, x2, y), delta(gapAt, y - 2 * k, 6 * k, hollow)],
};

/** Between one and six places along a run. */
function spread(x1: number, x2: number): readonly number[] {
  const count = Math.max(1, Math.min(6, Math.round((x2 - x1) / 60)));
  return Array.from({ length: count }, (_, i) => x1 + ((x2 - x1) * (i + 0.5)) / count);
}

/** "Changed since": a solid delta over a gap, its foot at y; hollow while only the draft says so. */
export const delta = (x: number, y: number, height: number, hollow = false): Mark =>
  path(hollow ? 'delta hollow' : 'delta', `M${round(x)} ${round(y - height)}l${round(height * 0.6)} ${round(height)}h${round(-height * 1.2)}z`);

/** The tick of "checked", beside the line, never across it; its foot at y. */
export const tickBeside = (x: number, y: number, k = 1): Mark =>
  path('beside', `M${round(x - 2.7 * k)} ${round(y - 2.2 * k)}l${round(1.9 * k)} ${round(2.1 * k)}l${round(3.5 * k)} ${round(-4.4 * k)}`);

/** The output channel: a square, dashed while open, full once wired. */
export const outputSquare = (x: number, y: number, edge: number, state: LaneState): Mark =>
  group(`st-${state}`, rect(`node ${state === 'unmapped' ? 'open' : state === 'mapped' ? '' : 'solid'}`, x, y - edge / 2, edge, edge));

/** A terminal: a small circle on the line. */
export const terminal = (x: number, y: number, r: number, state: LaneState): Mark => group(`st-${state}`, circle('term', x, y, r));

/** What moves the motor: the output's pulse, the device's own clock, or nothing yet. */
export type CapsuleSign = 'pulse' | 'clock' | 'empty';

/** The dispenser: a capsule with the sign of what moves it. */
export function capsule(x: number, y: number, width: number, height: number, state: LaneState, sign: CapsuleSign = 'pulse'): Mark {
  return group(`st-${state}`, rect('node', x, y - height / 2, width, height, round(height / 4)), ...SIGNS[sign](x, y, width, height));
}

const SIGNS: Readonly<Record<CapsuleSign, (x: number, y: number, width: number, height: number) => readonly Mark[]>> = {
  pulse: (x, y, width, height) => {
    const [w, h] = [width * 0.61, height / 2];
    const left = x + (width - w) / 2;
    return [path('pulse', `M${round(left)} ${round(y + h / 2)}h${round(w * 0.27)}v${round(-h)}h${round(w * 0.46)}v${round(h)}h${round(w * 0.27)}`)];
  },
  clock: (x, y, width, height) => {
    const [cx, r] = [x + width / 2, height * 0.33];
    return [circle('clock', cx, y, r), path('clock', `M${round(cx)} ${round(y - r * 0.65)}V${round(y)}h${round(r * 0.6)}`)];
  },
  empty: () => [],
};

/** The point: a bearing ring in amber; only its rim while no grease is planned. */
export const ring = (x: number, y: number, r: number, state: LaneState): Mark =>
  group(`st-${state} grease`, circle('node', x, y, r), ...(state === 'unmapped' ? [] : [circle('head', x, y, r / 3)]));

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

/** The place of the signature: empty, full with a tick, or broken open once it is stale. */
export function seal(x: number, y: number, k: number, state: LaneState): Mark {
  if (state === 'signed') {
    return group('st-signed', path('seal full', diamond(x, y, k)),
      path('seal-tick', `M${round(x - 0.44 * k)} ${round(y + 0.04 * k)}l${round(0.31 * k)} ${round(0.33 * k)}l${round(0.56 * k)} ${round(-0.67 * k)}`));
  }
  if (state !== 'stale') return path('seal place', diamond(x, y, k));
  const half = (side: 1 | -1): Mark => path('seal', `M${round(x + side * 1.6)} ${round(y - k)}L${round(x + side * (1.6 + k))} ${round(y)}L${round(x + side * 1.6)} ${round(y + k)}`);
  return group('st-stale', half(-1), half(1));
}

const diamond = (x: number, y: number, k: number): string =>
  `M${round(x)} ${round(y - k)}L${round(x + k)} ${round(y)}L${round(x)} ${round(y + k)}L${round(x - k)} ${round(y)}Z`;
