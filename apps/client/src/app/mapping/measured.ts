import { DestroyRef, Directive, ElementRef, inject, output } from '@angular/core';

/** Tells the height of its element, px, whenever the browser has laid it out anew. */
@Directive({ selector: '[lwMeasured]' })
export class Measured {
  readonly measured = output<number>({ alias: 'lwMeasured' });

  constructor() {
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const watch = new ResizeObserver(() => this.measured.emit(element.offsetHeight));
    watch.observe(element);
    inject(DestroyRef).onDestroy(() => watch.disconnect());
  }
}
