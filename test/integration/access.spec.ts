import { type Role, roles, rolesAllow } from '#contract';
import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Agent, testApp, type TestApp } from '#support/test-app.ts';
import { buildProject, type TestProject } from '#support/test-project.ts';
import type { Route } from '../../apps/server/src/platform/http/route.ts';
import { routes } from '../../apps/server/src/routes.ts';

let app: TestApp;
let project: TestProject;

beforeAll(async () => {
  app = await testApp();
  project = await buildProject(await app.as('engineer'));
});
afterAll(() => app.close());

const guarded = routes.filter((route) => route.permission !== 'public');
/** An event stream that is allowed has no end; its own test reads it. */
const ends = (route: Route) => route.produces !== 'text/event-stream';

function call(agent: Agent, route: Route) {
  const url = `/api/v1${route.path.replace(':projectId', project.id).replace(/:\w+/g, newId())}`;
  const request = agent[route.method](url);
  return route.body ? request.send({}) : request;
}

const held = (route: Route) => roles.filter((role) => route.permission !== 'public' && rolesAllow([role], route.permission));
const lacking = (route: Route) => roles.filter((role) => !held(route).includes(role));

describe.each(guarded.map((route) => ({ route, name: `${route.method.toUpperCase()} ${route.path}` })))('$name', ({ route }) => {
  it('answers a stranger 401', async () => {
    const answer = await call(app.stranger(), route);
    expect(answer.status).toBe(401);
    expect(answer.body.type).toMatch(/not-signed-in$/);
  });

  it('answers 403 to each role without the permission, before it looks at anything else', async () => {
    for (const role of lacking(route)) expect([role, (await call(await app.as(role), route)).status]).toEqual([role, 403]);
  });

  if (ends(route)) it('lets each role with the permission through', async () => {
    for (const role of held(route)) expect([401, 403, 500], role).not.toContain((await call(await app.as(role), route)).status);
  });

  if (route.path.includes(':projectId')) it('answers 404 to members of another organisation', async () => {
    for (const role of held(route)) expect([role, (await call(await app.asOther(role), route)).status]).toEqual([role, 404]);
  });
});

describe('what another organisation sees', () => {
  it.each<Role>(['engineer', 'viewer'])('is nothing of this one (%s)', async (role) => {
    const other = await app.asOther(role);
    expect((await other.get('/api/v1/projects').expect(200)).body).toEqual([]);
    expect((await other.get('/api/v1/catalogue').expect(200)).body.dispenserTypes).toEqual([]);
    expect((await other.get('/api/v1/auth/session').expect(200)).body.organisation.name).toBe('hillside');
  });

  it('does not include types or projects to refer to', async () => {
    const other = await app.asOther('engineer');
    const mine = await buildProject(other, 'Hillside');
    const { controller } = mine.ids;
    const module = { id: newId(), controllerId: controller, typeId: project.types.output, name: 'X', baseByte: 50, slot: 5 };
    await other.post(`${mine.url}/modules`).send(module).expect(422);
    await other.post(`${mine.url}/controllers`).send({ id: newId(), cabinetId: project.ids.cabinet, name: 'X' }).expect(422);
    await other.post('/api/v1/projects').send({ id: newId(), name: 'Copy', copyHardwareFrom: project.id }).expect(404);
    await other.patch(`${mine.url}/points/${project.ids.pointA}`).set('If-Match', '"1"').send({ tag: 'X' }).expect(404);
  });
});
