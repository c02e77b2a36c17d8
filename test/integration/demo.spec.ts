import { rolesAllow } from '#contract/permissions';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import supertest from 'supertest';
import { type App, createApp } from '../../apps/server/src/app.ts';
import { createLog } from '../../apps/server/src/platform/log.ts';
import { demoAccounts, demoDesigns, seedDemo } from '../../db/seed/demo.ts';
import { JWT_SECRET } from '#support/test-app.ts';
import { type TestDatabase, testDatabase } from '#support/test-database.ts';

let database: TestDatabase;
let app: App;

beforeAll(async () => {
  database = await testDatabase();
  await seedDemo(database.owner);
  const { appUrl, authUrl } = database;
  app = await createApp({ port: 0, host: '127.0.0.1', databaseAppUrl: appUrl, databaseAuthUrl: authUrl, jwtSecret: JWT_SECRET, clientDir: null }, createLog('silent'));
});
afterAll(async () => {
  await app.close();
  await database.drop();
});

const signedIn = async (email: string, password: string) => {
  const agent = supertest.agent(app.express);
  await agent.post('/api/v1/auth/sign-in').send({ email, password }).expect(200);
  return agent;
};

describe('the demo', () => {
  it.each(demoAccounts.map((each) => [each.email, each] as const))('signs %s in, with its own projects only', async (email, { password, role, organisation }) => {
    const agent = await signedIn(email, password);
    const session = await agent.get('/api/v1/auth/session').expect(200);
    expect(session.body).toMatchObject({ organisation: { name: organisation }, roles: [role] });
    expect(rolesAllow([role], 'project:read')).toBe(true);
    const projects = await agent.get('/api/v1/projects').expect(200);
    const names = (projects.body as { name: string }[]).map(({ name }) => name).sort();
    expect(names).toEqual(demoDesigns(organisation).map(({ project }) => project.name).sort());
  });

  it('holds the very rows of the design', async () => {
    const [design] = demoDesigns('Brackwater Terminal');
    const agent = await signedIn('engineer@brackwater.example', 'grease-before-rust');
    const { body } = await agent.get(`/api/v1/projects/${design.project.id}/design`).expect(200);
    const sorted = (rows: readonly { readonly id: string }[]) => rows.map((row) => ({ ...row, version: undefined })).sort((a, b) => (a.id < b.id ? -1 : 1));
    for (const name of ['points', 'dispensers', 'cabinets', 'controllers', 'modules', 'moduleGroups', 'supplies', 'circuits', 'cableNodes', 'assignments'] as const) {
      expect(sorted(body[name])).toEqual(sorted(design[name]));
    }
    expect(sorted(body.catalogue.dispenserTypes)).toEqual(sorted(design.dispenserTypes));
  });
});
