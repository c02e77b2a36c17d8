import type { ChangeNotice, HistoryEntry } from '#contract';
import { type SQL, sql } from 'drizzle-orm';
import type { Tx } from '../platform/database.ts';

/** The rows touched after a sequence number, each as its last change left it, and the number that this brings one to. */
export async function findChangesSince(tx: Tx, projectId: string, since: number): Promise<ChangeNotice> {
  const [row] = await tx.execute<{ notice: ChangeNotice }>(sql`
    select json_build_object('sequence', p.sequence, 'items', coalesce((
      select json_agg(json_build_object('collection', l.collection, 'id', l.row_id, 'row', l.after)) from (
        select distinct on (i.collection, i.row_id) i.collection, i.row_id, i.after from change_sets s
        join change_items i on i.change_set_id = s.id
        where s.project_id = p.id and s.sequence > ${since} and s.sequence <= p.sequence
        order by i.collection, i.row_id, s.sequence desc) l), '[]'::json)) as notice
    from projects p where p.id = ${projectId}`);
  return row?.notice ?? { sequence: since, items: [] };
}

/** Latest first, from before a sequence number. An entry is undone while an odd number of undos follows it. */
export async function findHistory(tx: Tx, projectId: string, before: number | undefined, limit: number): Promise<HistoryEntry[]> {
  const rows = await tx.execute<{ entry: HistoryEntry }>(sql`
    with recursive page as (
      select s.id, s.sequence, s.at, s.person_id, s.summary, s.undoes from change_sets s
      where s.project_id = ${projectId} and (${before ?? null}::bigint is null or s.sequence < ${before ?? null}::bigint)
      order by s.sequence desc limit ${limit}),
    chain(entry, id, depth) as (
      select id, id, 0 from page union all select chain.entry, s.id, chain.depth + 1 from chain join change_sets s on s.undoes = chain.id),
    tip as (select distinct on (entry) entry, id, depth from chain order by entry, depth desc)
    select json_build_object('id', s.id, 'sequence', s.sequence, 'at', ${isoTime(sql`s.at`)}, 'by', coalesce(p.name, ${FORMER}), 'summary', s.summary,
      'rows', (select count(*) from change_items i where i.change_set_id = s.id), 'undoes', s.undoes,
      'undoneBy', case when tip.depth % 2 = 1 then json_build_object('id', u.id, 'at', ${isoTime(sql`u.at`)}, 'by', coalesce(w.name, ${FORMER})) end) as entry
    from page s join tip on tip.entry = s.id join change_sets u on u.id = tip.id
    left join people p on p.id = s.person_id left join people w on w.id = u.person_id
    order by s.sequence desc`);
  return rows.map((row) => row.entry);
}

const FORMER = sql`'a former member'`;
const isoTime = (column: SQL): SQL => sql`to_char(${column} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`;
