import { sql } from 'drizzle-orm';
import type { Scope } from '../../../platform/editing/collection.ts';
import { NotFound } from '../../../platform/problems.ts';

/** A change set in words; `at` is day and time in the project's time zone. */
export type SetWords = Readonly<Record<'id' | 'summary' | 'by' | 'at', string>>;

/**
 * An edit and what was done with it since: taken back, made again and so on, one set after another. A set stands while
 * an even number of sets follows it.
 */
export interface Chain {
  /** The edit that all of it is about. */
  readonly root: Pick<SetWords, 'id' | 'summary'>;
  /** Sets from the edit to the one that is asked about. */
  readonly depth: number;
  /** Sets that follow the one that is asked about. */
  readonly followed: number;
  /** The latest set: its rows are those that an undo puts back. */
  readonly tip: SetWords & { readonly sequence: number };
}

/** Columns of a set in words; for queries over `change_sets s`, `people who` and `projects p`. */
export const setWords = sql`s.id, s.summary, coalesce(who.name, 'a former member') as by, to_char(s.at at time zone p.time_zone, 'FMDD Mon YYYY, HH24:MI') as at`;

/** @throws {NotFound} where the project has no such set */
export async function findChain(scope: Scope, setId: string): Promise<Chain> {
  const [root] = await findRoot(scope, setId);
  if (!root) throw new NotFound('entry of the history');
  const [{ followed, ...tip }] = await findTip(scope, setId);
  return { root: { id: root.id, summary: root.summary }, depth: root.depth, followed, tip: { ...tip, sequence: Number(tip.sequence) } };
}

const findRoot = ({ tx, projectId }: Scope, setId: string) => tx.execute<{ id: string; summary: string; depth: number }>(sql`
  with recursive up(id, undoes, summary, depth) as (
    select id, undoes, summary, 0 from change_sets where project_id = ${projectId} and id = ${setId}
    union all select s.id, s.undoes, s.summary, up.depth + 1 from up join change_sets s on s.id = up.undoes)
  select id, summary, depth from up order by depth desc limit 1`);

const findTip = ({ tx }: Scope, setId: string) => tx.execute<SetWords & { sequence: number; followed: number }>(sql`
  with recursive down(id, followed) as (
    select ${setId}::uuid, 0
    union all select s.id, down.followed + 1 from down join change_sets s on s.undoes = down.id)
  select ${setWords}, s.sequence, down.followed
  from down join change_sets s on s.id = down.id join projects p on p.id = s.project_id left join people who on who.id = s.person_id
  order by down.followed desc limit 1`);
