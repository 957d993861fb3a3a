import { readdirSync } from 'node:fs'
import path from 'node:path'
import { cruise, type ICruiseResult, type IForbiddenRuleType } from 'dependency-cruiser'
import { expect, test } from 'vitest'

const projectDir = path.join(import.meta.dirname, '../..')

function foldersOf(dir: string): string[] {
  return readdirSync(path.join(projectDir, dir), { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name)
}

function forbid(name: string, from: string, to: string, toNot?: string): IForbiddenRuleType {
  return {
    name,
    severity: 'error',
    from: { path: from },
    to: { path: to, ...(toNot ? { pathNot: toNot } : {}) },
  }
}

/** Made from the folder list, so that a new feature starts guarded. */
function zones(): IForbiddenRuleType[] {
  return [
    forbid('shared knows neither screens nor server', '^shared/', '^(src|server|fakes|tests)/'),
    forbid('the roof engine imports nothing outside itself', '^shared/roof/', '.', '^shared/roof/'),
    forbid('screens know no server', '^src/', '^(server|fakes|tests)/'),
    forbid('the server knows no screens', '^server/', '^(src|tests)/'),
    forbid(
      'primitives and drawings know no features',
      '^src/(ui|drawings|lib)/',
      '^src/(features|app)/',
    ),
    ...foldersOf('src/features').map((feature) =>
      forbid(
        `feature ${feature} stays out of the others’ insides`,
        `^src/features/${feature}/`,
        '^src/features/',
        `^src/features/${feature}/`,
      ),
    ),
    ...foldersOf('server').map((feature): IForbiddenRuleType => ({
      name: `nobody but the wiring imports the routes of ${feature}`,
      severity: 'error',
      from: { pathNot: `^server/(app\\.ts$|${feature}/)` },
      to: { path: `^server/${feature}/.*-routes\\.ts$` },
    })),
    {
      name: 'no import runs in a circle',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
  ]
}

test('imports keep to the house: shared below, features apart, no circles', async () => {
  const { output } = await cruise(
    ['src', 'server', 'shared', 'fakes'],
    {
      ruleSet: { forbidden: zones() },
      validate: true,
      baseDir: projectDir,
      doNotFollow: { path: 'node_modules' },
      tsPreCompilationDeps: true,
      exclude: { path: 'node_modules|\\.(css|woff2?)$' },
    },
    { extensions: ['.ts', '.tsx', '.mjs', '.js'] },
  )
  const { summary } = output as ICruiseResult
  expect(summary.violations.map((v) => `${v.rule.name}: ${v.from} → ${v.to}`)).toEqual([])
  expect(summary.totalCruised).toBeGreaterThan(100)
})
