import { moduleGroups, moduleTypes } from '#schema';
import { inArray } from 'drizzle-orm';
import { v7 as newId } from 'uuid';
import type { Collection, Scope } from '../platform/editing/collection.ts';
import type { Plan, Planned } from '../platform/editing/plan.ts';
import { findIdsBy } from '../platform/editing/rows.ts';

/** A new module gets its groups, a deleted one loses them, and one that changes its type gets as many as that has. */
export const groupsFollowModules: NonNullable<Collection['expand']> = async (scope, plan) => {
  const deleted = plan.of('modules', 'delete').map((change) => change.id);
  for (const id of await findIdsBy(scope, moduleGroups, moduleGroups.moduleId, deleted)) plan.add({ collection: 'moduleGroups', op: 'delete', id });
  const typed = [...plan.of('modules', 'create'), ...plan.of('modules', 'update')].filter((change) => typeOf(change) !== '');
  if (typed.length === 0) return;
  const counts = await groupCounts(scope, typed);
  const present = await presentGroups(scope, plan, typed.map((change) => change.id));
  for (const module of typed) adjust(plan, module.id, counts.get(typeOf(module)) ?? 0, present.get(module.id) ?? new Map<number, string | null>());
};

/** The type that a change names; empty where it names none. */
function typeOf({ values }: Planned): string {
  const typeId = values?.['typeId'];
  return typeof typeId === 'string' ? typeId : '';
}

async function groupCounts({ tx }: Scope, typed: readonly Planned[]): Promise<Map<string, number>> {
  const ids = [...new Set(typed.map(typeOf))];
  const types = await tx.select({ id: moduleTypes.id, channels: moduleTypes.channels, perGroup: moduleTypes.channelsPerGroup })
    .from(moduleTypes).where(inArray(moduleTypes.id, ids));
  return new Map(types.map((type) => [type.id, Math.ceil(type.channels / type.perGroup)]));
}

/** Group index → row, for each module; null for a group that the set itself makes. */
async function presentGroups({ tx }: Scope, plan: Plan, moduleIds: readonly string[]): Promise<Map<string, Map<number, string | null>>> {
  const rows = await tx.select({ id: moduleGroups.id, moduleId: moduleGroups.moduleId, index: moduleGroups.groupIndex })
    .from(moduleGroups).where(inArray(moduleGroups.moduleId, [...moduleIds]));
  const present = new Map<string, Map<number, string | null>>(moduleIds.map((id) => [id, new Map()]));
  for (const row of rows) present.get(row.moduleId)?.set(row.index, row.id);
  for (const { values } of plan.of('moduleGroups', 'create')) present.get(String(values?.['moduleId']))?.set(Number(values?.['groupIndex']), null);
  return present;
}

function adjust(plan: Plan, moduleId: string, count: number, present: ReadonlyMap<number, string | null>): void {
  for (let groupIndex = 0; groupIndex < count; groupIndex += 1) {
    if (!present.has(groupIndex)) plan.add({ collection: 'moduleGroups', op: 'create', id: newId(), values: { moduleId, groupIndex, circuitId: null } });
  }
  for (const [index, id] of present) {
    if (index >= count && id !== null) plan.add({ collection: 'moduleGroups', op: 'delete', id });
  }
}
