import type { Row, Scope } from '../../platform/editing/collection.ts';
import { deleteRows, insertRows, updateRows } from '../../platform/editing/rows.ts';
import { collections } from '../collections.ts';
import type { Outcome } from './outcome.ts';

/** Deletions, children first; then changes; then creations, parents first. One statement a collection and kind. */
export async function write(scope: Scope, { items }: Outcome): Promise<void> {
  const kinds = collections.map((collection) => {
    const mine = items.filter((item) => item.collection === collection.name);
    return {
      collection,
      deleted: mine.filter((item) => !item.after).map((item) => item.rowId),
      changed: mine.filter((item) => item.before && item.after).map((item) => item.after as Row),
      created: mine.filter((item) => !item.before && item.after).map((item) => item.after as Row),
    };
  });
  for (const { collection, deleted } of [...kinds].reverse()) await deleteRows(scope, collection, deleted);
  for (const { collection, changed } of kinds) await updateRows(scope, collection, changed);
  for (const { collection, created } of kinds) await insertRows(scope, collection, created);
}
