import type { Express } from 'express';
import jwt from 'jsonwebtoken';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD } from '#support/organisation.ts';
import { JWT_SECRET, signedIn, testApp, type TestApp } from '#support/test-app.ts';

let app: TestApp;
let server: Express;

beforeAll(async () => {
  app = await testApp();
  server = app.express;
});
afterAll(() => app.close());

interface Cookies {
  readonly lw_access?: string;
  readonly lw_refresh?: string;
}
const setCookies = (answer: supertest.Response): string[] => (answer.headers['set-cookie'] as unknown as string[] | undefined) ?? [];
const cookiesOf = (answer: supertest.Response): Cookies =>
  Object.fromEntries(setCookies(answer).map((cookie) => (cookie.split(';')[0] ?? '').split('=')) as [string, string][]);
const signIn = (email = app.org.emails.engineer, password = PASSWORD) => supertest(server).post('/api/v1/auth/sign-in').send({ email, password });
const refresh = (token = '') => supertest(server).post('/api/v1/auth/refresh').set('Cookie', `lw_refresh=${token}`).send({});
const session = (access = '', at = server) => supertest(at).get('/api/v1/auth/session').set('Cookie', `lw_access=${access}`);
/** As if the last refresh had been a while ago. */
const letTimePass = () => app.database.owner.begin(async (tx) => {
  await tx`select set_config('lanewright.org_id', ${app.org.id}, true)`;
  await tx`update sessions set rotated_at = rotated_at - interval '1 minute'`;
});

describe('signing in', () => {
  it('answers who is signed in, and keeps both tokens from scripts and other sites', async () => {
    const answer = await signIn().expect(200);
    expect(answer.body).toMatchObject({ person: { email: app.org.emails.engineer }, organisation: { name: 'brackwater' }, roles: ['engineer'] });
    const [access, renewal] = setCookies(answer);
    expect(access).toMatch(/^lw_access=.*; Path=\/;.*HttpOnly; SameSite=Strict$/);
    expect(renewal).toMatch(/^lw_refresh=.*; Path=\/api\/v1\/auth;.*HttpOnly; SameSite=Strict$/);
    expect(JSON.stringify(answer.body)).not.toMatch(/hash|token/i);
  });

  it('marks the cookies Secure when the request came by https', async () => {
    const answer = await signIn().set('X-Forwarded-Proto', 'https').expect(200);
    for (const cookie of setCookies(answer)) expect(cookie).toMatch(/; Secure/);
  });

  it('takes the address in any case', async () => {
    await signIn(app.org.emails.viewer.toUpperCase()).expect(200);
  });

  it('answers the same for a wrong password and an unknown address', async () => {
    const wrong = await signIn(app.org.emails.engineer, 'not it').expect(401);
    const unknown = await signIn('nobody@brackwater.example', 'not it').expect(401);
    expect(unknown.body).toEqual(wrong.body);
    expect(setCookies(wrong)).toEqual([]);
  });

  it('keeps tokens and passwords hashed', async () => {
    const { lw_refresh: token } = cookiesOf(await signIn());
    const kept = await app.database.owner.begin(async (tx) => {
      await tx`select set_config('lanewright.org_id', ${app.org.id}, true)`;
      return tx`select refresh_hash, password_hash from sessions join people on people.id = person_id`;
    });
    expect(kept.some((row) => token?.includes(row['refresh_hash'] as string))).toBe(false);
    expect(kept[0]?.['password_hash']).toMatch(/^\$argon2id\$v=19\$m=19456,p=1,t=2|^\$argon2id\$v=19\$m=19456,t=2,p=1/);
  });
});

describe('an access token', () => {
  it('is refused when forged, unsigned or expired', async () => {
    const claims = { org: app.org.id, sid: app.org.id, roles: ['administrator'] };
    const common = { issuer: 'lanewright', subject: app.org.id };
    const forged = jwt.sign(claims, 'another secret of thirty-two characters', { ...common, expiresIn: 600 });
    const unsigned = jwt.sign(claims, '', { ...common, algorithm: 'none', expiresIn: 600 });
    const expired = jwt.sign(claims, JWT_SECRET, { ...common, expiresIn: -1 });
    for (const token of [forged, unsigned, expired, 'nonsense']) await session(token).expect(401);
  });
});

describe('a refresh', () => {
  it('rotates the token', async () => {
    const first = cookiesOf(await signIn());
    const second = cookiesOf(await refresh(first.lw_refresh).expect(200));
    expect(second.lw_refresh).not.toBe(first.lw_refresh);
    await session(second.lw_access).expect(200);
    await refresh(second.lw_refresh).expect(200);
  });

  it('takes the token before for a few seconds, for a second tab, without another rotation', async () => {
    const first = cookiesOf(await signIn());
    const answers = await Promise.all([refresh(first.lw_refresh), refresh(first.lw_refresh)]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
    const renewed = answers.map(cookiesOf).filter((cookies) => cookies.lw_refresh);
    expect(renewed).toHaveLength(1);
    await refresh(renewed[0]?.lw_refresh).expect(200);
  });

  it('ends the session for everybody when an old token comes back', async () => {
    const first = cookiesOf(await signIn());
    const second = cookiesOf(await refresh(first.lw_refresh).expect(200));
    await letTimePass();
    await refresh(first.lw_refresh).expect(401);
    await refresh(second.lw_refresh).expect(401);
    await expect.poll(async () => (await session(second.lw_access)).status).toBe(401);
  });

  it('is refused without a token or with one that never was', async () => {
    await refresh('').expect(401);
    await refresh(`${app.org.id}.${'A'.repeat(43)}`).expect(401);
  });
});

describe('signing out', () => {
  it('ends the session at once, on every instance', async () => {
    const second = await app.secondInstance();
    const cookies = cookiesOf(await signIn());
    await session(cookies.lw_access, second).expect(200);
    const answer = await supertest(server).post('/api/v1/auth/sign-out')
      .set('Cookie', `lw_access=${cookies.lw_access}; lw_refresh=${cookies.lw_refresh}`).send({}).expect(204);
    expect(setCookies(answer).every((cookie) => /=;/.test(cookie))).toBe(true);
    await refresh(cookies.lw_refresh).expect(401);
    await expect.poll(async () => (await session(cookies.lw_access)).status).toBe(401);
    await expect.poll(async () => (await session(cookies.lw_access, second)).status).toBe(401);
  });
});

describe('writes from other sites', () => {
  it('are refused by what the browser says of them', async () => {
    const agent = await signedIn(server, app.org.emails.engineer);
    const write = () => agent.post('/api/v1/projects').send({});
    await write().set('Sec-Fetch-Site', 'cross-site').expect(403);
    await write().set('Sec-Fetch-Site', 'same-site').expect(403);
    await write().set('Origin', 'https://elsewhere.example').expect(403);
    await write().set('Sec-Fetch-Site', 'same-origin').expect(422);
  });

  it('are refused as forms', async () => {
    const agent = await signedIn(server, app.org.emails.engineer);
    await agent.post('/api/v1/projects').type('form').send('name=X').expect(400);
  });
});
