import { isDeepStrictEqual } from 'node:util';
import { getTableColumns } from 'drizzle-orm';
import type { Collection, Row } from '../../../platform/editing/collection.ts';

/** The fields of the contract in which two states of a row differ. The version is none of them. */
export function differingFields(collection: Collection, a: Row, b: Row): string[] {
  const columns = getTableColumns(collection.table) as Record<string, { columnType: string }>;
  return Object.keys(collection.resource.Row.properties).filter((field) => {
    // A field that the row did not have yet when it was kept says nothing about it.
    if (field === 'id' || field === 'version' || !(field in a) || !(field in b)) return false;
    return !sameValue(a[field], b[field], columns[field]?.columnType === 'PgUUID');
  });
}

/** PostgreSQL gives identifiers in lower case, whatever was sent. */
const sameValue = (a: unknown, b: unknown, identifier: boolean): boolean =>
  identifier && typeof a === 'string' && typeof b === 'string' ? a.toLowerCase() === b.toLowerCase() : isDeepStrictEqual(a, b);
