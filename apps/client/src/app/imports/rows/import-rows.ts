import { inject, Injectable, signal } from '@angular/core';
import type { ImportPreview, ImportRow, RowFilter } from '#contract';
import { ImportApi } from '../import-api';
import { firstWhere, RowSource } from './row-source';

/** More rows than a screen shows. */
const SCREENFUL = 60;

/** Rows of each kind; the skipped ones are among all. */
export function countOf({ toCreate, toUpdate, same, heldBack, skipped, withProblems }: ImportPreview['counts'], filter: RowFilter): number {
  const counts: Readonly<Record<RowFilter, number>> = {
    all: toCreate + toUpdate + same + heldBack + skipped,
    create: toCreate, update: toUpdate, same, hold: heldBack, problems: withProblems, skip: skipped,
  };
  return counts[filter];
}

/** The rows on the screen: which kind, where in them, and the one that is open. */
@Injectable()
export class ImportRows {
  private readonly api = inject(ImportApi);
  private readonly shown = signal<RowFilter>('all');
  private readonly rows = signal<RowSource | null>(null);
  private readonly place = signal<{ readonly index: number } | null>(null);
  private readonly opened = signal<ImportRow | null>(null);
  private problems: RowSource | null = null;
  private firstSeen = 0;
  private projectId = '';
  private preview: ImportPreview | null = null;

  readonly filter = this.shown.asReadonly();
  readonly source = this.rows.asReadonly();
  /** Where the list has to be; a new object each time somebody goes there. */
  readonly at = this.place.asReadonly();
  /** The row whose details are open. */
  readonly picked = this.opened.asReadonly();

  /** Shows the rows of this preview, of the kind that was shown before where there are some. */
  open(projectId: string, preview: ImportPreview): void {
    this.projectId = projectId;
    this.preview = preview;
    this.problems = this.sourceOf('problems');
    this.show(countOf(preview.counts, this.shown()) > 0 ? this.shown() : 'all');
  }

  close(): void {
    this.preview = null;
    this.problems = null;
    this.rows.set(null);
    this.shown.set('all');
    this.place.set(null);
    this.opened.set(null);
  }

  show(filter: RowFilter): void {
    this.firstSeen = 0;
    this.shown.set(filter);
    this.place.set(null);
    this.opened.set(null);
    this.rows.set(this.sourceOf(filter));
  }

  /** The first row in view, as the person scrolls. */
  see(index: number): void {
    this.firstSeen = index;
  }

  /** Opens the details of a row, or closes them. */
  pick(row: ImportRow | null, index?: number): void {
    this.opened.set(row);
    if (row && index !== undefined) this.place.set({ index });
  }

  /** To the next row with a problem (1) or the one before (-1), round the end; in another kind of rows, among all. */
  async goToProblem(step: 1 | -1): Promise<void> {
    if (!this.preview || !this.problems || this.problems.total() === 0) return;
    if (this.shown() === 'problems' || this.shown() === 'hold') {
      const total = this.rows()?.total() ?? 0;
      if (total > 0) await this.goTo((this.from(step) + step + total) % total);
      return;
    }
    if (this.shown() !== 'all') this.show('all');
    const from = this.from(step);
    const total = this.problems.total();
    const found = step > 0 ? await firstWhere(this.problems, (row) => row.index > from) : (await firstWhere(this.problems, (row) => row.index >= from)) - 1;
    const problem = await this.problems.row((found + total) % total);
    if (problem) await this.goTo(problem.index);
  }

  /** To the row of the file with this number, or the last one before it; among all rows. */
  async goToRow(row: number, sheet: string | null): Promise<void> {
    if (this.shown() !== 'all') this.show('all');
    const source = this.rows();
    if (!source) return;
    const order = this.preview?.sheets.map((each) => each.name) ?? [];
    const behind = (each: ImportRow): boolean =>
      sheet === null || each.sheet === sheet ? each.row > row : order.indexOf(each.sheet ?? '') > order.indexOf(sheet);
    await this.goTo(Math.max(0, (await firstWhere(source, behind)) - 1));
  }

  /** Where a search begins: at the row gone to last while it is in view, else at the edge of what is. */
  private from(step: 1 | -1): number {
    const at = this.place()?.index;
    if (at !== undefined && at >= this.firstSeen && at < this.firstSeen + SCREENFUL) return at;
    return step > 0 ? this.firstSeen - 1 : this.firstSeen;
  }

  private async goTo(index: number): Promise<void> {
    const row = await this.rows()?.row(index);
    if (!row) return;
    this.firstSeen = index; // Until the list has scrolled there and says so itself.
    this.pick(row, index);
  }

  private sourceOf(filter: RowFilter): RowSource | null {
    const preview = this.preview;
    if (!preview) return null;
    return new RowSource((offset, limit) => this.api.rows(this.projectId, preview.id, filter, offset, limit), countOf(preview.counts, filter));
  }
}
