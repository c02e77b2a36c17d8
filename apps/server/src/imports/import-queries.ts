import { imports } from '#schema';
import { and, eq, lt, sql } from 'drizzle-orm';
import type { Tx } from '../platform/database.ts';

export type ImportRow = typeof imports.$inferSelect;

/** Keeps an upload. Uploads of the project that were never committed and have expired go at the same time. */
export async function insertImport(tx: Tx, row: typeof imports.$inferInsert): Promise<void> {
  await tx.delete(imports).where(and(eq(imports.projectId, row.projectId), lt(imports.expiresAt, sql`now()`)));
  await tx.insert(imports).values(row);
}

export async function findImport(tx: Tx, projectId: string, id: string): Promise<ImportRow | undefined> {
  const [row] = await tx.select().from(imports).where(and(eq(imports.projectId, projectId), eq(imports.id, id)));
  return row;
}

export async function findImportForUpdate(tx: Tx, projectId: string, id: string): Promise<ImportRow | undefined> {
  const [row] = await tx.select().from(imports).where(and(eq(imports.projectId, projectId), eq(imports.id, id))).for('update');
  return row;
}

export async function markCommitted(tx: Tx, id: string, values: Pick<ImportRow, 'settings' | 'changeSetId' | 'created' | 'updated'>): Promise<void> {
  await tx.update(imports).set({ ...values, committedAt: new Date() }).where(eq(imports.id, id));
}
