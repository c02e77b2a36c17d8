import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import type { ProjectSummary } from '#contract';
import { Icon } from '../../shared/icon/icon';
import { ProjectApi } from '../project/project-api';

/** The open project's name, and the way to another. */
@Component({
  selector: 'lw-project-switcher',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styles: `
    button.name { display: flex; align-items: center; gap: 4px; max-width: 100%; height: 32px; padding: 0 6px; font-weight: 600; white-space: nowrap; background: none; border: 0; border-radius: var(--mat-sys-corner-small); cursor: pointer; }
    button.name:hover { background: var(--lw-hover); }
    .name span { overflow: hidden; text-overflow: ellipsis; }`,
  template: `
    <button class="name" type="button" [matMenuTriggerFor]="menu" (menuOpened)="load()">
      <span>{{ name() ?? 'Project' }}</span><lw-icon name="down" [size]="16" />
    </button>
    <mat-menu #menu="matMenu">
      @for (project of projects(); track project.id) {
        <a mat-menu-item [routerLink]="['/projects', project.id]" [attr.aria-current]="project.id === projectId() ? 'true' : null">{{ project.name }}</a>
      }
      <a mat-menu-item routerLink="/projects">All projects</a>
    </mat-menu>`,
})
export class ProjectSwitcher {
  readonly name = input.required<string | null>();
  readonly projectId = input.required<string>();
  private readonly api = inject(ProjectApi);
  protected readonly projects = signal<readonly ProjectSummary[]>([]);

  protected load(): void {
    // Without an answer the menu still leads to the list, which says what is wrong.
    this.api.list().subscribe({ next: (list) => this.projects.set(list), error: () => this.projects.set([]) });
  }
}
