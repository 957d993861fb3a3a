import { describe, expect, test } from 'vitest'
import { defaultLabourRates } from '../../shared/labour/default-labour-rates.ts'
import { packagesInWords } from '../../shared/labour/package-words.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { packageKeys } from '../../shared/labour/work-step.ts'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import { framedOnce } from '../roof/support/framed.ts'
import { rectangle } from '../roof/support/plans.ts'
import { convexReferences, makeRoof, referenceRoof, regularOutline } from '../roof/support/roofs.ts'

const plan = rectangle(9000, 6000)
const hipRoof = framedOnce(makeRoof(plan, [25, 25, 25, 25]))
const gableRoof = framedOnce(makeRoof(plan, [25, 'gable', 25, 'gable']))
const turret = framedOnce(makeRoof(regularOutline(8, 4000), Array(8).fill(30) as number[]))

const stepsOf = (spec: FrameSpec) =>
  workPackagesOf(spec, defaultLabourRates).flatMap((p) => p.steps)
const marks = (spec: FrameSpec, work: 'cut' | 'stand') =>
  stepsOf(spec)
    .filter((s) => s.work === work)
    .flatMap((s) => s.memberMarks)
const roleOf = (spec: FrameSpec) => new Map(spec.members.map((m) => [m.mark, m.role]))

describe.each([
  ...convexReferences.map((r) => [r.title, framedOnce(referenceRoof(r))] as const),
  ['octagonal turret', turret] as const,
])('the packages of %s', (_name, spec) => {
  test('cut every member once and stand every member once', () => {
    const all = spec.members.map((m) => m.mark).sort()
    expect(marks(spec, 'cut').sort()).toEqual(all)
    expect(marks(spec, 'stand').sort()).toEqual(all)
  })

  test('stand nothing before it is cut', () => {
    const cut = new Set<string>()
    for (const step of stepsOf(spec)) {
      if (step.work === 'cut') step.memberMarks.forEach((mark) => cut.add(mark))
      if (step.work === 'stand')
        expect(step.memberMarks.filter((mark) => !cut.has(mark))).toEqual([])
    }
  })

  test('take each step from one line of the cut list', () => {
    for (const step of stepsOf(spec)) {
      const line = spec.cutLines.find((l) => l.mark === step.cutLineMark)
      if (step.work === 'set-out') expect(step.cutLineMark).toBeNull()
      else expect(line?.members).toEqual(expect.arrayContaining(step.memberMarks))
    }
  })

  test('come in the order crews work', () => {
    const keys = workPackagesOf(spec, defaultLabourRates).map((p) => p.key)
    expect(keys).toEqual(packageKeys.filter((key) => keys.includes(key)))
  })
})

describe('a 9.0 × 6.0 m hip roof', () => {
  test('starts with the plates, one pair of facing commons, and trying it', () => {
    const [plates, pair, tried] = stepsOf(hipRoof)
    expect(plates).toMatchObject({ packageKey: 'set-out-plates', work: 'set-out' })
    expect(pair).toMatchObject({ packageKey: 'first-pair', work: 'cut' })
    const members = pair!.memberMarks.map((mark) => hipRoof.members.find((m) => m.mark === mark)!)
    expect(members.map((m) => m.role)).toEqual(['common', 'common'])
    expect(members[0]!.planes).not.toEqual(members[1]!.planes)
    expect(members[0]!.axis.to.x).toBeCloseTo(members[1]!.axis.to.x, 3)
    expect(tried).toMatchObject({ packageKey: 'first-pair', work: 'set-out', memberMarks: [] })
  })

  test('stands its ridge on the two centring pairs, one at each end, before anything else', () => {
    const stands = stepsOf(hipRoof).filter((s) => s.work === 'stand')
    const ridge = hipRoof.members.find((m) => m.role === 'ridge')!
    const centring = stands[0]!.memberMarks.map((k) => hipRoof.members.find((m) => m.mark === k)!)
    expect(centring).toHaveLength(4)
    expect(centring.map((m) => Math.round(m.axis.to.x)).sort((a, b) => a - b)).toEqual([
      Math.round(Math.min(ridge.axis.from.x, ridge.axis.to.x)),
      Math.round(Math.min(ridge.axis.from.x, ridge.axis.to.x)),
      Math.round(Math.max(ridge.axis.from.x, ridge.axis.to.x)),
      Math.round(Math.max(ridge.axis.from.x, ridge.axis.to.x)),
    ])
    expect(stands[1]!.memberMarks).toEqual([ridge.mark])
  })

  test('stands crown ends, then hips, then the other commons, then creepers', () => {
    const role = roleOf(hipRoof)
    const order = stepsOf(hipRoof)
      .filter((s) => s.work === 'stand')
      .map((s) => role.get(s.memberMarks[0]!))
    expect([...new Set(order)]).toEqual(['common', 'ridge', 'crown-end', 'hip', 'creeper'])
    expect(order.lastIndexOf('common')).toBeGreaterThan(order.indexOf('hip'))
    expect(order.lastIndexOf('common')).toBeLessThan(order.indexOf('creeper'))
  })

  test('stands creepers in opposed pairs: left and right of one hip after one another', () => {
    const creepers = stepsOf(hipRoof).filter(
      (s) => s.work === 'stand' && s.packageKey === 'creepers',
    )
    for (const step of creepers) {
      const members = step.memberMarks.map((mark) => hipRoof.members.find((m) => m.mark === mark)!)
      for (let i = 0; i + 1 < members.length; i += 2) {
        const [a, b] = [members[i]!, members[i + 1]!]
        const hipOf = (m: typeof a) => m.cuts.find((c) => c.end === 'head')!.against
        expect(hipOf(a)).toBe(hipOf(b))
        expect(new Set([a.hand, b.hand])).toEqual(new Set(['left', 'right']))
      }
    }
  })
})

test('a gable roof stands its ridge on the pairs at its two gables', () => {
  const stands = stepsOf(gableRoof).filter((s) => s.work === 'stand')
  const xs = stands[0]!.memberMarks.map(
    (mark) => gableRoof.members.find((m) => m.mark === mark)!.axis.to.x,
  )
  expect(xs).toHaveLength(4)
  expect(xs.filter((x) => x < 100)).toHaveLength(2)
  expect(xs.filter((x) => x > 8900)).toHaveLength(2)
})

test('a day says what it holds in a few words', () => {
  expect(packagesInWords([])).toBe('')
  expect(packagesInWords(['hips'])).toBe('Hips')
  expect(packagesInWords(['creepers', 'hips', 'hips'])).toBe('Hips, creepers')
  expect(packagesInWords(['set-out-plates', 'ridge', 'first-pair', 'cut-commons'])).toBe(
    'Set out plates to ridge',
  )
})
