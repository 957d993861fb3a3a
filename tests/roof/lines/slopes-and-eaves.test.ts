import { describe, expect, test } from 'vitest'

import { planAreaWithEavesMm2, roofSurface } from '../../../shared/roof/eaves.ts'
import { outlineProblems } from '../../../shared/roof/outline-problems.ts'
import { plateLines } from '../../../shared/roof/plate-lines.ts'
import { roofLines } from '../../../shared/roof/roof-lines.ts'
import { edgeUnder, slopePoint } from '../../../shared/roof/slopes.ts'
import { squareLineSpans } from '../../../shared/roof/square-spans.ts'
import type { Point2, Roof } from '../../../shared/roof/roof-types.ts'
import { lPlan, rectangle, tPlan } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { sampleOf } from '../support/sample.ts'
import { facePoints, placeIn } from './line-rules.ts'
import { numbersFrom, planAreaMm2, planKinds, randomPlan } from './random-outlines.ts'

const tan = (deg: number): number => Math.tan((deg * Math.PI) / 180)

const solve = (roof: Roof) => {
  const plates = plateLines(roof)
  expect(plates.wave.refusal).toBeNull()
  return { plates, lines: roofLines(plates) }
}

const eavesPlanMm2 = (roof: Roof): number[] => {
  const { plates, lines } = solve(roof)
  return plates.slopes.map((slope) => planAreaWithEavesMm2(plates, lines, slope))
}

const sum = (values: number[]): number => values.reduce((a, b) => a + b, 0)

const withOverhangs = (roof: Roof, overhangs: number[]): Roof => ({
  ...roof,
  edges: roof.edges.map((edge, k) => ({ ...edge, overhangMm: overhangs[k]! })),
})

/** The plan with every edge moved out by `outMm`: its corners are where the moved lines cross. */
const widened = (outline: Point2[], outMm: number): Point2[] => {
  const n = outline.length
  const line = (k: number) => {
    const [p, q] = [outline[(k + n) % n]!, outline[(k + 1) % n]!]
    const long = Math.hypot(q.x - p.x, q.y - p.y)
    const d = { x: (q.x - p.x) / long, y: (q.y - p.y) / long }
    return { p: { x: p.x + d.y * outMm, y: p.y - d.x * outMm }, d }
  }
  return outline.map((_, k) => {
    const [a, b] = [line(k - 1), line(k)]
    const cross = a.d.x * b.d.y - a.d.y * b.d.x
    const t = ((b.p.x - a.p.x) * b.d.y - (b.p.y - a.p.y) * b.d.x) / cross
    return { x: a.p.x + a.d.x * t, y: a.p.y + a.d.y * t }
  })
}

const pitches = (plan: unknown[], deg: number) => plan.map(() => deg)

describe('slopes with their overhangs (by hand, from the plan)', () => {
  test('at one pitch and overhang they cover the plan moved out all round', () => {
    let compared = 0
    const count = sampleOf(30, 60)
    for (let n = 0; n < count; n += 1) {
      const plan = randomPlan(planKinds[n % planKinds.length]!, 300 + n, 5 + (n % 12), true)
      const roof = makeRoof(plan, pitches(plan, 30), { overhangMm: 120 })
      const { plates } = solve(roof)
      // corners in the middle of a straight eave have no crossing of their own
      if (plates.wave.fronts.length < plan.length) continue
      compared += 1
      const wanted = planAreaMm2(widened(roof.outline, 120))
      expect(sum(eavesPlanMm2(roof)) / wanted, `plan ${n}`).toBeCloseTo(1, 6)
    }
    expect(compared).toBeGreaterThan((count * 2) / 3)
  })

  test('at a hip the wider overhang ends on the narrower one’s tail line', () => {
    const plan = rectangle(9000, 6000)
    const roof = withOverhangs(makeRoof(plan, pitches(plan, 25)), [450, 300, 450, 300])
    expect(sum(eavesPlanMm2(roof))).toBeCloseTo(9600 * 6900, 0)
  })

  test('at an inward corner each overhang ends on the valley run on outwards, at its own tail line', () => {
    const roof = withOverhangs(makeRoof(lPlan, pitches(lPlan, 25)), [0, 0, 600, 300, 0, 0])
    const areas = eavesPlanMm2(roof)
    const bare = eavesPlanMm2(withOverhangs(roof, [0, 0, 0, 0, 0, 0]))
    // edge 3: from the valley's line, 600 short at the tail, to the hip's, cut by a neighbour with none
    expect(areas[2]! - bare[2]!).toBeCloseTo(6000 * 600 - (600 * 600) / 2, 0)
    expect(areas[3]! - bare[3]!).toBeCloseTo(5000 * 300 - (300 * 300) / 2, 0)
  })

  test('a gable’s overhang carries both slopes on, tails and all', () => {
    const plan = rectangle(9000, 6000)
    const roof = withOverhangs(makeRoof(plan, [30, 'gable', 30, 'gable']), [450, 200, 450, 200])
    for (const area of eavesPlanMm2(roof)) expect(area).toBeCloseTo(9400 * 3450, 0)
  })

  test('a lean-to runs past its sides and its high wall', () => {
    const plan = rectangle(9000, 4000)
    const roof = withOverhangs(
      makeRoof(plan, [15, 'gable', 'gable', 'gable']),
      [450, 200, 100, 200],
    )
    expect(sum(eavesPlanMm2(roof))).toBeCloseTo(9400 * 4550, 0)
  })
})

describe('the surface of the roof', () => {
  const { plates, lines } = solve(makeRoof(lPlan, pitches(lPlan, 25)))
  test.each([
    ['in the middle of a slope', { x: 9000, y: 1000 }, 1000],
    ['on the ridge', { x: 6000, y: 3000 }, 3000],
    ['in the valley', { x: 5000, y: 5000 }, 1000],
    ['over an eave’s overhang', { x: 9000, y: -300 }, -300],
    ['outside the inward corner, on one side of the valley', { x: 6400, y: 6250 }, -250],
    ['outside the inward corner, on the other side', { x: 6150, y: 6400 }, -150],
    ['outside a hip', { x: -200, y: -100 }, -200],
  ] as const)('%s', (_name, p, insideMm) => {
    expect(roofSurface(plates, lines)(p)).toBeCloseTo(insideMm * tan(25), 6)
  })

  test('beyond a gable it is the slope run on', () => {
    const plan = rectangle(9000, 6000)
    const gabled = solve(makeRoof(plan, [30, 'gable', 30, 'gable']))
    const at = (x: number, y: number) => roofSurface(gabled.plates, gabled.lines)({ x, y })
    expect(at(9200, 1000)).toBeCloseTo(1000 * tan(30), 6)
    expect(at(9200, 5500)).toBeCloseTo(500 * tan(30), 6)
    expect(at(9200, -200)).toBeCloseTo(-200 * tan(30), 6)
  })
})

describe('a slope that rises from plates on both sides of a wing', () => {
  const { plates, lines } = solve(makeRoof(tPlan, pitches(tPlan, 25)))
  const slope = plates.slopes.find((s) => s.edges.includes(2))!
  const spansAt = (alongMm: number) =>
    squareLineSpans(lines, slope, lines.faces[slope.index]!, alongMm)

  test('has one plate line and says where there is a plate', () => {
    expect(slope.edges).toEqual([2, 6])
    expect(slope.origin).toEqual({ x: 12000, y: 6000 })
    expect(slope.lengthMm).toBe(12000)
    expect(slope.plateRuns).toEqual([
      { fromMm: 0, toMm: 4000, edge: 2 },
      { fromMm: 8000, toMm: 12000, edge: 6 },
    ])
    expect([1000, 3990, 5000, 7000, 9000].map((s) => edgeUnder(plates, slope, s).index)).toEqual([
      2, 2, 2, 6, 6,
    ])
  })

  test('starts at the plate beside the wing, at a valley behind it and at the end of the wing’s ridge', () => {
    // valleys at 45° from (8000, 6000) and (4000, 6000) to (6000, 4000); main ridge 3000 in
    const kinds = (alongMm: number) =>
      spansAt(alongMm).map(({ low, high, lowBorder }) => [
        Math.round(low * 1e6) / 1e6,
        Math.round(high * 1e6) / 1e6,
        lowBorder.kind === 'slope' ? plates.slopes[lowBorder.slope]!.edges[0] : 'plate',
      ])
    expect(kinds(3500)).toEqual([[0, 3000, 'plate']])
    expect(kinds(5000)).toEqual([[1000, 3000, 3]])
    expect(kinds(7000)).toEqual([[1000, 3000, 5]])
    expect(spansAt(6000).map(({ low, high }) => [low, high])).toEqual([
      [expect.closeTo(2000, 6), expect.closeTo(3000, 6)],
    ])
  })
})

/** At one pitch a slope has one part of every square line; steep slopes beside flat ones can have two. */
test('square lines lie in their slope and nowhere else, in as many parts as it has there', () => {
  let parted = 0
  const faults: string[] = []
  const count = sampleOf(80, 200)
  for (let n = 0; n < count; n += 1) {
    const next = numbersFrom(n + 40)
    const plan = randomPlan(planKinds[n % planKinds.length]!, 900 + n, 6 + (n % 20), true)
    const roof = makeRoof(
      plan,
      plan.map(() => 8 + next() * 50),
    )
    if (outlineProblems(roof.outline, roof.edges).length > 0) continue
    const plates = plateLines(roof)
    if (plates.wave.refusal !== null) continue
    const lines = roofLines(plates)
    for (const slope of plates.slopes) {
      const polygon = facePoints(lines, slope.index)
      for (let k = 0; k < 6; k += 1) {
        const alongMm = (next() * 1.6 - 0.3) * slope.lengthMm
        const spans = squareLineSpans(lines, slope, lines.faces[slope.index]!, alongMm)
        if (spans.length > 1) parted += 1
        for (let m = 0; m < 12; m += 1) {
          const inMm = next() * 9000
          const { inside, sideMm } = placeIn(polygon, slopePoint(slope, alongMm, inMm))
          if (sideMm < 1) continue
          const found = spans.some(({ low, high }) => low < inMm && inMm < high)
          if (found !== inside) faults.push(`plan ${n}, slope ${slope.index}, ${alongMm}, ${inMm}`)
        }
      }
    }
  }
  expect(faults).toEqual([])
  expect(parted).toBeGreaterThan(count / 40)
})

describe('a lean-to', () => {
  test('is one slope up to its high wall: a level top line with one slope, two verges, one eave', () => {
    const { plates, lines } = solve(
      makeRoof(rectangle(9000, 4000), [15, 'gable', 'gable', 'gable']),
    )
    expect(plates.slopes).toHaveLength(1)
    const shown = lines.lines.map(({ kind, from, to, slopes }) => [
      kind,
      ...[from, to].map((n) => lines.nodes[n]!.point),
      slopes,
    ])
    const top = expect.closeTo(4000 * tan(15), 6)
    expect(shown).toEqual([
      ['ridge', { x: 0, y: 4000, z: top }, { x: 9000, y: 4000, z: top }, [0]],
      ['verge', { x: 9000, y: 0, z: 0 }, { x: 9000, y: 4000, z: top }, [0]],
      ['verge', { x: 0, y: 0, z: 0 }, { x: 0, y: 4000, z: top }, [0]],
      ['eave', { x: 0, y: 0, z: 0 }, { x: 9000, y: 0, z: 0 }, [0]],
    ])
  })
})
