import { randomBytes } from 'node:crypto';
import type { TestProject } from 'vitest/node';
import { startCluster } from '../../apps/launcher/cluster.mjs';
import { type DatabaseSecrets, prepareDatabase } from '../../db/setup.ts';

/** What the set-up hands to the test files. */
export interface TestCluster {
  readonly adminUrl: string;
  readonly secrets: DatabaseSecrets;
  /** A migrated, empty database that each test file copies. */
  readonly template: string;
}

declare module 'vitest' {
  interface ProvidedContext {
    cluster: TestCluster;
  }
}

const newPassword = () => randomBytes(16).toString('hex');

/** Global set-up: one cluster for a run (TEST_ADMIN_URL names one that runs already) with a migrated template. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env['TEST_ADMIN_URL'];
  const cluster = given ? null : await startCluster({ durable: false });
  const adminUrl = given ?? cluster?.adminUrl ?? '';
  // The passwords of the roles belong to the whole server: runs that share one must agree on them.
  const password = given ? 'lanewright-test' : newPassword();
  const secrets = { ownerPassword: password, appPassword: password, authPassword: password };
  const template = `lanewright_template_${randomBytes(4).toString('hex')}`;
  await prepareDatabase({ adminUrl, secrets, databaseName: template });
  project.provide('cluster', { adminUrl, secrets, template });
  return async () => {
    await cluster?.stop();
  };
}
