import type { ChangeNotice, NewChangeSet } from '#contract';
import { changeItems, changeSets, projects } from '#schema';
import { and, eq, sql } from 'drizzle-orm';
import { v7 as newId } from 'uuid';
import { announceChange } from '../../platform/events.ts';
import type { Scope } from '../../platform/editing/collection.ts';
import { insertRecords } from '../../platform/editing/rows.ts';
import { NotFound } from '../../platform/problems.ts';
import type { ChangedRow } from './outcome.ts';

/** What a set is called in the history. */
export interface SetName extends Pick<NewChangeSet, 'id' | 'summary'> {
  /** The set that this one takes back. */
  readonly undoes?: string;
}

/**
 * Writes the history of a set and takes the sequence number at the very end: it locks the project, so numbers become
 * visible in the order in which they are given.
 *
 * @returns the new number, or the current one where nothing changed
 */
export async function recordChangeSet(scope: Scope, personId: string, set: SetName, items: readonly ChangedRow[]): Promise<number> {
  const { tx, orgId, projectId } = scope;
  if (items.length === 0) return currentSequence(scope);
  await tx.execute(sql`set constraints change_items_set_fk deferred`);
  await insertRecords(scope, changeItems, items, ({ collection, rowId, before, after }) => ({
    id: newId(), org_id: orgId, project_id: projectId, change_set_id: set.id, collection, row_id: rowId, before, after,
  }));
  const [taken] = await tx.update(projects).set({ sequence: sql`${projects.sequence} + 1` }).where(eq(projects.id, projectId))
    .returning({ sequence: projects.sequence });
  if (!taken) throw new NotFound('project');
  await tx.insert(changeSets).values({ id: set.id, orgId, projectId, sequence: taken.sequence, personId, summary: set.summary, undoes: set.undoes });
  await announceChange(tx, projectId, taken.sequence);
  return taken.sequence;
}

export async function findRecordedSet({ tx, projectId }: Scope, id: string): Promise<boolean> {
  const found = await tx.select({ id: changeSets.id }).from(changeSets).where(and(eq(changeSets.id, id), eq(changeSets.projectId, projectId)));
  return found.length > 0;
}

/** The answer that a recorded set was given. */
export async function noticeOfSet({ tx }: Scope, id: string): Promise<ChangeNotice> {
  const [set] = await tx.select({ sequence: changeSets.sequence }).from(changeSets).where(eq(changeSets.id, id));
  const items = await tx.select({ collection: changeItems.collection, id: changeItems.rowId, row: changeItems.after })
    .from(changeItems).where(eq(changeItems.changeSetId, id)).orderBy(changeItems.id);
  return { sequence: set?.sequence ?? 0, items: items as ChangeNotice['items'] };
}

async function currentSequence({ tx, projectId }: Scope): Promise<number> {
  const [project] = await tx.select({ sequence: projects.sequence }).from(projects).where(eq(projects.id, projectId));
  if (!project) throw new NotFound('project');
  return project.sequence;
}
