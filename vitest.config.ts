import { defineConfig } from 'vitest/config'

const never = ['**/node_modules/**', 'dist/**', 'site/**']

export default defineConfig({
  test: {
    pool: 'threads',
    maxWorkers: 2,
    restoreMocks: true,
    projects: [
      {
        extends: true,
        test: {
          name: 'rooms',
          include: ['test/**/*.test.ts'],
          exclude: [...never, 'test/whole/**', 'test/browser/**'],
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'whole',
          include: ['test/whole/**/*.test.ts'],
          exclude: never,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['test/browser/**/*.test.ts'],
          exclude: never,
          // One browser at a time: two would compete for the two cores that the tests are timed on.
          fileParallelism: false,
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
