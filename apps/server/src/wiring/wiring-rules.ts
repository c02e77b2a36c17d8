import { sql } from 'drizzle-orm';
import { uuidArray } from '../platform/database.ts';
import type { Rule } from '../platform/editing/collection.ts';
import { Invalid } from '../platform/problems.ts';

/** The box before a box is of the same circuit, and no chain of boxes comes back to its beginning. */
export const boxesFormATree: Rule = async ({ tx }, touched) => {
  const ids = touched('cableNodes');
  if (ids.length === 0) return;
  const [foreign] = await tx.execute<{ location: string; parent: string }>(sql`
    select n.location, p.location as parent from cable_nodes n join cable_nodes p on p.id = n.parent_id
    where (n.id = any(${uuidArray(ids)}) or p.id = any(${uuidArray(ids)})) and n.circuit_id <> p.circuit_id limit 1`);
  if (foreign) throw new Invalid([{ field: 'parentId', message: `${foreign.location} and the box before it, ${foreign.parent}, must be in the same circuit.` }]);
  const [looped] = await tx.execute<{ location: string }>(sql`
    with recursive up(start, id) as (
      select id, parent_id from cable_nodes where id = any(${uuidArray(ids)}) and parent_id is not null
      union select up.start, n.parent_id from up join cable_nodes n on n.id = up.id where n.parent_id is not null)
    select n.location from up join cable_nodes n on n.id = up.start where up.id = up.start limit 1`);
  if (looped) throw new Invalid([{ field: 'parentId', message: `${looped.location} would hang on itself through other boxes. Choose a box that is not behind it.` }]);
};

/** A dispenser's box is a box of the dispenser's circuit. */
export const dispensersHangInTheirCircuit: Rule = async ({ tx }, touched) => {
  const [dispensers, nodes] = [touched('dispensers'), touched('cableNodes')];
  if (dispensers.length + nodes.length === 0) return;
  const wrong = await tx.execute<{ tag: string; location: string }>(sql`
    select p.tag, n.location from dispensers d join cable_nodes n on n.id = d.node_id join points p on p.id = d.point_id
    where (d.id = any(${uuidArray(dispensers)}) or n.id = any(${uuidArray(nodes)})) and d.circuit_id is distinct from n.circuit_id
    order by p.tag limit 20`);
  if (wrong.length === 0) return;
  throw new Invalid(wrong.map(({ tag, location }) => ({ field: 'nodeId', message: `${tag}: box ${location} is in another circuit than the dispenser. Choose a box of its circuit.` })));
};
