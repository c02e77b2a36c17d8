import { sql } from 'drizzle-orm';
import { uuidArray } from '../platform/database.ts';
import type { Rule } from '../platform/editing/collection.ts';
import { Conflict, Invalid } from '../platform/problems.ts';

/** The tag is the one name that is unique in a project. */
export const tagsAreUnique: Rule = async ({ tx, projectId }, touched) => {
  const ids = touched('points');
  if (ids.length === 0) return;
  const twice = await tx.execute<{ tag: string }>(sql`
    select distinct p.tag from points p join points other on other.project_id = p.project_id and other.tag = p.tag and other.id <> p.id
    where p.project_id = ${projectId} and p.id = any(${uuidArray(ids)}) order by p.tag limit 20`);
  if (twice.length === 0) return;
  throw new Conflict(`The tag ${twice[0]?.tag} is taken by another point`, twice.map(({ tag }) => ({ field: 'tag', message: `${tag} is the tag of another point.` })));
};

/** A dispenser is wired as its type is made. */
export const wiringFitsType: Rule = async ({ tx }, touched) => {
  const ids = touched('dispensers');
  if (ids.length === 0) return;
  const wrong = await tx.execute<{ tag: string; type: string; wiring: string }>(sql`
    select p.tag, t.name as type, t.wiring from dispensers d
    join dispenser_types t on t.id = d.type_id join points p on p.id = d.point_id
    where d.id = any(${uuidArray(ids)}) and d.wiring <> t.wiring order by p.tag limit 20`);
  if (wrong.length === 0) return;
  throw new Invalid(wrong.map(({ tag, type, wiring }) => ({ field: 'wiring', message: `${tag}: the type "${type}" is ${wiring}. Choose ${wiring} or another type.` })));
};
