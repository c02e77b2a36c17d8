import { ImportPreview, ImportRowPage } from '#contract';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { faultsOf } from '../../apps/server/src/platform/validated.ts';
import { ImportProject, seedTerminal } from '#support/import-project.ts';
import { type TestApp, testApp } from '#support/test-app.ts';

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

describe('import over the API', () => {
  it('previews without changing anything, commits once, and the same file again changes nothing', async () => {
    const preview = await project.upload('brackwater-points.csv');
    expect(faultsOf(ImportPreview, preview)).toEqual([]);
    expect(preview.counts).toMatchObject({ rows: 60, toCreate: 60, heldBack: 0 });
    expect((await project.design()).points).toHaveLength(0);

    expect(await project.commit(preview)).toMatchObject({ created: 60, updated: 0, heldBack: 0 });
    const after = await project.design();
    expect([after.points.length, after.dispensers.length, after.assignments.length]).toEqual([60, 60, 25]);

    expect(await project.commit(preview)).toMatchObject({ created: 60 });
    expect((await project.upload('brackwater-points.csv')).counts).toMatchObject({ toCreate: 0, toUpdate: 0, same: 60 });
    expect((await project.design()).sequence).toBe(after.sequence);
  });

  it('is one change set of its history, under the name of the file', async () => {
    await project.commit(await project.upload('brackwater-points.csv'));
    const [latest] = (await project.engineer.get(`${project.url}/history`).expect(200)).body as { summary: string; rows: number }[];
    expect(latest).toMatchObject({ summary: 'Import of brackwater-points.csv', rows: 145 });
  });

  it('takes corrected settings: the German list as detected, then with a column left out', async () => {
    const preview = await project.upload('brackwater-points-semicolon-1252.csv');
    expect(preview.settings).toEqual({ encoding: 'windows-1252', delimiter: ';', decimal: ',', headerRow: 1 });
    const mapping = Object.fromEntries(preview.columns.filter((c) => c.field && c.field !== 'remarks').map((c) => [c.column, c.field]));
    const again = await project.preview(preview, { mapping });
    expect(again.columns.find((c) => c.heading === 'Bemerkung')?.field).toBeNull();
    await project.commit(preview, { mapping });
    const after = await project.design();
    expect(after.points).toHaveLength(40);
    expect(after.points.every((p) => p.remarks === null)).toBe(true);
  });

  it('updates what the project has, and a blank cell erases nothing', async () => {
    await project.commit(await project.upload('brackwater-points.csv'));
    const bytes = Buffer.from('Tag,Description,Dose cm³\nGC1-L01,Head pulley renamed,\nNEW-1,New point,0.2\n');
    const preview = await project.upload('small.csv', bytes);
    expect(preview.counts).toMatchObject({ toCreate: 1, toUpdate: 1 });
    const page = await project.rows(preview, '?show=update');
    expect(faultsOf(ImportRowPage, page)).toEqual([]);
    expect(page.total).toBe(1);
    expect(page.rows[0].changes).toEqual([{ field: 'description', from: 'Head pulley, bearing drive side', to: 'Head pulley renamed' }]);
    await project.commit(preview);
    const after = await project.design();
    const point = after.points.find((p) => p.tag === 'GC1-L01');
    expect(point).toMatchObject({ description: 'Head pulley renamed', boreMm: 100 });
    expect(after.dispensers.find((d) => d.pointId === point?.id)?.doseUl).toBe(300);
  });

  it.each([
    { name: 'book.csv', bytes: Buffer.from([0x50, 0x4b, 3, 4, 0, 0]), status: 422, says: /workbook/i },
    { name: 'empty.csv', bytes: Buffer.from(''), status: 422, says: /empty/i },
    { name: 'wide.csv', bytes: Buffer.from(`${'a,'.repeat(300)}a\n${'1,'.repeat(300)}1\n`), status: 413, says: /columns/i },
    { name: 'large.csv', bytes: Buffer.alloc(25_000_001, 'a'), status: 413, says: /MB/ },
  ])('refuses $name with what to do, and keeps nothing', async ({ name, bytes, status, says }) => {
    const answer = await project.engineer.post(`${project.url}/imports`).attach('file', bytes, name).expect(status);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(`${(answer.body as { title: string }).title} ${(answer.body as { detail: string }).detail}`).toMatch(says);
    expect((await project.design()).points).toHaveLength(0);
  });

  it('refuses a mapping to a field that does not exist, and a request without a file', async () => {
    const preview = await project.upload('designations.csv');
    await project.engineer.post(`${project.url}/imports/${preview.id}/preview`).send({ mapping: { A: 'colour' } }).expect(422);
    await project.engineer.post(`${project.url}/imports`).field('note', 'no file').expect(400);
  });

  it("does not know another organisation's import", async () => {
    const preview = await project.upload('designations.csv');
    const other = await app.asOther('engineer');
    await other.post(`${project.url}/imports/${preview.id}/commit`).send({}).expect(404);
    await project.engineer.post(`/api/v1/projects/${terminal}/imports/${preview.id}/commit`).send({}).expect(404);
  });
});
