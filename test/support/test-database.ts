import { randomBytes } from 'node:crypto';
import postgres from 'postgres';
import { inject } from 'vitest';
import { type DatabaseUrls, urlsOf } from '../../db/setup.ts';

export interface TestDatabase extends DatabaseUrls {
  /** As the owner; row-level security holds for it too, see `asOrganisation`. */
  readonly owner: postgres.Sql;
  drop(): Promise<void>;
}

/** A migrated, empty database of its own. */
export async function testDatabase(): Promise<TestDatabase> {
  const { adminUrl, secrets, template } = inject('cluster');
  const name = `lanewright_test_${randomBytes(6).toString('hex')}`;
  const admin = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  await admin`create database ${admin(name)} template ${admin(template)}`;
  const urls = urlsOf(adminUrl, name, secrets);
  const owner = postgres(urls.ownerUrl, { max: 2, onnotice: () => undefined });
  return {
    ...urls,
    owner,
    drop: async () => {
      await owner.end();
      await admin`drop database ${admin(name)} with (force)`;
      await admin.end();
    },
  };
}

/** Runs statements with the organisation named, as the server does. */
export const asOrganisation = <T>(sql: postgres.Sql, orgId: string, work: (tx: postgres.TransactionSql) => Promise<T>): Promise<T> =>
  sql.begin(async (tx) => {
    await tx`select set_config('lanewright.org_id', ${orgId}, true)`;
    return work(tx);
  }) as Promise<T>;
