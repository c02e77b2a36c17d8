import type { DesignDocument, RowChange } from '#contract';
import { describe, expect, it } from 'vitest';
import { alters, rowOf, withAnswer, withChanges, withNotice } from './document-rows';

const point = (id: string, tag = id) => ({ id, version: 1, tag });
const documentOf = (points: readonly object[]) =>
  ({ sequence: 5, project: { id: 'project', version: 1, name: 'P' }, points, dispensers: [{ id: 'd1', version: 1, pointId: 'p1' }], cabinets: [] }) as unknown as DesignDocument;
const item = (id: string, row: object | null) => ({ collection: 'points' as const, id, row: row as Record<string, unknown> | null });

describe('rows of a document', () => {
  it('are replaced, added and taken out in one pass; what is untouched stays the same object', () => {
    const before = documentOf([point('p1'), point('p2'), point('p3')]);
    const after = withNotice(before, { sequence: 6, items: [item('p2', point('p2', 'new')), item('p3', null), item('p4', point('p4'))] });
    expect(after.points.map(({ tag }) => tag)).toEqual(['p1', 'new', 'p4']);
    expect(after.points[0]).toBe(before.points[0]);
    expect(after.dispensers).toBe(before.dispensers);
    expect(after.sequence).toBe(6);
  });

  it('stay the same list where nothing of it changes', () => {
    const before = documentOf([point('p1')]);
    const after = withNotice(before, { sequence: 6, items: [item('gone', null), item('p1', before.points[0])] });
    expect(after.points).toBe(before.points);
  });

  it('wait for what others wrote where an answer skips numbers', () => {
    const keep = <T>(placed: T): T => placed;
    expect(withAnswer(documentOf([]), { sequence: 6, items: [] }, keep).sequence).toBe(6);
    expect(withAnswer(documentOf([]), { sequence: 8, items: [] }, keep).sequence).toBe(5);
  });

  it('show changes before they are written', () => {
    const changes: RowChange[] = [
      { collection: 'points', op: 'update', id: 'p1', values: { tag: 'renamed' } },
      { collection: 'points', op: 'create', id: 'p9', values: { tag: 'new' } },
      { collection: 'dispensers', op: 'delete', id: 'd1' },
      { collection: 'projects', op: 'update', id: 'project', values: { name: 'Q' } },
    ];
    const after = withChanges(documentOf([point('p1')]), changes);
    expect(rowOf(after, 'points', 'p1')).toEqual({ id: 'p1', version: 1, tag: 'renamed' });
    expect(rowOf(after, 'points', 'p9')).toMatchObject({ version: 0, tag: 'new', daysPerWeek: 7 });
    expect(after.dispensers).toEqual([]);
    expect(after.project.name).toBe('Q');
  });

  it('take 10,000 at once in one pass', () => {
    const ids = Array.from({ length: 20_000 }, (_, i) => `p${i}`);
    const before = documentOf(ids.map((id) => point(id)));
    const fastest = (count: number): number => {
      const items = ids.slice(0, count).map((id) => item(id, point(id, 'new')));
      return Math.min(...Array.from({ length: 5 }, () => {
        const start = performance.now();
        withNotice(before, { sequence: 6, items });
        return performance.now() - start;
      }));
    };
    // Measured 5 ms against 1 ms; a pass for each row would cost 10,000 times one.
    expect(fastest(10_000)).toBeLessThan(200 * Math.max(fastest(1), 0.25));
  });
});

describe('alters', () => {
  const update: RowChange = { collection: 'points', op: 'update', id: 'p1', version: 1, values: {} };
  it.each([
    { title: 'a row of the same version: nothing was written', items: [item('p1', point('p1'))], says: false },
    { title: 'a higher version', items: [item('p1', { ...point('p1'), version: 2 })], says: true },
    { title: 'a deletion', items: [item('p1', null)], says: true },
    { title: 'a row that came with it', items: [item('p1', point('p1')), item('p2', point('p2'))], says: true },
  ])('$title', ({ items, says }) => {
    expect(alters({ sequence: 6, items }, [update])).toBe(says);
  });
});
