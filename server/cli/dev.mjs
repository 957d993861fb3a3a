import { spawn } from 'node:child_process'
import { ensureInstalled, projectDir } from './prepare.mjs'

ensureInstalled()
// The screens reload by themselves; the server starts again when its own files change.
const server = spawn(
  process.execPath,
  ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/main.ts', '--hot'],
  { cwd: projectDir, stdio: 'inherit' },
)
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal))
server.on('exit', (code) => process.exit(code ?? 1))
