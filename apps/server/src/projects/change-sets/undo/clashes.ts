import type { Scope } from '../../../platform/editing/collection.ts';
import { collectionNamed } from '../../collections.ts';
import type { ChangedRow } from '../outcome.ts';
import type { Chain } from './chain.ts';
import { differingFields } from './field-changes.ts';
import { type Clash, fieldsOfItem } from './inverse.ts';
import { findStandingChanges } from './later-changes.ts';

/**
 * Rows that a later, still standing edit touched where the set did. Their values may be those that the set left: then
 * the later edit put them there on purpose.
 */
export async function standingClashes(scope: Scope, { tip }: Chain, items: readonly ChangedRow[]): Promise<Clash[]> {
  const own = new Map(items.map((item) => [item.rowId, item]));
  return (await findStandingChanges(scope, tip)).flatMap((later) => {
    const item = own.get(later.rowId);
    const clash = item && clashWith(item, later);
    return clash ? [clash] : [];
  });
}

function clashWith(item: ChangedRow, later: ChangedRow): Clash | null {
  const collection = collectionNamed(item.collection);
  const row = item.after ?? item.before;
  if (!row) return null;
  const clash = { collection, rowId: item.rowId, row };
  if (!later.after) return { ...clash, kind: 'deleted', fields: [] };
  if (!later.before || !item.after) return { ...clash, kind: 'exists', fields: [] };
  const touched = new Set(fieldsOfItem(collection, item));
  const fields = differingFields(collection, later.before, later.after).filter((field) => touched.has(field));
  return fields.length > 0 ? { ...clash, kind: 'changed', fields } : null;
}

/** One clash a row. */
export function byRow(clashes: readonly Clash[]): Clash[] {
  const rows = new Map<string, Clash>();
  for (const clash of clashes) {
    const known = rows.get(clash.rowId);
    rows.set(clash.rowId, known?.kind === 'changed' ? { ...known, fields: [...new Set([...known.fields, ...clash.fields])] } : (known ?? clash));
  }
  return [...rows.values()];
}
