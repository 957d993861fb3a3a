import path from 'node:path'
import { defineConfig } from 'vitest/config'

export default defineConfig({
  test: {
    root: path.join(import.meta.dirname, '../..'),
    include: ['tests/e2e/**/*.test.ts'],
    environment: 'node',
    testTimeout: 90_000,
    hookTimeout: 60_000,
    // One browser at a time on a small machine.
    fileParallelism: false,
  },
})
