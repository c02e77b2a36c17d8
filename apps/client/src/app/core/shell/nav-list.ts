import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { FindingMark } from '../../shared/findings/finding-mark';
import type { NavGroup } from './nav';

@Component({
  selector: 'lw-nav-list',
  imports: [FindingMark, RouterLink, RouterLinkActive],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    nav { display: flex; flex-direction: column; gap: 1px; height: 100%; padding: 12px 0; overflow: auto; font: var(--mat-sys-body-small); border-right: 1px solid var(--lw-rule); }
    h2 { padding: 14px 16px 4px; font: var(--mat-sys-label-small); color: var(--mat-sys-on-surface-variant); }
    a { display: flex; align-items: center; gap: 8px; min-height: 32px; margin: 0 8px; padding: 0 8px; color: inherit; text-decoration: none; border-radius: var(--mat-sys-corner-small); transition: background var(--lw-quick); }
    a:hover { background: var(--mat-sys-surface-container-high); }
    a.here { color: var(--mat-sys-on-primary-container); font-weight: 600; background: var(--mat-sys-primary-container); }
    .n { display: inline-flex; align-items: center; gap: 5px; margin-left: auto; font-size: 12px; color: var(--mat-sys-on-surface-variant); }
    a.here .n { color: inherit; }
    .end { margin-top: auto; }`,
  template: `
    <nav aria-label="Pages">
      @for (group of groups(); track $index) {
        @if (group.title) { <h2 [class.end]="$last">{{ group.title }}</h2> }
        @for (entry of group.entries; track entry.label) {
          <a [routerLink]="entry.link" routerLinkActive="here" ariaCurrentWhenActive="page" [routerLinkActiveOptions]="{ exact: entry.label === 'Projects' }">
            {{ entry.label }}
            <span class="n">
              @if (entry.errors) { <lw-finding-mark kind="error" [size]="13" /> }
              {{ entry.count }}
            </span>
          </a>
        }
      }
    </nav>`,
})
export class NavList {
  readonly groups = input.required<readonly NavGroup[]>();
}
