import { defineConfig } from 'vitest/config'

/**
 * Files that share what a worker has loaded: pure functions, and servers each on a database of its own.
 * Loading engine and server anew for every file took as long as the tests.
 */
const together = [
  'tests/{roof,drawing,marking,labour,outline,units,day-plan}/**/*.test.ts',
  'tests/{api,mail}/**/*.test.ts',
]
/** Files that start or kill threads and processes of their own. */
const apart = ['tests/api/framing.test.ts', 'tests/mail/killed-process.test.ts']
const never = ['tests/e2e/**', 'node_modules/**']

export default defineConfig({
  test: {
    environment: 'node',
    setupFiles: ['tests/support/fixed-seeds.ts'],
    testTimeout: 30_000,
    hookTimeout: 30_000,
    // all cores: left to itself the runner keeps one free
    maxWorkers: '100%',
    projects: [
      {
        extends: true,
        test: {
          name: 'together',
          include: together,
          exclude: [...never, ...apart],
          isolate: false,
        },
      },
      { extends: true, test: { name: 'apart', include: apart } },
      {
        extends: true,
        test: {
          name: 'rest',
          include: ['tests/**/*.test.{ts,tsx}'],
          exclude: [...never, ...together],
        },
      },
    ],
  },
})
