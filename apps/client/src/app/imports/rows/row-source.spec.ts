import type { ListRange } from '@angular/cdk/collections';
import type { ImportRow } from '#contract';
import { of, Subject, throwError } from 'rxjs';
import { firstWhere, type RowOrPlace, RowSource } from './row-source';

const row = (index: number) => ({ index, row: index + 2 }) as ImportRow;
const pageOf = (total: number, offset: number, limit: number) => ({ total, rows: Array.from({ length: Math.min(limit, total - offset) }, (_, i) => row(offset + i)) });
const settle = () => new Promise((resolve) => setTimeout(resolve, 60));

/** A source of a file with `total` rows, with what it asked for and what it shows. */
function scrolled(total: number) {
  const asked: number[] = [];
  const viewChange = new Subject<ListRange>();
  const source = new RowSource((offset, limit) => {
    asked.push(offset);
    return of(pageOf(total, offset, limit));
  }, total);
  let shown: readonly RowOrPlace[] = [];
  source.connect({ viewChange }).subscribe((rows) => (shown = rows));
  const view = async (start: number, end: number) => {
    viewChange.next({ start, end });
    await settle();
  };
  return { source, asked, view, shown: () => shown };
}

describe('RowSource', () => {
  it('has a place for every row, and fetches the first page at once', () => {
    const { asked, shown } = scrolled(50_000);
    expect(shown()).toHaveLength(50_000);
    expect(asked).toEqual([0]);
    expect(shown()[99]?.row).toBe(101);
    expect(shown()[100]).toBeUndefined();
  });

  it('fetches the pages around what is in view, each once', async () => {
    const { asked, view, shown } = scrolled(50_000);
    await view(20_000, 20_030);
    expect(asked).toEqual([0, 19_900, 20_000]);
    await view(20_030, 20_060);
    expect(asked).toEqual([0, 19_900, 20_000, 20_100]);
    expect(shown()[20_040]?.index).toBe(20_040);
  });

  it('fetches once for a scroll that runs through many rows', async () => {
    const { asked, view } = scrolled(50_000);
    void view(10_000, 10_030);
    void view(20_000, 20_030);
    await view(30_060, 30_090);
    expect(asked).toEqual([0, 30_000, 30_100]);
  });

  it('keeps twenty pages and lets the oldest go', async () => {
    const { view, shown } = scrolled(50_000);
    for (let page = 1; page <= 25; page++) await view(page * 100 + 50, page * 100 + 50);
    const held = shown().filter((each) => each !== undefined).length;
    expect(held).toBeLessThanOrEqual(2000);
    expect(shown()[0]).toBeUndefined();
    expect(shown()[2550]).toBeDefined();
  });

  it('says that rows did not come, and asks again', async () => {
    let down = true;
    const source = new RowSource((offset, limit) => (down ? throwError(() => new Error('away')) : of(pageOf(5, offset, limit))), 5);
    source.connect({ viewChange: new Subject() });
    expect(source.failed()).toBe(true);
    down = false;
    source.retry();
    expect(source.failed()).toBe(false);
    expect((await source.row(4))?.row).toBe(6);
  });

  it('finds a place with few pages', async () => {
    const { source, asked } = scrolled(50_000);
    expect(await firstWhere(source, (each) => each.row > 31_415)).toBe(31_414);
    expect(new Set(asked).size).toBeLessThan(12);
    expect(await firstWhere(source, () => false)).toBe(50_000);
  });
});
