import { v7 as newId } from 'uuid';
import type { RowChange } from '#contract';
import { type Context, withOrg } from '../platform/context.ts';
import type { Collection, Row } from '../platform/editing/collection.ts';
import { findPage, findRow } from '../platform/editing/rows.ts';
import { NotFound } from '../platform/problems.ts';
import { applyChangeSet } from './change-sets/apply-change-set.ts';

export interface Page {
  readonly rows: readonly Row[];
  /** The `after` of the next page; null: this was the last one. */
  readonly next: string | null;
}

export async function listRows(context: Context, collection: Collection, projectId: string, after: string | undefined, limit: number): Promise<Page> {
  const rows = await withOrg(context, (tx) => findPage({ tx, orgId: context.orgId, projectId }, collection, after, limit + 1));
  const page = rows.slice(0, limit);
  return { rows: page, next: rows.length > limit ? (page.at(-1)?.id ?? null) : null };
}

/** @throws {NotFound} */
export async function readRow(context: Context, collection: Collection, projectId: string, id: string): Promise<Row> {
  const row = await withOrg(context, (tx) => findRow({ tx, orgId: context.orgId, projectId }, collection, id));
  if (!row) throw new NotFound(collection.noun);
  return row;
}

const verbs = { create: 'added', update: 'changed', delete: 'deleted' } as const;

/** Changes one row as a change set of its own. @returns the row, or null where it was deleted */
export async function changeRow(context: Context, collection: Collection, projectId: string, change: Omit<RowChange, 'collection'>): Promise<Row | null> {
  const label = change.op === 'create' ? '' : collection.labelOf(await readRow(context, collection, projectId, change.id));
  const made = change.op === 'create' ? collection.labelOf({ ...change.values, id: change.id, version: 1 }) : label;
  const summary = `${[capitalised(collection.noun), made].filter(Boolean).join(' ')} ${verbs[change.op]}`.slice(0, 300);
  const set = { id: newId(), summary, changes: [{ ...change, collection: collection.name }] };
  const notice = await applyChangeSet(context, projectId, set);
  return (notice.items.find((item) => item.id === change.id)?.row ?? null) as Row | null;
}

const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
