import { describe, expect, test } from 'vitest'

import { outlineProblems } from '../../../shared/roof/outline-problems.ts'
import { plateLines } from '../../../shared/roof/plate-lines.ts'
import { roofLines } from '../../../shared/roof/roof-lines.ts'
import { roofProblems } from '../../../shared/roof/roof-problems.ts'
import type { RoofLines } from '../../../shared/roof/roof-lines.ts'
import type { Point2, Point3, Roof } from '../../../shared/roof/roof-types.ts'
import type { PlateLines } from '../../../shared/roof/slopes.ts'
import {
  facePoints,
  faultsOf,
  placeIn,
  planeHeightMm,
  shownLines,
  unmatched,
} from './line-rules.ts'
import { numbersFrom, planAreaMm2, randomLinesRoof } from './random-outlines.ts'
import { sampleOf } from '../support/sample.ts'

/**
 * Properties that any roof has, on random outlines with fixed seeds: square and skew plans, plans like
 * stars, 4 to 32 corners; half of them at one pitch, half with a pitch for each eave and gables.
 * `PROOF=1` runs all 2,000, otherwise a sample.
 */
const count = sampleOf(160, 2000)

type Solved = { name: string; roof: Roof; plates: PlateLines; lines: RoofLines; onePitch: boolean }

const solvedRoofs = (): Solved[] =>
  Array.from({ length: count }, (_, n) => n).flatMap((n): Solved[] => {
    const onePitch = n % 2 === 0
    const roof = randomLinesRoof(n, onePitch)
    if (outlineProblems(roof.outline, roof.edges).length > 0) return []
    const plates = plateLines(roof)
    if (plates.wave.refusal !== null) return []
    const name = `roof ${n}, ${roof.outline.length} corners`
    return [{ name, roof, plates, lines: roofLines(plates), onePitch }]
  })

const solved = solvedRoofs()

/** No nodes were drawn together: every slope's corners lie in its plane to a thousandth of a millimetre. */
const isExact = ({ plates, lines }: Solved): boolean =>
  plates.slopes.every((slope) =>
    facePoints(lines, slope.index).every((p) => Math.abs(planeHeightMm(slope, p) - p.z) < 0.001),
  )

/** Random points of a plan, none nearer than 2 mm to a line of the roof. */
const pointsIn = ({ roof, lines }: Solved, seed: number): Point2[] => {
  const next = numbersFrom(seed)
  const [xs, ys] = [roof.outline.map((p) => p.x), roof.outline.map((p) => p.y)]
  const [x0, x1, y0, y1] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  const points: Point2[] = []
  while (points.length < 10) {
    const p = { x: x0 + next() * (x1 - x0), y: y0 + next() * (y1 - y0) }
    const sides = lines.faces.map((face) => placeIn(facePoints(lines, face.slope), p).sideMm)
    if (placeIn(roof.outline, p).inside && Math.min(...sides) > 2) points.push(p)
  }
  return points
}

describe('over random outlines', () => {
  test('most are solved, and the rest are refused in words that name an edge or corner', () => {
    expect(solved.length).toBeGreaterThan(count * 0.8)
    const unnamed: string[] = []
    for (let n = 0; n < count; n += 1) {
      for (const { message } of roofProblems(randomLinesRoof(n, n % 2 === 0))) {
        if (!/((edge|edges|corner) \d+|every edge)/i.test(message))
          unnamed.push(`roof ${n}: ${message}`)
        if (/cannot be set out/.test(message)) unnamed.push(`roof ${n}: ${message}`)
      }
    }
    expect(unnamed).toEqual([])
  })

  test('every line is the crease of its two slopes, every slope lies in its plane, together they cover the plan', () => {
    const faults = solved.flatMap(({ name, roof, plates, lines }) =>
      faultsOf(roof, plates, lines).map((fault) => `${name}: ${fault}`),
    )
    expect(faults).toEqual([])
  })

  test('slopes lie in their planes to a thousandth of a millimetre, but where near nodes became one', () => {
    const off = solved.filter((one) => !isExact(one))
    expect(off.length / solved.length).toBeLessThan(0.02)
  })

  test('at one pitch the slopes add up to the plan area over the cosine', () => {
    for (const { name, roof, plates, lines, onePitch } of solved) {
      if (!onePitch) continue
      const lean = Math.cos((plates.slopes[0]!.pitchDeg * Math.PI) / 180)
      const onSlope = lines.faces.reduce(
        (sum, face) => sum + planAreaMm2(facePoints(lines, face.slope)) / lean,
        0,
      )
      const wanted = planAreaMm2(roof.outline) / lean
      expect(Math.abs(onSlope - wanted) / wanted, name).toBeLessThan(1e-5)
    }
  })

  test('every point of the plan lies under exactly one slope', () => {
    solved.forEach((one, n) => {
      for (const p of pointsIn(one, n + 1)) {
        const over = one.lines.faces.filter(
          (face) => placeIn(facePoints(one.lines, face.slope), p).inside,
        )
        expect(over.length, `${one.name} at ${p.x}, ${p.y}`).toBe(1)
      }
    })
  })
})

describe('a plan set down another way has the same lines', () => {
  const MM = 0.01
  const sample = solved.filter((_, n) => n % 5 === 0)
  const moved = (roof: Roof, to: (p: Point2) => Point2): Roof => ({
    ...roof,
    outline: roof.outline.map(to),
  })
  const check = (
    change: (roof: Roof) => Roof,
    move: (p: Point3) => Point3,
    of: Solved[] = sample,
  ): string[] =>
    of.flatMap(({ name, roof, lines }) => {
      const other = roofLines(plateLines(change(roof)))
      const [before, after] = [shownLines(lines, move), shownLines(other)]
      const lost = [...unmatched(before, after, MM), ...unmatched(after, before, MM)]
      return lost.length === 0 ? [] : [`${name}: ${lost.length} of ${before.length} lines differ`]
    })

  test('shifted', () => {
    const to = <P extends Point2>(p: P): P => ({ ...p, x: p.x + 31234.5, y: p.y - 20987.25 })
    expect(check((roof) => moved(roof, to), to)).toEqual([])
  })

  test('turned', () => {
    const [c, s] = [Math.cos(2.5), Math.sin(2.5)]
    const to = <P extends Point2>(p: P): P => ({ ...p, x: p.x * c - p.y * s, y: p.x * s + p.y * c })
    expect(check((roof) => moved(roof, to), to)).toEqual([])
  })

  test('mirrored', () => {
    const to = <P extends Point2>(p: P): P => ({ ...p, x: -p.x })
    const change = (roof: Roof): Roof => ({
      ...roof,
      outline: roof.outline.map(to).reverse(),
      edges: [...roof.edges.slice(0, -1)].reverse().concat(roof.edges.slice(-1)),
    })
    expect(check(change, to)).toEqual([])
  })

  test('started at another corner', () => {
    const turned = <T>(list: T[]): T[] => [...list.slice(3), ...list.slice(0, 3)]
    const change = (roof: Roof): Roof => ({
      ...roof,
      outline: turned(roof.outline),
      edges: turned(roof.edges),
    })
    expect(check(change, (p) => p)).toEqual([])
  })

  // nodes half a millimetre apart are one; scaled up they are two
  test('scaled, every length scales', () => {
    const exact = sample.filter(isExact)
    expect(exact.length).toBeGreaterThan(sample.length * 0.95)
    const to = <P extends Point2>(p: P): P => ({ ...p, x: p.x * 1.25, y: p.y * 1.25 })
    const up = (p: Point3): Point3 => ({ ...to(p), z: p.z * 1.25 })
    expect(check((roof) => moved(roof, to), up, exact)).toEqual([])
  })
})
