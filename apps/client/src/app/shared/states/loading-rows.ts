import { ChangeDetectionStrategy, Component, computed, DestroyRef, inject, input, signal } from '@angular/core';

const WIDTHS = [70, 110, 92, 120, 84, 104] as const;
const QUIET_MS = 300;

/** Nothing for 300 ms, then still bars and what is awaited. */
@Component({
  selector: 'lw-loading-rows',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'status' },
  styles: `
    :host { display: block; background: var(--lw-sheet); }
    li { display: grid; grid-template-columns: 90px 1fr 60px; align-items: center; height: var(--lw-row); padding: 0 var(--lw-gutter); border-bottom: 1px solid var(--lw-rule); }
    i { height: 9px; background: var(--mat-sys-surface-container-high); }
    p { padding: 8px var(--lw-gutter); font: var(--mat-sys-body-small); color: var(--mat-sys-on-surface-variant); }`,
  template: `
    @if (late()) {
      <ul aria-hidden="true">
        @for (width of widths(); track $index) { <li><i [style.width.px]="64"></i><i [style.width.px]="width"></i><i [style.width.px]="36"></i></li> }
      </ul>
      <p>{{ text() }}</p>
    }`,
})
export class LoadingRows {
  readonly text = input('Loading');
  readonly rows = input(4);
  protected readonly late = signal(false);
  protected readonly widths = computed(() => Array.from({ length: this.rows() }, (_, i) => WIDTHS[i % WIDTHS.length]));

  constructor() {
    const timer = setTimeout(() => this.late.set(true), QUIET_MS);
    inject(DestroyRef).onDestroy(() => clearTimeout(timer));
  }
}
