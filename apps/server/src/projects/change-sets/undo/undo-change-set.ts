import type { ChangeNotice } from '#contract';
import { imports } from '#schema';
import { and, eq } from 'drizzle-orm';
import { type Context, withOrg } from '../../../platform/context.ts';
import type { Tx } from '../../../platform/database.ts';
import { problemOfDatabase } from '../../../platform/database-problems.ts';
import type { Scope } from '../../../platform/editing/collection.ts';
import { ProblemError } from '../../../platform/problems.ts';
import { commitOutcome, lockProject } from '../commit.ts';
import type { ChangedRow, Outcome } from '../outcome.ts';
import { findRecordedSet, noticeOfSet } from '../record.ts';
import { twice } from '../twice.ts';
import { type Chain, findChain } from './chain.ts';
import { byRow, standingClashes } from './clashes.ts';
import { inverseOf } from './inverse.ts';
import { findItems } from './later-changes.ts';
import { findDangling } from './references.ts';
import { refusedAsChanged, refusedAsDangling, refusedAsDone, UndoRefused } from './refusals.ts';

/**
 * Takes a change set back by a new one: rows that it made are deleted, rows that it deleted are there again, fields that
 * it changed are as before. The undo of an undo makes the edit again. The same request again gets the same answer.
 *
 * @param id of the new set
 * @throws {NotFound}, {UndoRefused} where it is taken back already or something later stands on it, in words
 */
export async function undoChangeSet(context: Context, projectId: string, setId: string, id: string): Promise<ChangeNotice> {
  try {
    return await twice(() => withOrg(context, (tx) => undoIn(tx, context, projectId, setId, id)));
  } catch (error) {
    throw inWords(error);
  }
}

async function undoIn(tx: Tx, context: Context, projectId: string, setId: string, id: string): Promise<ChangeNotice> {
  const scope: Scope = { tx, orgId: context.orgId, projectId };
  if (await findRecordedSet(scope, id)) return noticeOfSet(scope, id);
  const found = await findChain(scope, setId);
  const items = await findItems(scope, found.tip.id);
  // Rows first, then the project, as every edit does it; from there on nobody else writes to the history.
  const { outcome, clashes } = await inverseOf(scope, items);
  await lockProject(scope);
  const chain = await findChain(scope, setId);
  if (chain.tip.id === id) return noticeOfSet(scope, id);
  if (chain.followed % 2 === 1) throw refusedAsDone(chain);
  refuseProject(items);
  const standing = byRow([...clashes, ...(await standingClashes(scope, chain, items))]);
  if (standing.length > 0) throw await refusedAsChanged(scope, chain, standing);
  const undoing = (chain.depth + chain.followed) % 2 === 0;
  if (undoing) await forgetFile(scope, chain.root.id);
  const summary = `${undoing ? 'Undone' : 'Redone'}: ${chain.root.summary}`.slice(0, 300);
  return commitOutcome(scope, context.personId, { id, summary, undoes: chain.tip.id }, outcome, refuseDangling(chain));
}

/** The file of an import is kept until the import is undone. */
async function forgetFile({ tx, projectId }: Scope, setId: string): Promise<void> {
  await tx.delete(imports).where(and(eq(imports.projectId, projectId), eq(imports.changeSetId, setId)));
}

function refuseProject(items: readonly ChangedRow[]): void {
  if (items.some(({ collection, before }) => collection === 'projects' && !before)) {
    throw new UndoRefused('The creation of a project cannot be undone', 'Everything else in its history stands on it.');
  }
}

const refuseDangling = (chain: Chain) => async (scope: Scope, outcome: Outcome): Promise<void> => {
  const dangling = await findDangling(scope, outcome);
  if (dangling.length === 0) return;
  const deleted = new Set(outcome.items.filter((item) => !item.after).map((item) => item.rowId));
  throw await refusedAsDangling(scope, chain, dangling, deleted);
};

/** What a rule or the database says against the rows as they were: a tag that is taken since, a channel in use. */
function inWords(error: unknown): unknown {
  const problem = error instanceof ProblemError ? error : problemOfDatabase(error);
  if (!problem || !['conflict', 'invalid-input', 'still-used'].includes(problem.type)) return error;
  const { detail, errors } = problem.more;
  const reasons = [problem.message, ...(detail ? [detail] : []), ...(errors ?? []).slice(0, 3).map(({ message }) => message)];
  const sentences = new Set(reasons.map((text) => text.replace(/\.$/, '')));
  return new UndoRefused('The design no longer allows this', `${[...sentences].join('. ')}.`);
}
