import type { Role } from '#contract';
import type { Database, Tx } from './database.ts';

/** Who asks, for which organisation. */
export interface Context {
  readonly orgId: string;
  readonly personId: string;
  readonly sessionId: string;
  readonly roles: readonly Role[];
  readonly database: Database;
}

/** The one door to an organisation's rows: a transaction in which no other organisation exists. */
export const withOrg = <T>(context: Context, work: (tx: Tx) => Promise<T>): Promise<T> =>
  context.database.inOrganisation(context.orgId, work);
