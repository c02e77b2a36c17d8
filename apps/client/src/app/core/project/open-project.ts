import { inject, Injectable, signal } from '@angular/core';
import type { ChangeNotice, DesignDocument, EditableCollection, Problem } from '#contract';
import { firstValueFrom, type Subscription } from 'rxjs';
import { problemOf } from '../api/problem';
import { SessionStore } from '../session/session-store';
import { type PlacedRow, rowOf, withAnswer, withNotice, withRows } from './document-rows';
import { liveChanges } from './live-changes';
import { type AnyRow, ProjectApi } from './project-api';
import { WriteQueue } from './write-queue';

/** The rows of the open project as this browser knows them: read whole once, then kept up with what the server announces. */
@Injectable({ providedIn: 'root' })
export class OpenProject {
  private readonly api = inject(ProjectApi);
  private readonly session = inject(SessionStore);
  private readonly queue = inject(WriteQueue);
  private readonly doc = signal<DesignDocument | null>(null);
  private readonly problem = signal<Problem | null>(null);
  private events: Subscription | null = null;
  private projectId: string | null = null;

  readonly document = this.doc.asReadonly();
  readonly failed = this.problem.asReadonly();

  get id(): string | null {
    return this.projectId;
  }

  async open(projectId: string): Promise<void> {
    this.projectId = projectId;
    await this.reload();
    this.events = liveChanges(projectId, () => this.session.renew()).subscribe({
      next: (sequence) => void this.catchUp(sequence),
      error: () => undefined, // Nobody is signed in any more; the next request says so.
    });
  }

  async reload(): Promise<void> {
    const projectId = this.projectId;
    if (!projectId) return;
    this.problem.set(null);
    try {
      const document = await firstValueFrom(this.api.design(projectId));
      if (projectId === this.projectId) this.doc.set(document);
    } catch (error) {
      this.problem.set(problemOf(error));
    }
  }

  close(): void {
    this.events?.unsubscribe();
    this.events = null;
    this.projectId = null;
    this.doc.set(null);
    this.problem.set(null);
  }

  row(collection: EditableCollection | 'projects', id: string): AnyRow | undefined {
    const document = this.doc();
    return document ? rowOf(document, collection, id) : undefined;
  }

  /** Shows another state of the project's rows. */
  show(change: (document: DesignDocument) => DesignDocument): void {
    this.doc.update((document) => document && change(document));
  }

  place(placed: PlacedRow): void {
    this.show((document) => withRows(document, [placed]));
  }

  /**
   * Takes the rows of an answer, save what later edits of the same rows have put on the screen.
   * @param writes of each row that this answer belongs to
   */
  take(projectId: string, answer: ChangeNotice, writes: number): void {
    if (projectId !== this.projectId) return;
    this.show((document) => withAnswer(document, answer, ({ collection, id, row }) => {
      const shown = this.queue.writesOf(id) > writes ? rowOf(document, collection, id) : undefined;
      return { collection, id, row: row && shown ? { ...shown, version: row.version } : row };
    }));
  }

  private async catchUp(sequence: number): Promise<void> {
    const [projectId, known] = [this.projectId, this.doc()?.sequence];
    if (known === undefined || sequence <= known || !projectId) return;
    try {
      const notice = await firstValueFrom(this.api.changesSince(projectId, known));
      if (projectId === this.projectId) this.show((document) => withNotice(document, notice, (placed) => this.unlessNewer(document, placed)));
    } catch {
      // The next event, or the next edit's answer, brings what this one missed.
    }
  }

  /** A row with an edit on its way is told by the answer to that, and an answer may have overtaken what came here. */
  private unlessNewer(document: DesignDocument, placed: PlacedRow): PlacedRow | null {
    const { collection, id, row } = placed;
    if (this.queue.writesOf(id) > 0) return null;
    return row && row.version < (rowOf(document, collection, id)?.version ?? 0) ? null : placed;
  }
}
