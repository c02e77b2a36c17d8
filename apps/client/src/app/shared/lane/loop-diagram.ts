import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatNumber } from '#calc';
import { Drawing } from '../drawing/drawing';
import { PROFILE, WIDTH } from './loop-geometry';
import { loopShapes } from './loop-shapes';
import { LoopUpright } from './loop-upright';
import type { LoopView } from './loop-view';

/** The whole lane with its voltage profile; upright on a phone. */
@Component({
  selector: 'lw-loop-diagram',
  imports: [Drawing, LoopUpright],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: ':host { display: block; } .wide { overflow-x: auto; } svg { width: 100%; min-width: 1000px; max-width: 1500px; height: auto; }',
  template: `
    <div class="wide desk-only">
      <svg class="lane loop" role="img" [attr.viewBox]="'0 0 ' + width + ' ' + height()" [attr.aria-label]="words()" [lwDrawing]="shapes()"></svg>
    </div>
    <div class="phone-only"><lw-loop-upright [loop]="loop()" /></div>`,
})
export class LoopDiagram {
  readonly loop = input.required<LoopView>();
  protected readonly width = WIDTH;
  protected readonly height = computed(() => (this.loop().profile === null ? PROFILE.top : PROFILE.top + PROFILE.height + 4));
  protected readonly shapes = computed(() => loopShapes(this.loop()));
  protected readonly words = computed(() => {
    const loop = this.loop();
    const end = loop.profile?.stations.at(-1);
    return `Loop diagram of ${loop.tag}${end ? `; ${formatNumber(end.worstV, 1, 'down')} V at the dispenser with the worst set, ${formatNumber(end.aloneV, 1)} V running alone` : ''}`;
  });
}
