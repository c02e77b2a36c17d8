import * as schema from '#schema';
import type { Design } from '#calc';
import { getTableColumns, sql } from 'drizzle-orm';
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core';
import type { Tx } from './transaction.ts';

/** Rows of one statement: a few megabytes of JSON. */
const ROWS_A_STATEMENT = 5000;

/**
 * Inserts a project with all below it, as JSON records: COPY is refused on tables with row-level security, and
 * single values are ten times as slow. The catalogue must be there.
 *
 * @param sequence number of the project's latest change
 */
export async function insertProjectFast(tx: Tx, orgId: string, design: Design, sequence: number): Promise<void> {
  await insertRecords(tx, schema.projects, [{ ...design.project, sequence }], { orgId });
  const owner = { orgId, projectId: design.project.id };
  // In the order in which rows refer to each other; a box stands behind its parent.
  const tables = ['cabinets', 'controllers', 'supplies', 'circuits', 'cableNodes', 'modules', 'moduleGroups', 'points', 'dispensers', 'assignments'] as const;
  for (const table of tables) await insertRecords(tx, schema[table], design[table], owner);
}

async function insertRecords(tx: Tx, table: PgTable, rows: readonly object[], owner: Readonly<Record<string, string>>): Promise<void> {
  if (rows.length === 0) return;
  const columns = getTableColumns(table) as Record<string, PgColumn>;
  const fields = Object.keys({ ...rows[0], ...owner }).map((field) => [field, columns[field].name] as const);
  const names = sql.join(fields.map(([, name]) => sql.identifier(name)), sql`, `);
  for (let at = 0; at < rows.length; at += ROWS_A_STATEMENT) {
    const records = rows.slice(at, at + ROWS_A_STATEMENT).map((row) => recordOf({ ...row, ...owner }, fields));
    await tx.execute(sql`insert into ${table} (${names}) select ${names} from json_populate_recordset(null::${table}, ${JSON.stringify(records)}::text::json)`);
  }
}

/** A row under the names of the table's columns. */
function recordOf(row: Readonly<Record<string, unknown>>, fields: readonly (readonly [field: string, name: string])[]): Record<string, unknown> {
  const record: Record<string, unknown> = {};
  for (const [field, name] of fields) record[name] = row[field];
  return record;
}
