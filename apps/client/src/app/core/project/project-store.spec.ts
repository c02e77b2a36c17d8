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
const stale = (current: object) => ({ type: 'https://lanewright.example/problems/stale-write', title: 'Changed meanwhile', status: 412, current });
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
  const nextPatch = async () => {
    await settle();
    return http.expectOne({ method: 'PATCH', url: `/api/v1/projects/project/points/${point.id}` });
  };

  it('shows an edit at once and takes the version that the server made', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    expect(shown()?.description).toBe('mine');
    const patch = await nextPatch();
    expect(patch.request.headers.get('If-Match')).toBe('"1"');
    patch.flush({ ...point, description: 'mine', version: 2 });
    await done;
    expect(shown()?.version).toBe(2);
    expect(store.saveState()).toEqual({ kind: 'saved' });
  });

  it('takes a refused edit back and says why', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextPatch()).flush({ type: 'invalid-input', title: 'Not possible', status: 422 }, { status: 422, statusText: 'Unprocessable' });
    await done;
    expect(shown()?.description).toBe('as read');
    expect(store.saveState()).toMatchObject({ kind: 'refused', problem: { title: 'Not possible' } });
  });

  it('repeats an edit on the new row where somebody else changed another field, and says so', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextPatch()).flush(stale({ ...point, machine: 'M2', version: 4 }), { status: 412, statusText: 'Stale' });
    const again = await nextPatch();
    expect(again.request.headers.get('If-Match')).toBe('"4"');
    again.flush({ ...point, machine: 'M2', description: 'mine', version: 5 });
    await done;
    expect(shown()).toMatchObject({ machine: 'M2', description: 'mine', version: 5 });
    expect(store.notice()).toContain('P-01');
  });

  it('asks where both changed the same field, and keeps theirs when told so', async () => {
    const done = store.edit('points', point.id, { description: 'mine' });
    (await nextPatch()).flush(stale({ ...point, description: 'theirs', version: 4 }), { status: 412, statusText: 'Stale' });
    await settle();
    expect(store.conflict()?.fields).toEqual([{ field: 'description', mine: 'mine', theirs: 'theirs' }]);
    store.conflict()?.takeTheirs();
    await done;
    expect(shown()).toMatchObject({ description: 'theirs', version: 4 });
  });
});
