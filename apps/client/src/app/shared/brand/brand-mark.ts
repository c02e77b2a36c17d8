import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A pulse that ends in a bearing ring. */
@Component({
  selector: 'lw-brand-mark',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
  styles: ':host { display: inline-flex; flex: none; } circle { stroke: var(--lw-pulse); }',
  template: `
    <svg [attr.width]="size() * 1.45" [attr.height]="size()" viewBox="0 0 32 22" fill="none" stroke-width="2.6">
      <path d="M1 15.5H8V5.5H16V15.5H22" stroke="currentColor" />
      <circle cx="26.2" cy="15.5" r="3.9" />
    </svg>`,
})
export class BrandMark {
  /** Height, px. */
  readonly size = input(18);
}
