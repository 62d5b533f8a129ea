import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    passWithNoTests: false,
    // Two cores are shared with PostgreSQL and, in the browser tests, with Chromium.
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'inversion',
          include: ['tests/{inversion,published}/**/*.test.ts', 'tests/*.test.ts'],
          // fits and integrations are honest work, and the machine may be busy
          testTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: { name: 'src', include: ['tests/src/**/*.test.{ts,tsx}'], testTimeout: 30_000 },
      },
      {
        extends: true,
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: ['tests/setup/database-cluster.ts'],
          hookTimeout: 60_000,
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'examples',
          include: ['tests/examples/**/*.test.ts'],
          globalSetup: ['tests/setup/database-cluster.ts'],
          hookTimeout: 60_000,
          testTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          globalSetup: ['tests/setup/database-cluster.ts', 'tests/setup/built-app.ts'],
          fileParallelism: false,
          hookTimeout: 60_000,
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'scripts',
          include: ['tests/scripts/**/*.test.ts'],
          fileParallelism: false,
          hookTimeout: 120_000,
          testTimeout: 120_000,
        },
      },
    ],
  },
});
