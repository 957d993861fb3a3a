import { spawn } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { binPath, ensureBuilt, ensureChromium, ensureInstalled, projectDir } from './prepare.mjs'

const proof = process.argv.includes('--proof')
const resultsDir = path.join(projectDir, 'node_modules', '.cache', 'ridgehand')

function step(name, command, args, env = {}) {
  return new Promise((resolve) => {
    const started = Date.now()
    const child = spawn(command, args, {
      cwd: projectDir,
      stdio: 'inherit',
      env: { ...process.env, ...env },
    })
    child.on('exit', (code) => {
      const seconds = ((Date.now() - started) / 1000).toFixed(0)
      console.log(`${code === 0 ? 'ok' : 'FAILED'}  ${name} (${seconds} s)`)
      resolve(code === 0)
    })
  })
}

/** Runs one set of tests and counts what it says of itself. */
async function vitestStep(name, config, env = {}) {
  const file = path.join(resultsDir, `${name}.json`)
  rmSync(file, { force: true })
  const reporters = ['--reporter=dot', '--reporter=json', `--outputFile.json=${file}`]
  const ok = await step(name, binPath('vitest'), ['run', '--config', config, ...reporters], env)
  if (!existsSync(file)) return { ok: false, passed: 0, failed: 1 }
  const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(file, 'utf8'))
  // A file that does not even load has no failed test of its own.
  return { ok, passed: numPassedTests, failed: ok ? numFailedTests : Math.max(1, numFailedTests) }
}

async function checkStep(name, command, args) {
  const ok = await step(name, command, args)
  return { ok, passed: ok ? 1 : 0, failed: ok ? 0 : 1 }
}

ensureInstalled()
ensureChromium()
ensureBuilt()
mkdirSync(resultsDir, { recursive: true })

const results = await Promise.all([
  checkStep('types', binPath('tsc'), ['--noEmit', '-p', '.']),
  checkStep('lint', binPath('eslint'), ['.', '--max-warnings', '0']),
  checkStep('format', binPath('prettier'), ['--check', '--log-level', 'warn', '.']),
])
const length = proof ? { PROOF: '1' } : {}
results.push(await vitestStep('unit-and-api', 'vitest.config.ts', length))
results.push(await vitestStep('browser', 'tests/e2e/vitest.config.ts', length))

const passed = results.reduce((sum, result) => sum + result.passed, 0)
const failed = results.reduce((sum, result) => sum + result.failed, 0)
const line = `${passed} passed, ${failed} failed`
writeFileSync(path.join(resultsDir, 'summary.txt'), `${line}\n`)
console.log(line)
process.exit(failed === 0 && results.every((result) => result.ok) ? 0 : 1)
