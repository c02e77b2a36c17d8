import type { ChangeNotice, NewChangeSet } from '#contract';
import { projects } from '#schema';
import { eq, sql } from 'drizzle-orm';
import { type Context, withOrg } from '../../platform/context.ts';
import type { Tx } from '../../platform/database.ts';
import { brokenUnique, isTransient } from '../../platform/database-problems.ts';
import type { CollectionName, Scope } from '../../platform/editing/collection.ts';
import { collections } from '../collections.ts';
import { makePlan } from './make-plan.ts';
import { type Outcome, outcomeOf } from './outcome.ts';
import { findRecordedSet, noticeOfSet, recordChangeSet } from './record.ts';
import { write } from './write.ts';

/**
 * The one way in which rows of a project change: all of a set or nothing, in one transaction. Checks versions and
 * values, writes, keeps before and after, takes the project's next sequence number last and announces it. A set that
 * was applied before, or that changes nothing, leaves no trace; the answer holds the rows as they are.
 *
 * @throws {StaleWrite} with the row as it is, {VersionMissing}, {NotFound}, {Invalid}, {Conflict}, {StillUsed}
 */
export async function applyChangeSet(context: Context, projectId: string, set: NewChangeSet): Promise<ChangeNotice> {
  const attempt = () => withOrg(context, (tx) => applyChangeSetIn(tx, context, projectId, set));
  try {
    return await attempt();
  } catch (error) {
    // The same request was under way a second time: now its rows are there.
    if (!brokenUnique(error)?.endsWith('_pkey') && !isTransient(error)) throw error;
    return attempt();
  }
}

/** As `applyChangeSet`, inside a transaction of `withOrg` that does more; nothing may be written to the project after it. */
export async function applyChangeSetIn(tx: Tx, context: Context, projectId: string, set: NewChangeSet): Promise<ChangeNotice> {
  const scope: Scope = { tx, orgId: context.orgId, projectId };
  if (await findRecordedSet(scope, set.id)) return noticeOfSet(scope, set.id);
  // A row may refer to one that the same set makes, and two rows may swap what is unique.
  await tx.execute(sql`set constraints all deferred`);
  const plan = await makePlan(scope, set);
  const outcome = await outcomeOf(scope, plan);
  await write(scope, outcome);
  if (outcome.items.length > 0) await lockProject(scope);
  await keepRules(scope, outcome);
  await tx.execute(sql`set constraints all immediate`);
  const sequence = await recordChangeSet(scope, context.personId, set, outcome.items);
  return { sequence, items: outcome.answer };
}

/** From here on one set after another, so that no two sets are each right and together wrong. */
async function lockProject({ tx, projectId }: Scope): Promise<void> {
  await tx.select({ id: projects.id }).from(projects).where(eq(projects.id, projectId)).for('update');
}

async function keepRules(scope: Scope, { items }: Outcome): Promise<void> {
  const touched = new Map<CollectionName, string[]>();
  for (const { collection, rowId, after } of items) {
    if (!after) continue;
    const ids = touched.get(collection);
    if (ids) ids.push(rowId);
    else touched.set(collection, [rowId]);
  }
  const rules = new Set(collections.flatMap((collection) => collection.rules ?? []));
  for (const rule of rules) await rule(scope, (name) => touched.get(name) ?? []);
}
