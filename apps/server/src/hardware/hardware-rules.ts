import { sql } from 'drizzle-orm';
import { uuidArray } from '../platform/database.ts';
import type { Rule } from '../platform/editing/collection.ts';
import { Invalid, StillUsed } from '../platform/problems.ts';

/** A group belongs to a module whose type has so many groups. */
export const groupsStayWithTheirModule: Rule = async ({ tx }, touched) => {
  const ids = touched('moduleGroups');
  if (ids.length === 0) return;
  const wrong = await tx.execute<{ name: string; index: number }>(sql`
    select m.name, g.group_index as index from module_groups g join modules m on m.id = g.module_id join module_types t on t.id = m.type_id
    where g.id = any(${uuidArray(ids)}) and g.group_index * t.channels_per_group >= t.channels limit 20`);
  if (wrong.length === 0) return;
  throw new Invalid(wrong.map(({ name, index }) => ({ field: 'groupIndex', message: `Module ${name} has no group ${index + 1}.` })));
};

/** A module cannot become a type that lacks the channels in use. */
export const modulesKeepTheirChannels: Rule = async ({ tx }, touched) => {
  const ids = touched('modules');
  if (ids.length === 0) return;
  const [lost] = await tx.execute<{ name: string; channel: number; tag: string; type: string }>(sql`
    select m.name, a.channel, p.tag, t.name as type from assignments a
    join modules m on m.id = a.module_id join module_types t on t.id = m.type_id
    join dispensers d on d.id = a.dispenser_id join points p on p.id = d.point_id
    where m.id = any(${uuidArray(ids)}) and (a.channel >= t.channels or (a.purpose = 'control') <> (t.kind = 'output'))
    order by m.name, a.channel limit 1`);
  if (lost) throw new StillUsed(`Channel ${lost.channel} of ${lost.name} is used by ${lost.tag}`, `The type "${lost.type}" has no such channel. Unassign it first.`);
};
