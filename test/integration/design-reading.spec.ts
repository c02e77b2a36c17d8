import { createServer, request, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { gunzipSync } from 'node:zlib';
import { PASSWORD } from '#support/organisation.ts';
import { signedIn, type TestApp, testApp } from '#support/test-app.ts';
import { buildProject, type TestProject } from '#support/test-project.ts';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

let app: TestApp;
let project: TestProject;
let server: Server;
beforeAll(async () => {
  app = await testApp();
  project = await buildProject(await app.as('engineer'));
  server = createServer(app.express).listen(0, '127.0.0.1');
});
afterAll(async () => {
  server.close();
  await app.close();
});

const design = async (headers: Record<string, string> = {}) => (await app.as('viewer')).get(`${project.url}/design`).set(headers);

/** The bytes as they come over the wire. */
async function bytesOf(encoding: string): Promise<{ readonly encoding: string | undefined; readonly bytes: Buffer }> {
  const { port } = server.address() as AddressInfo;
  const signIn = await fetch(`http://127.0.0.1:${port}/api/v1/auth/sign-in`, {
    method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ email: app.org.emails.viewer, password: PASSWORD }),
  });
  const cookie = signIn.headers.getSetCookie().map((each) => each.split(';')[0]).join('; ');
  return new Promise((resolve, reject) => {
    request(`http://127.0.0.1:${port}${project.url}/design`, { headers: { cookie, 'accept-encoding': encoding } }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () => resolve({ encoding: answer.headers['content-encoding'], bytes: Buffer.concat(chunks) }));
    }).on('error', reject).end();
  });
}

describe('the whole design', () => {
  it('is the same at the second reading, and not sent to whom has it', async () => {
    const first = await design();
    const second = await design();
    expect(second.body).toEqual(first.body);
    expect(second.headers['etag']).toBe(first.headers['etag']);
    expect((await design({ 'If-None-Match': first.headers['etag'] })).status).toBe(304);
  });

  it('shows an edit that another instance of the server took', async () => {
    const before = await design();
    const elsewhere = await signedIn(await app.secondInstance(), app.org.emails.engineer);
    await elsewhere.patch(`${project.url}/points/${project.ids.pointA}`).set('If-Match', '"1"').send({ machine: 'Gallery conveyor 1' }).expect(200);
    const after = await design({ 'If-None-Match': before.headers['etag'] });
    expect(after.status).toBe(200);
    expect(after.body.points).toContainEqual(expect.objectContaining({ id: project.ids.pointA, machine: 'Gallery conveyor 1', version: 2 }));
  });

  it('shows a catalogue entry that was added', async () => {
    await (await app.as('engineer')).post('/api/v1/catalogue/greases').send({ id: '01900000-0000-7000-8000-000000000001', name: 'Grease', nlgi: '2', thickener: 'lithium', densityGPerCm3: 0.9 }).expect(201);
    expect((await design()).body.catalogue.greases).toHaveLength(1);
  });

  it('has the same bytes compressed and not', async () => {
    const [plain, small] = [await bytesOf('identity'), await bytesOf('gzip')];
    expect([plain.encoding, small.encoding]).toEqual([undefined, 'gzip']);
    expect(gunzipSync(small.bytes).equals(plain.bytes)).toBe(true);
  });

  it('is unknown to another organisation, also once it was read', async () => {
    await design();
    await (await app.asOther('viewer')).get(`${project.url}/design`).expect(404);
  });
});
