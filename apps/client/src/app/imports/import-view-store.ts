import { HttpEventType } from '@angular/common/http';
import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { ImportPreview, ImportResult, ImportSettings, Problem, ReadingSettings } from '#contract';
import { EmptyError, filter, firstValueFrom, map, type Observable, Subject, takeUntil, tap } from 'rxjs';
import { v7 as newId } from 'uuid';
import { problemOf } from '../core/api/problem';
import { ProjectStore } from '../core/project/project-store';
import { ImportApi } from './import-api';
import { choicesOf, mappingOf, metWith, readingOf, refusalOf, withColumn, withValue } from './import-settings';
import { WorkWatch } from './progress/work-watch';
import { ImportRows } from './rows/import-rows';

/** What is being done: the file on its way or read first, read again in another way, written, or taken back. */
export type ImportJob = 'upload' | 'read' | 'commit' | 'undo';

/** One import on its way: the file at the server, the settings chosen, what they would do. */
@Injectable()
export class ImportViewStore {
  private readonly api = inject(ImportApi);
  private readonly project = inject(ProjectStore);
  private readonly watch = inject(WorkWatch);
  private readonly rows = inject(ImportRows);
  private readonly shown = signal<ImportPreview | null>(null);
  private readonly chosen = signal<ImportSettings>({});
  private readonly doing = signal<ImportJob | null>(null);
  private readonly refused = signal<Problem | null>(null);
  private readonly said = signal('');
  private readonly done = signal<ImportResult | null>(null);
  private readonly met = signal<ImportPreview['unknownValues']>([]);
  private readonly back = signal(false);
  private readonly dropped = new Subject<void>();
  private readonly sent = signal<File | null>(null);
  private importId = '';
  /** The settings to read with next, where they were chosen while it was being read. */
  private wanted: ImportSettings | null = null;
  private sending = false;
  private stopped = false;

  readonly preview = this.shown.asReadonly();
  readonly job = this.doing.asReadonly();
  readonly progress = this.watch.progress;
  readonly problem = this.refused.asReadonly();
  /** One sentence on what has just happened, for instance that it was stopped. */
  readonly told = this.said.asReadonly();
  readonly result = this.done.asReadonly();
  /** The import was taken back. */
  readonly undone = this.back.asReadonly();
  readonly settings = this.chosen.asReadonly();
  readonly mapping = computed(() => mappingOf(this.shown()));
  readonly values = computed(() => choicesOf(this.met(), this.shown(), this.chosen()));
  /** Rows that the commit would write. */
  readonly writes = computed(() => (this.shown()?.counts.toCreate ?? 0) + (this.shown()?.counts.toUpdate ?? 0));
  /** The file that is on its way. */
  readonly fileName = computed(() => this.sent()?.name ?? '');
  /** The file did not reach the server, and can be sent again. */
  readonly canRetry = computed(() => this.refused()?.type === 'offline' && this.shown() === null);

  constructor() {
    inject(DestroyRef).onDestroy(() => this.leave());
  }

  async upload(file: File, importId: string = newId()): Promise<void> {
    if (this.doing() !== null) return;
    this.reset();
    this.sent.set(file);
    this.importId = importId;
    const refusal = refusalOf(file);
    if (refusal) return this.refused.set(refusal);
    await this.run('upload', async (projectId) => {
      const preview = await this.send(projectId, file);
      if (!this.stopped) this.take(projectId, preview, {});
    });
  }

  /** Sends the same file again after the network was lost; with the same id, so that it is not kept twice. */
  async retry(): Promise<void> {
    const file = this.sent();
    if (file) await this.upload(file, this.importId);
  }

  /** Reads the file in another way: encoding, delimiter, decimal mark, heading row or sheets. The columns are suggested anew. */
  async read(reading: ReadingSettings): Promise<void> {
    await this.look(readingOf({ ...this.chosen(), ...reading }));
  }

  /** Takes these sheets together. Headings that stand in another row are found anew. */
  async takeSheets(sheets: readonly string[]): Promise<void> {
    const { decimal } = this.chosen();
    await this.look({ ...(decimal && { decimal }), sheets: [...sheets] });
  }

  /** Gives a column to a field, or leaves it out; a field belongs to one column. */
  async mapColumn(column: string, field: string | null): Promise<void> {
    const before = this.latest();
    await this.look({ ...before, mapping: withColumn(before.mapping ?? this.mapping(), column, field) });
  }

  async mapValue(field: string, text: string, value: string | null): Promise<void> {
    const { mapping = this.mapping(), valueMapping = {}, ...before } = this.latest();
    await this.look({ ...before, mapping, valueMapping: withValue(valueMapping, field, text, value) });
  }

  async commit(): Promise<void> {
    const preview = this.shown();
    if (!preview || this.doing() !== null) return;
    await this.run('commit', async (projectId) => {
      this.watch.follow(projectId, preview.id);
      const result = await firstValueFrom(this.api.commit(projectId, preview.id, { ...this.chosen(), mapping: this.mapping() }));
      this.done.set(result);
      if (result.sequence !== null) this.project.ownSet(result.id, `Import of ${preview.fileName}`);
      if (this.stopped) this.said.set('The import was done before it could be stopped.');
      await this.project.reload();
    });
  }

  /** Takes the import back, whole or not at all. */
  async undo(): Promise<void> {
    const [result, preview] = [this.done(), this.shown()];
    if (!result || !preview || this.doing() !== null) return;
    this.doing.set('undo');
    this.refused.set(null);
    const taken = await this.project.takeBack('undo', { id: result.id, summary: `Import of ${preview.fileName}` });
    if (taken?.problem) this.refused.set(taken.problem);
    else this.back.set(taken !== null);
    this.doing.set(null);
  }

  /** Stops what is being done. Bytes stop at once; the server ends its work and says so. */
  cancel(): void {
    const projectId = this.projectId();
    if (this.doing() === null || !projectId) return;
    this.stopped = true;
    this.wanted = null;
    if (this.sending) this.dropped.next();
    else this.watch.stop(projectId, this.shown()?.id ?? this.importId);
  }

  reset(): void {
    this.shown.set(null);
    this.rows.close();
    this.chosen.set({});
    this.met.set([]);
    this.refused.set(null);
    this.said.set('');
    this.done.set(null);
    this.back.set(false);
  }

  private async send(projectId: string, file: File): Promise<ImportPreview> {
    this.sending = true;
    const answer: Observable<ImportPreview | null> = this.api.upload(projectId, this.importId, file).pipe(
      tap((event) => {
        if (event.type === HttpEventType.UploadProgress) this.showSent(projectId, event.loaded, event.total ?? null);
      }),
      filter((event) => event.type === HttpEventType.Response),
      map((event) => event.body),
      takeUntil(this.dropped),
    );
    return (await firstValueFrom(answer))!;
  }

  private showSent(projectId: string, loaded: number, total: number | null): void {
    this.watch.sent(loaded, total);
    if (total === null || loaded < total) return;
    this.sending = false;
    this.watch.follow(projectId, this.importId);
  }

  /** Reads again with these settings; a choice made meanwhile is read next, the ones between never. */
  private async look(settings: ImportSettings): Promise<void> {
    const id = this.shown()?.id;
    if (!id || this.doing() === 'commit') return;
    this.wanted = settings;
    if (this.doing() !== null) return;
    await this.run('read', async (projectId) => {
      while (this.wanted) {
        const next = this.wanted;
        this.watch.follow(projectId, id);
        const preview = await firstValueFrom(this.api.preview(projectId, id, next));
        this.take(projectId, preview, next);
        if (this.wanted === next) this.wanted = null;
      }
    });
  }

  private latest(): ImportSettings {
    return this.wanted ?? this.chosen();
  }

  private take(projectId: string, preview: ImportPreview, settings: ImportSettings): void {
    this.shown.set(preview);
    this.chosen.set(settings);
    this.met.update((before) => [...metWith(before, preview)]);
    this.rows.open(projectId, preview);
  }

  private async run(job: ImportJob, work: (projectId: string) => Promise<void>): Promise<void> {
    const projectId = this.projectId();
    if (!projectId) return;
    this.doing.set(job);
    this.refused.set(null);
    this.said.set('');
    this.stopped = false;
    this.watch.begin(job === 'upload' ? 'sending' : 'waiting');
    try {
      await work(projectId);
    } catch (error) {
      this.fail(error);
    } finally {
      this.watch.end();
      this.sending = false;
      this.wanted = null;
      this.doing.set(null);
    }
    if (this.stopped && this.done() === null) this.said.set(job === 'commit' ? 'Stopped. Nothing was imported.' : 'Stopped. Nothing was changed.');
  }

  /** What was stopped has not failed. */
  private fail(error: unknown): void {
    if (error instanceof EmptyError) return;
    const problem = problemOf(error);
    if (problem.type.endsWith('cancelled')) this.stopped = true;
    else this.refused.set(problem);
  }

  private projectId(): string | null {
    return this.project.document()?.project.id ?? null;
  }

  /** The page is left: nobody waits for a file that is still being read. An import under way goes on. */
  private leave(): void {
    const projectId = this.projectId();
    if (projectId && (this.doing() === 'upload' || this.doing() === 'read')) this.api.stop(projectId, this.importId).subscribe({ error: () => undefined });
    this.dropped.next();
  }
}
