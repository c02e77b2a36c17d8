import type { Express } from 'express';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { JWT_SECRET } from '#support/test-app.ts';
import { type TestDatabase, testDatabase } from '#support/test-database.ts';
import { type App, createApp } from '../../apps/server/src/app.ts';
import { createLog } from '../../apps/server/src/platform/log.ts';

let database: TestDatabase;
let app: App;
let server: Express;
const folder = mkdtempSync(join(tmpdir(), 'lanewright-client-'));

beforeAll(async () => {
  writeFileSync(join(folder, 'index.html'), '<!doctype html><lw-root ngCspNonce="BUILD_STYLE_NONCE"></lw-root><script src="main-ABCDEFGH.js" type="module"></script>');
  writeFileSync(join(folder, 'main-ABCDEFGH.js'), 'export {};');
  writeFileSync(join(folder, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  database = await testDatabase();
  const { appUrl, authUrl } = database;
  app = await createApp({ port: 0, host: '127.0.0.1', databaseAppUrl: appUrl, databaseAuthUrl: authUrl, jwtSecret: JWT_SECRET, clientDir: folder }, createLog('silent'));
  server = app.express;
});
afterAll(async () => {
  await app.close();
  await database.drop();
  rmSync(folder, { recursive: true });
});

describe('the client\'s files', () => {
  it('give the page for addresses of its own, with the style nonce of the policy and no other', async () => {
    const answer = await supertest(server).get('/projects/1/points').expect(200);
    const nonce = /ngCspNonce="([\w-]+)"/.exec(answer.text)?.[1];
    expect(answer.headers['content-security-policy']).toContain(`style-src 'self' 'nonce-${nonce}'`);
    expect(answer.headers['content-security-policy']).toContain("script-src 'self';");
    expect(answer.headers['content-security-policy']).not.toMatch(/unsafe|upgrade-insecure/);
    expect(answer.headers['cache-control']).toBe('no-cache');
    expect((await supertest(server).get('/')).text).toBe(answer.text);
  });

  it('are kept for ever where their name holds a hash, and asked for again where it does not', async () => {
    expect((await supertest(server).get('/main-ABCDEFGH.js').expect(200)).headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect((await supertest(server).get('/favicon.svg').expect(200)).headers['cache-control']).toBe('no-cache');
  });

  it('travel compressed where the browser takes that', async () => {
    const brotli = await supertest(server).get('/main-ABCDEFGH.js').set('Accept-Encoding', 'gzip, br').expect(200);
    expect(brotli.headers).toMatchObject({ 'content-encoding': 'br', vary: 'Accept-Encoding', 'content-type': 'text/javascript; charset=utf-8' });
    expect((await supertest(server).get('/main-ABCDEFGH.js').set('Accept-Encoding', 'gzip').expect(200)).text).toBe('export {};');
    expect((await supertest(server).get('/main-ABCDEFGH.js').set('Accept-Encoding', 'identity').expect(200)).headers['content-encoding']).toBeUndefined();
  });

  it('that are missing are missing, and so are addresses of the API', async () => {
    await supertest(server).get('/main-OLDHASH1.js').expect(404);
    expect((await supertest(server).get('/api/nothing').expect(404)).headers['content-type']).toMatch(/problem\+json/);
    await supertest(server).get('/..%2fpackage.json').expect(404);
    await supertest(server).get('/api/v1/projects/%zz').expect(400);
  });
});
