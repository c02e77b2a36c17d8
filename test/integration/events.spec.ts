import type { Express } from 'express';
import { createServer, get, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import supertest from 'supertest';
import { v7 as newId } from 'uuid';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD } from '#support/organisation.ts';
import { signedIn, testApp, type TestApp } from '#support/test-app.ts';
import { buildProject, type TestProject } from '#support/test-project.ts';

let app: TestApp;
let project: TestProject;
let second: Express;
let server: Server;
const open: IncomingMessage[] = [];

beforeAll(async () => {
  app = await testApp();
  project = await buildProject(await app.as('engineer'));
  second = await app.secondInstance();
  server = createServer(app.express).listen(0, '127.0.0.1');
});
afterEach(() => open.splice(0).forEach((answer) => answer.destroy()));
afterAll(async () => {
  server.closeAllConnections();
  server.close();
  await app.close();
});

interface Listener {
  readonly sequences: number[];
  readonly ended: Promise<void>;
}

async function cookieHeader(email: string): Promise<string> {
  const answer = await supertest(app.express).post('/api/v1/auth/sign-in').send({ email, password: PASSWORD }).expect(200);
  return (answer.headers['set-cookie'] as unknown as string[]).map((cookie) => cookie.split(';')[0]).join('; ');
}

/** Listens at the first instance. */
async function listen(cookie: string): Promise<Listener> {
  const { port } = server.address() as AddressInfo;
  const answer = await new Promise<IncomingMessage>((resolve) => {
    get({ port, host: '127.0.0.1', path: `${project.url}/events`, headers: { cookie } }, resolve);
  });
  expect(answer.headers['content-type']).toMatch(/^text\/event-stream/);
  open.push(answer);
  const sequences: number[] = [];
  let text = '';
  answer.setEncoding('utf8').on('data', (part: string) => {
    text += part;
    for (let end = text.indexOf('\n\n'); end >= 0; end = text.indexOf('\n\n')) {
      const data = /^event: change\ndata: (.*)$/m.exec(text.slice(0, end));
      if (data) sequences.push((JSON.parse(data[1] ?? '') as { sequence: number }).sequence);
      text = text.slice(end + 2);
    }
  });
  const ended = new Promise<void>((resolve) => {
    answer.once('close', () => resolve());
  });
  await expect.poll(() => sequences.length).toBeGreaterThan(0);
  return { sequences, ended };
}

describe('events', () => {
  it('begin with the number as it is and tell of writes made at another instance', async () => {
    const listener = await listen(await cookieHeader(app.org.emails.viewer));
    const [now = 0] = listener.sequences;
    const engineer = await signedIn(second, app.org.emails.engineer);
    await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'EV-1' }).expect(201);
    await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'EV-2' }).expect(201);
    await expect.poll(() => listener.sequences).toEqual([now, now + 1, now + 2]);
  });

  it('do not tell of what was refused', async () => {
    const listener = await listen(await cookieHeader(app.org.emails.viewer));
    const engineer = await app.as('engineer');
    await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'EV-1' }).expect(409);
    await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'EV-3' }).expect(201);
    await expect.poll(() => listener.sequences.length).toBe(2);
  });

  it('end when the session is signed out', async () => {
    const cookie = await cookieHeader(app.org.emails.viewer);
    const listener = await listen(cookie);
    await supertest(second).post('/api/v1/auth/sign-out').set('Cookie', cookie).send({}).expect(204);
    await listener.ended;
  });
});
