import { type SQL, sql } from 'drizzle-orm';
import type { Static, TObject } from 'typebox';
import { type Context, withOrg } from '../platform/context.ts';
import type { Tx } from '../platform/database.ts';
import { brokenUnique } from '../platform/database-problems.ts';
import { jsonObject, jsonRows } from '../platform/editing/json-rows.ts';
import { columnsOf, insertRecords } from '../platform/editing/rows.ts';
import { Conflict } from '../platform/problems.ts';
import { type CatalogueKind, catalogueKinds } from './catalogue-tables.ts';

/** Only the organisation's entries are visible, so no further filter is needed. */
const everything = sql`true`;

/** The whole catalogue as a JSON expression, for queries that take it along. */
export const catalogueJson = (): SQL =>
  jsonObject(Object.fromEntries(catalogueKinds.map(({ name, table, Row }) => [name, jsonRows(table, Row, everything)])));

/** How many entries there are. Entries are added, never changed, so the number tells whether the catalogue is the same. */
export const catalogueSize = (): SQL<number> =>
  sql<number>`(${sql.join(catalogueKinds.map(({ table }) => sql`(select count(*) from ${table})`), sql` + `)})::int`;

/** @returns JSON text of the catalogue */
export const readCatalogue = (context: Context): Promise<string> =>
  withOrg(context, (tx) => jsonText(tx, catalogueJson()));

/** @returns JSON text of one kind's entries */
export const readKind = (context: Context, { table, Row }: CatalogueKind): Promise<string> =>
  withOrg(context, (tx) => jsonText(tx, jsonRows(table, Row, everything)));

/** Adds an entry; where the name exists it becomes that type's next version. The same request again gives the same entry. */
export async function addEntry(context: Context, kind: CatalogueKind, entry: Static<TObject>): Promise<unknown> {
  const attempt = () => withOrg(context, (tx) => insertEntry(tx, context.orgId, kind, entry as Readonly<Record<string, unknown>>));
  try {
    return await attempt();
  } catch (error) {
    // Two people added a version at the same time: the second one becomes the next.
    if (!brokenUnique(error)?.endsWith('_version_uq')) throw error;
    return attempt();
  }
}

async function insertEntry(tx: Tx, orgId: string, { table, Row }: CatalogueKind, entry: Readonly<Record<string, unknown>>): Promise<unknown> {
  const known = await findEntry(tx, table, Row, String(entry['id']));
  if (known) return known;
  const typeVersion = 'typeVersion' in table ? { type_version: await nextVersion(tx, table, String(entry['name'])) } : {};
  const columns = columnsOf(table, Row);
  const values = Object.fromEntries(Object.entries(entry).map(([field, value]) => [columns[field]?.name ?? field, value]));
  await insertRecords({ tx }, table, [{ ...values, org_id: orgId, ...typeVersion, created_at: new Date().toISOString() }], (record) => record);
  return findEntry(tx, table, Row, String(entry['id']));
}

async function findEntry(tx: Tx, table: CatalogueKind['table'], Row: TObject, id: string): Promise<unknown> {
  const [entry] = JSON.parse(await jsonText(tx, jsonRows(table, Row, sql`id = ${id}`))) as unknown[];
  return entry;
}

async function nextVersion(tx: Tx, table: CatalogueKind['table'], name: string): Promise<number> {
  const [row] = await tx.execute<{ next: number }>(sql`select coalesce(max(type_version), 0)::int + 1 as next from ${table} where name = ${name}`);
  if (!row) throw new Conflict('The next version could not be told');
  return row.next;
}

async function jsonText(tx: Tx, expression: SQL): Promise<string> {
  const [row] = await tx.execute<{ text: string }>(sql`select ${expression}::text as text`);
  return row?.text ?? 'null';
}
