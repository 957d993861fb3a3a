import { spawnSync } from 'node:child_process'
import { ensureBuilt, ensureChromium, ensureInstalled, projectDir } from './prepare.mjs'

ensureInstalled()
ensureChromium()
ensureBuilt()
const result = spawnSync(
  process.execPath,
  ['--import', 'tsx', 'tests/e2e/screens.ts', ...process.argv.slice(2)],
  {
    cwd: projectDir,
    stdio: 'inherit',
  },
)
process.exit(result.status ?? 1)
