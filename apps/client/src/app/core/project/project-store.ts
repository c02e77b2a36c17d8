import { computed, DestroyRef, inject, Injectable } from '@angular/core';
import { type Assessment, createAssessor, type Design } from '#calc';
import type { EditableCollection, RowChange } from '#contract';
import { designOf } from '#contract/design-of';
import { v7 as newId } from 'uuid';
import { SessionStore } from '../session/session-store';
import { OpenProject } from './open-project';
import { ProjectWrites, type TakenBack } from './project-writes';
import type { SaveState } from './save-state';
import type { Direction, OwnSet } from './undo-stack';
import { WriteQueue } from './write-queue';

/**
 * The project that is open: its rows as the server holds them, the figures derived from them, and the edits on
 * their way. An edit shows at once, is sent in order, and is taken back with the reason where the server refuses it.
 */
@Injectable({ providedIn: 'root' })
export class ProjectStore {
  private readonly project = inject(OpenProject);
  private readonly writes = inject(ProjectWrites);
  private readonly queue = inject(WriteQueue);
  private readonly session = inject(SessionStore);

  /** Derives anew only what an edit touches; belongs to one project. */
  private reassess = createAssessor();

  readonly document = this.project.document;
  readonly failed = this.project.failed;
  readonly loading = computed(() => this.document() === null && this.failed() === null);
  readonly design = computed<Design | null>(() => {
    const document = this.document();
    return document && designOf(document);
  });
  readonly assessment = computed<Assessment | null>(() => {
    const design = this.design();
    return design && this.reassess(design);
  });
  readonly canEdit = computed(() => this.session.can('design:write'));
  readonly saveState = computed<SaveState>(() => {
    const [waiting, problem] = [this.queue.waiting(), this.queue.refused()];
    if (waiting > 0) return { kind: 'saving', count: waiting };
    return problem ? { kind: 'refused', problem } : { kind: 'saved' };
  });
  /** Two people changed the same field; the shell shows both values. */
  readonly conflict = this.writes.conflicts.open;
  /** One sentence on what happened behind the user's back, for instance that an edit was repeated on a newer row. */
  readonly notice = this.writes.notice;
  /** What this person would undo and redo next in this tab. */
  readonly nextUndo = this.writes.own.undo;
  readonly nextRedo = this.writes.own.redo;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.close());
  }

  /** Opens a project; the one that is open stays when it is the same. */
  async open(projectId: string): Promise<void> {
    if (this.project.id === projectId && this.document()) return;
    this.close();
    await this.project.open(projectId);
  }

  reload(): Promise<void> {
    return this.project.reload();
  }

  close(): void {
    this.project.close();
    this.writes.close();
    this.reassess = createAssessor();
  }

  /** Changes fields of one row; resolves when the server has it or has refused it. */
  edit(collection: EditableCollection | 'projects', id: string, values: Readonly<Record<string, unknown>>): Promise<void> {
    return this.writes.edit(collection, id, values);
  }

  /**
   * Several rows in one change set: all or none. Shown at once, and taken back whole where the server refuses it.
   * @param summary null: what the changes say by themselves, "Dose of 12 points"
   */
  apply(summary: string | null, changes: readonly RowChange[]): Promise<boolean> {
    return this.writes.apply(summary, changes);
  }

  create(collection: EditableCollection, values: Readonly<Record<string, unknown>>, summary: string): Promise<boolean> {
    return this.apply(summary, [{ collection, op: 'create', id: newId(), values: { ...values } }]);
  }

  remove(collection: EditableCollection, id: string, summary: string): Promise<boolean> {
    return this.apply(summary, [{ collection, op: 'delete', id }]);
  }

  /** A change set that this person made in another way, by an import for instance: it can be undone like an edit. */
  ownSet(id: string, summary: string): void {
    this.writes.own.push({ id, summary });
  }

  /**
   * Undoes or redoes once everything on its way is saved: `given`, a set of the history, else the latest of one's own.
   * @returns null where there is nothing to take back
   */
  takeBack(direction: Direction, given?: OwnSet): Promise<TakenBack | null> {
    return this.writes.takeBack(direction, given);
  }

  dismiss(): void {
    this.writes.dismiss();
  }
}
