import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Icon } from '../../shared/icon/icon';
import { ProjectStore } from '../project/project-store';
import { UndoCommands } from '../project/undo-commands';
import type { NavEntry, NavGroup } from './nav';

/** The pages that stand in the bar itself; the others are behind "More". */
const IN_BAR: Readonly<Record<string, string>> = { Overview: 'Overview', 'Points and doses': 'Points', 'I/O mapping': 'Mapping', Findings: 'Findings' };

/** The phone's navigation, with undo and redo behind "More". */
@Component({
  selector: 'lw-tab-bar',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink, RouterLinkActive],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    nav { position: fixed; inset: auto 0 0; z-index: 5; display: grid; grid-auto-flow: column; grid-auto-columns: 1fr; height: 64px; background: var(--lw-sheet); border-top: 1px solid var(--lw-rule-strong); }
    nav a, nav button { display: flex; flex-direction: column; align-items: center; justify-content: center; gap: 3px; padding: 0; font: 500 12px/16px var(--lw-sans); color: var(--mat-sys-on-surface-variant); text-decoration: none; background: none; border: 0; }
    .here { color: var(--mat-sys-on-primary-container); font-weight: 600; background: var(--mat-sys-primary-container); }
    hr { height: 1px; margin: 4px 0; background: var(--lw-rule); border: 0; }
    .act { display: flex; align-items: center; gap: 10px; }
    :focus-visible { outline-offset: -3px; }`,
  template: `
    <nav aria-label="Pages">
      @for (tab of tabs(); track tab.label) {
        <a [routerLink]="tab.link" routerLinkActive="here" ariaCurrentWhenActive="page" [routerLinkActiveOptions]="{ exact: tab.label === 'Projects' }">
          <lw-icon [name]="tab.icon" [size]="20" />{{ short(tab) }}
        </a>
      }
      @if (more().length > 0) {
        <button type="button" [matMenuTriggerFor]="rest"><lw-icon name="menu" [size]="20" />More</button>
      }
    </nav>
    <mat-menu #rest="matMenu">
      @for (entry of more(); track entry.label) { <a mat-menu-item [routerLink]="entry.link">{{ entry.label }}</a> }
      @if (inProject() && store.canEdit()) {
        <hr>
        @for (act of undo.acts(); track act.direction) {
          <button mat-menu-item type="button" [disabled]="!act.set" (click)="undo.run(act.direction)">
            <span class="act"><lw-icon [name]="act.direction" [size]="18" />{{ act.label }}</span>
          </button>
        }
      }
    </mat-menu>`,
})
export class TabBar {
  readonly groups = input.required<readonly NavGroup[]>();
  protected readonly store = inject(ProjectStore);
  protected readonly undo = inject(UndoCommands);
  private readonly entries = computed(() => this.groups().flatMap((g) => g.entries));
  protected readonly inProject = computed(() => this.entries().some((e) => e.label in IN_BAR));
  protected readonly tabs = computed(() => (this.inProject() ? this.entries().filter((e) => e.label in IN_BAR) : this.entries()));
  protected readonly more = computed(() => this.entries().filter((e) => !this.tabs().includes(e)));
  protected readonly short = (entry: NavEntry): string => IN_BAR[entry.label] ?? entry.label;
}
