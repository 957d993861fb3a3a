// Runs before anything is installed: Node's own modules only.
import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { fileURLToPath } from 'node:url'

export const projectDir = path.join(path.dirname(fileURLToPath(import.meta.url)), '../..')
const inProject = (...parts) => path.join(projectDir, ...parts)

const oldestNode = 20

function fail(message) {
  console.error(message)
  process.exit(1)
}

/** Runs a command with our output; stops everything when it fails. */
export function run(command, args, options = {}) {
  const result = spawnSync(command, args, { cwd: projectDir, stdio: 'inherit', ...options })
  if (result.status !== 0)
    fail(`'${command} ${args.join(' ')}' did not work. Its own words stand above.`)
}

function hashOf(files) {
  const hash = createHash('sha256')
  for (const file of files) hash.update(path.relative(projectDir, file)).update(readFileSync(file))
  return hash.digest('hex')
}

function filesUnder(dir) {
  return readdirSync(dir, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name))
    .sort()
}

function stampSays(file, value) {
  return existsSync(file) && readFileSync(file, 'utf8') === value
}

/** Whether what npm says it installed is what the lock asks for. */
function lockIsInstalled() {
  const installedFile = inProject('node_modules', '.package-lock.json')
  if (!existsSync(installedFile)) return false
  const wanted = JSON.parse(readFileSync(inProject('package-lock.json'), 'utf8')).packages
  const installed = JSON.parse(readFileSync(installedFile, 'utf8')).packages
  return Object.entries(wanted).every(
    ([place, { version, optional }]) =>
      place === '' || optional || installed[place]?.version === version,
  )
}

/** Installs the locked packages when they are missing, the lock has changed, or Node has. */
export function ensureInstalled() {
  if (Number(process.versions.node.split('.')[0]) < oldestNode) {
    fail(`Ridgehand needs Node ${oldestNode} or newer; this is ${process.versions.node}.`)
  }
  // The two databases are compiled against one Node's binary interface.
  const stamp = inProject('node_modules', '.built-for-abi')
  const abi = process.versions.modules
  const otherAbi = existsSync(stamp) && !stampSays(stamp, abi)
  if (otherAbi || !lockIsInstalled()) {
    console.log('Installing the locked packages. The first time takes a few minutes.')
    // Screens are built here, so the build's packages are wanted in production too.
    run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'])
  }
  writeFileSync(stamp, abi)
}

/** Builds the screens when what they are made of has changed. */
export function ensureBuilt() {
  const sources = [
    ...filesUnder(inProject('src')),
    ...filesUnder(inProject('shared')),
    ...filesUnder(inProject('public')),
    ...['index.html', 'vite.config.ts', 'package-lock.json'].map((name) => inProject(name)),
  ]
  const stamp = inProject('dist', '.built-from')
  const wanted = hashOf(sources)
  if (stampSays(stamp, wanted)) return
  console.log('Building the screens.')
  run(process.execPath, [inProject('node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'])
  mkdirSync(inProject('dist'), { recursive: true })
  writeFileSync(stamp, wanted)
}

const chromiumPath = '/usr/bin/chromium'

/** Debian's Chromium for the browser tests: installed when missing and we may. */
export function ensureChromium() {
  if (existsSync(chromiumPath)) return
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    fail('The browser tests need Chromium: run `apt-get install chromium` as root, then again.')
  }
  console.log('Installing Chromium for the browser tests.')
  run('apt-get', ['update', '-qq'])
  run(
    'apt-get',
    ['install', '-y', '-qq', '--no-install-recommends', 'chromium', 'fonts-liberation'],
    {
      env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
      stdio: ['ignore', 'ignore', 'inherit'],
    },
  )
}

/** A local package's command, run by this very Node. */
export function binPath(name) {
  return inProject('node_modules', '.bin', name)
}
