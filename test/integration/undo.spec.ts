import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Agent, signedIn, testApp, type TestApp } from '#support/test-app.ts';
import { buildProject, buildTypes, type TestProject, type TestTypes } from '#support/test-project.ts';
import { created, deleted, undoProject, updated } from '#support/undo-project.ts';

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
  project = await buildProject(engineer, `Undo ${newId()}`, types);
  on = undoProject(project);
});

describe('undo of an edit', () => {
  it('puts back the fields that it changed, and only those; versions go up', async () => {
    const { dispenserA: id } = project.ids;
    const dose = await on.edit(engineer, 'dispensers', id, { doseUl: 300 }, 'Dose of GC1-L01');
    await on.edit(engineer, 'dispensers', id, { cableTag: 'W11' });
    const { notice } = await on.undone(engineer, dose);
    expect(notice.items).toEqual([{ collection: 'dispensers', id, row: expect.objectContaining({ doseUl: null, cableTag: 'W11', version: 4 }) }]);
    expect(await on.row(engineer, 'dispensers', id)).toEqual(notice.items[0]?.row);
  });

  it('is a change set of its own: who, when, what it undid, and the entry says by whom it was undone', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 }, 'Dose of GC1-L01');
    const { id, notice } = await on.undone(engineer, dose);
    const [latest, entry] = await on.history(engineer);
    expect(latest).toMatchObject({ id, summary: 'Undone: Dose of GC1-L01', by: 'The engineer', rows: 1, sequence: notice.sequence, undoes: dose, undoneBy: null });
    expect(entry).toMatchObject({ id: dose, undoes: null, undoneBy: { id, by: 'The engineer', at: latest?.at } });
  });

  it('is redone by its own undo, again and again, without piling up words', async () => {
    const { dispenserA } = project.ids;
    const dose = await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 300 }, 'Dose of GC1-L01');
    const undo = await on.undone(engineer, dose);
    const redo = await on.undone(engineer, undo.id);
    expect(await on.row(engineer, 'dispensers', dispenserA)).toMatchObject({ doseUl: 300, version: 4 });
    expect((await on.history(engineer)).slice(0, 3)).toMatchObject([
      { id: redo.id, summary: 'Redone: Dose of GC1-L01', undoes: undo.id, undoneBy: null },
      { id: undo.id, undoneBy: { id: redo.id } },
      { id: dose, undoneBy: null },
    ]);
    await on.undone(engineer, dose);
    expect(await on.row(engineer, 'dispensers', dispenserA)).toMatchObject({ doseUl: null, version: 5 });
    const [latest, again, , first] = await on.history(engineer);
    expect(latest).toMatchObject({ summary: 'Undone: Dose of GC1-L01', undoes: redo.id });
    expect([again?.undoneBy?.id, first?.undoneBy?.id]).toEqual([latest?.id, latest?.id]);
  });

  it('gets the same answer when it is asked again, also at the same time', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 });
    const id = newId();
    const answers = await Promise.all([1, 2, 3].map(() => on.undo(engineer, dose, id)));
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    const again = await on.undo(engineer, dose, id).expect(200);
    for (const answer of answers) expect(answer.body).toEqual(again.body);
    expect((await on.history(engineer)).filter((entry) => entry.undoes === dose)).toHaveLength(1);
  });

  it('makes deleted rows again with their values, and redo deletes them again', async () => {
    const { pointA, dispenserA, assignment } = project.ids;
    const before = await on.state(engineer);
    const gone = await on.apply(engineer, 'Point GC1-L01 deleted', [deleted('points', pointA, 1)]);
    const { id } = await on.undone(engineer, gone);
    expect(await on.state(engineer)).toEqual(before);
    for (const [path, row] of [['points', pointA], ['dispensers', dispenserA], ['assignments', assignment]]) {
      expect((await on.row(engineer, path ?? '', row ?? '')).version).toBe(2);
    }
    await on.undone(engineer, id);
    await engineer.get(`${on.url}/points/${pointA}`).expect(404);
  });

  it('takes a module back with the groups that it brought', async () => {
    const before = await on.state(engineer);
    const made = await on.apply(engineer, 'DO2 added', [created('modules', newId(), { controllerId: project.ids.controller, typeId: types.output, name: 'DO2', baseByte: 8, slot: 3 })]);
    await on.undone(engineer, made);
    expect(await on.state(engineer)).toEqual(before);
  });

  it('swaps back what was swapped', async () => {
    const { pointA, pointB } = project.ids;
    const before = await on.state(engineer);
    const swap = await on.apply(engineer, 'Tags swapped', [updated('points', pointA, 1, { tag: 'GC1-L02' }), updated('points', pointB, 1, { tag: 'GC1-L01' })]);
    const { id } = await on.undone(engineer, swap);
    expect(await on.state(engineer)).toEqual(before);
    await on.undone(engineer, id);
    expect(await on.row(engineer, 'points', pointA)).toMatchObject({ tag: 'GC1-L02', version: 4 });
  });

  it('puts back the policies of the project', async () => {
    const policies = async () => (await engineer.get(project.url).expect(200)).body as { version: number; sparePercent: number };
    const { version } = await policies();
    const set = await on.apply(engineer, 'Spare', [updated('projects', project.id, version, { sparePercent: 5 })]);
    await on.undone(engineer, set);
    expect(await policies()).toMatchObject({ sparePercent: 20, version: version + 2 });
  });

  it('leaves no trace where it is not known, not allowed or of somebody else', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 });
    await on.undo(await app.as('viewer'), dose).expect(403);
    await on.undo(app.stranger(), dose).expect(401);
    await on.undo(await app.asOther('engineer'), dose).expect(404);
    await on.undo(engineer, newId()).expect(404);
    const other = undoProject(await buildProject(engineer, `Other ${newId()}`, types));
    await other.undo(engineer, dose).expect(404);
    await engineer.post(`${on.url}/change-sets/${dose}/undo`).send({ id: 'x' }).expect(422);
    expect(await on.row(engineer, 'dispensers', project.ids.dispenserA)).toMatchObject({ doseUl: 300, version: 2 });
  });

  it('is announced like every change', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 });
    const since = (await on.history(engineer))[0]?.sequence ?? 0;
    const { notice } = await on.undone(engineer, dose);
    expect((await engineer.get(`${on.url}/changes?since=${since}`).expect(200)).body).toEqual(notice);
  });
});

describe('an undo is refused with the reason', () => {
  it('where somebody changed the same field later: who, when, what', async () => {
    const { dispenserA } = project.ids;
    const dose = await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 300, cableTag: 'W1' });
    await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 500 }, 'Dose of GC1-L01');
    const problem = await on.refused(engineer, dose);
    expect(problem.type).toMatch(/undo-refused$/);
    expect(problem.title).toBe('Later changes stand on this');
    expect(problem.detail).toMatch(/^Dispenser at GC1-L01: dose changed by The engineer on \d+ \w{3} \d{4}, \d\d:\d\d \(“Dose of GC1-L01”\)\. Undo the later changes first\.$/);
    expect(await on.row(engineer, 'dispensers', dispenserA)).toMatchObject({ doseUl: 500, cableTag: 'W1' });
  });

  it('also where the later edit came back to the same value', async () => {
    const { dispenserA } = project.ids;
    const dose = await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 300 });
    await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 500 });
    await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 300 }, 'Dose on purpose');
    expect((await on.refused(engineer, dose)).detail).toContain('“Dose on purpose”');
  });

  it('not where the later change was undone', async () => {
    const { dispenserA } = project.ids;
    const dose = await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 300 });
    const later = await on.edit(engineer, 'dispensers', dispenserA, { doseUl: 500 });
    await on.undone(engineer, later);
    await on.undone(engineer, dose);
    expect(await on.row(engineer, 'dispensers', dispenserA)).toMatchObject({ doseUl: null });
  });

  it('names a few rows and counts the others', async () => {
    const ids = Array.from({ length: 8 }, () => newId());
    const made = await on.apply(engineer, 'Eight points', ids.map((id, i) => created('points', id, { tag: `N-${i}` })));
    await on.apply(engineer, 'Bores', ids.map((id) => updated('points', id, 1, { boreMm: 60 })));
    const { detail } = await on.refused(engineer, made);
    expect(detail).toContain('Point N-0: bore changed by The engineer');
    expect(detail).toContain('5 more rows were changed later too.');
  });

  it('where it is undone already, or redone, and says by whom', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 }, 'Dose of GC1-L01');
    const { id } = await on.undone(engineer, dose);
    expect(await on.refused(engineer, dose)).toMatchObject({ title: 'This was undone already', detail: expect.stringMatching(/“Dose of GC1-L01” was undone by The engineer on/) });
    await on.undone(engineer, id);
    expect(await on.refused(engineer, id)).toMatchObject({ title: 'This was redone already' });
  });

  it('is one of two at the same time', async () => {
    const dose = await on.edit(engineer, 'dispensers', project.ids.dispenserA, { doseUl: 300 });
    const gone = await on.apply(engineer, 'Point gone', [deleted('points', project.ids.pointB, 1)]);
    const other = await signedIn(await app.secondInstance(), app.org.emails.engineer);
    for (const set of [dose, gone]) {
      const answers = await Promise.all([on.undo(engineer, set), on.undo(other, set)]);
      expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    }
  });

  it('where a row that it made was deleted since, or is used by others now', async () => {
    const [point, dispenser] = [newId(), newId()];
    const made = await on.apply(engineer, 'Point NEW-1', [created('points', point, { tag: 'NEW-1' })]);
    const hung = await on.apply(engineer, 'Dispenser at NEW-1', [created('dispensers', dispenser, { pointId: point })]);
    const used = await on.refused(engineer, made);
    expect(used.title).toBe('Other rows stand on this');
    expect(used.detail).toMatch(/^Dispenser at NEW-1 belongs to point NEW-1 now, by The engineer on .* \(“Dispenser at NEW-1”\)\. Move or delete it first\.$/);
    await on.undone(engineer, hung);
    await on.apply(engineer, 'NEW-1 deleted', [deleted('points', point, 1)]);
    expect((await on.refused(engineer, made)).detail).toMatch(/^Point NEW-1: deleted by The engineer on .* \(“NEW-1 deleted”\)\./);
  });

  it('where the parent of a row that it deleted is gone', async () => {
    const { pointB, dispenserB } = project.ids;
    const gone = await on.apply(engineer, 'Dispenser deleted', [deleted('dispensers', dispenserB, 1)]);
    await on.apply(engineer, 'GC1-L02 deleted', [deleted('points', pointB, 1)]);
    expect((await on.refused(engineer, gone)).detail).toMatch(/^Dispenser at GC1-L02 would need point GC1-L02, which was deleted, by The engineer on .* \(“GC1-L02 deleted”\)\. Undo that first\.$/);
  });

  it('where the tag or the channel of a deleted row is taken since', async () => {
    const { pointA, dispenserB, outputs } = project.ids;
    const gone = await on.apply(engineer, 'GC1-L01 deleted', [deleted('points', pointA, 1)]);
    const channel = await on.apply(engineer, 'GC1-L02 on its channel', [created('assignments', newId(), { dispenserId: dispenserB, moduleId: outputs, channel: 0, purpose: 'control' })]);
    expect(await on.refused(engineer, gone)).toMatchObject({ title: 'The design no longer allows this', detail: 'Channel 0 of DO1 is taken by GC1-L02.' });
    await on.undone(engineer, channel);
    await on.apply(engineer, 'Tag again', [created('points', newId(), { tag: 'GC1-L01' })]);
    expect((await on.refused(engineer, gone)).detail).toMatch(/tag GC1-L01 is taken by another point/i);
  });

  it('where a rule of the design forbids the old values now', async () => {
    const { dispenserB, supply } = project.ids;
    const moved = await on.edit(engineer, 'dispensers', dispenserB, { nodeId: null });
    const other = newId();
    await on.apply(engineer, 'Circuit 2', [created('circuits', other, { supplyId: supply, name: '-F2', protection: 'fuse', protectionA: 4 })]);
    await on.edit(engineer, 'dispensers', dispenserB, { circuitId: other });
    expect((await on.refused(engineer, moved)).detail).toContain('box +JB1 is in another circuit');
  });

  it('where it is the creation of the project', async () => {
    const first = (await on.history(engineer)).at(-1);
    expect((await on.refused(engineer, first?.id ?? '')).title).toBe('The creation of a project cannot be undone');
  });
});
