import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Severity } from '#calc';
import { Drawing } from '../drawing/drawing';
import { circle, group, type Mark, path } from '../drawing/mark';
import { run } from './lane-parts';
import { LANE_STATE_WORDS, LANE_STATES, type LaneState } from './lane-view';

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
    LANE_STATES.map((s) => [count(this.lanes(), s), LANE_STATE_WORDS[s].toLowerCase()] as const).filter(([n]) => n > 0).map((p) => p.join(' ')).join(', '));
}

const count = (lanes: readonly LaneMark[], state: LaneState): number => lanes.filter((l) => l.state === state).length;

function marks(lanes: readonly LaneMark[], perRow: number): readonly Mark[] {
  return lanes.flatMap((lane, i) => {
    const x = (i % perRow) * (WIDTH + GAP);
    const y = Math.floor(i / perRow) * ROW + 22;
    return [...stretch(x, x + WIDTH, y, lane.state), ...(lane.severity ? [findingShape(x + WIDTH / 2, y - 14, lane.severity)] : [])];
  });
}

function stretches(lanes: readonly LaneMark[], width: number): readonly Mark[] {
  let x = 0;
  return LANE_STATES.filter((s) => count(lanes, s) > 0).flatMap((state) => {
    const from = x;
    x += (width * count(lanes, state)) / lanes.length;
    return stretch(from, x - GAP, 22, state);
  });
}

function stretch(x1: number, x2: number, y: number, state: LaneState): readonly Mark[] {
  const ends = state === 'mapped' ? [group('st-mapped', circle('node', x1 + 2, y, 2), circle('node', x2 - 2, y, 2))] : [];
  return [run(x1, x2, y, state), ...ends];
}

/** The finding marks in 11 px, with their centre at (x, y). */
const findingShape = (x: number, y: number, severity: 'error' | 'warning'): Mark => severity === 'error'
  ? group('small-mark', path('octagon', `M${x - 2.2} ${y - 5.1}h4.4l2.9 2.9v4.4l-2.9 2.9h-4.4l-2.9 -2.9v-4.4z`), path('bang', `M${x} ${y - 3}v3.6M${x} ${y + 2.2}v.8`))
  : group('small-mark', path('triangle', `M${x} ${y - 4.4}L${x + 4.9} ${y + 4.4}H${x - 4.9}z`), path('stroke', `M${x} ${y - 1.4}v2.8M${x} ${y + 2.4}v.8`));
