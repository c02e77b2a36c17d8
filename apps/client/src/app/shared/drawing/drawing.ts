import { Directive, DOCUMENT, ElementRef, inject, input, type OnChanges } from '@angular/core';
import type { Mark } from './mark';

const SVG = 'http://www.w3.org/2000/svg';

/**
 * Draws marks into its `<svg>` or `<g>`: one write a drawing, and no effect of its own, which long lists of lanes
 * need. Marks that are the same object as before are not drawn again.
 */
@Directive({ selector: '[lwDrawing]' })
export class Drawing implements OnChanges {
  readonly lwDrawing = input.required<readonly Mark[]>();
  private readonly document = inject(DOCUMENT);
  private readonly host = inject<ElementRef<SVGElement>>(ElementRef).nativeElement;

  ngOnChanges(): void {
    this.host.replaceChildren(...this.lwDrawing().map((mark) => this.element(mark)));
  }

  private element(mark: Mark): SVGElement {
    const made = this.document.createElementNS(SVG, mark.tag);
    for (const [name, value] of Object.entries(mark.attrs)) if (value !== '') made.setAttribute(name, value);
    if (mark.text !== undefined) made.textContent = mark.text;
    for (const child of mark.children ?? []) made.appendChild(this.element(child));
    return made;
  }
}
