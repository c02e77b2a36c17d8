import { computed, inject, Injectable, signal } from '@angular/core';
import type { ImportPreview, ImportResult, ImportRow, ImportSettings, Problem } from '#contract';
import { firstValueFrom } from 'rxjs';
import { problemOf } from '../core/api/problem';
import { ProjectStore } from '../core/project/project-store';
import { ImportApi } from './import-api';

export type RowFilter = 'all' | 'create' | 'update' | 'same' | 'problems' | 'skip';

/** One import on its way: the file at the server, the settings chosen, what they would do. */
@Injectable()
export class ImportViewStore {
  private readonly api = inject(ImportApi);
  private readonly project = inject(ProjectStore);
  private readonly shown = signal<ImportPreview | null>(null);
  private readonly chosen = signal<ImportSettings>({});
  private readonly working = signal(false);
  private readonly refused = signal<Problem | null>(null);
  private readonly done = signal<ImportResult | null>(null);
  readonly filter = signal<RowFilter>('all');

  readonly preview = this.shown.asReadonly();
  readonly busy = this.working.asReadonly();
  readonly problem = this.refused.asReadonly();
  readonly result = this.done.asReadonly();
  readonly settings = this.chosen.asReadonly();
  readonly mapping = computed<Readonly<Record<string, string>>>(() => {
    const columns = this.shown()?.columns ?? [];
    return Object.fromEntries(columns.flatMap((c) => (c.field === null ? [] : [[c.column, c.field]])));
  });
  readonly filters = computed(() => {
    const rows = this.shown()?.rows ?? [];
    const count = (filter: RowFilter) => rows.filter((row) => passes(row, filter)).length;
    const label: readonly (readonly [RowFilter, string])[] = [
      ['all', 'All'], ['create', 'Create'], ['update', 'Change'], ['same', 'Same'], ['problems', 'Problems'], ['skip', 'Skip'],
    ];
    return label.map(([value, text]) => ({ value, label: text, count: count(value) }));
  });
  readonly rows = computed(() => (this.shown()?.rows ?? []).filter((row) => passes(row, this.filter())));
  /** Rows that the commit would write. */
  readonly writes = computed(() => (this.shown()?.counts.toCreate ?? 0) + (this.shown()?.counts.toUpdate ?? 0));

  async upload(file: File): Promise<void> {
    this.reset();
    await this.run(async (projectId) => this.shown.set(await firstValueFrom(this.api.upload(projectId, file))));
  }

  /** Reads the file in another way: encoding, delimiter, decimal mark or heading row. The columns are suggested anew. */
  async read(reading: Pick<ImportSettings, 'encoding' | 'delimiter' | 'decimal' | 'headerRow'>): Promise<void> {
    const { encoding, delimiter, decimal, headerRow } = { ...this.chosen(), ...reading };
    await this.look({ ...(encoding && { encoding }), ...(delimiter && { delimiter }), ...(decimal && { decimal }), ...(headerRow && { headerRow }) });
  }

  /** Gives a column to a field, or leaves it out; a field belongs to one column. */
  async mapColumn(column: string, field: string | null): Promise<void> {
    const others = Object.entries(this.mapping()).filter(([c, f]) => c !== column && f !== field);
    await this.look({ ...this.chosen(), mapping: Object.fromEntries(field === null ? others : [...others, [column, field]]) });
  }

  async mapValue(field: string, text: string, value: string | null): Promise<void> {
    const before = this.chosen().valueMapping ?? {};
    await this.look({ ...this.chosen(), mapping: this.mapping(), valueMapping: { ...before, [field]: { ...before[field], [text]: value } } });
  }

  show(filter: string): void {
    this.filter.set(filter as RowFilter);
  }

  async commit(): Promise<void> {
    const preview = this.shown();
    if (!preview) return;
    await this.run(async (projectId) => {
      this.done.set(await firstValueFrom(this.api.commit(projectId, preview.id, { ...this.chosen(), mapping: this.mapping() })));
      await this.project.reload();
    });
  }

  reset(): void {
    this.shown.set(null);
    this.chosen.set({});
    this.refused.set(null);
    this.done.set(null);
    this.filter.set('all');
  }

  private async look(settings: ImportSettings): Promise<void> {
    const id = this.shown()?.id;
    if (!id) return;
    await this.run(async (projectId) => {
      this.shown.set(await firstValueFrom(this.api.preview(projectId, id, settings)));
      this.chosen.set(settings);
    });
  }

  private async run(work: (projectId: string) => Promise<void>): Promise<void> {
    const projectId = this.project.document()?.project.id;
    if (!projectId) return;
    this.working.set(true);
    this.refused.set(null);
    try {
      await work(projectId);
    } catch (error) {
      this.refused.set(problemOf(error));
    } finally {
      this.working.set(false);
    }
  }
}

const passes = (row: ImportRow, filter: RowFilter): boolean => {
  if (filter === 'all') return true;
  return filter === 'problems' ? row.problems.length > 0 : row.action === filter;
};
