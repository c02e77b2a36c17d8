import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { HungDispenser } from '../supply-views';

/** Tags of the dispensers that hang on a box or at the cabinet; each leads to its lane. */
@Component({
  selector: 'lw-hung-list',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    :host { display: flex; flex-wrap: wrap; gap: 3px 12px; font: var(--mat-sys-body-small); color: var(--mat-sys-on-surface-variant); }
    a { color: var(--mat-sys-on-surface); text-decoration: none; }
    a:hover { text-decoration: underline; }
    @media (pointer: coarse) { :host { gap: 4px 18px; } a { padding: 8px 0; } }`,
  template: `
    @for (dispenser of dispensers(); track dispenser.id) {
      <a class="tag" [routerLink]="['/projects', projectId(), 'lanes', dispenser.id]">{{ dispenser.tag }}</a>
    } @empty { no dispenser here }`,
})
export class HungList {
  readonly dispensers = input.required<readonly HungDispenser[]>();
  readonly projectId = input.required<string>();
}
