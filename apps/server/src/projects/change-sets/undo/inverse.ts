import type { Collection, Row, Scope } from '../../../platform/editing/collection.ts';
import { defaultsOf, lockRows } from '../../../platform/editing/rows.ts';
import { collections } from '../../collections.ts';
import type { ChangedRow, Outcome } from '../outcome.ts';
import { differingFields } from './field-changes.ts';

/** A row that is not as the set left it. */
export interface Clash {
  readonly collection: Collection;
  readonly rowId: string;
  /** The row as the set knew it. */
  readonly row: Row;
  /** `changed` in these fields, `deleted`, or there again (`exists`). */
  readonly kind: 'changed' | 'deleted' | 'exists';
  readonly fields: readonly string[];
}

export interface Inverse {
  readonly outcome: Outcome;
  readonly clashes: readonly Clash[];
}

/** Locks the rows of a set and works out each as it was before, its other fields as they are now. */
export async function inverseOf(scope: Scope, items: readonly ChangedRow[]): Promise<Inverse> {
  const changed: ChangedRow[] = [];
  const clashes: Clash[] = [];
  for (const collection of collections) {
    const mine = items.filter((item) => item.collection === collection.name);
    if (mine.length === 0) continue;
    const present = await lockRows(scope, collection, mine.map((item) => item.rowId));
    const defaults = defaultsOf(collection.table, collection.resource.Row);
    for (const item of mine) {
      const current = present.get(item.rowId) ?? null;
      const clash = clashOf(collection, item, current);
      if (clash) clashes.push(clash);
      changed.push({ collection: collection.name, rowId: item.rowId, before: current, after: putBack(collection, item, current, defaults) });
    }
  }
  return { outcome: { items: changed, answer: changed.map(({ collection, rowId, after }) => ({ collection, id: rowId, row: after })) }, clashes };
}

/** The fields that a set changed in a row; all of them where it made the row, none where it deleted it. */
export const fieldsOfItem = (collection: Collection, { before, after }: ChangedRow): string[] =>
  before && after ? differingFields(collection, before, after) : Object.keys(after ?? {}).filter((field) => field !== 'version');

function clashOf(collection: Collection, item: ChangedRow, current: Row | null): Clash | null {
  const row = (item.after ?? item.before) as Row;
  const clash = (kind: Clash['kind'], fields: readonly string[] = []): Clash => ({ collection, rowId: item.rowId, row, kind, fields });
  if (!item.after) return current ? clash('exists') : null;
  if (!current) return clash('deleted');
  const touched = new Set(fieldsOfItem(collection, item));
  const fields = differingFields(collection, item.after, current).filter((field) => touched.has(field));
  return fields.length > 0 ? clash('changed', fields) : null;
}

/** Versions go on: whoever read the row before the undo must not take it for the one that he read. */
function putBack(collection: Collection, item: ChangedRow, current: Row | null, defaults: object): Row | null {
  const { before } = item;
  if (!before) return null;
  if (!item.after || !current) return { ...defaults, ...before, version: before.version + 1 };
  const fields = fieldsOfItem(collection, item);
  return { ...current, ...Object.fromEntries(fields.map((field) => [field, before[field]])), version: current.version + 1 };
}
