import { sql } from 'drizzle-orm';
import { getTableConfig, type PgColumn } from 'drizzle-orm/pg-core';
import type { Collection, Scope } from '../../../platform/editing/collection.ts';
import { collections } from '../../collections.ts';
import type { Outcome } from '../outcome.ts';

/** A column of one collection that names rows of another. */
interface Reference {
  readonly from: Collection;
  readonly column: PgColumn;
  readonly to: Collection;
}

/** A row that names one that is not there. */
export interface Dangling {
  readonly from: Collection;
  readonly fromId: string;
  readonly to: Collection;
  readonly toId: string;
}

const references: readonly Reference[] = collections.flatMap((from) => getTableConfig(from.table).foreignKeys.flatMap((key) => {
  const { columns, foreignTable } = key.reference();
  const to = collections.find(({ table }) => table === foreignTable);
  const column = columns.at(-1);
  return to && to.name !== 'projects' && column ? [{ from, column, to }] : [];
}));

/** Rows of the project that name rows which are gone, as far as an outcome may have caused it; a few of each kind. */
export async function findDangling(scope: Scope, { items }: Outcome): Promise<Dangling[]> {
  const written = new Set(items.filter((item) => item.after).map((item) => item.collection));
  const deleted = new Set(items.filter((item) => !item.after).map((item) => item.collection));
  const found: Dangling[] = [];
  for (const { from, column, to } of references) {
    if (!written.has(from.name) && !deleted.has(to.name)) continue;
    const rows = await scope.tx.execute<{ fromId: string; toId: string }>(sql`
      select child.id as "fromId", child.${sql.identifier(column.name)} as "toId" from ${from.table} child
      left join ${to.table} parent on parent.id = child.${sql.identifier(column.name)}
      where child.project_id = ${scope.projectId} and child.${sql.identifier(column.name)} is not null and parent.id is null
      order by child.id limit 4`);
    found.push(...rows.map(({ fromId, toId }) => ({ from, fromId, to, toId })));
  }
  return found;
}
