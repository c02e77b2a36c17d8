import { changeItems } from '#schema';
import { and, desc, eq } from 'drizzle-orm';
import type { Collection, Row, Scope } from '../../../platform/editing/collection.ts';
import { findRow } from '../../../platform/editing/rows.ts';
import { collectionNamed } from '../../collections.ts';

/** What people call a row in a sentence: "Point GC1-L01", "Dispenser at GC1-L01", "Channel 3 of DO1". */
export async function nameOfRow(scope: Scope, collection: Collection, row: Row): Promise<string> {
  const noun = collection.noun.charAt(0).toUpperCase() + collection.noun.slice(1);
  switch (collection.name) {
    case 'dispensers': return `${noun} at ${await labelOf(scope, 'points', row['pointId'])}`;
    case 'assignments': return `Channel ${String(row['channel'])} of ${await labelOf(scope, 'modules', row['moduleId'])}`;
    case 'moduleGroups': return `Group ${collection.labelOf(row)} of ${await labelOf(scope, 'modules', row['moduleId'])}`;
    case 'projects': return 'The project';
    default: return `${noun} ${collection.labelOf(row)}`;
  }
}

/** The label of a row that may be gone. */
async function labelOf(scope: Scope, name: Parameters<typeof collectionNamed>[0], id: unknown): Promise<string> {
  const row = await findRowOrItsLast(scope, collectionNamed(name), String(id));
  return row ? collectionNamed(name).labelOf(row) : 'a row that is gone';
}

/** A row as it is, or as it was last known. */
export async function findRowOrItsLast(scope: Scope, collection: Collection, id: string): Promise<Row | undefined> {
  const present = await findRow(scope, collection, id);
  if (present) return present;
  const [last] = await scope.tx.select({ before: changeItems.before, after: changeItems.after }).from(changeItems)
    .where(and(eq(changeItems.projectId, scope.projectId), eq(changeItems.rowId, id))).orderBy(desc(changeItems.id)).limit(1);
  return ((last?.after ?? last?.before) as Row | null | undefined) ?? undefined;
}
