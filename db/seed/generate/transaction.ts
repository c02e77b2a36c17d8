import type { PostgresJsDatabase } from 'drizzle-orm/postgres-js';

/** A transaction as the owner role; the organisation must be set in it, since row-level security is forced. */
export type Tx = Parameters<Parameters<PostgresJsDatabase['transaction']>[0]>[0];
