import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { figureParts, NOTHING } from '#calc';

/** A figure as `#calc` writes it, its unit drawn quietly. With `explains` it says on a click why it is so. */
@Component({
  selector: 'lw-figure',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { white-space: nowrap; }
    button { border: 0; background: none; padding: 0; cursor: pointer; text-decoration: underline dotted var(--mat-sys-outline) 1.25px; text-underline-offset: 3px; }
    button[aria-expanded='true'] { text-decoration: none; }
    .bad { color: var(--mat-sys-error); font-weight: 600; }`,
  template: `
    @if (explains() && !nothing()) {
      <button type="button" [attr.aria-label]="text() + ', explain ' + explains()" [attr.aria-expanded]="open()" [class.bad]="bad()" (click)="explain.emit()">
        {{ parts().figure }}@if (parts().unit) {<span class="u">{{ parts().unit }}</span>}
      </button>
    } @else {
      <span [class.bad]="bad()">{{ parts().figure }}@if (parts().unit) {<span class="u">{{ parts().unit }}</span>}</span>
    }`,
})
export class Figure {
  /** As the formatters of `#calc` write it, for instance `23.1 V`. */
  readonly text = input.required<string>();
  /** What it is, as `pulse interval`; empty: it explains nothing. */
  readonly explains = input('');
  /** Its explanation is shown now. */
  readonly open = input(false);
  /** Beyond its limit. */
  readonly bad = input(false);
  readonly explain = output();
  protected readonly parts = computed(() => figureParts(this.text()));
  protected readonly nothing = computed(() => this.text() === NOTHING);
}
