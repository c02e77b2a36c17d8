import type { ChangeNotice, HistoryEntry } from '#contract';
import { sql } from 'drizzle-orm';
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

/** Latest first, from before a sequence number. */
export async function findHistory(tx: Tx, projectId: string, before: number | undefined, limit: number): Promise<HistoryEntry[]> {
  const rows = await tx.execute<{ entry: HistoryEntry }>(sql`
    select json_build_object('id', s.id, 'sequence', s.sequence, 'at', to_char(s.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'),
      'by', coalesce(p.name, 'a former member'), 'summary', s.summary,
      'rows', (select count(*) from change_items i where i.change_set_id = s.id)) as entry
    from change_sets s left join people p on p.id = s.person_id
    where s.project_id = ${projectId} and (${before ?? null}::bigint is null or s.sequence < ${before ?? null}::bigint)
    order by s.sequence desc limit ${limit}`);
  return rows.map((row) => row.entry);
}
