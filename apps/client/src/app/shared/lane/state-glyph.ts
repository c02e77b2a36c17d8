import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { glyphShapes } from './glyph-shapes';
import { LANE_STATE_WORDS, type LaneState } from './lane-view';

/** A lane's state as a short stretch of its line, with its word unless the place already has it. */
@Component({
  selector: 'lw-state-glyph',
  imports: [Drawing],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: inline-flex; align-items: center; gap: 7px; white-space: nowrap; vertical-align: middle; }
    b { font-weight: 500; }
    .st-checked, .st-signed, .st-stale { color: var(--c); }`,
  template: `
    <svg class="glyph" width="28" height="12" viewBox="0 0 28 12" aria-hidden="true" [lwDrawing]="shapes()"></svg>
    @if (word()) { <b class="st-{{ state() }}">{{ aboutTo() ? 'About to go stale' : words[state()] }}</b> }`,
})
export class StateGlyph {
  readonly state = input.required<LaneState>();
  readonly word = input(true);
  /** Stale in the draft only. */
  readonly aboutTo = input(false);
  protected readonly words = LANE_STATE_WORDS;
  protected readonly shapes = computed(() => glyphShapes(this.state(), 0, 0, this.aboutTo()));
}
