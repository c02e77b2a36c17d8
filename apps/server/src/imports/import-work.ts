import type { ImportWork } from '#contract';
import { importWork } from '#schema';
import { and, eq, sql } from 'drizzle-orm';
import { type Context, withOrg } from '../platform/context.ts';
import type { Tx } from '../platform/database.ts';
import type { Progress } from '../platform/tasks/task.ts';
import type { TaskThread } from '../platform/tasks/task-thread.ts';

const TELL_EVERY_MS = 400;

/** Which import of which project. */
export interface ImportKey {
  readonly projectId: string;
  readonly importId: string;
}

/**
 * Runs a task of an import in the thread. Where it lasts, its progress stands in the database, so that every instance
 * can tell it, and a wish to cancel left there is seen.
 */
export async function runTracked<Output>(tasks: TaskThread, context: Context, key: ImportKey, name: string, input: unknown): Promise<Output> {
  let latest: Progress = { stage: 'waiting', done: 0, total: null };
  const told: Promise<void>[] = [];
  const tell = () => {
    told.push((told.at(-1) ?? Promise.resolve()).then(() => tellProgress(context, key, latest)).then((stop) => { if (stop) tasks.cancel(key.importId); })
      // The next one tells again; the import itself does not depend on it.
      .catch(() => undefined));
  };
  const timer = setInterval(tell, TELL_EVERY_MS);
  try {
    return await tasks.run<Output>(name, input, key.importId, (progress) => { latest = progress; });
  } finally {
    clearInterval(timer);
    if (told.length > 0) {
      await told.at(-1);
      await withOrg(context, (tx) => tx.delete(importWork).where(eq(importWork.importId, key.importId)));
    }
  }
}

/** @returns whether somebody wants it to stop */
async function tellProgress(context: Context, { projectId, importId }: ImportKey, { stage, done, total }: Progress): Promise<boolean> {
  const [row] = await withOrg(context, (tx) => tx.insert(importWork)
    .values({ importId, orgId: context.orgId, projectId, stage, done, total })
    .onConflictDoUpdate({ target: importWork.importId, set: { stage, done, total } })
    .returning({ cancelled: importWork.cancelled }));
  return row?.cancelled ?? false;
}

export async function findWork(tx: Tx, { projectId, importId }: ImportKey): Promise<ImportWork | undefined> {
  const [row] = await tx.select({
    stage: importWork.stage, done: importWork.done, total: importWork.total,
    elapsedMs: sql<number>`(extract(epoch from clock_timestamp() - ${importWork.startedAt}) * 1000)::int`,
  }).from(importWork).where(and(eq(importWork.projectId, projectId), eq(importWork.importId, importId)));
  return row as ImportWork | undefined;
}

/** Leaves the wish to stop where the instance at work finds it. */
export async function wishToStop(tx: Tx, importId: string): Promise<void> {
  await tx.update(importWork).set({ cancelled: true }).where(eq(importWork.importId, importId));
}
