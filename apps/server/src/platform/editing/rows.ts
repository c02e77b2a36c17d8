import type { TObject } from 'typebox';
import { and, asc, eq, getTableColumns, gt, inArray, type SQL, sql } from 'drizzle-orm';
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core';
import { uuidArray } from '../database.ts';
import type { Collection, Row, Scope } from './collection.ts';

/** Rows a statement: more would make one parameter too large to be good. */
const BATCH = 5000;

/** The columns of a contract row, by field name. */
export function columnsOf(table: PgTable, schema: TObject): Record<string, PgColumn> {
  const columns = getTableColumns(table) as Record<string, PgColumn>;
  return Object.fromEntries(Object.keys(schema.properties).map((field) => {
    const column = columns[field];
    if (!column) throw new Error(`The table has no column for the field ${field}`);
    return [field, column];
  }));
}

/** Values that the database would fill in, so that the row is known before it is written. */
export function defaultsOf(table: PgTable, schema: TObject): Record<string, unknown> {
  return Object.fromEntries(Object.entries(columnsOf(table, schema)).map(([field, column]) => [field, column.default ?? null]));
}

/** A project's own row stands in its scope by its identifier, all others by their project. */
const inScope = ({ table }: Collection, { projectId }: Scope): SQL => {
  const columns = getTableColumns(table) as Record<string, PgColumn>;
  return eq(columns['projectId'] ?? table.id, projectId);
};

export async function findRow(scope: Scope, collection: Collection, id: string): Promise<Row | undefined> {
  const [row] = await scope.tx.select(columnsOf(collection.table, collection.resource.Row)).from(collection.table)
    .where(and(inScope(collection, scope), eq(collection.table.id, id)));
  return row as Row | undefined;
}

/** A page in the order of identifiers, which is that of creation. */
export async function findPage(scope: Scope, collection: Collection, after: string | undefined, limit: number): Promise<Row[]> {
  const { table, resource } = collection;
  const rows = await scope.tx.select(columnsOf(table, resource.Row)).from(table)
    .where(and(inScope(collection, scope), after === undefined ? undefined : gt(table.id, after)))
    .orderBy(asc(table.id)).limit(limit);
  return rows as Row[];
}

/** Locks rows in the order of their identifiers, so that two sets never wait for each other. */
export async function lockRows(scope: Scope, collection: Collection, ids: readonly string[]): Promise<Map<string, Row>> {
  const { table, resource } = collection;
  const found = new Map<string, Row>();
  for (const batch of batches(ids)) {
    const rows = await scope.tx.select(columnsOf(table, resource.Row)).from(table)
      .where(and(inScope(collection, scope), sql`${table.id} = any(${uuidArray(batch)})`)).orderBy(asc(table.id)).for('update');
    for (const row of rows as Row[]) found.set(row.id, row);
  }
  return found;
}

export async function insertRows(scope: Scope, { table, resource }: Collection, rows: readonly Row[]): Promise<void> {
  const fixed = { org_id: scope.orgId, project_id: scope.projectId };
  const inColumns = columnNamer(columnsOf(table, resource.Row));
  await insertRecords(scope, table, rows, (row) => Object.assign(inColumns(row), fixed));
}

/** Inserts a record for each of `all`; the keys of every record are the same column names of the table. */
export async function insertRecords<T>(
  { tx, written }: Pick<Scope, 'tx' | 'written'>, table: PgTable, all: readonly T[], recordOf: (each: T) => Readonly<Record<string, unknown>>,
): Promise<void> {
  if (all.length === 0) return;
  const names = sql.join(Object.keys(recordOf(all[0])).map((name) => sql.identifier(name)), sql`, `);
  // Records are made batch by batch: all of them at once would be the import's largest heap.
  for (const part of batches(all)) {
    const batch = part.map(recordOf);
    await tx.execute(sql`insert into ${table} (${names}) select ${names} from json_populate_recordset(null::${table}, ${JSON.stringify(batch)}::text::json)`);
    written?.(batch.length);
  }
}

/** Writes whole rows, version included. */
export async function updateRows(scope: Scope, collection: Collection, rows: readonly Row[]): Promise<void> {
  const { table, resource } = collection;
  const columns = columnsOf(table, resource.Row);
  const assignments = Object.entries(columns).filter(([field]) => field !== 'id')
    .map(([, column]) => sql`${sql.identifier(column.name)} = r.${sql.identifier(column.name)}`);
  const inColumns = columnNamer(columns);
  for (const part of batches(rows)) {
    const batch = part.map(inColumns);
    await scope.tx.execute(sql`
      update ${table} set ${sql.join(assignments, sql`, `)}
      from json_populate_recordset(null::${table}, ${JSON.stringify(batch)}::text::json) r
      where ${table.id} = r.id and ${inScope(collection, scope)}`);
    scope.written?.(batch.length);
  }
}

export async function deleteRows(scope: Scope, collection: Collection, ids: readonly string[]): Promise<void> {
  for (const batch of batches(ids)) {
    await scope.tx.delete(collection.table).where(and(inScope(collection, scope), sql`${collection.table.id} = any(${uuidArray(batch)})`));
  }
}

/** Turns a row's field names into column names; fields that it lacks are null. */
function columnNamer(columns: Record<string, PgColumn>): (row: Row) => Record<string, unknown> {
  const pairs = Object.entries(columns).map(([field, { name }]) => [field, name] as const);
  return (row) => {
    const record: Record<string, unknown> = {};
    for (const [field, name] of pairs) record[name] = row[field] ?? null;
    return record;
  };
}

function batches<T>(all: readonly T[]): T[][] {
  const parts: T[][] = [];
  for (let at = 0; at < all.length; at += BATCH) parts.push(all.slice(at, at + BATCH));
  return parts;
}

/** Identifiers of the rows whose column holds one of the values. */
export async function findIdsBy(scope: Scope, table: PgTable & { id: PgColumn }, column: PgColumn, values: readonly string[]): Promise<string[]> {
  if (values.length === 0) return [];
  const rows = await scope.tx.select({ id: table.id }).from(table).where(values.length === 1 ? eq(column, values[0]) : inArrayOf(column, values));
  return rows.map((row) => row.id as string);
}

const inArrayOf = (column: PgColumn, values: readonly string[]): SQL =>
  values.length < 1000 ? inArray(column, [...values]) : sql`${column} = any(${uuidArray(values)})`;
