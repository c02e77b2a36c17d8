import type { ImportSettings } from '#contract';
import { imports } from '#schema';
import { and, eq, lt, type SQL, sql } from 'drizzle-orm';
import type { Tx } from '../platform/database.ts';

export type ImportRow = typeof imports.$inferSelect;

/**
 * Keeps an upload. Uploads of the project that were never committed and have expired go at the same time.
 *
 * @returns false where another file has this identifier
 */
export async function insertImport(tx: Tx, row: typeof imports.$inferInsert): Promise<boolean> {
  await tx.delete(imports).where(and(eq(imports.projectId, row.projectId), lt(imports.expiresAt, sql`now()`)));
  await tx.insert(imports).values(row).onConflictDoNothing({ target: imports.id });
  const [kept] = await tx.select({ id: imports.id }).from(imports)
    .where(and(keyIs(row.projectId, row.id), eq(imports.sha256, row.sha256), eq(imports.personId, row.personId)));
  return kept !== undefined;
}

export async function findImport(tx: Tx, projectId: string, id: string): Promise<ImportRow | undefined> {
  const [row] = await tx.select().from(imports).where(keyIs(projectId, id));
  return row;
}

// Not 'update': the rows that tell how far the import is refer to this one while it is locked.
export async function findImportForUpdate(tx: Tx, projectId: string, id: string): Promise<ImportRow | undefined> {
  const [row] = await tx.select().from(imports).where(keyIs(projectId, id)).for('no key update');
  return row;
}

/** Without the file itself. */
export async function findImportState(tx: Tx, projectId: string, id: string): Promise<{ readonly settings: ImportSettings | null } | undefined> {
  const [row] = await tx.select({ settings: imports.settings }).from(imports).where(keyIs(projectId, id));
  return row as { settings: ImportSettings | null } | undefined;
}

/** Notes how the file was last read. */
export async function keepSettings(tx: Tx, id: string, settings: ImportSettings): Promise<void> {
  await tx.update(imports).set({ settings }).where(eq(imports.id, id));
}

export async function markCommitted(tx: Tx, id: string, values: Pick<ImportRow, 'settings' | 'changeSetId' | 'created' | 'updated'>): Promise<void> {
  await tx.update(imports).set({ ...values, committedAt: new Date() }).where(eq(imports.id, id));
}

/** An upload that cannot be read, or was given up, leaves nothing. */
export async function deleteImport(tx: Tx, id: string): Promise<void> {
  await tx.delete(imports).where(and(eq(imports.id, id), sql`${imports.committedAt} is null`));
}

const keyIs = (projectId: string, id: string): SQL | undefined => and(eq(imports.projectId, projectId), eq(imports.id, id));
