import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import { assess, type Assessment, type Design } from '#calc';
import type { ChangeNotice, DesignDocument, EditableCollection, Problem, RowChange } from '#contract';
import { designOf } from '#contract/design-of';
import { firstValueFrom, type Subscription } from 'rxjs';
import { v7 as newId } from 'uuid';
import { problemOf } from '../api/problem';
import { SessionStore } from '../session/session-store';
import { withChanges, withNotice, withRow } from './document-rows';
import { liveChanges } from './live-changes';
import { type AnyRow, ProjectApi } from './project-api';
import type { Conflict, SaveState } from './save-state';

type Collection = EditableCollection | 'projects';

/**
 * The project that is open: its rows as the server holds them, the figures derived from them, and the edits on
 * their way. An edit shows at once, is sent in order, and is taken back with the reason where the server refuses it.
 */
@Injectable({ providedIn: 'root' })
export class ProjectStore {
  private readonly api = inject(ProjectApi);
  private readonly session = inject(SessionStore);
  private readonly doc = signal<DesignDocument | null>(null);
  private readonly problem = signal<Problem | null>(null);
  private readonly waiting = signal(0);
  private readonly refused = signal<Problem | null>(null);
  private readonly asking = signal<Conflict | null>(null);
  private readonly told = signal<string | null>(null);
  private queue: Promise<unknown> = Promise.resolve();
  private events: Subscription | null = null;
  private projectId: string | null = null;
  private readonly unsent = new Map<string, number>();

  readonly document = this.doc.asReadonly();
  readonly failed = this.problem.asReadonly();
  readonly loading = computed(() => this.doc() === null && this.problem() === null);
  readonly design = computed<Design | null>(() => {
    const document = this.doc();
    return document && designOf(document);
  });
  readonly assessment = computed<Assessment | null>(() => {
    const design = this.design();
    return design && assess(design);
  });
  readonly canEdit = computed(() => this.session.can('design:write'));
  readonly saveState = computed<SaveState>(() => {
    const problem = this.refused();
    if (this.waiting() > 0) return { kind: 'saving', count: this.waiting() };
    return problem ? { kind: 'refused', problem } : { kind: 'saved' };
  });
  /** Two people changed the same field; the shell shows both values. */
  readonly conflict = this.asking.asReadonly();
  /** One sentence on what happened behind the user's back, for instance that an edit was repeated on a newer row. */
  readonly notice = this.told.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => this.close());
  }

  /** Opens a project; the one that is open stays when it is the same. */
  async open(projectId: string): Promise<void> {
    if (this.projectId === projectId && this.doc()) return;
    this.close();
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
    this.refused.set(null);
    this.asking.set(null);
    this.told.set(null);
  }

  /** Changes fields of one row; resolves when the server has it or has refused it. */
  edit(collection: Collection, id: string, values: Readonly<Record<string, unknown>>): Promise<void> {
    const before = this.row(collection, id);
    if (!before) return Promise.resolve();
    this.show(collection, id, { ...before, ...values });
    return this.send(id, () => this.patch(collection, before, values));
  }

  /** Several rows in one change set: all or none. Shown at once, and taken back whole where the server refuses it. */
  apply(summary: string, changes: readonly RowChange[]): Promise<boolean> {
    const versions = new Map(changes.map((c) => [c.id, this.row(c.collection, c.id)?.version ?? 0]));
    this.doc.update((document) => document && withChanges(document, changes));
    return this.enqueue(async () => {
      const named = changes.map((c) => (c.op === 'create' ? c : { ...c, version: this.versionOf(c, versions) }));
      try {
        this.take(await firstValueFrom(this.api.apply(this.projectId ?? '', { id: newId(), summary, changes: named })));
      } catch (error) {
        await this.reload();
        throw error;
      }
    });
  }

  create(collection: EditableCollection, values: Readonly<Record<string, unknown>>, summary: string): Promise<boolean> {
    return this.apply(summary, [{ collection, op: 'create', id: newId(), values: { ...values } }]);
  }

  remove(collection: EditableCollection, id: string, summary: string): Promise<boolean> {
    return this.apply(summary, [{ collection, op: 'delete', id }]);
  }

  dismiss(): void {
    this.refused.set(null);
    this.told.set(null);
  }

  private row(collection: Collection, id: string): AnyRow | undefined {
    const document = this.doc();
    if (!document) return undefined;
    const rows = collection === 'projects' ? [document.project] : document[collection];
    return (rows as readonly unknown[] as readonly AnyRow[]).find((r) => r.id === id);
  }

  private show(collection: Collection, id: string, row: AnyRow | null): void {
    this.doc.update((document) => document && withRow(document, collection, id, row));
  }

  private take(notice: ChangeNotice): void {
    this.doc.update((document) => document && withNotice(document, notice));
  }

  /** The row's version when its turn comes; a row that was taken from the screen has the one that it had then. */
  private versionOf({ collection, id }: RowChange, shown: ReadonlyMap<string, number>): number {
    return this.row(collection, id)?.version ?? shown.get(id) ?? 0;
  }

  private async send(id: string, work: () => Promise<void>): Promise<void> {
    this.unsent.set(id, (this.unsent.get(id) ?? 0) + 1);
    await this.enqueue(work);
    const left = (this.unsent.get(id) ?? 1) - 1;
    if (left > 0) this.unsent.set(id, left);
    else this.unsent.delete(id);
  }

  /** One write after another, so that each names the version that the one before it made. */
  private enqueue(work: () => Promise<void>): Promise<boolean> {
    this.waiting.update((n) => n + 1);
    this.refused.set(null);
    const done = this.queue.then(work).then(
      () => true,
      (error: unknown) => {
        this.refused.set(problemOf(error));
        return false;
      },
    ).finally(() => this.waiting.update((n) => n - 1));
    this.queue = done;
    return done;
  }

  private async patch(collection: Collection, base: AnyRow, values: Readonly<Record<string, unknown>>): Promise<void> {
    const version = this.row(collection, base.id)?.version ?? base.version;
    try {
      const row = await firstValueFrom(this.api.patch(this.projectId ?? '', collection, base.id, version, values));
      this.settle(collection, row);
    } catch (error) {
      const problem = problemOf(error);
      if (problem.type.endsWith('stale-write') && problem.current) {
        await this.reconcile(collection, base, values, problem.current as AnyRow);
        return;
      }
      this.show(collection, base.id, { ...(this.row(collection, base.id) ?? base), ...pick(base, Object.keys(values)) });
      throw error;
    }
  }

  /** Keeps later edits of the same row that still wait, and the server's word on everything else. */
  private settle(collection: Collection, row: AnyRow): void {
    const shown = this.row(collection, row.id);
    const busy = (this.unsent.get(row.id) ?? 0) > 1;
    this.show(collection, row.id, busy && shown ? { ...shown, version: row.version } : row);
  }

  /** Other fields changed meanwhile: the edit is repeated on the new row. The same field: both values are shown. */
  private async reconcile(collection: Collection, base: AnyRow, values: Readonly<Record<string, unknown>>, current: AnyRow): Promise<void> {
    const clashing = Object.keys(values).filter((f) => !same(current[f], base[f]) && !same(current[f], values[f]));
    if (clashing.length > 0 && !(await this.ask(collection, current, values, clashing))) {
      this.show(collection, current.id, current);
      return;
    }
    this.show(collection, current.id, { ...current, ...values });
    await this.patch(collection, current, values);
    if (clashing.length === 0) this.told.set(`${labelOf(current)} was changed by somebody else meanwhile; your change was made on the new state.`);
  }

  private ask(collection: Collection, current: AnyRow, values: Readonly<Record<string, unknown>>, fields: readonly string[]): Promise<boolean> {
    return new Promise((resolve) => {
      const answer = (mine: boolean) => () => {
        this.asking.set(null);
        resolve(mine);
      };
      this.asking.set({
        label: labelOf(current),
        fields: fields.map((field) => ({ field, mine: values[field], theirs: current[field] })),
        keepMine: answer(true),
        takeTheirs: answer(false),
      });
    });
  }

  private async catchUp(sequence: number): Promise<void> {
    const known = this.doc()?.sequence;
    if (known === undefined || sequence <= known || !this.projectId) return;
    try {
      const notice = await firstValueFrom(this.api.changesSince(this.projectId, known));
      this.doc.update((document) => document && withNotice(document, notice, new Set(this.unsent.keys())));
    } catch {
      // The next event, or the next edit's answer, brings what this one missed.
    }
  }
}

const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);
const pick = (row: AnyRow, fields: readonly string[]) => Object.fromEntries(fields.map((f) => [f, row[f]]));
const labelOf = (row: AnyRow): string => [row['tag'], row['name'], row['location'], 'This row'].find((v) => typeof v === 'string') as string;
