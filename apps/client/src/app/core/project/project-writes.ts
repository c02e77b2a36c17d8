import { inject, Injectable, signal } from '@angular/core';
import type { EditableCollection, Problem, RowChange } from '#contract';
import { firstValueFrom } from 'rxjs';
import { v7 as newId } from 'uuid';
import { problemOf } from '../api/problem';
import { clashingFields, Conflicts, labelOf } from './conflicts';
import { alters, rowOf, withChanges } from './document-rows';
import { editSummary } from './edit-summary';
import { OpenProject } from './open-project';
import { type AnyRow, ProjectApi } from './project-api';
import { type Direction, type OwnSet, UndoStack } from './undo-stack';
import { WriteQueue } from './write-queue';

type Collection = EditableCollection | 'projects';

/** An edit of one row: the row as it was read, and the fields that it changes. */
interface Edit {
  readonly projectId: string;
  readonly collection: Collection;
  readonly base: AnyRow;
  readonly values: Readonly<Record<string, unknown>>;
  readonly summary: string;
}

/** What became of an undo or redo. */
export interface TakenBack {
  readonly set: OwnSet;
  /** The new set, whose own undo is the way back. */
  readonly by: OwnSet;
  /** Why it was refused. */
  readonly problem: Problem | null;
}

/**
 * How rows of the open project change: shown at once, sent in order, each as a change set with an identifier of our
 * own, so that it can be taken back; and taken from the screen again where the server refuses it.
 */
@Injectable({ providedIn: 'root' })
export class ProjectWrites {
  private readonly api = inject(ProjectApi);
  private readonly project = inject(OpenProject);
  private readonly queue = inject(WriteQueue);
  private readonly told = signal<string | null>(null);
  readonly conflicts = new Conflicts();
  readonly own = new UndoStack();
  readonly notice = this.told.asReadonly();

  async edit(collection: Collection, id: string, values: Readonly<Record<string, unknown>>): Promise<void> {
    const document = this.project.document();
    const base = document && rowOf(document, collection, id);
    if (!base) return;
    const summary = editSummary(document, [{ collection, op: 'update', id, values: { ...values } }]);
    this.project.place({ collection, id, row: { ...base, ...values } });
    await this.queue.run([id], () => this.send({ projectId: document.project.id, collection, base, values, summary }));
  }

  apply(summary: string | null, changes: readonly RowChange[]): Promise<boolean> {
    const document = this.project.document();
    if (!document) return Promise.resolve(false);
    const shown = new Map(changes.map((c) => [c.id, rowOf(document, c.collection, c.id)?.version ?? 0]));
    const name = summary ?? editSummary(document, changes);
    this.project.show((before) => withChanges(before, changes));
    return this.queue.run(changes.map(({ id }) => id), async () => {
      try {
        await this.post(document.project.id, name, changes.map((change) => this.versioned(change, shown)));
      } catch (error) {
        await this.project.reload();
        throw error;
      }
    });
  }

  /** Undoes or redoes `given`, else the latest of one's own at its turn. */
  async takeBack(direction: Direction, given?: OwnSet): Promise<TakenBack | null> {
    const projectId = this.project.id ?? '';
    let taken: TakenBack | null = null;
    await this.queue.run([], async () => {
      // Was the edit refused that the undo was meant for, the one before it stays.
      const set = given ?? (this.queue.refused() ? null : this.own.next(direction));
      if (!set) return;
      const by = { id: newId(), summary: set.summary };
      taken = { set, by, problem: await this.postUndo(projectId, direction, set, by) };
    });
    return taken;
  }

  dismiss(): void {
    this.queue.dismiss();
    this.told.set(null);
  }

  close(): void {
    this.conflicts.close();
    this.own.clear();
    this.dismiss();
  }

  /** With the row's version when its turn comes; a row that was taken from the screen has the one that it had then. */
  private versioned(change: RowChange, shown: ReadonlyMap<string, number>): RowChange {
    if (change.op === 'create') return change;
    return { ...change, version: this.project.row(change.collection, change.id)?.version ?? shown.get(change.id) ?? 0 };
  }

  private async post(projectId: string, summary: string, changes: readonly RowChange[]): Promise<void> {
    const set = { id: newId(), summary: summary.slice(0, 300) };
    const answer = await firstValueFrom(this.api.apply(projectId, { ...set, changes: [...changes] }));
    this.project.take(projectId, answer, 1);
    if (alters(answer, changes) && projectId === this.project.id) this.own.push(set);
  }

  private async postUndo(projectId: string, direction: Direction, set: OwnSet, by: OwnSet): Promise<Problem | null> {
    try {
      this.project.take(projectId, await firstValueFrom(this.api.undo(projectId, set.id, by.id)), 0);
      this.own.moved(direction, set, by);
      return null;
    } catch (error) {
      const problem = problemOf(error);
      // What stands in the way stays there: the next undo takes the set before it, and the history still offers this one.
      if (problem.status === 404 || problem.status === 409) this.own.drop(set);
      return problem;
    }
  }

  private async send(edit: Edit): Promise<void> {
    const { projectId, collection, base, values, summary } = edit;
    const version = this.project.row(collection, base.id)?.version ?? base.version;
    try {
      await this.post(projectId, summary, [{ collection, op: 'update', id: base.id, version, values: { ...values } }]);
    } catch (error) {
      const problem = problemOf(error);
      if (problem.type.endsWith('stale-write') && problem.current) {
        await this.reconcile(edit, problem.current as AnyRow);
        return;
      }
      const before = Object.fromEntries(Object.keys(values).map((field) => [field, base[field]]));
      this.project.place({ collection, id: base.id, row: { ...(this.project.row(collection, base.id) ?? base), ...before } });
      throw error;
    }
  }

  /** Other fields changed meanwhile: the edit is repeated on the new row. The same field: both values are shown. */
  private async reconcile(edit: Edit, current: AnyRow): Promise<void> {
    const { collection, base, values } = edit;
    const { id } = current;
    const clashing = clashingFields(base, values, current);
    if (clashing.length > 0 && !(await this.conflicts.ask(current, values, clashing))) {
      this.project.place({ collection, id, row: current });
      return;
    }
    this.project.place({ collection, id, row: { ...current, ...values } });
    await this.send({ ...edit, base: current });
    if (clashing.length === 0) this.told.set(`${labelOf(current)} was changed by somebody else meanwhile; your change was made on the new state.`);
  }
}
