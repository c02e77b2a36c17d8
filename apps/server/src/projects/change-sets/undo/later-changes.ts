import { sql } from 'drizzle-orm';
import { uuidArray } from '../../../platform/database.ts';
import type { CollectionName, Row, Scope } from '../../../platform/editing/collection.ts';
import type { ChangedRow } from '../outcome.ts';
import { type SetWords, setWords } from './chain.ts';

/** What a change set did to a row, and which set it was. */
export interface LaterChange extends ChangedRow {
  readonly set: SetWords;
}

/** The rows of a set, each before and after, in the order in which they were written. */
export async function findItems({ tx }: Scope, setId: string): Promise<ChangedRow[]> {
  const rows = await tx.execute<{ collection: CollectionName; rowId: string; before: Row | null; after: Row | null }>(sql`
    select collection, row_id as "rowId", before, after from change_items where change_set_id = ${setId} order by id`);
  return [...rows];
}

/** What edits made after a set, and still standing, did to the rows of that set. */
export async function findStandingChanges({ tx, projectId }: Scope, set: { readonly id: string; readonly sequence: number }): Promise<ChangedRow[]> {
  const rows = await tx.execute<{ collection: CollectionName; rowId: string; before: Row | null; after: Row | null }>(sql`
    with recursive touching as (
      select i.id as item_id, s.id as set_id from change_items mine
      join change_items i on i.project_id = mine.project_id and i.row_id = mine.row_id
      join change_sets s on s.id = i.change_set_id
      where mine.change_set_id = ${set.id} and s.project_id = ${projectId} and s.sequence > ${set.sequence} and s.undoes is null),
    chain(root, id, depth) as (
      select distinct set_id, set_id, 0 from touching
      union all select chain.root, s.id, chain.depth + 1 from chain join change_sets s on s.undoes = chain.id),
    standing as (select root from chain group by root having max(depth) % 2 = 0)
    select i.collection, i.row_id as "rowId", i.before, i.after
    from standing join touching t on t.set_id = standing.root join change_items i on i.id = t.item_id`);
  return [...rows];
}

/** Everything that happened to a few rows after a sequence number, the latest first. */
export async function findLaterChanges({ tx, projectId }: Scope, rowIds: readonly string[], sequence: number): Promise<LaterChange[]> {
  const rows = await tx.execute<SetWords & { collection: CollectionName; rowId: string; before: Row | null; after: Row | null }>(sql`
    select i.collection, i.row_id as "rowId", i.before, i.after, ${setWords}
    from change_items i join change_sets s on s.id = i.change_set_id join projects p on p.id = s.project_id
    left join people who on who.id = s.person_id
    where i.project_id = ${projectId} and i.row_id = any(${uuidArray(rowIds)}) and s.sequence > ${sequence}
    order by s.sequence desc`);
  return rows.map(({ collection, rowId, before, after, ...set }) => ({ collection, rowId, before, after, set }));
}
