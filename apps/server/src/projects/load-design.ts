import type { Design, Versioned } from '#calc';
import { type DesignDocument, designOf } from '#contract';
import { type Context, withOrg } from '../platform/context.ts';
import type { Tx } from '../platform/database.ts';
import { NotFound } from '../platform/problems.ts';
import { findDesign } from './design-queries.ts';

/** The design as the calculation takes it, for services that compute. @throws {NotFound} */
export const loadDesign = (context: Context, projectId: string): Promise<Design> => withOrg(context, (tx) => loadDesignIn(tx, projectId));

/** The same inside a transaction of `withOrg`. @throws {NotFound} */
export async function loadDesignIn(tx: Tx, projectId: string): Promise<Design> {
  const found = await findDesign(tx, projectId);
  if (!found) throw new NotFound('project');
  return designOf(JSON.parse(found.text) as DesignDocument);
}

/** The version of a design's row: the rows of a loaded design carry it, though the calculation does not need it. */
export const versionOf = (row: object): number => (row as Versioned<object>).version;
