import { defineConfig } from 'vitest/config';

// Rooms are tested from their source; only what starts threads or processes runs the built `dist`.
const conditions = ['spinassay-source'];
const resolve = { conditions };
const ssr = { resolve: { conditions } };

export default defineConfig({
  resolve,
  ssr,
  test: {
    maxWorkers: 2,
    // One PostgreSQL for the run, started when the first test asks for a database.
    globalSetup: ['./packages/store/test-support/one-postgres.ts'],
    reporters: ['default', './tests/closing-line-reporter.ts'],
    projects: [
      {
        resolve,
        ssr,
        test: {
          name: 'fast',
          include: [
            'packages/*/src/**/*.test.ts',
            'services/*/src/**/*.test.ts',
            'deploy/postgres/**/*.test.ts',
            'tests/architecture/**/*.test.ts',
          ],
          exclude: ['**/*.system.test.ts'],
          testTimeout: 30_000,
          // The first that asks for a database waits for the server to be made.
          hookTimeout: 60_000,
        },
      },
      {
        resolve,
        ssr,
        test: {
          name: 'system',
          include: [
            'tests/contract/**/*.test.ts',
            'tests/end-to-end/**/*.test.ts',
            'tests/accuracy/**/*.test.ts',
            '{packages,services}/*/src/**/*.system.test.ts',
          ],
          testTimeout: 300_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
