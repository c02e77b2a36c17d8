import { v7 as newId } from 'uuid';
import type { CollectionName, Row, Scope } from '../platform/editing/collection.ts';
import { findPage } from '../platform/editing/rows.ts';
import type { ChangedRow } from './change-sets/outcome.ts';
import { collectionNamed } from './collections.ts';

/** Those that others refer to first, and the fields that refer inside the project. */
const hardware: readonly { readonly name: CollectionName; readonly references: readonly string[] }[] = [
  { name: 'cabinets', references: [] },
  { name: 'controllers', references: ['cabinetId'] },
  { name: 'supplies', references: ['cabinetId'] },
  { name: 'circuits', references: ['supplyId'] },
  { name: 'cableNodes', references: ['circuitId', 'parentId'] },
  { name: 'modules', references: ['controllerId'] },
  { name: 'moduleGroups', references: ['moduleId', 'circuitId'] },
];
const MOST_ROWS = 100_000;

/** The rows of another project's hardware as new rows of this one, with identifiers of their own. */
export async function copyHardware(scope: Scope, fromProjectId: string): Promise<ChangedRow[]> {
  const source = { ...scope, projectId: fromProjectId };
  const rows: { name: CollectionName; references: readonly string[]; row: Row }[] = [];
  for (const { name, references } of hardware) {
    for (const row of await findPage(source, collectionNamed(name), undefined, MOST_ROWS)) rows.push({ name, references, row });
  }
  const ids = new Map(rows.map(({ row }) => [row.id, newId()]));
  return rows.map(({ name, references, row }) => {
    const moved = Object.fromEntries(references.map((field) => [field, ids.get(String(row[field])) ?? null]));
    const after = { ...row, ...moved, id: ids.get(row.id) ?? newId(), version: 1 };
    return { collection: name, rowId: after.id, before: null, after };
  });
}
