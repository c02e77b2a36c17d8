import { sql } from 'drizzle-orm';
import { uuidArray } from '../platform/database.ts';
import type { Rule } from '../platform/editing/collection.ts';
import { Conflict, Invalid } from '../platform/problems.ts';

/** A control signal sits on an output, a status signal on an input, on a channel that the module has. */
export const channelsExist: Rule = async ({ tx }, touched) => {
  const ids = touched('assignments');
  if (ids.length === 0) return;
  const wrong = await tx.execute<{ name: string; channel: number; channels: number; purpose: string; kind: string; missing: boolean }>(sql`
    select m.name, a.channel, t.channels, a.purpose, t.kind, a.channel >= t.channels as missing from assignments a
    join modules m on m.id = a.module_id join module_types t on t.id = m.type_id
    where a.id = any(${uuidArray(ids)}) and (a.channel >= t.channels or (a.purpose = 'control') <> (t.kind = 'output'))
    order by m.name, a.channel limit 20`);
  if (wrong.length === 0) return;
  throw new Invalid(wrong.map(({ name, channel, channels, purpose, kind, missing }) => missing
    ? { field: 'channel', message: `${name} has channels 0 to ${channels - 1}, not ${channel}.` }
    : { field: 'moduleId', message: `${name} is an ${kind} module; a ${purpose} signal needs an ${purpose === 'control' ? 'output' : 'input'}.` }));
};

/** One dispenser a channel, one channel a dispenser and purpose; says who is there. */
export const channelsAreFree: Rule = async ({ tx }, touched) => {
  const ids = touched('assignments');
  if (ids.length === 0) return;
  const taken = await tx.execute<{ name: string; channel: number; tag: string }>(sql`
    select distinct m.name, a.channel, p.tag from assignments a
    join assignments b on b.module_id = a.module_id and b.channel = a.channel and b.id <> a.id
    join modules m on m.id = a.module_id join dispensers d on d.id = b.dispenser_id join points p on p.id = d.point_id
    where a.id = any(${uuidArray(ids)}) order by m.name, a.channel limit 20`);
  if (taken.length > 0) throw new Conflict(...inWords('channel', taken.map(({ name, channel, tag }) => `Channel ${channel} of ${name} is taken by ${tag}`)));
  const second = await tx.execute<{ tag: string; purpose: string; name: string; channel: number }>(sql`
    select distinct p.tag, a.purpose, m.name, b.channel from assignments a
    join assignments b on b.dispenser_id = a.dispenser_id and b.purpose = a.purpose and b.id <> a.id
    join modules m on m.id = b.module_id join dispensers d on d.id = a.dispenser_id join points p on p.id = d.point_id
    where a.id = any(${uuidArray(ids)}) order by p.tag limit 20`);
  if (second.length > 0) throw new Conflict(...inWords('purpose', second.map((s) => `${s.tag} has its ${s.purpose} signal on channel ${s.channel} of ${s.name} already`)));
};

const inWords = (field: string, messages: readonly string[]): [string, { field: string; message: string }[]] =>
  [messages[0] ?? '', messages.map((message) => ({ field, message: `${message}.` }))];
