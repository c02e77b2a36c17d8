import type { ChangeNotice } from '#contract';
import { projects } from '#schema';
import { eq, sql } from 'drizzle-orm';
import type { CollectionName, Scope } from '../../platform/editing/collection.ts';
import { collections } from '../collections.ts';
import type { Outcome } from './outcome.ts';
import { recordChangeSet, type SetName } from './record.ts';
import { write } from './write.ts';

/**
 * Writes what a set changes, holds it against every rule, and keeps it in the history. `check` looks at the rows as they
 * are written, before the references between them are checked.
 */
export async function commitOutcome(
  scope: Scope, personId: string, set: SetName, outcome: Outcome, check: (scope: Scope, outcome: Outcome) => Promise<void> = nothingMore,
): Promise<ChangeNotice> {
  // A row may refer to one that the same set makes, and two rows may swap what is unique.
  await scope.tx.execute(sql`set constraints all deferred`);
  await write(scope, outcome);
  if (outcome.items.length > 0) await lockProject(scope);
  await check(scope, outcome);
  await keepRules(scope, outcome);
  await scope.tx.execute(sql`set constraints all immediate`);
  const sequence = await recordChangeSet(scope, personId, set, outcome.items);
  return { sequence, items: outcome.answer };
}

const nothingMore = () => Promise.resolve();

/** From here on one set after another, so that no two sets are each right and together wrong. */
export async function lockProject({ tx, projectId }: Scope): Promise<void> {
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
