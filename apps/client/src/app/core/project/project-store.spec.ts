import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { DesignDocument } from '#contract';
import { buildDesign, buildLane } from '#support/design-builder';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ProjectStore } from './project-store';

const design = buildDesign({ lanes: [buildLane('P-01', {}, { description: 'as read', machine: 'M1' })] });
const versioned = (rows: readonly object[]) => rows.map((row) => ({ ...row, version: 1 }));
const { dispenserTypes, moduleTypes, cableTypes, supplyTypes, greases, project, ...rows } = design;
const openDocument = {
  sequence: 7, project: { ...project, version: 1 }, catalogue: { dispenserTypes, moduleTypes, cableTypes, supplyTypes, greases },
  ...Object.fromEntries(Object.entries(rows).map(([name, list]) => [name, versioned(list)])),
} as unknown as DesignDocument;
const [point] = openDocument.points;
const problem = (status: number, type: string) => ({ type: `https://lanewright.example/problems/${type}`, title: 'Refused', status });
const stale = (current: object) => ({ ...problem(412, 'stale-write'), title: 'Changed meanwhile', current });
const settle = () => new Promise((resolve) => setTimeout(resolve));

describe('ProjectStore', () => {
  let store: ProjectStore;
  let http: HttpTestingController;

  beforeEach(async () => {
    vi.stubGlobal('EventSource', class { addEventListener() { /* no events in this test */ } close() { /* nothing open */ } });
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    store = TestBed.inject(ProjectStore);
    http = TestBed.inject(HttpTestingController);
    const opened = store.open('project');
    http.expectOne('/api/v1/projects/project/design').flush(openDocument);
    await opened;
  });
  afterEach(() => {
    http.verify();
    vi.unstubAllGlobals();
  });

  const shown = () => store.document()?.points[0];
  interface SetBody { id: string; summary: string; changes: { op: string; id: string; version?: number; values?: object }[] }
  const nextSet = async () => {
    await settle();
    const request = http.expectOne({ method: 'POST', url: '/api/v1/projects/project/change-sets' });
    const body = request.request.body as SetBody;
    return {
      request, body,
      answer: (row: object, sequence = 8) => request.flush({ sequence, items: [{ collection: 'points', id: point.id, row }] }),
      refuse: (why: { status: number; title: string; current?: object }) => request.flush(why, { status: why.status, statusText: 'Refused' }),
    };
  };
  const nextUndo = async (setId: string) => {
    await settle();
    return http.expectOne({ method: 'POST', url: `/api/v1/projects/project/change-sets/${setId}/undo` });
  };
  /** An edit of the point's description that the server takes. @returns the identifier of its set */
  const edited = async (description: string, version: number): Promise<string> => {
    const done = store.edit('points', point.id, { description });
    const set = await nextSet();
    set.answer({ ...point, description, version }, version + 6);
    await done;
    return set.body.id;
  };

  it('shows an edit at once, sends it as a change set in words, and takes the version that the server made', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    expect(shown()?.description).toBe('mine');
    const set = await nextSet();
    expect(set.body.summary).toBe('Description of P-01');
    expect(set.body.changes).toEqual([{ collection: 'points', op: 'update', id: point.id, version: 1, values: { description: 'mine' } }]);
    set.answer({ ...point, description: 'mine', version: 2 });
    await done;
    expect(shown()?.version).toBe(2);
    expect(store.document()?.sequence).toBe(8);
    expect(store.saveState()).toEqual({ kind: 'saved' });
  });

  it('names the version that the edit before it made, and keeps what was typed meanwhile', async () => {
    const first = store.edit('points', point.id, { description: 'mine' });
    const second = store.edit('points', point.id, { machine: 'M2' });
    (await nextSet()).answer({ ...point, description: 'mine', version: 2 });
    await first;
    expect(shown()).toMatchObject({ description: 'mine', machine: 'M2', version: 2 });
    const set = await nextSet();
    expect(set.body.changes[0]).toMatchObject({ version: 2, values: { machine: 'M2' } });
    set.answer({ ...point, description: 'mine', machine: 'M2', version: 3 }, 9);
    await second;
  });

  it('waits for what others wrote where its own answer skips a number', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextSet()).answer({ ...point, description: 'mine', version: 2 }, 10);
    await done;
    expect(store.document()?.sequence).toBe(7);
  });

  it('takes a refused edit back and says why', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextSet()).refuse({ ...problem(422, 'invalid-input'), title: 'Not possible' });
    await done;
    expect(shown()?.description).toBe('as read');
    expect(store.saveState()).toMatchObject({ kind: 'refused', problem: { title: 'Not possible' } });
    expect(store.nextUndo()).toBeNull();
  });

  it('repeats an edit on the new row where somebody else changed another field, and says so', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextSet()).refuse(stale({ ...point, machine: 'M2', version: 4 }));
    const again = await nextSet();
    expect(again.body.changes[0]?.version).toBe(4);
    again.answer({ ...point, machine: 'M2', description: 'mine', version: 5 });
    await done;
    expect(shown()).toMatchObject({ machine: 'M2', description: 'mine', version: 5 });
    expect(store.notice()).toContain('P-01');
    expect(store.nextUndo()?.id).toBe(again.body.id);
  });

  it('asks where both changed the same field, and keeps theirs when told so', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextSet()).refuse(stale({ ...point, description: 'theirs', version: 4 }));
    await settle();
    expect(store.conflict()?.fields).toEqual([{ field: 'description', mine: 'mine', theirs: 'theirs' }]);
    store.conflict()?.takeTheirs();
    await done;
    expect(shown()).toMatchObject({ description: 'theirs', version: 4 });
    expect(store.nextUndo()).toBeNull();
  });

  it('undoes the latest of its own sets and redoes it, each by a set of its own', async () => {
    await edited('first', 2);
    const id = await edited('second', 3);
    expect(store.nextUndo()).toEqual({ id, summary: 'Description of P-01' });
    const undone = store.takeBack('undo');
    const undo = await nextUndo(id);
    undo.flush({ sequence: 10, items: [{ collection: 'points', id: point.id, row: { ...point, description: 'first', version: 4 } }] });
    expect(await undone).toMatchObject({ set: { id }, problem: null });
    expect(shown()).toMatchObject({ description: 'first', version: 4 });
    const undoId = (undo.request.body as { id: string }).id;
    expect(store.nextRedo()).toEqual({ id: undoId, summary: 'Description of P-01' });

    const redone = store.takeBack('redo');
    (await nextUndo(undoId)).flush({ sequence: 11, items: [{ collection: 'points', id: point.id, row: { ...point, description: 'second', version: 5 } }] });
    await redone;
    expect(shown()?.description).toBe('second');
    expect(store.nextRedo()).toBeNull();
  });

  it('undoes an edit that is still on its way, once it is saved', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    const undone = store.takeBack('undo');
    const set = await nextSet();
    set.answer({ ...point, description: 'mine', version: 2 });
    await done;
    (await nextUndo(set.body.id)).flush({ sequence: 9, items: [{ collection: 'points', id: point.id, row: { ...point, version: 3 } }] });
    await undone;
    expect(shown()?.description).toBe('as read');
  });

  it('undoes nothing where the edit was refused that it was meant for', async () => {
    const before = await edited('first', 2);
    const done = store.edit('points', point.id, { description: 'second' });
    const undone = store.takeBack('undo');
    (await nextSet()).refuse(problem(422, 'invalid-input'));
    await done;
    expect(await undone).toBeNull();
    expect(store.nextUndo()?.id).toBe(before);
    expect(store.saveState().kind).toBe('refused');
  });

  it('keeps a refused undo out of what is saved, and takes the set before it next', async () => {
    const first = await edited('first', 2);
    const second = await edited('second', 3);
    const undone = store.takeBack('undo');
    (await nextUndo(second)).flush(problem(409, 'undo-refused'), { status: 409, statusText: 'Conflict' });
    expect((await undone)?.problem?.type).toContain('undo-refused');
    expect(store.saveState()).toEqual({ kind: 'saved' });
    expect(store.nextUndo()?.id).toBe(first);
  });

  it('keeps a set whose undo did not reach the server', async () => {
    const id = await edited('mine', 2);
    const undone = store.takeBack('undo');
    (await nextUndo(id)).error(new ProgressEvent('error'));
    expect((await undone)?.problem?.type).toBe('offline');
    expect(store.nextUndo()?.id).toBe(id);
  });

  it('does not offer the undo of an edit that changed nothing', async () => {
    const done = store.edit('points', point.id, { description: 'as read' });
    (await nextSet()).answer({ ...point }, 7);
    await done;
    expect(store.nextUndo()).toBeNull();
  });

  it('takes sets that were made in another way, and forgets all of them with the project', () => {
    store.ownSet('import', 'Import of list.csv, 60 points');
    expect(store.nextUndo()).toEqual({ id: 'import', summary: 'Import of list.csv, 60 points' });
    store.close();
    expect(store.nextUndo()).toBeNull();
  });

  it('shows several rows at once and takes them back whole where the server refuses', async () => {
    const done = store.apply(null, [{ collection: 'points', op: 'update', id: point.id, values: { description: 'all' } }]);
    expect(shown()?.description).toBe('all');
    const set = await nextSet();
    expect(set.body).toMatchObject({ summary: 'Description of P-01', changes: [{ version: 1 }] });
    set.refuse(problem(409, 'conflict'));
    await settle();
    http.expectOne('/api/v1/projects/project/design').flush(openDocument);
    expect(await done).toBe(false);
    expect(shown()?.description).toBe('as read');
  });
});
