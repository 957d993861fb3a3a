import { defineConfig } from 'vitest/config'

/** Tests of pure functions: nothing they load keeps a state, so a worker loads the engine once for all of them. */
const pure = ['tests/{roof,drawing,marking,labour,outline,units}/**/*.test.ts']

export default defineConfig({
  test: {
    environment: 'node',
    testTimeout: 30_000,
    hookTimeout: 30_000,
    // all cores: left to itself the runner keeps one for watching
    maxWorkers: '100%',
    projects: [
      { extends: true, test: { name: 'pure', include: pure, isolate: false } },
      {
        extends: true,
        test: {
          name: 'whole',
          include: ['tests/**/*.test.{ts,tsx}'],
          exclude: ['tests/e2e/**', 'node_modules/**', ...pure],
        },
      },
    ],
  },
})
