import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { v7 as newId } from 'uuid';
import { tagListBytes } from '#support/brackwater-setup.ts';
import { ImportProject, seedTerminal } from '#support/import-project.ts';
import { signedIn, type TestApp, testApp } from '#support/test-app.ts';
import { asOrganisation } from '#support/test-database.ts';

const WORKBOOK = 'brackwater-signals.xlsx';
/** Source: our own list of what this workbook holds, written with it (see its README). */
const expected = JSON.parse(readFileSync('test/fixtures/tag-lists/expected/brackwater-signals.json', 'utf8')) as {
  points: { rows: number[]; values: { tag: string; outputAddress: string; statusAddress: string | null; cableLengthM: number } }[];
};
/** A list that takes the thread long enough to be watched. */
const longList = (rows: number): Buffer =>
  Buffer.from(`Tag,Description,Bore d mm\n${Array.from({ length: rows }, (_, i) => `L-${i},Bearing ${i},60`).join('\n')}\n`);

let app: TestApp;
let terminal: string;
let project: ImportProject;

beforeAll(async () => {
  app = await testApp();
  terminal = (await seedTerminal(app)).project.id;
});
afterAll(() => app.close());
beforeEach(async () => {
  project = await ImportProject.create(await app.as('engineer'), terminal);
});

describe('a signal list as a workbook', () => {
  it('gives the points that its rows make together, and each again as the same', async () => {
    const preview = await project.upload(WORKBOOK);
    expect(preview.counts).toMatchObject({ rows: 54, toCreate: 30, problems: 0, notes: 0, heldBack: 0, skipped: 1 });
    expect(preview.settings).toMatchObject({ encoding: null, delimiter: null, headerRow: 6 });
    expect(preview.sheets.map(({ name, taken }) => [name, taken])).toEqual([['Signals', true], ['Legend', false]]);
    const page = await project.rows(preview, '?show=create');
    expect(page.rows.map(({ rows, values }) => [values['tag'], rows])).toEqual(expected.points.map(({ rows, values }) => [values.tag, rows]));

    expect(await project.commit(preview)).toMatchObject({ created: 30, heldBack: 0 });
    const design = await project.design();
    expect([design.points.length, design.dispensers.length, design.assignments.length]).toEqual([30, 30, 54]);
    for (const { values } of expected.points) {
      const point = design.points.find((p) => p.tag === values.tag);
      expect(design.dispensers.find((d) => d.pointId === point?.id)).toMatchObject({ cableLengthM: values.cableLengthM });
    }
    expect((await project.upload(WORKBOOK)).counts).toMatchObject({ toCreate: 0, toUpdate: 0, same: 30 });
  });

  it('remembers for the organisation how columns and texts were mapped', async () => {
    const bytes = Buffer.from('Lube spot,Words,Wires\nR-1,First,pair\nR-2,Second,quad\n');
    const first = await project.upload('odd.csv', bytes);
    const mapping = { A: 'tag', C: 'wiring' };
    await project.commit(first, { mapping, valueMapping: { wiring: { pair: 'two-core', quad: 'four-core' } } });

    const other = await ImportProject.create(await app.as('engineer'), terminal);
    const again = await other.upload('odd.csv', bytes);
    expect(again.columns.map(({ field, reason }) => [field, reason])).toEqual([['tag', 'as last time'], [null, 'left out last time'], ['wiring', 'as last time']]);
    expect(again.unknownValues.map(({ text, value, remembered }) => [text, value, remembered])).toEqual([['pair', 'two-core', true], ['quad', 'four-core', true]]);
    expect((await other.rows(again)).rows.map(({ values }) => values['wiring'])).toEqual(['two-core', 'four-core']);
  });

  it('shows the columns of a list whose tag column nobody knows, so that a person can point it out', async () => {
    const preview = await project.upload('odd.csv', Buffer.from('Spot,Words\nfirst one,First\nsecond one,Second\n'));
    expect(preview.refusal?.detail).toMatch(/Choose the column/);
    expect([preview.columns.length, preview.counts.toCreate]).toEqual([2, 0]);
    await project.engineer.post(`${project.url}/imports/${preview.id}/commit`).send({}).expect(422);
    expect((await project.preview(preview, { mapping: { A: 'tag', B: 'description' } })).counts).toMatchObject({ toCreate: 2 });
  });

  it('refuses what is no workbook that may be read, with what to do, and keeps nothing', async () => {
    const whole = tagListBytes(WORKBOOK);
    const answer = await project.engineer.post(`${project.url}/imports`).attach('file', whole.subarray(0, 5000), WORKBOOK).expect(422);
    expect((answer.body as { detail: string }).detail).toMatch(/again|save/i);
    const kept = await asOrganisation(app.database.owner, app.org.id, (tx) => tx`select id from imports where project_id = ${project.url.split('/').at(-1) ?? ''}`);
    expect(kept).toEqual([]);
  });
});

describe('a long import', () => {
  it('tells how far it is in every instance, and stops there and then when it is cancelled', async () => {
    const elsewhere = await signedIn(await app.secondInstance(), app.org.emails.engineer);
    const id = newId();
    const work = `${project.url}/imports/${id}/work`;
    const upload = project.engineer.post(`${project.url}/imports`).field('id', id).attach('file', longList(45_000), 'long.csv');
    const answer = upload.then((response) => response);
    let progress = await elsewhere.get(work);
    while (progress.status === 204) progress = await elsewhere.get(work);
    expect(progress.body).toMatchObject({ stage: expect.stringMatching(/waiting|reading|checking/) as string, elapsedMs: expect.any(Number) as number });

    await elsewhere.delete(work).expect(204);
    const { status, body } = await answer;
    expect([status, (body as { type: string }).type.split('/').at(-1)]).toEqual([409, 'cancelled']);
    expect((await project.design()).points).toEqual([]);
    await elsewhere.get(work).expect(204);
    // The next one is not hindered by it.
    expect((await project.upload('brackwater-points.csv')).counts.toCreate).toBe(60);
  });

  it('lets others be answered meanwhile, and gives its rows in pages', async () => {
    let done = false;
    const upload = project.upload('long.csv', longList(45_000)).finally(() => { done = true; });
    let answered = 0;
    while (!done) {
      await project.engineer.get('/api/v1/projects').expect(200);
      answered += 1;
    }
    expect(answered).toBeGreaterThan(5);
    const preview = await upload;
    expect(preview.counts.toCreate).toBe(45_000);
    const page = await project.rows(preview, '?show=create&offset=44990&limit=100');
    expect([page.total, page.rows.length, page.rows.at(-1)?.values['tag']]).toEqual([45_000, 10, 'L-44999']);
    expect((await project.rows(preview, '?show=problems')).total).toBe(0);
  });
});
