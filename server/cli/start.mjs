import { spawn } from 'node:child_process'
import { ensureBuilt, ensureInstalled, projectDir } from './prepare.mjs'

ensureInstalled()
ensureBuilt()
const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
  cwd: projectDir,
  stdio: 'inherit',
})
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal))
server.on('exit', (code) => process.exit(code ?? 1))
