import type { DesignDocument, HistoryEntry, ImportPreview } from '#contract';
import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Agent, testApp, type TestApp } from '#support/test-app.ts';
import { asOrganisation } from '#support/test-database.ts';
import { buildProject, buildTypes, type TestProject, type TestTypes } from '#support/test-project.ts';
import { created, undoProject, updated } from '#support/undo-project.ts';

let app: TestApp;
let engineer: Agent;
let types: TestTypes;
let project: TestProject;
let on: ReturnType<typeof undoProject>;

beforeAll(async () => {
  app = await testApp();
  engineer = await app.as('engineer');
  types = await buildTypes(engineer);
});
afterAll(() => app.close());
beforeEach(async () => {
  project = await buildProject(engineer, `Undo import ${newId()}`, types);
  on = undoProject(project);
});

const LIST = 'Tag,Description,Dose cm³\nGC1-L01,Head pulley renamed,0.3\nNEW-1,New point,0.2\nNEW-2,Another,0.4\n';
const imported = async (text = LIST): Promise<string> => {
  const preview = (await engineer.post(`${on.url}/imports`).attach('file', Buffer.from(text), 'list.csv').expect(201)).body as ImportPreview;
  await engineer.post(`${on.url}/imports/${preview.id}/commit`).send({}).expect(200);
  return preview.id;
};
const design = async (): Promise<DesignDocument> => (await engineer.get(`${on.url}/design`).expect(200)).body as DesignDocument;
const keptFiles = async (): Promise<number> => {
  const [row] = await asOrganisation(app.database.owner, app.org.id, (tx) => tx`select count(*)::int as n from imports where project_id = ${project.id}`);
  return row?.['n'] as number;
};

describe('undo of an import', () => {
  it('takes it back as a whole and forgets its file; redo brings the rows again', async () => {
    const before = await on.state(engineer);
    const id = await imported();
    const after = await on.state(engineer);
    expect([after, await keptFiles()]).toEqual([expect.not.objectContaining(before as object), 1]);
    const undo = await on.undone(engineer, id);
    expect(await on.state(engineer)).toEqual(before);
    expect(await keptFiles()).toBe(0);
    const redo = await on.undone(engineer, undo.id);
    expect(await on.state(engineer)).toEqual(after);
    const summaries = (await on.history(engineer)).slice(0, 2).map((entry: HistoryEntry) => entry.summary);
    expect(summaries).toEqual([expect.stringMatching(/^Redone: Import of list\.csv/), expect.stringMatching(/^Undone: Import of list\.csv/)]);
    await on.undone(engineer, redo.id);
    expect(await on.state(engineer)).toEqual(before);
  });

  it('is refused as a whole where one of its rows was changed since, and keeps the file', async () => {
    const id = await imported();
    const point = (await design()).points.find((p) => p.tag === 'NEW-2');
    await on.edit(engineer, 'points', point?.id ?? '', { boreMm: 80 }, 'Bore of NEW-2');
    const before = await on.state(engineer);
    expect((await on.refused(engineer, id)).detail).toMatch(/^Point NEW-2: bore changed by The engineer on .* \(“Bore of NEW-2”\)\. Undo the later changes first\.$/);
    expect([await on.state(engineer), await keptFiles()]).toEqual([before, 1]);
  });

  it('is not in the way of what was edited in other fields of a row that it changed', async () => {
    const id = await imported('Tag,Description\nGC1-L01,Head pulley renamed\n');
    await on.edit(engineer, 'points', project.ids.pointA, { boreMm: 80 });
    await on.undone(engineer, id);
    expect(await on.row(engineer, 'points', project.ids.pointA)).toMatchObject({ description: null, boreMm: 80 });
  });
});

describe('10,000 points', () => {
  const ids = Array.from({ length: 10_000 }, () => newId());

  it('with their dispensers are undone and redone about as fast as they were written', async () => {
    const before = await on.state(engineer);
    const made = await timed(() => on.apply(engineer, 'Import of large.csv', ids.flatMap((id, i) => [
      created('points', id, { tag: `P-${i}`, boreMm: 60 }),
      created('dispensers', newId(), { pointId: id, typeId: types.dispenser, wiring: 'four-core', circuitId: project.ids.circuit, nodeId: project.ids.box }),
    ])));
    const bulk = await on.apply(engineer, 'Bores', ids.map((id) => updated('points', id, 1, { boreMm: 70 })));
    expect((await on.refused(engineer, made.result)).detail).toContain('9997 more rows');
    const undoBulk = await timed(() => on.undone(engineer, bulk));
    const undo = await timed(() => on.undone(engineer, made.result));
    expect(undo.result.notice.items).toHaveLength(20_000);
    expect(await on.state(engineer)).toEqual(before);
    const redo = await timed(() => on.undone(engineer, undo.result.id));
    expect((await design()).dispensers).toHaveLength(10_002);
    // A row that were asked for by itself would cost many times the writing of all. The machine may be busy elsewhere.
    expect(Math.max(undo.ms, undoBulk.ms, redo.ms)).toBeLessThan(3 * made.ms + 3000);
  }, 300_000);
});

async function timed<T>(work: () => Promise<T>): Promise<{ result: T; ms: number }> {
  const start = performance.now();
  const result = await work();
  return { result, ms: performance.now() - start };
}
