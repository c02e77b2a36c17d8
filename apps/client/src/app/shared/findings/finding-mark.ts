import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

export type FindingMarkKind = 'error' | 'warning' | 'note' | 'changed' | 'passes';

const NAMES: Readonly<Record<FindingMarkKind, string>> = {
  error: 'error', warning: 'warning', note: 'note', changed: 'changed', passes: 'passes',
};

/** Severity as a shape of its own: octagon, triangle, ring, delta, tick. `hollow` says "about to be", not yet. */
@Component({
  selector: 'lw-finding-mark',
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: inline-flex; flex: none; vertical-align: -2px; }
    svg { overflow: visible; }
    .brick { fill: var(--mat-sys-error); } .on-brick { stroke: var(--mat-sys-on-error); }
    .brick-line { stroke: var(--mat-sys-error); } .quiet-line { stroke: var(--mat-sys-on-surface-variant); }
    .plum { fill: var(--lw-changed); } .plum-line { stroke: var(--lw-changed); } .leaf-line { stroke: var(--lw-signed); }`,
  template: `
    <svg [attr.width]="size()" [attr.height]="size()" viewBox="0 0 14 14" fill="none" role="img" [attr.aria-label]="label()">
      @switch (kind()) {
        @case ('error') {
          <path [attr.class]="hollow() ? 'brick-line' : 'brick'" stroke-width="1.4" d="M4.2 .5h5.6l3.7 3.7v5.6l-3.7 3.7H4.2L.5 9.8V4.2z" />
          <path [attr.class]="hollow() ? 'brick-line' : 'on-brick'" stroke-width="1.8" d="M7 3.2v4.6M7 9.9v.9" />
        }
        @case ('warning') {
          <path class="brick-line" stroke-width="1.5" stroke-linejoin="round" d="M7 1.4L13.2 12.6H.8z" />
          <path class="brick-line" stroke-width="1.5" d="M7 5.2v3.6M7 10v1" />
        }
        @case ('note') {
          <circle class="quiet-line" stroke-width="1.4" cx="7" cy="7" r="5.6" />
          <path class="quiet-line" stroke-width="1.5" d="M7 6.4v3.6M7 3.9v1" />
        }
        @case ('changed') {
          <path [attr.class]="hollow() ? 'plum-line' : 'plum'" stroke-width="1.5" stroke-linejoin="round" d="M7 1.2L12.8 12H1.2z" />
        }
        @case ('passes') { <path class="leaf-line" stroke-width="1.8" d="M2 7.4l3.2 3.2L12 3.4" /> }
      }
    </svg>`,
})
export class FindingMark {
  readonly kind = input.required<FindingMarkKind>();
  readonly hollow = input(false);
  /** Edge, px. */
  readonly size = input(14);
  protected readonly label = computed(() => (this.hollow() ? `about to be: ${NAMES[this.kind()]}` : NAMES[this.kind()]));
}
