import { type CdkVirtualScrollViewport, VIRTUAL_SCROLL_STRATEGY, type VirtualScrollStrategy } from '@angular/cdk/scrolling';
import { Directive, effect, forwardRef, input } from '@angular/core';
import { distinctUntilChanged, Subject } from 'rxjs';
import { offsetsOf, rangeIn } from './section-heights';

const MARGIN_PX = 700;

/** Draws the items of known, different heights that are in sight; a short list it draws whole, so that the browser's own search finds all. */
class SectionScrollStrategy implements VirtualScrollStrategy {
  private readonly indexes = new Subject<number>();
  readonly scrolledIndexChange = this.indexes.pipe(distinctUntilChanged());
  private viewport: CdkVirtualScrollViewport | null = null;
  private offsets: readonly number[] = [0];
  private whole = true;

  attach(viewport: CdkVirtualScrollViewport): void {
    this.viewport = viewport;
    this.measure();
  }

  detach(): void {
    this.indexes.complete();
    this.viewport = null;
  }

  set(heights: readonly number[], whole: boolean): void {
    this.offsets = offsetsOf(heights);
    this.whole = whole;
    this.measure();
  }

  onContentScrolled(): void {
    this.draw();
  }

  onDataLengthChanged(): void {
    this.measure();
  }

  onContentRendered(): void { /* Heights are known beforehand. */ }

  onRenderedOffsetChanged(): void { /* The offset follows from the heights. */ }

  scrollToIndex(index: number, behavior: ScrollBehavior): void {
    this.viewport?.scrollToOffset(this.offsets[index] ?? 0, behavior);
  }

  private measure(): void {
    this.viewport?.setTotalContentSize(this.offsets[this.offsets.length - 1]);
    this.draw();
  }

  private draw(): void {
    const viewport = this.viewport;
    if (!viewport) return;
    const top = viewport.measureScrollOffset();
    const range = rangeIn(this.offsets, top, viewport.getViewportSize(), this.whole ? Infinity : MARGIN_PX);
    viewport.setRenderedRange(range);
    viewport.setRenderedContentOffset(this.offsets[range.start] ?? 0);
    this.indexes.next(rangeIn(this.offsets, top, 0, 0).start);
  }
}

/** Virtual scrolling over items whose heights are given, px, in order. */
@Directive({
  selector: 'cdk-virtual-scroll-viewport[lwSectionScroll]',
  providers: [{ provide: VIRTUAL_SCROLL_STRATEGY, useFactory: (self: SectionScroll) => self.strategy, deps: [forwardRef(() => SectionScroll)] }],
})
export class SectionScroll {
  readonly heights = input.required<readonly number[]>({ alias: 'lwSectionScroll' });
  /** Draw all of it. */
  readonly whole = input(false);
  readonly strategy = new SectionScrollStrategy();

  constructor() {
    effect(() => this.strategy.set(this.heights(), this.whole()));
  }
}
