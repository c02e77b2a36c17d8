import { HttpEventType, provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { vi } from 'vitest';
import { ProjectStore } from '../core/project/project-store';
import { ImportViewStore } from './import-view-store';
import { WorkWatch } from './progress/work-watch';
import { ImportRows } from './rows/import-rows';
import { buildColumn, buildCounts, buildPreview } from './testing/preview';

const base = '/api/v1/projects/p/imports';
const file = new File(['Tag\nA-1\n'], 'list.csv');
const columns = [buildColumn('A', 'tag'), buildColumn('B', 'circuit'), buildColumn('C', null)];
const unknownValues = [{ field: 'wiring', text: '2-adrig', rows: 9, choices: ['two-core', 'four-core'], remembered: false, value: null }];
const preview = buildPreview({ columns, unknownValues, counts: buildCounts({ rows: 3, toCreate: 2, heldBack: 1 }) });
const cancelled = { type: 'https://lanewright.example/problems/cancelled', title: 'Stopped', status: 409 };

describe('ImportViewStore', () => {
  let store: ImportViewStore;
  let http: HttpTestingController;
  const reload = vi.fn(() => Promise.resolve());
  const ownSet = vi.fn();
  const takeBack = vi.fn();

  beforeEach(() => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'setInterval', 'clearInterval', 'performance', 'Date'] });
    const project = { document: () => ({ project: { id: 'p' } }), reload, ownSet, takeBack };
    TestBed.configureTestingModule({ providers: [
      provideHttpClient(), provideHttpClientTesting(), { provide: ProjectStore, useValue: project }, ImportViewStore, ImportRows, WorkWatch,
    ] });
    store = TestBed.inject(ImportViewStore);
    http = TestBed.inject(HttpTestingController);
  });
  afterEach(() => {
    http.verify();
    vi.useRealTimers();
  });

  const upload = () => {
    const done = store.upload(file);
    return { done, request: http.expectOne({ method: 'POST', url: base }) };
  };
  const checked = async () => {
    const { done, request } = upload();
    request.flush(preview, { status: 201, statusText: 'Created' });
    await done;
  };
  const idOf = (body: unknown) => (body as FormData).get('id') as string;

  it('sends the id before the file, and shows what importing would do', async () => {
    const { done, request } = upload();
    expect([...(request.request.body as FormData).keys()]).toEqual(['id', 'file']);
    expect(idOf(request.request.body)).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7/);
    expect(store.job()).toBe('upload');
    request.flush(preview, { status: 201, statusText: 'Created' });
    await done;
    expect(store.preview()?.fileName).toBe('list.csv');
    expect(store.writes()).toBe(2);
    expect(store.job()).toBeNull();
  });

  it('shows no progress for a file that is read at once', async () => {
    const { done, request } = upload();
    vi.advanceTimersByTime(390);
    expect(store.progress()).toBeNull();
    request.flush(preview);
    await done;
    vi.advanceTimersByTime(100);
    expect(store.progress()).toBeNull();
  });

  it('shows the bytes sent, then what the server has read', async () => {
    const { done, request } = upload();
    request.event({ type: HttpEventType.UploadProgress, loaded: 500, total: 1000 });
    vi.advanceTimersByTime(600);
    expect(store.progress()).toMatchObject({ stage: 'sending', done: 500, total: 1000 });
    const id = idOf(request.request.body);
    http.expectNone(`${base}/${id}/work`);
    request.event({ type: HttpEventType.UploadProgress, loaded: 1000, total: 1000 });
    vi.advanceTimersByTime(500);
    http.expectOne(`${base}/${id}/work`).flush({ stage: 'reading', done: 200, total: null, elapsedMs: 400 });
    expect(store.progress()).toMatchObject({ stage: 'reading', done: 200, total: null });
    request.flush(preview);
    await done;
    expect(store.progress()).toBeNull();
  });

  it('stops the bytes at once when it is cancelled', async () => {
    const { done, request } = upload();
    store.cancel();
    expect(request.cancelled).toBe(true);
    await done;
    expect(store.preview()).toBeNull();
    expect(store.told()).toBe('Stopped. Nothing was changed.');
    expect(store.problem()).toBeNull();
  });

  it('asks the server to stop reading until it has', async () => {
    const { done, request } = upload();
    const id = idOf(request.request.body);
    request.event({ type: HttpEventType.UploadProgress, loaded: 1000, total: 1000 });
    store.cancel();
    expect(store.progress()?.stage).toBe('stopping');
    vi.advanceTimersByTime(0);
    const stop = { method: 'DELETE', url: `${base}/${id}/work` };
    http.expectOne(stop).flush({ title: 'Nothing is under way', status: 404 }, { status: 404, statusText: 'Not found' });
    vi.advanceTimersByTime(500);
    http.match({ method: 'GET' });
    http.expectOne(stop).flush(null, { status: 204, statusText: 'No content' });
    request.flush(cancelled, { status: 409, statusText: 'Conflict' });
    await done;
    expect(store.told()).toBe('Stopped. Nothing was changed.');
    expect(store.problem()).toBeNull();
  });

  it('says why a file is refused, and does not offer to send it again', async () => {
    const { done, request } = upload();
    request.flush({ type: 'unreadable-file', title: 'The workbook is encrypted', status: 422, detail: 'Remove the password.' }, { status: 422, statusText: 'Unprocessable' });
    await done;
    expect(store.problem()).toMatchObject({ title: 'The workbook is encrypted', detail: 'Remove the password.' });
    expect(store.canRetry()).toBe(false);
  });

  it('does not send a file that is too large', async () => {
    await store.upload(new File([new Uint8Array(25_000_001)], 'huge.csv'));
    expect(store.problem()).toMatchObject({ title: 'The file is too large', detail: expect.stringContaining('It has 25.1 MB') as string });
  });

  it('sends the same file with the same id again after the network was lost', async () => {
    const { done, request } = upload();
    request.error(new ProgressEvent('error'));
    await done;
    expect(store.canRetry()).toBe(true);
    const again = store.retry();
    const second = http.expectOne({ method: 'POST', url: base });
    expect(idOf(second.request.body)).toBe(idOf(request.request.body));
    second.flush(preview);
    await again;
    expect(store.preview()).not.toBeNull();
    expect(store.canRetry()).toBe(false);
  });

  it('gives a field to one column only', async () => {
    await checked();
    const done = store.mapColumn('C', 'circuit');
    const request = http.expectOne(`${base}/import/preview`);
    expect(request.request.body).toEqual({ mapping: { A: 'tag', C: 'circuit' } });
    request.flush(preview);
    await done;
  });

  it('reads next what was chosen last while it was reading', async () => {
    await checked();
    const first = store.mapColumn('C', 'machine');
    void store.mapColumn('B', null);
    void store.read({ decimal: ',' });
    http.expectOne(`${base}/import/preview`).flush(preview);
    await vi.advanceTimersByTimeAsync(0);
    const next = http.expectOne(`${base}/import/preview`);
    expect(next.request.body).toEqual({ decimal: ',' });
    next.flush(preview);
    await first;
    expect(store.settings()).toEqual({ decimal: ',' });
  });

  it('keeps a text in the list once it has a value, so that the choice can be changed', async () => {
    await checked();
    expect(store.values()).toMatchObject([{ text: '2-adrig', value: undefined }]);
    const done = store.mapValue('wiring', '2-adrig', 'two-core');
    const request = http.expectOne(`${base}/import/preview`);
    expect(request.request.body).toMatchObject({ valueMapping: { wiring: { '2-adrig': 'two-core' } } });
    request.flush({ ...preview, unknownValues: [] });
    await done;
    expect(store.values()).toMatchObject([{ text: '2-adrig', value: 'two-core' }]);
  });

  it('keeps what was shown when reading in another way is refused or stopped', async () => {
    await checked();
    const done = store.read({ headerRow: 900 });
    http.expectOne(`${base}/import/preview`).flush({ type: 'unreadable-file', title: 'No row 900', status: 422 }, { status: 422, statusText: 'Unprocessable' });
    await done;
    expect(store.problem()?.title).toBe('No row 900');
    expect(store.preview()?.fileName).toBe('list.csv');
    expect(store.settings()).toEqual({});
  });

  it('imports with the mapping shown, and reads the project anew', async () => {
    await checked();
    reload.mockClear();
    const done = store.commit();
    const request = http.expectOne(`${base}/import/commit`);
    expect(request.request.body).toEqual({ mapping: { A: 'tag', B: 'circuit' } });
    vi.advanceTimersByTime(500);
    http.expectOne(`${base}/import/work`).flush({ stage: 'writing', done: 1, total: 2, elapsedMs: 400 });
    expect(store.progress()).toMatchObject({ stage: 'writing', done: 1, total: 2 });
    request.flush({ id: 'import', created: 2, updated: 0, same: 0, heldBack: 1, sequence: 8 });
    await done;
    expect(store.result()?.created).toBe(2);
    expect(reload).toHaveBeenCalledOnce();
  });

  it('takes the import back as one change set, or says why it cannot', async () => {
    await checked();
    const done = store.commit();
    http.expectOne(`${base}/import/commit`).flush({ id: 'import', created: 2, updated: 0, same: 0, heldBack: 1, sequence: 8 });
    await done;
    const set = { id: 'import', summary: 'Import of list.csv' };
    expect(ownSet).toHaveBeenLastCalledWith(set.id, set.summary);
    takeBack.mockResolvedValueOnce({ set, by: set, problem: { type: 'undo-refused', title: 'Changed since', status: 409 } });
    await store.undo();
    expect(store.undone()).toBe(false);
    expect(store.problem()?.title).toBe('Changed since');
    takeBack.mockResolvedValueOnce({ set, by: set, problem: null });
    await store.undo();
    expect(takeBack).toHaveBeenLastCalledWith('undo', set);
    expect(store.undone()).toBe(true);
    expect(store.problem()).toBeNull();
  });

  it('is back at the check when an import was stopped', async () => {
    await checked();
    const done = store.commit();
    store.cancel();
    vi.advanceTimersByTime(0);
    http.expectOne({ method: 'DELETE', url: `${base}/${store.preview()?.id}/work` }).flush(null, { status: 204, statusText: 'No content' });
    http.expectOne(`${base}/import/commit`).flush(cancelled, { status: 409, statusText: 'Conflict' });
    await done;
    expect(store.result()).toBeNull();
    expect(store.preview()).not.toBeNull();
    expect(store.told()).toBe('Stopped. Nothing was imported.');
  });

  it('says so where the import was done before it could be stopped', async () => {
    await checked();
    const done = store.commit();
    store.cancel();
    http.expectOne(`${base}/import/commit`).flush({ id: 'import', created: 2, updated: 0, same: 0, heldBack: 1, sequence: 8 });
    await done;
    expect(store.result()).not.toBeNull();
    expect(store.told()).toBe('The import was done before it could be stopped.');
  });
});
