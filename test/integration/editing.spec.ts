import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Agent, testApp, type TestApp } from '#support/test-app.ts';
import { buildProject, type TestProject } from '#support/test-project.ts';

let app: TestApp;
let engineer: Agent;
let project: TestProject;

beforeAll(async () => {
  app = await testApp();
  engineer = await app.as('engineer');
  project = await buildProject(engineer);
});
afterAll(() => app.close());

type AnyRow = Readonly<Record<string, unknown>> & { readonly id: string };
/** The rows of a list, or of a collection in a design. */
const rowsOf = (value: unknown) => value as AnyRow[];
const sorted = (values: readonly unknown[]) => [...values].sort();

const rowUrl = (path: string, id: string) => `${project.url}/${path}/${id}`;
const patch = (path: string, id: string, version: number, values: object) =>
  engineer.patch(rowUrl(path, id)).set('If-Match', `"${version}"`).send(values);
const versionOf = async (path: string, id: string): Promise<number> => (await engineer.get(rowUrl(path, id)).expect(200)).body.version;
const applySet = (changes: object[], id = newId()) => engineer.post(`${project.url}/change-sets`).send({ id, summary: 'Test', changes });

describe('one row', () => {
  it('is made, read, changed and deleted, each with its version as ETag', async () => {
    const id = newId();
    const made = await engineer.post(`${project.url}/points`).send({ id, tag: 'BE1-L01' }).expect(201);
    expect(made.body).toMatchObject({ id, version: 1, tag: 'BE1-L01', daysPerWeek: 7, factors: { temperature: 1 } });
    expect(made.headers['etag']).toBe('"1"');
    expect((await engineer.get(rowUrl('points', id)).expect(200)).body).toEqual(made.body);
    const changed = await patch('points', id, 1, { boreMm: 60, hoursPerDay: 16.5 }).expect(200);
    expect(changed.body).toMatchObject({ version: 2, boreMm: 60, hoursPerDay: 16.5, tag: 'BE1-L01' });
    await engineer.delete(rowUrl('points', id)).set('If-Match', '"2"').expect(204);
    await engineer.get(rowUrl('points', id)).expect(404);
  });

  it('answers a repeated creation with the row that is there', async () => {
    const body = { id: newId(), tag: 'BE1-L02' };
    const first = await engineer.post(`${project.url}/points`).send(body).expect(201);
    const second = await engineer.post(`${project.url}/points`).send(body).expect(201);
    expect(second.body).toEqual(first.body);
  });

  it('answers two simultaneous creations of one row with that row', async () => {
    const body = { id: newId(), tag: 'BE1-L03' };
    const answers = await Promise.all([1, 2, 3].map(() => engineer.post(`${project.url}/points`).send(body)));
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201]);
  });

  it('demands the version that was read (428) and refuses an old one with the row as it is (412)', async () => {
    const { pointA } = project.ids;
    const missing = await engineer.patch(rowUrl('points', pointA)).send({ zone: '22' }).expect(428);
    expect(missing.body.type).toMatch(/version-missing$/);
    const version = await versionOf('points', pointA);
    await patch('points', pointA, version, { zone: '22' }).expect(200);
    const stale = await patch('points', pointA, version, { zone: '21' }).expect(412);
    expect(stale.headers['content-type']).toMatch(/application\/problem\+json/);
    expect(stale.body.current).toMatchObject({ id: pointA, zone: '22', version: version + 1 });
  });

  it('leaves version and history alone where nothing changes', async () => {
    const version = await versionOf('points', project.ids.pointA);
    const row = await engineer.get(rowUrl('points', project.ids.pointA)).expect(200);
    const before = (await engineer.get(`${project.url}/design`)).body.sequence;
    const answer = await patch('points', project.ids.pointA, version, { tag: row.body.tag }).expect(200);
    expect(answer.body.version).toBe(version);
    expect((await engineer.get(`${project.url}/design`)).body.sequence).toBe(before);
  });

  it('names the fields at fault', async () => {
    const answer = await engineer.post(`${project.url}/points`).send({ id: newId(), tag: ' x', hoursPerDay: 30, colour: 'red' }).expect(422);
    expect(sorted(rowsOf(answer.body.errors).map((e) => e['field']))).toEqual(['colour', 'hoursPerDay', 'tag']);
  });

  it('refuses a bore wider than the outside diameter in words', async () => {
    const answer = await patch('points', project.ids.pointB, await versionOf('points', project.ids.pointB), { boreMm: 90, outsideMm: 80 }).expect(422);
    expect(answer.body.errors[0].message).toBe('The outside diameter must be larger than the bore.');
  });

  it('refuses a second point with the same tag', async () => {
    const answer = await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'GC1-L01' }).expect(409);
    expect(answer.body.title).toBe('The tag GC1-L01 is taken by another point');
  });

  it('refuses to delete a cabinet that still holds something', async () => {
    const { cabinet } = project.ids;
    const answer = await engineer.delete(rowUrl('cabinets', cabinet)).set('If-Match', `"${await versionOf('cabinets', cabinet)}"`).expect(409);
    expect(answer.body.type).toMatch(/still-used$/);
  });

  it('refuses a reference to what is not in the project', async () => {
    const answer = await engineer.post(`${project.url}/controllers`).send({ id: newId(), cabinetId: newId(), name: 'PLC9' }).expect(422);
    expect(answer.body.errors).toEqual([{ field: 'cabinetId', message: 'There is no such cabinet here.' }]);
  });
});

describe('a list', () => {
  it('comes in pages', async () => {
    const first = await engineer.get(`${project.url}/points?limit=2`).expect(200);
    expect(first.body.rows).toHaveLength(2);
    const second = await engineer.get(`${project.url}/points?limit=2&after=${first.body.next}`).expect(200);
    expect(second.body.rows[0].id > first.body.rows[1].id).toBe(true);
    await engineer.get(`${project.url}/points?limit=0`).expect(422);
  });
});

describe('a module', () => {
  it('gets its groups and loses them with its deletion', async () => {
    const id = newId();
    const { controller } = project.ids;
    await engineer.post(`${project.url}/modules`).send({ id, controllerId: controller, typeId: project.types.output, name: 'DO9', baseByte: 90, slot: 9 }).expect(201);
    const groups = async () => rowsOf((await engineer.get(`${project.url}/module-groups?limit=1000`)).body.rows).filter((g) => g['moduleId'] === id);
    expect((await groups()).map((g) => g['groupIndex'])).toEqual([0, 1]);
    await engineer.delete(rowUrl('modules', id)).set('If-Match', '"1"').expect(204);
    expect(await groups()).toEqual([]);
  });

  it('stays while a channel is in use', async () => {
    await engineer.delete(rowUrl('modules', project.ids.outputs)).set('If-Match', '"1"').expect(409);
  });

  it('cannot become a type that lacks the channels in use', async () => {
    const answer = await patch('modules', project.ids.outputs, 1, { typeId: project.types.input }).expect(409);
    expect(answer.body.title).toBe('Channel 0 of DO1 is used by GC1-L01');
  });
});

describe('channels', () => {
  const assign = (dispenserId: string, moduleId: string, channel: number, purpose: string) =>
    engineer.post(`${project.url}/assignments`).send({ id: newId(), dispenserId, moduleId, channel, purpose });

  it('hold one dispenser each, and the refusal says which', async () => {
    const answer = await assign(project.ids.dispenserB, project.ids.outputs, 0, 'control').expect(409);
    expect(answer.body.title).toBe('Channel 0 of DO1 is taken by GC1-L01');
  });

  it('are one for a dispenser and purpose', async () => {
    const answer = await assign(project.ids.dispenserA, project.ids.outputs, 5, 'control').expect(409);
    expect(answer.body.title).toBe('GC1-L01 has its control signal on channel 0 of DO1 already');
  });

  it('must exist and fit the signal', async () => {
    const beyond = await assign(project.ids.dispenserB, project.ids.outputs, 16, 'control').expect(422);
    expect(beyond.body.errors[0].message).toBe('DO1 has channels 0 to 15, not 16.');
    const wrong = await assign(project.ids.dispenserB, project.ids.inputs, 0, 'control').expect(422);
    expect(wrong.body.errors[0].message).toBe('DI1 is an input module; a control signal needs an output.');
  });

  it('are swapped in one set', async () => {
    const { assignment, dispenserA, dispenserB, outputs } = project.ids;
    const other = (await assign(dispenserB, outputs, 1, 'control').expect(201)).body;
    const create = (dispenserId: string, channel: number) => ({ collection: 'assignments', op: 'create', id: newId(), values: { dispenserId, moduleId: outputs, channel, purpose: 'control' } });
    const remove = (id: string) => ({ collection: 'assignments', op: 'delete', id, version: 1 });
    await applySet([create(dispenserA, 1), create(dispenserB, 0), remove(assignment), remove(other.id)]).expect(200);
    const rows: { dispenserId: string; channel: number }[] = (await engineer.get(`${project.url}/assignments`)).body.rows;
    expect(rows.find((r) => r.dispenserId === dispenserA)?.channel).toBe(1);
    expect(rows.find((r) => r.dispenserId === dispenserB)?.channel).toBe(0);
    const change = (id: string, channel: number) => ({ collection: 'assignments', op: 'update', id, version: 1, values: { channel } });
    const [a, b] = (await engineer.get(`${project.url}/assignments`)).body.rows;
    await applySet([change(a.id, b.channel), change(b.id, a.channel)]).expect(200);
  });
});

describe('wiring', () => {
  it('lets no box hang on itself through others', async () => {
    const answer = await patch('cable-nodes', project.ids.box, 1, { parentId: project.ids.farBox }).expect(422);
    expect(answer.body.errors[0].message).toMatch(/would hang on itself/);
  });

  it('keeps boxes and dispensers in one circuit', async () => {
    const circuit = newId();
    await engineer.post(`${project.url}/circuits`).send({ id: circuit, supplyId: project.ids.supply, name: '-F2', protection: 'fuse', protectionA: 4 }).expect(201);
    await patch('cable-nodes', project.ids.farBox, 1, { circuitId: circuit }).expect(422);
    const answer = await patch('dispensers', project.ids.dispenserA, 1, { circuitId: circuit }).expect(422);
    expect(answer.body.errors[0].message).toMatch(/GC1-L01: box \+JB1 is in another circuit/);
    await patch('dispensers', project.ids.dispenserA, 1, { circuitId: circuit, nodeId: null }).expect(200);
  });

  it('stays whole when two people change it at the same time', async () => {
    const box = { circuitId: project.ids.circuit, lengthM: 5, powerMm2: 2.5, signalMm2: 1, cableTag: 'W9' };
    const [a, b] = [newId(), newId()];
    const create = (id: string, location: string) => ({ collection: 'cableNodes', op: 'create', id, values: { ...box, location } });
    await applySet([create(a, '+JB8'), create(b, '+JB9')]).expect(200);
    const answers = await Promise.all([patch('cable-nodes', a, 1, { parentId: b }), patch('cable-nodes', b, 1, { parentId: a })]);
    expect(sorted(answers.map((answer) => answer.status))).toEqual([200, 422]);
  });

  it('is that of the type', async () => {
    const answer = await patch('dispensers', project.ids.dispenserB, 1, { wiring: 'two-core' }).expect(422);
    expect(answer.body.errors[0].message).toMatch(/is four-core/);
  });
});

describe('a change set', () => {
  it('is applied once, and a repetition gets the same answer', async () => {
    const id = newId();
    const changes = [{ collection: 'points', op: 'create', id: newId(), values: { tag: 'SL1-L01' } }];
    const first = await applySet(changes, id).expect(200);
    const second = await applySet(changes, id).expect(200);
    expect(second.body).toEqual(first.body);
  });

  it('is all or nothing', async () => {
    const id = newId();
    const before = (await engineer.get(`${project.url}/design`)).body.sequence;
    await applySet([
      { collection: 'points', op: 'create', id, values: { tag: 'SL1-L02' } },
      { collection: 'points', op: 'create', id: newId(), values: { tag: 'SL1-L01' } },
    ]).expect(409);
    await engineer.get(rowUrl('points', id)).expect(404);
    expect((await engineer.get(`${project.url}/design`)).body.sequence).toBe(before);
  });

  it('swaps two tags', async () => {
    const [a, b] = [newId(), newId()];
    const create = (id: string, tag: string) => ({ collection: 'points', op: 'create', id, values: { tag } });
    const rename = (id: string, tag: string) => ({ collection: 'points', op: 'update', id, version: 1, values: { tag } });
    await applySet([create(a, 'SW-1'), create(b, 'SW-2')]).expect(200);
    await applySet([rename(a, 'SW-2'), rename(b, 'SW-1')]).expect(200);
    expect((await engineer.get(rowUrl('points', a))).body.tag).toBe('SW-2');
  });

  it('deletes a point with its dispenser and channels, and history keeps all three', async () => {
    const { pointB, dispenserB } = project.ids;
    const answer = await applySet([{ collection: 'points', op: 'delete', id: pointB, version: await versionOf('points', pointB) }]).expect(200);
    expect(sorted(rowsOf(answer.body.items).map((i) => i['collection']))).toEqual(['assignments', 'dispensers', 'points']);
    await engineer.get(rowUrl('dispensers', dispenserB)).expect(404);
    const [latest] = (await engineer.get(`${project.url}/history?limit=1`).expect(200)).body;
    expect(latest).toMatchObject({ rows: 3, by: 'The engineer', summary: 'Test', sequence: answer.body.sequence });
  });

  it('tells what changed since a number, each row as it is now', async () => {
    const since = (await engineer.get(`${project.url}/design`)).body.sequence;
    const id = newId();
    await engineer.post(`${project.url}/points`).send({ id, tag: 'SINCE-1' }).expect(201);
    await patch('points', id, 1, { tag: 'SINCE-2' }).expect(200);
    const { body } = await engineer.get(`${project.url}/changes?since=${since}`).expect(200);
    expect(body.sequence).toBe(since + 2);
    expect(body.items).toEqual([{ collection: 'points', id, row: expect.objectContaining({ tag: 'SINCE-2', version: 2 }) }]);
  });

  it('takes numbers without gap or doubling under simultaneous writes', async () => {
    const before = (await engineer.get(`${project.url}/design`)).body.sequence;
    const writes = Array.from({ length: 20 }, (_, i) => applySet([{ collection: 'points', op: 'create', id: newId(), values: { tag: `PAR-${i}` } }]));
    const numbers = (await Promise.all(writes)).map((answer) => answer.body.sequence as number).sort((a, b) => a - b);
    expect(numbers).toEqual(Array.from({ length: 20 }, (_, i) => before + 1 + i));
  });

  it('carries 20,000 rows', async () => {
    const changes = Array.from({ length: 20_000 }, (_, i) => ({ collection: 'points', op: 'create', id: newId(), values: { tag: `BULK-${i}`, boreMm: 60 } }));
    const answer = await applySet(changes).expect(200);
    expect(answer.body.items).toHaveLength(20_000);
  });
});

describe('a project', () => {
  it('starts with the hardware and the policies of another', async () => {
    const id = newId();
    const before = (await engineer.get(project.url).expect(200)).body as { version: number };
    await engineer.patch(project.url).set('If-Match', `"${before.version}"`).send({ relayLifeYears: 7 }).expect(200);
    await engineer.post('/api/v1/projects').send({ id, name: 'Second line', copyHardwareFrom: project.id }).expect(201);
    const design = (await engineer.get(`/api/v1/projects/${id}/design`).expect(200)).body;
    expect(sorted(rowsOf(design.modules).map((m) => m['name']))).toEqual(['DI1', 'DO1']);
    expect(design.moduleGroups).toHaveLength(4);
    expect(sorted(rowsOf(design.cableNodes).map((n) => n['location']))).toEqual(['+JB1', '+JB2', '+JB8', '+JB9']);
    expect(design.points).toEqual([]);
    expect(design.project).toMatchObject({ name: 'Second line', relayLifeYears: 7 });
    expect(design.sequence).toBe(1);
    const boxes = rowsOf(design.cableNodes);
    const far = boxes.find((n) => n['location'] === '+JB2');
    expect(boxes.find((n) => n.id === far?.['parentId'])?.['location']).toBe('+JB1');
  });

  it('changes its policies with a version', async () => {
    const { version } = (await engineer.get(project.url).expect(200)).body as { version: number };
    const named = (n: number) => engineer.patch(project.url).set('If-Match', `"${n}"`);
    const answer = await named(version).send({ sparePercent: 10 }).expect(200);
    expect(answer.body).toMatchObject({ sparePercent: 10, version: version + 1 });
    await named(version).send({ sparePercent: 15 }).expect(412);
    await named(version + 1).send({ timeZone: 'Nowhere' }).expect(422);
    await engineer.post('/api/v1/projects').send({ id: newId(), name: 'Gallery conveyors' }).expect(409);
  });

  it('is read whole with an ETag, and not again while nothing changes', async () => {
    const first = await engineer.get(`${project.url}/design`).expect(200);
    await engineer.get(`${project.url}/design`).set('If-None-Match', first.headers['etag']).expect(304);
    await engineer.post(`${project.url}/points`).send({ id: newId(), tag: 'ETAG-1' }).expect(201);
    await engineer.get(`${project.url}/design`).set('If-None-Match', first.headers['etag']).expect(200);
  });
});
