import type { DesignDocument } from '#contract';
import { designOf } from '#contract/design-of';
import { type TestApp, testApp } from '#support/test-app.ts';
import postgres from 'postgres';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findOrganisation } from '../../db/seed/generate/find-organisation.ts';
import { generateDesign } from '../../db/seed/generate/generate-design.ts';
import { seedGeneratedProject, type SeededProject } from '../../db/seed/generate/seed-project.ts';

let app: TestApp;
let auth: postgres.Sql;
let made: SeededProject;
beforeAll(async () => {
  app = await testApp();
  auth = postgres(app.database.authUrl, { max: 1 });
  made = await seedGeneratedProject(app.database.owner, app.org.id, { lanes: 300, seed: 5 });
});
afterAll(async () => {
  await auth.end();
  await app.close();
});

const readDesign = async (id: string) => designOf((await (await app.as('viewer')).get(`/api/v1/projects/${id}/design`).expect(200)).body as DesignDocument);
const withoutVersion = (rows: readonly object[]) => rows.map((row) => Object.fromEntries(Object.entries(row).filter(([key]) => key !== 'version')));

describe('a generated project in the database', () => {
  it('is read back as it was generated', async () => {
    const read = await readDesign(made.id);
    const ids = new Map([...read.dispenserTypes, ...read.moduleTypes, ...read.cableTypes, ...read.supplyTypes, ...read.greases].map(({ name, id }) => [name, id]));
    const generated = generateDesign({ lanes: 300, seed: 5, owner: app.org.id, catalogueId: (name) => ids.get(name) ?? name });
    expect(read.project).toMatchObject(generated.project);
    for (const name of ['points', 'dispensers', 'cabinets', 'controllers', 'modules', 'moduleGroups', 'supplies', 'circuits', 'cableNodes', 'assignments'] as const) {
      expect(withoutVersion(read[name])).toEqual([...generated[name]].sort((a, b) => (a.id < b.id ? -1 : 1)));
    }
  });

  it('has one entry in its history', async () => {
    const { body } = await (await app.as('viewer')).get(`/api/v1/projects/${made.id}/history`).expect(200);
    expect(body).toHaveLength(1);
    expect(body[0]).toMatchObject({ sequence: 1, summary: 'Generated project of 300 lanes' });
  });

  it('can stand beside another of the same plant, on the same catalogue', async () => {
    const other = await seedGeneratedProject(app.database.owner, app.org.id, { lanes: 300, seed: 5, name: 'Once more' });
    expect((await readDesign(other.id)).moduleTypes).toEqual((await readDesign(made.id)).moduleTypes);
  });

  it('is refused where the name is taken, and nothing is left of it', async () => {
    await expect(seedGeneratedProject(app.database.owner, app.org.id, { lanes: 100, seed: 9, name: made.name })).rejects.toThrow('Give this one another name');
    expect((await readDesign(made.id)).points).toHaveLength(300);
  });

  it('is unknown to another organisation', async () => {
    await (await app.asOther('administrator')).get(`/api/v1/projects/${made.id}/design`).expect(404);
  });
});

describe('findOrganisation', () => {
  it('takes a name or its beginning, whatever the capitals', async () => {
    expect(await findOrganisation(auth, 'BRACK')).toEqual({ id: app.org.id, name: 'brackwater' });
  });

  it('names the ones there are where none fits', async () => {
    await expect(findOrganisation(auth, 'acme')).rejects.toThrow('No organisation is named “acme”. Name one with --org: “brackwater”, “hillside”.');
  });
});
