import { defineConfig } from 'vitest/config';

/** Tests against PostgreSQL: one cluster for all of a run, made by the global set-up. */
const withDatabase = {
  environment: 'node' as const,
  globalSetup: ['test/support/database-cluster.ts'],
  testTimeout: 30_000,
  hookTimeout: 60_000,
};

export default defineConfig({
  test: {
    projects: [
      { extends: true, test: { name: 'libs', include: ['libs/**/*.spec.ts'], environment: 'node' } },
      {
        extends: true,
        test: { name: 'server', include: ['apps/server/**/*.spec.ts', 'db/**/*.spec.ts'], ...withDatabase },
      },
      {
        extends: true,
        test: { name: 'reference', include: ['test/reference/**/*.spec.ts'], environment: 'node', testTimeout: 30_000 },
      },
      { extends: true, test: { name: 'integration', include: ['test/integration/**/*.spec.ts'], ...withDatabase } },
    ],
  },
});
