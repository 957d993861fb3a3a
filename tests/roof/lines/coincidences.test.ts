import { describe, expect, test } from 'vitest'

import { plateLines } from '../../../shared/roof/plate-lines.ts'
import { roofLines } from '../../../shared/roof/roof-lines.ts'
import type { LineKind } from '../../../shared/roof/roof-types.ts'
import { lPlan, type Plan, rectangle, tPlan } from '../support/plans.ts'
import { makeRoof, regularOutline } from '../support/roofs.ts'
import { sampleOf } from '../support/sample.ts'
import { faultsOf, facePoints } from './line-rules.ts'
import { numbersFrom, planAreaMm2 } from './random-outlines.ts'

/**
 * Plans whose slopes meet many at a point. The number of nodes over the plate, of slopes, and of lines of
 * each kind is counted by hand from the plan. Source: geometry by hand, no outside figure.
 */
type Wanted = { nodes: number; slopes: number } & Partial<Record<LineKind, number>>

const regular = (sides: number): [string, Plan, Wanted] => [
  `a regular plan of ${sides} sides`,
  regularOutline(sides, 3000 + 400 * sides),
  { nodes: 1, slopes: sides, hip: sides },
]

const plans: [string, Plan, Wanted][] = [
  ['a square', rectangle(6000, 6000), { nodes: 1, slopes: 4, hip: 4 }],
  ...[3, 5, 6, 8, 12].map(regular),
  ['an L of two equal wings', lPlan, { nodes: 3, slopes: 6, ridge: 2, hip: 5, valley: 1 }],
  [
    'a T with a wing as wide as the main roof',
    [
      [0, 0],
      [12000, 0],
      [12000, 6000],
      [9000, 6000],
      [9000, 11000],
      [3000, 11000],
      [3000, 6000],
      [0, 6000],
    ],
    { nodes: 4, slopes: 8, ridge: 3, hip: 6, valley: 2 },
  ],
  ['a T with a narrow wing', tPlan, { nodes: 4, slopes: 7, ridge: 2, hip: 6, valley: 2 }],
  [
    'a cross of four equal wings',
    [
      [4000, 0],
      [10000, 0],
      [10000, 4000],
      [14000, 4000],
      [14000, 10000],
      [10000, 10000],
      [10000, 14000],
      [4000, 14000],
      [4000, 10000],
      [0, 10000],
      [0, 4000],
      [4000, 4000],
    ],
    { nodes: 5, slopes: 12, ridge: 4, hip: 8, valley: 4 },
  ],
  [
    'a cross with two narrow wings',
    [
      [4000, 0],
      [8000, 0],
      [8000, 4000],
      [12000, 4000],
      [12000, 10000],
      [8000, 10000],
      [8000, 14000],
      [4000, 14000],
      [4000, 10000],
      [0, 10000],
      [0, 4000],
      [4000, 4000],
    ],
    { nodes: 6, slopes: 10, ridge: 3, hip: 8, valley: 4 },
  ],
  [
    'a U of three equal wings',
    [
      [0, 0],
      [14000, 0],
      [14000, 9000],
      [9000, 9000],
      [9000, 5000],
      [5000, 5000],
      [5000, 9000],
      [0, 9000],
    ],
    { nodes: 4, slopes: 8, ridge: 3, hip: 6, valley: 2 },
  ],
]

/** The T with the plate on the right of its wing so far out of line with the one on the left. */
const tWithStep = (byMm: number): Plan =>
  tPlan.map(([x, y]) => (y === 6000 && x >= 8000 ? [x, y + byMm] : [x, y]))

const solve = (plan: Plan, pitchDeg = 25) => {
  const roof = makeRoof(
    plan,
    plan.map(() => pitchDeg),
  )
  const plates = plateLines(roof)
  expect(plates.wave.refusal).toBeNull()
  return { roof, plates, lines: roofLines(plates) }
}

const counted = (plan: Plan): Wanted => {
  const { plates, lines } = solve(plan)
  const kinds: Partial<Record<LineKind, number>> = {}
  for (const { kind } of lines.lines) {
    if (kind !== 'eave') kinds[kind] = (kinds[kind] ?? 0) + 1
  }
  const nodes = lines.nodes.filter((node) => node.corner === null).length
  return { nodes, slopes: plates.slopes.length, ...kinds }
}

const turned = (plan: Plan, angle: number): Plan =>
  plan.map(([x, y]) => [
    x * Math.cos(angle) - y * Math.sin(angle),
    x * Math.sin(angle) + y * Math.cos(angle),
  ])

const outOfSquare = (plan: Plan, byMm: number, seed: number): Plan => {
  const next = numbersFrom(seed)
  return plan.map(([x, y]) => [x + (2 * next() - 1) * byMm, y + (2 * next() - 1) * byMm])
}

describe('slopes that meet many at a point meet in one node:', () => {
  test.each(plans)('%s, whatever way it is turned', (_name, plan, wanted) => {
    for (const angle of [0, 0.3, 1, Math.PI / 2, 2.7, 4.4]) {
      expect(counted(turned(plan, angle)), `turned by ${angle}`).toEqual(wanted)
    }
  })

  test.each(plans)('%s set out to a hundredth of a millimetre', (_name, plan, wanted) => {
    for (const byMm of [1e-9, 1e-6, 1e-4, 0.001, 0.01]) {
      for (let seed = 0; seed < sampleOf(3, 12); seed += 1) {
        expect(counted(outOfSquare(plan, byMm, seed)), `${byMm} mm, ${seed}`).toEqual(wanted)
      }
    }
  })
})

describe('plates out of square give a roof without slivers:', () => {
  test.each(plans)('%s, 0.1, 0.3 and 1 mm out', (_name, plan) => {
    for (const byMm of [0.1, 0.3, 1]) {
      for (let seed = 0; seed < sampleOf(5, 20); seed += 1) {
        const out = turned(outOfSquare(plan, byMm, seed), seed % 2 === 0 ? 0 : seed)
        const { roof, plates, lines } = solve(out)
        const where = `${byMm} mm, ${seed}`
        expect(faultsOf(roof, plates, lines), where).toEqual([])
        for (const line of lines.lines) {
          const [a, b] = [lines.nodes[line.from]!.point, lines.nodes[line.to]!.point]
          expect(Math.hypot(a.x - b.x, a.y - b.y), where).toBeGreaterThanOrEqual(0.5)
        }
        for (const face of lines.faces) {
          // no face is less than a tenth of what the plan's smallest eave carries
          expect(planAreaMm2(facePoints(lines, face.slope)), where).toBeGreaterThan(100_000)
        }
      }
    }
  })

  test('a wing between two plates 1 mm out of one line leaves one slope over both', () => {
    const { plates } = solve(tWithStep(1))
    expect(plates.slopes.map((slope) => slope.edges)).toContainEqual([2, 6])
  })

  test('a plan turned and read off in whole millimetres has the slopes of the plan', () => {
    for (const name of ['a T with a narrow wing', 'a cross with two narrow wings']) {
      const [, plan, wanted] = plans.find((one) => one[0] === name)!
      for (let n = 1; n < 40; n += sampleOf(3, 1)) {
        const read = turned(plan, n * 0.155).map(([x, y]): [number, number] => [
          Math.round(x),
          Math.round(y),
        ])
        expect(counted(read), `${name}, ${n}`).toMatchObject({
          nodes: wanted.nodes,
          slopes: wanted.slopes,
        })
      }
    }
  })

  test('a corner 0.9 mm out of a straight plate is no corner of the roof', () => {
    const { plates, lines } = solve([
      [0, 0],
      [4000, -0.9],
      [9000, 0],
      [9000, 6000],
      [0, 6000],
    ])
    expect(plates.slopes.map((slope) => slope.edges)).toEqual([[0, 1], [2], [3], [4]])
    expect(lines.lines.filter((line) => line.kind === 'hip')).toHaveLength(4)
  })

  test('two plates 20 mm out of one line stay two slopes', () => {
    const { roof, plates, lines } = solve(tWithStep(20))
    expect(plates.slopes).toHaveLength(8)
    expect(faultsOf(roof, plates, lines)).toEqual([])
  })
})

describe('the kinds of a level line', () => {
  // as roofs are set out now: level within half a millimetre, and within 2 mm in a metre
  test.each([
    [9000, 0.2, 'ridge'],
    [9000, 20, 'broken-hip'],
  ] as const)(
    'a ridge %d mm long that climbs for plates %d mm askew is a %s',
    (long, byMm, kind) => {
      const { lines } = solve([
        [0, 0],
        [long, 0],
        [long, 6000 + byMm * 2],
        [0, 6000],
      ])
      const inner = lines.lines.filter((line) =>
        [line.from, line.to].every((n) => lines.nodes[n]!.corner === null),
      )
      expect(inner.map((line) => line.kind)).toEqual([kind])
    },
  )
})
