import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ICON_PATHS, type IconName } from './icon-paths';

/** A small stroke drawing beside words; it says nothing by itself, so a button that has only an icon needs a label. */
@Component({
  selector: 'lw-icon',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
  styles: ':host { display: inline-flex; flex: none; }',
  template: `
    <svg [attr.width]="size()" [attr.height]="size()" viewBox="0 0 18 18" fill="none" stroke="currentColor" stroke-width="1.5" stroke-linecap="round" stroke-linejoin="round">
      <path [attr.d]="path()" />
    </svg>`,
})
export class Icon {
  readonly name = input.required<IconName>();
  /** Edge, px. */
  readonly size = input(18);
  protected readonly path = computed(() => ICON_PATHS[this.name()]);
}
