import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Severity } from '#calc';
import { Drawing } from '../drawing/drawing';
import { circle, group, type Mark } from '../drawing/mark';
import { findingMark } from './finding-mark-shapes';
import { run, seal } from './lane-parts';
import { ALL_LANE_STATES, LANE_STATE_WORDS, type LaneState } from './lane-view';

/** One dispenser in the row of an area. */
export interface LaneMark {
  readonly id: string;
  readonly state: LaneState;
  /** Its gravest finding; null: none, or notes only. */
  readonly severity: Exclude<Severity, 'note'> | null;
}

const [WIDTH, GAP, PER_ROW, ROW, MOST] = [20, 4, 20, 30, 60];

/** An area at a glance: one short mark a dispenser, its finding above it; beyond 60 one stretch a state, length by count. */
@Component({
  selector: 'lw-lane-marks',
  imports: [Drawing],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: block; } svg { max-width: 100%; }',
  template: `
    <svg class="lane" role="img" [attr.aria-label]="words()" [attr.width]="width()" [attr.height]="height()"
      [attr.viewBox]="'0 0 ' + width() + ' ' + height()" [lwDrawing]="shapes()"></svg>`,
})
export class LaneMarks {
  readonly lanes = input.required<readonly LaneMark[]>();
  /** Marks in a row before the next one begins. */
  readonly perRow = input(PER_ROW);
  private readonly many = computed(() => this.lanes().length > MOST);
  protected readonly width = computed(() => this.perRow() * (WIDTH + GAP));
  protected readonly height = computed(() => (this.many() ? 1 : Math.max(1, Math.ceil(this.lanes().length / this.perRow()))) * ROW + 2);
  protected readonly shapes = computed(() => (this.many() ? stretches(this.lanes(), this.width()) : marks(this.lanes(), this.perRow())));
  protected readonly words = computed(() =>
    ALL_LANE_STATES.map((s) => [count(this.lanes(), s), LANE_STATE_WORDS[s].toLowerCase()] as const).filter(([n]) => n > 0).map((p) => p.join(' ')).join(', '));
}

const count = (lanes: readonly LaneMark[], state: LaneState): number => lanes.filter((l) => l.state === state).length;

function marks(lanes: readonly LaneMark[], perRow: number): readonly Mark[] {
  return lanes.flatMap((lane, i) => {
    const x = (i % perRow) * (WIDTH + GAP);
    const y = Math.floor(i / perRow) * ROW + 22;
    return [...stretch(x, x + WIDTH, y, lane.state), ...(lane.severity ? [findingMark(x + WIDTH / 2, y - 14, lane.severity)] : [])];
  });
}

function stretches(lanes: readonly LaneMark[], width: number): readonly Mark[] {
  let x = 0;
  return ALL_LANE_STATES.filter((s) => count(lanes, s) > 0).flatMap((state) => {
    const from = x;
    x += (width * count(lanes, state)) / lanes.length;
    return stretch(from, x - GAP, 22, state);
  });
}

/** A short mark of a lane: ends while it is mapped, its seal once it is signed or stale. */
function stretch(x1: number, x2: number, y: number, state: LaneState): readonly Mark[] {
  const middle = (x1 + x2) / 2;
  const ends = state === 'mapped' ? [group('st-mapped', circle('node', x1 + 2, y, 2), circle('node', x2 - 2, y, 2))] : [];
  const seals = state === 'signed' ? [circle('gap', middle, y, 5.5), seal(middle, y, 4, state)] : [];
  return [run(x1, x2, y, state, { ticks: [middle], k: 0.85 }), ...ends, ...seals];
}
