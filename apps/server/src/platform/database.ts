import * as schema from '#schema';
import { sql } from 'drizzle-orm';
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';

type Handle = PostgresJsDatabase<typeof schema>;
/** A database handle inside a transaction that is confined to one organisation. */
export type Tx = Parameters<Parameters<Handle['transaction']>[0]>[0];

const quiet = { onnotice: () => undefined, connection: { application_name: 'lanewright' } };

/** The connections of one server instance. Feature code reaches rows only through `withOrg` of the context. */
export class Database {
  /** For sign-in only: sees people and sessions of every organisation, and nothing else. */
  readonly auth: Handle;
  private readonly app: Handle;
  private readonly pools: readonly postgres.Sql[];

  constructor(urls: { readonly appUrl: string; readonly authUrl: string }) {
    // prepare: false lets both stand behind a transaction pooler.
    const app = postgres(urls.appUrl, { ...quiet, max: 10, prepare: false });
    const auth = postgres(urls.authUrl, { ...quiet, max: 4, prepare: false });
    this.pools = [app, auth];
    this.app = drizzle(app, { schema });
    this.auth = drizzle(auth, { schema });
  }

  /** Opens a transaction in which only this organisation's rows exist. */
  inOrganisation<T>(orgId: string, work: (tx: Tx) => Promise<T>): Promise<T> {
    return this.app.transaction(async (tx) => {
      await tx.execute(sql`select set_config('lanewright.org_id', ${orgId}, true)`);
      return work(tx);
    });
  }

  /** @throws when PostgreSQL does not answer */
  async ready(): Promise<void> {
    await this.app.execute(sql`select 1`);
  }

  async close(): Promise<void> {
    await Promise.all(this.pools.map((pool) => pool.end({ timeout: 5 })));
  }
}

/** A PostgreSQL array of row identifiers as one parameter. */
export const uuidArray = (ids: readonly string[]) => sql`${`{${ids.join(',')}}`}::uuid[]`;
