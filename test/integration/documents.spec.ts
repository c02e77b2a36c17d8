import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedTerminal } from '#support/import-project.ts';
import { type TestApp, testApp } from '#support/test-app.ts';

let app: TestApp;
let url: string;

beforeAll(async () => {
  app = await testApp();
  url = `/api/v1/projects/${(await seedTerminal(app)).project.id}/documents/io-list`;
});
afterAll(() => app.close());

describe('the I/O list over the API', () => {
  it('comes as CSV under a safe name that says it is a draft', async () => {
    const viewer = await app.as('viewer');
    const answer = await viewer.get(`${url}.csv`).expect(200);
    expect(answer.headers['content-type']).toContain('text/csv');
    expect(answer.headers['content-disposition']).toMatch(/^attachment; filename="brackwater-terminal-io-list-draft-\d{4}-\d\d-\d\d\.csv"$/);
    expect(answer.text).toContain("GC1-L01,\"Head pulley, bearing drive side\",'=T1.GL1,'+G1,'-GP01");
    expect(answer.text.trimEnd().split('\r\n')).toHaveLength(61);
  });

  it('comes with another delimiter and decimal mark on request', async () => {
    const viewer = await app.as('viewer');
    const { text } = await viewer.get(`${url}.csv?delimiter=semicolon&decimal=comma&bom=false`).expect(200);
    expect(text).toContain(";0,75;");
    expect(text.charCodeAt(0)).not.toBe(0xfeff);
    await viewer.get(`${url}.csv?delimiter=pipe`).expect(422);
  });

  it('comes as a workbook', async () => {
    const viewer = await app.as('viewer');
    const answer = await viewer.get(`${url}.xlsx`).buffer().parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on('data', (chunk: Buffer) => chunks.push(chunk));
      res.on('end', () => done(null, Buffer.concat(chunks)));
    }).expect(200);
    expect(answer.headers['content-disposition']).toMatch(/\.xlsx"$/);
    expect((answer.body as Buffer).subarray(0, 2).toString()).toBe('PK');
  });

  it('is not for strangers, nor for another organisation', async () => {
    await app.stranger().get(`${url}.csv`).expect(401);
    const other = await app.asOther('engineer');
    await other.get(`${url}.csv`).expect(404);
    await other.get(`${url}.xlsx`).expect(404);
  });
});
