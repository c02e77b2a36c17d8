import { type CollectionViewer, DataSource, type ListRange } from '@angular/cdk/collections';
import { signal } from '@angular/core';
import type { ImportRow, ImportRowPage } from '#contract';
import { auditTime, BehaviorSubject, firstValueFrom, type Observable, type Subscription } from 'rxjs';

export const PAGE = 100;
const AHEAD = 50;
const KEPT_PAGES = 20;
const SETTLE_MS = 40;

/** A row that has come, or the place of one that has not. */
export type RowOrPlace = ImportRow | undefined;

/**
 * The rows of a preview for a virtual scroll. Pages of a hundred are fetched around what is in view; those that have
 * been out of view longest are let go, so that 50,000 rows cost no more than 2,000.
 */
export class RowSource extends DataSource<RowOrPlace> {
  /** In the order of their last use. */
  private readonly pages = new Map<number, readonly ImportRow[]>();
  private readonly asked = new Map<number, Subscription>();
  private readonly list: BehaviorSubject<readonly RowOrPlace[]>;
  private inView: ListRange = { start: 0, end: 0 };
  private viewing: Subscription | null = null;
  private readonly count = signal(0);
  private readonly broken = signal(false);

  /** Rows of this kind in the file. */
  readonly total = this.count.asReadonly();
  readonly failed = this.broken.asReadonly();

  /** @param expected rows as the preview counts them, until the first page says so itself */
  constructor(private readonly fetch: (offset: number, limit: number) => Observable<ImportRowPage>, expected: number) {
    super();
    this.count.set(expected);
    this.list = new BehaviorSubject<readonly RowOrPlace[]>(new Array<RowOrPlace>(expected).fill(undefined));
  }

  override connect(viewer: CollectionViewer): Observable<readonly RowOrPlace[]> {
    this.viewing?.unsubscribe();
    this.view({ start: 0, end: 1 });
    this.viewing = viewer.viewChange.pipe(auditTime(SETTLE_MS)).subscribe((range) => this.view(range));
    return this.list;
  }

  override disconnect(): void {
    this.viewing?.unsubscribe();
    for (const asking of this.asked.values()) asking.unsubscribe();
    this.asked.clear();
  }

  retry(): void {
    this.view(this.inView);
  }

  /** One row, fetched if it has to be. @throws where it cannot be fetched */
  async row(index: number): Promise<RowOrPlace> {
    const page = Math.floor(index / PAGE);
    if (!this.pages.has(page)) this.take(page, await firstValueFrom(this.fetch(page * PAGE, PAGE)));
    return this.touched(page)[index % PAGE];
  }

  private view(range: ListRange): void {
    this.inView = range;
    this.broken.set(false);
    const wanted = this.pagesOf(range);
    for (const [page, asking] of this.asked) if (!wanted.includes(page)) this.drop(page, asking);
    for (const page of wanted) if (this.pages.has(page)) this.touched(page);
    for (const page of wanted) if (!this.pages.has(page) && !this.asked.has(page)) this.ask(page);
  }

  private pagesOf({ start, end }: ListRange): readonly number[] {
    const first = Math.floor(Math.max(0, start - AHEAD) / PAGE);
    const last = Math.floor(Math.max(0, Math.min(this.count(), end + AHEAD) - 1) / PAGE);
    return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
  }

  private ask(page: number): void {
    const asking = this.fetch(page * PAGE, PAGE).subscribe({
      next: (answer) => {
        this.asked.delete(page);
        this.take(page, answer);
      },
      error: () => {
        this.asked.delete(page);
        this.broken.set(true);
      },
    });
    if (!asking.closed) this.asked.set(page, asking);
  }

  private drop(page: number, asking: Subscription): void {
    asking.unsubscribe();
    this.asked.delete(page);
  }

  private take(page: number, { total, rows }: ImportRowPage): void {
    this.count.set(total);
    this.pages.set(page, rows);
    this.letGo();
    const list = new Array<RowOrPlace>(total).fill(undefined);
    for (const [each, held] of this.pages) held.forEach((row, i) => (list[each * PAGE + i] = row));
    this.list.next(list);
  }

  private touched(page: number): readonly ImportRow[] {
    const rows = this.pages.get(page) ?? [];
    this.pages.delete(page);
    this.pages.set(page, rows);
    return rows;
  }

  private letGo(): void {
    const near = new Set(this.pagesOf(this.inView));
    for (const page of this.pages.keys()) {
      if (this.pages.size <= KEPT_PAGES) return;
      if (!near.has(page)) this.pages.delete(page);
    }
  }
}

/**
 * First place whose row passes, where every row behind a passing one passes too; `total` where none does. Looks at as
 * few pages as it can.
 */
export async function firstWhere(source: RowSource, passes: (row: ImportRow) => boolean): Promise<number> {
  let [from, to] = [0, source.total()];
  while (from < to) {
    const middle = Math.floor((from + to) / 2);
    const row = await source.row(middle);
    if (row === undefined || passes(row)) to = middle;
    else from = middle + 1;
  }
  return from;
}
