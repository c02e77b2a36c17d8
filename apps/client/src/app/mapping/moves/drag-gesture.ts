import { DestroyRef, Directive, DOCUMENT, ElementRef, inject, input, output } from '@angular/core';
import { edgeSpeed, farEnough } from './drag-rules';

/** Where the pointer is, and over which target. */
export interface DragPoint {
  readonly x: number;
  readonly y: number;
  /** The `data-drop` of what lies under it. */
  readonly key: string | null;
}

const LONG_PRESS_MS = 400;

/**
 * Dragging within its element: rows with `data-lift` are picked up by mouse or pen after a few pixels, by touch after a
 * long press; elements with `data-drop` are targets; elements with `data-scrolls` scroll while the pointer is at their edge.
 */
@Directive({ selector: '[lwDragGesture]' })
export class DragGesture {
  readonly enabled = input(true, { alias: 'lwDragGesture' });
  /** A row was picked up; answers with its `data-lift`. */
  readonly lifted = output<string>();
  readonly moved = output<DragPoint>();
  readonly dropped = output<void>();
  readonly cancelled = output<void>();

  private readonly document = inject(DOCUMENT);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private start: { readonly id: number; readonly x: number; readonly y: number; readonly key: string; readonly touch: boolean } | null = null;
  private dragging = false;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private frame = 0;
  private at = { x: 0, y: 0 };

  constructor() {
    this.host.addEventListener('pointerdown', this.press);
    // Once a long press has picked something up, the finger must not scroll; a passive listener could not say so.
    this.host.addEventListener('touchmove', this.hold, { passive: false });
    this.host.addEventListener('contextmenu', this.hold);
    inject(DestroyRef).onDestroy(() => this.stop());
  }

  private readonly press = (event: PointerEvent): void => {
    const source = (event.target as Element).closest<HTMLElement>('[data-lift]');
    if (!this.enabled() || !source || this.start || event.button !== 0 || isField(event.target as Element)) return;
    const touch = event.pointerType === 'touch';
    this.start = { id: event.pointerId, x: event.clientX, y: event.clientY, key: source.dataset['lift'] ?? '', touch };
    if (touch) this.timer = setTimeout(() => this.lift(), LONG_PRESS_MS);
    this.at = { x: event.clientX, y: event.clientY };
    this.document.addEventListener('pointermove', this.move);
    this.document.addEventListener('pointerup', this.release);
    this.document.addEventListener('pointercancel', this.abort);
    this.document.addEventListener('keydown', this.escape, true);
  };

  private readonly move = (event: PointerEvent): void => {
    const start = this.start;
    if (event.pointerId !== start?.id) return;
    this.at = { x: event.clientX, y: event.clientY };
    if (!this.dragging && farEnough(start, this.at, start.touch)) {
      // A finger that moves at once scrolls.
      if (start.touch) return this.stop();
      this.lift();
    }
    if (this.dragging) this.tell();
  };

  private readonly release = (event: PointerEvent): void => {
    if (event.pointerId !== this.start?.id) return;
    const dragged = this.dragging;
    this.stop();
    if (!dragged) return;
    this.document.addEventListener('click', swallow, { capture: true, once: true });
    setTimeout(() => this.document.removeEventListener('click', swallow, true));
    this.dropped.emit();
  };

  private readonly abort = (): void => {
    const dragged = this.dragging;
    this.stop();
    if (dragged) this.cancelled.emit();
  };

  private readonly escape = (event: KeyboardEvent): void => {
    if (event.key !== 'Escape' || !this.dragging) return;
    event.stopPropagation();
    this.abort();
  };

  private readonly hold = (event: Event): void => {
    if (this.dragging) event.preventDefault();
  };

  private lift(): void {
    if (!this.start) return;
    this.dragging = true;
    this.document.getSelection()?.removeAllRanges();
    this.lifted.emit(this.start.key);
    this.tell();
    this.frame = requestAnimationFrame(this.scroll);
  }

  private tell(): void {
    const under = this.document.elementFromPoint(this.at.x, this.at.y)?.closest<HTMLElement>('[data-drop]');
    this.moved.emit({ ...this.at, key: (under && this.host.contains(under) && under.dataset['drop']) || null });
  }

  /** Scrolls what the pointer holds near its edge, frame by frame. */
  private readonly scroll = (): void => {
    if (!this.dragging) return;
    const scroller = this.document.elementFromPoint(this.at.x, this.at.y)?.closest<HTMLElement>('[data-scrolls]');
    if (scroller) {
      const box = scroller.getBoundingClientRect();
      const down = edgeSpeed(this.at.y, box.top, box.bottom);
      const right = scroller.scrollWidth > scroller.clientWidth ? edgeSpeed(this.at.x, box.left, box.right) : 0;
      if (down !== 0 || right !== 0) {
        scroller.scrollBy(right, down);
        this.tell();
      }
    }
    this.frame = requestAnimationFrame(this.scroll);
  };

  private stop(): void {
    clearTimeout(this.timer);
    cancelAnimationFrame(this.frame);
    this.start = null;
    this.dragging = false;
    this.document.removeEventListener('pointermove', this.move);
    this.document.removeEventListener('pointerup', this.release);
    this.document.removeEventListener('pointercancel', this.abort);
    this.document.removeEventListener('keydown', this.escape, true);
  }
}

const isField = (element: Element): boolean => element.closest('input, select, textarea, button, mat-checkbox') !== null;

/** The click that a browser makes of the release selects nothing and follows no link. */
function swallow(event: Event): void {
  event.preventDefault();
  event.stopPropagation();
}
