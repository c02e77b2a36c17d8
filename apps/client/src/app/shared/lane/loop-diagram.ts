import { afterNextRender, ChangeDetectionStrategy, Component, computed, DestroyRef, type ElementRef, inject, input, signal, viewChild } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { LEAST_WIDTH, layoutOf, WIDTH } from './loop-geometry';
import { loopShapes } from './loop-shapes';
import { LoopStations } from './loop-stations';
import { LoopUpright } from './loop-upright';
import type { LoopView } from './loop-view';
import { loopWords } from './loop-words';

/** The whole lane with its voltage profile; upright where there is no room for it, and its figures as a list. */
@Component({
  selector: 'lw-loop-diagram',
  imports: [Drawing, LoopStations, LoopUpright],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './loop-diagram.css',
  template: `
    <div class="wide" #wide>
      <svg class="lane loop" role="img" [attr.viewBox]="'0 0 ' + width() + ' ' + layout().height" [attr.aria-label]="words()" [lwDrawing]="shapes()"></svg>
    </div>
    <lw-loop-upright class="narrow" [loop]="loop()" [words]="words()" />
    <lw-loop-stations class="list" [loop]="loop()" />`,
})
export class LoopDiagram {
  readonly loop = input.required<LoopView>();
  private readonly wide = viewChild.required<ElementRef<HTMLElement>>('wide');
  /** As wide as its place, so that its words keep their size and the trunk takes the room. */
  protected readonly width = signal(WIDTH);
  protected readonly layout = computed(() => layoutOf(this.loop(), this.width()));
  protected readonly shapes = computed(() => loopShapes(this.loop(), this.width()));
  protected readonly words = computed(() => loopWords(this.loop()));

  constructor() {
    const destroyed = inject(DestroyRef);
    afterNextRender(() => {
      const observer = new ResizeObserver(([entry]) => this.fit(entry.contentRect.width));
      observer.observe(this.wide().nativeElement);
      destroyed.onDestroy(() => observer.disconnect());
    });
  }

  /** Hidden it has no width, and keeps the one it had. */
  private fit(px: number): void {
    if (px > 0) this.width.set(Math.round(Math.min(1640, Math.max(LEAST_WIDTH, px))));
  }
}
