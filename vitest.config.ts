import { defineConfig } from 'vitest/config';

// Set before any worker starts, so that dates read the same on every machine.
process.env['TZ'] = 'UTC';

export default defineConfig({
  test: {
    // One process per worker: the native database module is never shared between threads, and a crash stays in its file.
    pool: 'forks',
    maxWorkers: 2,
    testTimeout: 30_000,
    hookTimeout: 60_000,
    env: { TZ: 'UTC' },
    reporters: ['default', './scripts/closing-line-reporter.mjs'],
    coverage: { provider: 'v8', include: ['src/**/*.ts'], exclude: ['src/browser/**'], reporter: ['text-summary'] },
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          globalSetup: ['test/support/temporary-setup.ts'],
          // As below; what must not be shared (working folders, environment) no test changes.
          isolate: false,
          include: ['test/**/*.test.ts'],
          exclude: ['test/browser/**', 'test/engineering/**', 'test/reference/**', 'test/fixtures/**'],
        },
      },
      {
        extends: true,
        // Pure functions: nothing is left behind that a next file could see, and loading the methods anew for each costs minutes.
        test: {
          name: 'engineering',
          include: ['test/engineering/**/*.test.ts', 'test/reference/**/*.test.ts'],
          isolate: false,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          isolate: false,
          include: ['test/browser/**/*.test.ts'],
          globalSetup: ['test/support/chromium-setup.ts', 'test/support/temporary-setup.ts'],
        },
      },
    ],
  },
});
