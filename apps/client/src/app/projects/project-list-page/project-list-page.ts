import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import type { Problem, ProjectSummary } from '#contract';
import { problemOf } from '../../core/api/problem';
import { ProjectApi } from '../../core/project/project-api';
import { SessionStore } from '../../core/session/session-store';
import { Icon } from '../../shared/icon/icon';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { dayAndTime } from '../../shared/words/day-and-time';
import { NewProjectDialog } from '../new-project-dialog/new-project-dialog';

/** All projects of the organisation with how far each is. */
@Component({
  selector: 'lw-project-list-page',
  imports: [EmptyState, ErrorState, Icon, LoadingRows, MatButton, PageHead, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page' },
  styleUrl: './project-list-page.css',
  templateUrl: './project-list-page.html',
})
export class ProjectListPage {
  private readonly api = inject(ProjectApi);
  private readonly session = inject(SessionStore);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  protected readonly projects = signal<readonly ProjectSummary[] | null>(null);
  protected readonly failed = signal<Problem | null>(null);
  protected readonly canCreate = computed(() => this.session.can('project:create'));
  protected readonly organisation = computed(() => this.session.session()?.organisation.name ?? '');
  protected readonly when = dayAndTime;

  constructor() {
    this.load();
  }

  protected load(): void {
    this.failed.set(null);
    this.api.list().subscribe({
      next: (projects) => this.projects.set(projects),
      error: (error: unknown) => this.failed.set(problemOf(error)),
    });
  }

  protected create(): void {
    this.dialog.open<NewProjectDialog, readonly ProjectSummary[], string>(NewProjectDialog, { data: this.projects() ?? [], width: '480px' })
      .afterClosed().subscribe((id) => {
        if (id !== undefined) void this.router.navigate(['/projects', id]);
      });
  }

  protected share(project: ProjectSummary): number {
    return project.dispensers === 0 ? 0 : (100 * project.mapped) / project.dispensers;
  }
}
