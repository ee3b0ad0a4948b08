import { defineConfig } from 'vitest/config';

/** Component specs (src/) are run by `ng test`; these are all others. */
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: [
            'shared/**/*.spec.ts',
            'server/**/*.spec.ts',
            'seeds/**/*.spec.ts',
            'search-fixtures/**/*.spec.ts',
            'test/reference/**/*.spec.ts',
            'test/lint/**/*.spec.ts',
          ],
          testTimeout: 30_000,
        },
      },
      {
        test: {
          name: 'api',
          include: ['test/api/**/*.spec.ts'],
          globalSetup: ['test/api/support/global-setup.ts'],
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
      {
        test: {
          name: 'faults',
          include: ['test/faults/**/*.spec.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          // Each file has a database and a server of its own, which it kills.
          maxWorkers: 1,
        },
      },
      {
        test: {
          name: 'browser',
          include: ['test/browser/**/*.spec.ts'],
          globalSetup: ['test/browser/support/global-setup.ts'],
          testTimeout: 120_000,
          hookTimeout: 180_000,
          // Pages are driven on one running app with two cores: more at once only makes each slower.
          maxWorkers: 1,
        },
      },
    ],
  },
});
