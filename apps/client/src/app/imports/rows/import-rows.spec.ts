import { TestBed } from '@angular/core/testing';
import type { ImportRow, RowFilter } from '#contract';
import { of } from 'rxjs';
import { ImportApi } from '../import-api';
import { buildCounts, buildPreview, buildRow } from '../testing/preview';
import { countOf, ImportRows } from './import-rows';

const problem: ImportRow['problems'][number] = { code: 'x', severity: 'error', field: null, column: null, cell: null, message: 'm', remedy: 'r' };

/** Two sheets of 300 rows; every seventieth row is at fault and held back. */
const rows = Array.from({ length: 600 }, (_, index) => {
  const held = index % 70 === 69;
  return buildRow({ index, sheet: index < 300 ? 'GC1' : 'GC2', row: (index % 300) + 7, action: held ? 'hold' : 'create', problems: held ? [problem] : [] });
});
const counts = buildCounts({ rows: 600, toCreate: 592, heldBack: 8, withProblems: 8, problems: 8 });
const sheet = (name: string) => ({ name, rows: 300, taken: true, alike: true });
const preview = buildPreview({ counts, sheets: [sheet('GC1'), sheet('GC2')] });
const shows = (row: ImportRow, show: RowFilter) => show === 'all' || (show === 'problems' ? row.problems.length > 0 : row.action === show);

describe('ImportRows', () => {
  let store: ImportRows;

  beforeEach(() => {
    const api = {
      rows: (_project: string, _import: string, show: RowFilter, offset: number, limit: number) => {
        const list = rows.filter((row) => shows(row, show));
        return of({ total: list.length, rows: list.slice(offset, offset + limit) });
      },
    };
    TestBed.configureTestingModule({ providers: [ImportRows, { provide: ImportApi, useValue: api }] });
    store = TestBed.inject(ImportRows);
    store.open('p', preview);
  });

  it('goes from problem to problem, and round the end', async () => {
    await store.goToProblem(1);
    expect(store.picked()?.index).toBe(69);
    await store.goToProblem(1);
    expect(store.at()?.index).toBe(139);
    await store.goToProblem(-1);
    await store.goToProblem(-1);
    expect(store.picked()?.index).toBe(559);
  });

  it('begins at what is in view, not where somebody went long ago', async () => {
    await store.goToProblem(1);
    store.see(400);
    await store.goToProblem(1);
    expect(store.picked()?.index).toBe(419);
    store.see(400);
    store.pick(null);
    store.see(300);
    await store.goToProblem(-1);
    expect(store.picked()?.index).toBe(279);
  });

  it('goes through the held-back rows where these are shown, and from other kinds to all', async () => {
    store.show('hold');
    await store.goToProblem(1);
    expect(store.at()?.index).toBe(0);
    expect(store.picked()?.index).toBe(69);
    store.show('create');
    await store.goToProblem(1);
    expect(store.filter()).toBe('all');
    expect(store.picked()?.index).toBe(69);
  });

  it('goes to a row of a sheet, or the last one before it', async () => {
    await store.goToRow(8, 'GC2');
    expect(store.picked()?.index).toBe(301);
    await store.goToRow(8, null);
    expect(store.picked()?.row).toBe(8);
    await store.goToRow(9999, 'GC1');
    expect(store.picked()?.index).toBe(299);
    await store.goToRow(1, 'GC1');
    expect(store.picked()?.index).toBe(0);
  });

  it('keeps the kind that is shown for the next preview while it has rows', () => {
    store.show('hold');
    store.open('p', preview);
    expect(store.filter()).toBe('hold');
    store.open('p', buildPreview({ counts: buildCounts({ toCreate: 3 }) }));
    expect(store.filter()).toBe('all');
  });

  it('counts the skipped rows among all', () => {
    expect(countOf(buildCounts({ rows: 9, toCreate: 4, same: 5, skipped: 2 }), 'all')).toBe(11);
  });
});
