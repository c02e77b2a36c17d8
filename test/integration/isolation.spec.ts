import postgres from 'postgres';
import { v7 as newId } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { testApp, type TestApp } from '#support/test-app.ts';
import { asOrganisation } from '#support/test-database.ts';
import { buildProject, type TestProject } from '#support/test-project.ts';

/** Raw SQL as the role that serves requests: what holds even where a query forgets its filter. */
let app: TestApp;
let project: TestProject;
let sql: postgres.Sql;

beforeAll(async () => {
  app = await testApp();
  project = await buildProject(await app.as('engineer'));
  sql = postgres(app.database.appUrl, { max: 1, onnotice: () => undefined });
});
afterAll(async () => {
  await sql.end();
  await app.close();
});

const tablesOf = async (): Promise<string[]> =>
  (await app.database.owner`select table_name from information_schema.columns where table_schema = 'public' and column_name = 'org_id'`).map((row) => row['table_name'] as string);
const count = async (tx: postgres.ISql, table: string): Promise<number> => Number((await tx`select count(*) as n from ${tx(table)}`)[0]?.['n']);
const readable = async (): Promise<string[]> => (await tablesOf()).filter((table) => table !== 'sessions');

describe('row-level security', () => {
  it('is forced on every table of an organisation', async () => {
    const forced = await app.database.owner`select relname from pg_class where relrowsecurity and relforcerowsecurity and relkind = 'r'`;
    const names = forced.map((row) => row['relname'] as string);
    expect(names).toEqual(expect.arrayContaining([...(await tablesOf()), 'organisations']));
  });

  it('shows nothing before an organisation is named', async () => {
    for (const table of [...(await readable()), 'organisations']) expect([table, await count(sql, table)]).toEqual([table, 0]);
    expect((await sql`select id, name, email from people`)).toHaveLength(0);
  });

  it('shows an organisation its own rows, and another one none of them', async () => {
    const own = await asOrganisation(sql, app.org.id, (tx) => count(tx, 'points'));
    expect(own).toBe(2);
    for (const table of (await readable()).filter((name) => name !== 'memberships')) {
      expect([table, await asOrganisation(sql, app.otherOrg.id, (tx) => count(tx, table))]).toEqual([table, 0]);
    }
    const names = await asOrganisation(sql, app.otherOrg.id, (tx) => tx`select email from people`);
    expect(names.every((row) => (row['email'] as string).endsWith('@hillside.example'))).toBe(true);
  });

  it('lets nobody write into another organisation', async () => {
    const insert = (tx: postgres.ISql) => tx`insert into projects (id, org_id, name) values (${newId()}, ${app.org.id}, 'Smuggled')`;
    await expect(asOrganisation(sql, app.otherOrg.id, insert)).rejects.toThrow(/row-level security/);
    const change = await asOrganisation(sql, app.otherOrg.id, (tx) => tx`update points set tag = 'X' where id = ${project.ids.pointA}`);
    expect(change.count).toBe(0);
  });

  it('ends with the transaction that named the organisation', async () => {
    await asOrganisation(sql, app.org.id, (tx) => count(tx, 'points'));
    expect(await count(sql, 'points')).toBe(0);
  });
});

describe('the role that serves requests', () => {
  it('is neither owner nor exempt', async () => {
    const [role] = await sql`select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb from pg_roles where rolname = current_user`;
    expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false });
    expect(await app.database.owner`select 1 from pg_tables where schemaname = 'public' and tableowner <> 'lanewright_owner'`).toHaveLength(0);
  });

  it.each([
    'update change_sets set summary = null', 'delete from change_sets', 'update change_items set after = null', 'delete from change_items',
    'update dispenser_types set name = name', 'delete from module_types', 'select password_hash from people', 'select * from sessions',
    'update memberships set roles = roles', 'insert into organisations (id, name) values (gen_random_uuid(), \'X\')', 'create table x (y int)',
  ])('may not: %s', async (statement) => {
    await expect(asOrganisation(sql, app.org.id, (tx) => tx.unsafe(statement))).rejects.toThrow(/permission denied/);
  });

  it('cannot point a row at another organisation\'s', async () => {
    const other = await buildProject(await app.asOther('engineer'), 'Hillside');
    const insert = (tx: postgres.ISql) => tx`insert into controllers (id, org_id, project_id, cabinet_id, name)
      values (${newId()}, ${app.otherOrg.id}, ${other.id}, ${project.ids.cabinet}, 'X')`;
    await expect(asOrganisation(sql, app.otherOrg.id, insert)).rejects.toThrow(/controllers_cabinet_fk/);
  });
});

describe('the role for sign-in', () => {
  it('sees no project', async () => {
    const auth = postgres(app.database.authUrl, { max: 1, onnotice: () => undefined });
    await expect(auth`select * from projects`).rejects.toThrow(/permission denied/);
    await auth.end();
  });
});
