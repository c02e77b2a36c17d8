import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { HistoryEntry, Problem } from '#contract';
import { problemOf } from '../../core/api/problem';
import { ProjectApi } from '../../core/project/project-api';
import { ProjectStore } from '../../core/project/project-store';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { dayAndTime } from '../../shared/words/day-and-time';

/** Who changed what, and when: the change sets of the project, latest first. */
@Component({
  selector: 'lw-history-page',
  imports: [EmptyState, ErrorState, LoadingRows, MatButton, PageHead],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'page' },
  styleUrl: './history-page.css',
  templateUrl: './history-page.html',
})
export class HistoryPage {
  private readonly api = inject(ProjectApi);
  protected readonly store = inject(ProjectStore);
  protected readonly entries = signal<readonly HistoryEntry[] | null>(null);
  protected readonly failed = signal<Problem | null>(null);
  protected readonly ended = signal(false);
  protected readonly when = dayAndTime;
  private readonly projectId = computed(() => this.store.document()?.project.id ?? null);
  private readonly sequence = computed(() => this.store.document()?.sequence ?? 0);

  constructor() {
    // Each change of the project, by whomever, stands at the head of the list at once.
    effect(() => {
      this.sequence();
      if (this.projectId()) untracked(() => this.load());
    });
  }

  protected load(): void {
    this.fetch(undefined, () => []);
  }

  protected older(): void {
    const known = this.entries() ?? [];
    this.fetch(known.at(-1)?.sequence, () => known);
  }

  private fetch(before: number | undefined, known: () => readonly HistoryEntry[]): void {
    this.failed.set(null);
    this.api.history(this.projectId() ?? '', before).subscribe({
      next: (page) => {
        this.ended.set(page.length === 0);
        this.entries.set([...known(), ...page]);
      },
      error: (error: unknown) => this.failed.set(problemOf(error)),
    });
  }
}
