import { projectResources } from '#contract';
import { v7 as newId } from 'uuid';
import type { TSchema } from 'typebox';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Agent, testApp, type TestApp } from '#support/test-app.ts';
import { buildProject, dispenserType, moduleType, type TestProject } from '#support/test-project.ts';
import { faultsOf } from '../../apps/server/src/platform/validated.ts';
import { routes } from '../../apps/server/src/routes.ts';

let app: TestApp;
let engineer: Agent;
let project: TestProject;

beforeAll(async () => {
  app = await testApp();
  engineer = await app.as('engineer');
  project = await buildProject(engineer);
});
afterAll(() => app.close());

interface OpenApi {
  readonly openapi: string;
  readonly paths: Record<string, Record<string, { operationId: string; responses: object; parameters: { in: string; name: string }[] }>>;
  readonly components: { schemas: object };
}

describe('the OpenAPI document', () => {
  it('describes every route, with unique names, its parameters and the problem answer', async () => {
    const document = (await app.stranger().get('/api/openapi.json').expect(200)).body as OpenApi;
    expect(document.openapi).toMatch(/^3\.1\./);
    const names = new Set<string>();
    for (const route of routes) {
      const path = `/api/v1${route.path.replace(/:(\w+)/g, '{$1}')}`;
      const operation = document.paths[path]?.[route.method];
      expect(operation, `${route.method} ${path}`).toBeDefined();
      names.add(operation?.operationId ?? '');
      expect(Object.keys(operation?.responses ?? {})).toEqual(expect.arrayContaining([...Object.keys(route.answers), 'default']));
      const inPath = operation?.parameters.filter((parameter) => parameter.in === 'path').map((parameter) => parameter.name);
      expect(inPath).toEqual([...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name));
    }
    expect(names.size).toBe(routes.length);
    expect(JSON.stringify(document).match(/"\$ref":"[^"]+"/g)?.every((ref) => ref === '"$ref":"#/components/schemas/Problem"')).toBe(true);
  });
});

describe('answers are as their schemas say', () => {
  const schemaOf = (path: string): TSchema => {
    const route = routes.find((one) => one.method === 'get' && one.path === path);
    return route?.answers[200] as TSchema;
  };
  const reads = routes.filter((route) => route.method === 'get' && route.answers[200] && !route.produces && !route.path.endsWith('/:id') && !route.path.includes('importId'));

  it.each(reads.map((route) => route.path))('GET %s', async (path) => {
    const query = path.endsWith('/changes') ? '?since=0' : '';
    const answer = await engineer.get(`/api/v1${path.replace(':projectId', project.id)}${query}`).expect(200);
    expect(faultsOf(schemaOf(path), answer.body)).toEqual([]);
  });

  it('holds every collection of the test project in its design, and every single row', async () => {
    const design = (await engineer.get(`${project.url}/design`).expect(200)).body;
    for (const [name, { path, Row }] of Object.entries(projectResources)) {
      expect(design[name].length, name).toBeGreaterThan(0);
      const answer = await engineer.get(`${project.url}/${path}/${design[name][0].id}`).expect(200);
      expect(faultsOf(Row, answer.body)).toEqual([]);
      expect(answer.body).toEqual(design[name][0]);
    }
    expect(Object.keys(design.catalogue).sort()).toEqual(['cableTypes', 'dispenserTypes', 'greases', 'moduleTypes', 'supplyTypes']);
  });
});

describe('the catalogue', () => {
  it('makes the next version of a name that exists, and leaves the old one as it was', async () => {
    const name = 'Dispenser, two versions';
    const first = (await engineer.post('/api/v1/catalogue/dispenser-types').send(dispenserType(newId(), name)).expect(201)).body;
    const second = (await engineer.post('/api/v1/catalogue/dispenser-types').send({ ...dispenserType(newId(), name), minV: 19 }).expect(201)).body;
    expect([first.typeVersion, second.typeVersion, first.minV, second.minV]).toEqual([1, 2, 18, 19]);
    const all = (await engineer.get('/api/v1/catalogue/dispenser-types').expect(200)).body as { id: string }[];
    expect(all.find((type) => type.id === first.id)).toEqual(first);
  });

  it('answers a repeated request with the same entry, and gives simultaneous ones different versions', async () => {
    const entry = moduleType(newId(), 'output', 'Module, repeated');
    const first = await engineer.post('/api/v1/catalogue/module-types').send(entry).expect(201);
    expect((await engineer.post('/api/v1/catalogue/module-types').send(entry).expect(201)).body).toEqual(first.body);
    const both = await Promise.all([1, 2].map(() => engineer.post('/api/v1/catalogue/module-types').send({ ...entry, id: newId() })));
    expect(both.map((answer) => answer.body.typeVersion as number).sort()).toEqual([2, 3]);
  });

  it('keeps one grease a name and says what is impossible', async () => {
    const grease = { name: 'Grease, lithium complex', nlgi: '2', thickener: 'Lithium complex', densityGPerCm3: 0.9 };
    await engineer.post('/api/v1/catalogue/greases').send({ id: newId(), ...grease }).expect(201);
    await engineer.post('/api/v1/catalogue/greases').send({ id: newId(), ...grease }).expect(409);
    const wrong = await engineer.post('/api/v1/catalogue/dispenser-types').send({ ...dispenserType(newId(), 'Odd'), peakA: 0.1 }).expect(422);
    expect(wrong.body.errors[0].message).toBe('The peak current cannot be below the run current.');
  });

  it('changes the ETag of designs that may use it', async () => {
    const before = (await engineer.get(`${project.url}/design`).expect(200)).headers['etag'];
    await engineer.post('/api/v1/catalogue/greases').send({ id: newId(), name: 'Grease, new', nlgi: '1', thickener: 'Calcium', densityGPerCm3: 0.92 }).expect(201);
    await engineer.get(`${project.url}/design`).set('If-None-Match', before).expect(200);
  });
});

describe('addresses', () => {
  it('that do not exist answer with a problem', async () => {
    expect((await engineer.get('/api/v1/nothing').expect(404)).body.type).toMatch(/not-found$/);
    await engineer.get('/api/v1/projects/not-a-uuid/design').expect(404);
    await engineer.get(`${project.url}/changes?since=-1`).expect(422);
    await engineer.post('/api/v1/projects').set('Content-Type', 'application/json').send('{').expect(400);
    expect((await app.stranger().get('/api/health').expect(200)).body).toEqual({ status: 'ready' });
  });
});
