import type { ChangeNotice, NewChangeSet } from '#contract';
import { type Context, withOrg } from '../../platform/context.ts';
import type { Tx } from '../../platform/database.ts';
import type { Scope } from '../../platform/editing/collection.ts';
import { commitOutcome } from './commit.ts';
import { makePlan } from './make-plan.ts';
import { outcomeOf } from './outcome.ts';
import { findRecordedSet, noticeOfSet } from './record.ts';
import { twice } from './twice.ts';

/**
 * The one way in which rows of a project change: all of a set or nothing, in one transaction. Checks versions and
 * values, writes, keeps before and after, takes the project's next sequence number last and announces it. A set that
 * was applied before, or that changes nothing, leaves no trace; the answer holds the rows as they are.
 *
 * @throws {StaleWrite} with the row as it is, {VersionMissing}, {NotFound}, {Invalid}, {Conflict}, {StillUsed}
 */
export async function applyChangeSet(context: Context, projectId: string, set: NewChangeSet): Promise<ChangeNotice> {
  return twice(() => withOrg(context, (tx) => applyChangeSetIn(tx, context, projectId, set)));
}

/** As `applyChangeSet`, inside a transaction of `withOrg` that does more; nothing may be written to the project after it. */
export async function applyChangeSetIn(tx: Tx, context: Context, projectId: string, set: NewChangeSet, written?: Scope['written']): Promise<ChangeNotice> {
  const scope: Scope = { tx, orgId: context.orgId, projectId, written };
  if (await findRecordedSet(scope, set.id)) return noticeOfSet(scope, set.id);
  const plan = await makePlan(scope, set);
  const outcome = await outcomeOf(scope, plan);
  return commitOutcome(scope, context.personId, set, outcome);
}
