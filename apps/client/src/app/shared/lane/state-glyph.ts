import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { circle, group, type Mark } from '../drawing/mark';
import { run } from './lane-parts';
import { LANE_STATE_WORDS, type LaneState } from './lane-view';

/** A lane's state as a short stretch of its line, with its word unless the place already has it. */
@Component({
  selector: 'lw-state-glyph',
  imports: [Drawing],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: inline-flex; align-items: center; gap: 7px; white-space: nowrap; vertical-align: middle; } b { font-weight: 500; }',
  template: `
    <svg class="glyph" width="28" height="12" viewBox="0 0 28 12" aria-hidden="true" [lwDrawing]="shapes()"></svg>
    @if (word()) { <b>{{ words[state()] }}</b> }`,
})
export class StateGlyph {
  readonly state = input.required<LaneState>();
  readonly word = input(true);
  protected readonly words = LANE_STATE_WORDS;
  protected readonly shapes = computed(() => glyphShapes(this.state()));
}

function glyphShapes(state: LaneState): readonly Mark[] {
  if (state === 'unmapped') return [run(2, 26, 6, state)];
  const wired = state === 'wired';
  const end = (x: number) => circle(wired ? 'head' : 'node', x, 6, wired ? 3.2 : 2.5);
  return [run(4, 24, 6, state), group(`st-${state}`, end(3.5), end(24.5))];
}
