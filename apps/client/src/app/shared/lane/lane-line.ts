import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { LANE_SIZES, laneShapes, type LaneSize } from './lane-shapes';
import type { LaneView } from './lane-view';
import { laneWords } from './lane-words';

/** The picture of a dispenser wherever it appears: output, terminal, cable, dispenser, point, and the status back. */
@Component({
  selector: 'lw-lane-line',
  imports: [Drawing],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: inline-block; flex: none; vertical-align: bottom; } .fluid { width: 100%; height: auto; }',
  template: `
    <svg class="lane" [class.fluid]="size() === 'large' || size() === 'phone'" [class.moved-on]="movedOn()" role="img" [lwDrawing]="shapes()" [attr.aria-label]="words()"
      [attr.width]="box().width" [attr.height]="box().height" [attr.viewBox]="'0 0 ' + box().width + ' ' + box().height"></svg>`,
})
export class LaneLine {
  readonly lane = input.required<LaneView>();
  readonly size = input<LaneSize>('inline');
  protected readonly box = computed(() => LANE_SIZES[this.size()]);
  protected readonly shapes = computed(() => laneShapes(this.lane(), this.size()));
  protected readonly words = computed(() => laneWords(this.lane()));
  /** The same lane has come to another state: drawn once from left to right. A row that now shows another lane has not. */
  protected readonly movedOn = linkedSignal<LaneView, boolean>({
    source: this.lane,
    computation: (lane, before) => before !== undefined && before.source.tag === lane.tag && before.source.state !== lane.state,
  });
}
