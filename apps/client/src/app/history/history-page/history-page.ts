import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import type { HistoryEntry, Problem } from '#contract';
import { firstValueFrom, type Subscription } from 'rxjs';
import { problemOf, problemText } from '../../core/api/problem';
import { ProjectApi } from '../../core/project/project-api';
import { ProjectStore } from '../../core/project/project-store';
import { UndoCommands } from '../../core/project/undo-commands';
import { EmptyState } from '../../shared/states/empty-state';
import { ErrorState } from '../../shared/states/error-state';
import { LoadingRows } from '../../shared/states/loading-rows';
import { PageHead } from '../../shared/states/page-head';
import { ConfirmUndo } from '../confirm-undo/confirm-undo';
import { type EntryView, entryView } from '../entry-view';

const PAGE = 50;
/** As many as the server gives at once. */
const MOST = 200;

/** Who changed what, and when: the change sets of the project, latest first, each with its undo or redo. */
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
  private readonly dialog = inject(MatDialog);
  private readonly undo = inject(UndoCommands);
  protected readonly store = inject(ProjectStore);
  private readonly entries = signal<readonly HistoryEntry[] | null>(null);
  protected readonly views = computed(() => this.entries()?.map(entryView) ?? null);
  protected readonly failed = signal<Problem | null>(null);
  protected readonly ended = signal(false);
  /** The entry whose undo is under way, and the reason where one was refused. */
  protected readonly busy = signal<string | null>(null);
  protected readonly refused = signal<{ readonly id: string; readonly text: string } | null>(null);
  private readonly projectId = computed(() => this.store.document()?.project.id ?? null);
  private readonly sequence = computed(() => this.store.document()?.sequence ?? 0);

  private request: Subscription | null = null;

  constructor() {
    // Each change of the project, by whomever, stands at the head of the list at once.
    effect(() => {
      this.sequence();
      if (this.projectId()) untracked(() => this.load());
    });
  }

  /** As many entries as are shown, since any of them may be undone meanwhile. */
  protected load(): void {
    const limit = Math.min(MOST, Math.max(PAGE, this.entries()?.length ?? 0));
    this.fetch(limit, undefined, () => []);
  }

  protected older(): void {
    const known = this.entries() ?? [];
    this.fetch(PAGE, known.at(-1)?.sequence, () => known);
  }

  protected async act(view: EntryView): Promise<void> {
    const { act, entry } = view;
    if (!act || (entry.rows > 1 && !(await this.confirmed(view)))) return;
    this.refused.set(null);
    this.busy.set(entry.id);
    const taken = await this.undo.take(act.direction, act.set);
    this.busy.set(null);
    if (taken?.problem) this.refused.set({ id: entry.id, text: problemText(taken.problem) });
    else this.load();
  }

  private confirmed(view: EntryView): Promise<boolean | undefined> {
    return firstValueFrom(this.dialog.open<ConfirmUndo, EntryView, boolean>(ConfirmUndo, { data: view, width: '460px' }).afterClosed());
  }

  private fetch(limit: number, before: number | undefined, known: () => readonly HistoryEntry[]): void {
    this.failed.set(null);
    // A later request knows more than one that is still on its way.
    this.request?.unsubscribe();
    this.request = this.api.history(this.projectId() ?? '', before === undefined ? { limit } : { limit, before }).subscribe({
      next: (page) => {
        this.ended.set(page.length < limit);
        this.entries.set([...known(), ...page]);
      },
      error: (error: unknown) => this.failed.set(problemOf(error)),
    });
  }
}
