import { circle, group, type Mark } from '../drawing/mark';
import { run, seal, tickBeside } from './lane-parts';
import type { LaneState } from './lane-view';

/** A state as a short stretch of its line, 28 × 12 px with its left edge at x and its top at y. */
export function glyphShapes(state: LaneState, x = 0, y = 0, hollow = false): readonly Mark[] {
  const middle = y + 6;
  const ends = (cls: string, r: number): Mark => group(`st-${state}`, circle(cls, x + 3.5, middle, r), circle(cls, x + 24.5, middle, r));
  const drawn: Readonly<Record<LaneState, () => readonly Mark[]>> = {
    unmapped: () => [run(x + 2, x + 26, middle, state)],
    mapped: () => [run(x + 4, x + 24, middle, state), ends('node', 2.5)],
    wired: () => [run(x + 3, x + 25, middle, state), ends('head', 3.2)],
    checked: () => [run(x + 3, x + 25, middle, state, { ticks: [] }), ends('head', 3.2), group('st-checked', tickBeside(x + 14, y + 2.6, 1.25))],
    signed: () => [run(x, x + 28, middle, state), circle('gap', x + 14, middle, 7.5), seal(x + 14, middle, 5.5, state)],
    stale: () => [run(x, x + 28, middle + 1, state, { k: 1.15, hollow })],
  };
  return drawn[state]();
}
