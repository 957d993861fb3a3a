import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { pathToFileURL } from 'node:url'
import { build } from 'vite'
import type * as engineEntry from './engine-entry.ts'

export type Engine = typeof engineEntry

/**
 * The engine built as the screens are, as a browser runs it while a person types. Run from its source it
 * is slower: the loader gives every inner function its name each time it is made.
 */
export async function builtEngine(): Promise<Engine> {
  const answer = await build({
    configFile: false,
    logLevel: 'warn',
    build: {
      write: false,
      lib: { entry: path.join(import.meta.dirname, 'engine-entry.ts'), formats: ['es'] },
    },
  })
  const [bundle] = [answer].flat()
  if (!bundle || !('output' in bundle)) throw new Error('Nothing was built.')
  const dir = mkdtempSync(path.join(tmpdir(), 'ridgehand-bench-'))
  try {
    const file = path.join(dir, 'engine.mjs')
    writeFileSync(file, bundle.output[0].code)
    return (await import(pathToFileURL(file).href)) as Engine
  } finally {
    rmSync(dir, { recursive: true, force: true })
  }
}
