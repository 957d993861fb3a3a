import { beforeAll, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { Roof } from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import { plateFlat } from './plates.ts'
import { skewedPlan } from './random-houses.ts'
import { reportLines } from './report.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { dryFit } from './stand-up.ts'

let kit: SolidKit
beforeAll(async () => {
  kit = await loadSolidKit()
})

/**
 * Area of the ring by hand: each side's length times the width, less what two sides share at an
 * outward corner, and with what is added at an inward one: width² over the tangent of half the corner.
 */
function ringByHand({ outline, plateWidthMm: width }: Roof): number {
  const n = outline.length
  return outline.reduce((sum, corner, i) => {
    const [before, after] = [outline.at(i - 1)!, outline[(i + 1) % n]!]
    const along = Math.hypot(after.x - corner.x, after.y - corner.y)
    const turn = (p: { x: number; y: number }): number => Math.atan2(p.y - corner.y, p.x - corner.x)
    const inside = (turn(before) - turn(after) + 4 * Math.PI) % (2 * Math.PI)
    return sum + along * width - width ** 2 / Math.tan(inside / 2)
  }, 0)
}

const lPlan = makeRoof(
  [
    [0, 0],
    [8000, 0],
    [8000, 4000],
    [3000, 4000],
    [3000, 7000],
    [0, 7000],
  ],
  Array<number>(6).fill(25),
)

test('the plates of an L are two strips less their five outward corners, with the inward one filled', () => {
  // sides 30 m of 90 mm, five corners of 90 × 90 counted twice, one left out
  const byHand = 30_000 * 90 - 5 * 90 * 90 + 90 * 90
  expect(ringByHand(lPlan)).toBeCloseTo(byHand, 3)
  expect(plateFlat(kit, lPlan).area()).toBeCloseTo(byHand, 3)
})

test('the inward corner of a plate keeps its point', () => {
  const ring = plateFlat(kit, lPlan)
  const speck = (x: number, y: number): number =>
    kit.CrossSection.square([1, 1]).translate([x, y]).intersect(ring).area()
  expect(speck(3000 - 89, 4000 - 89)).toBeCloseTo(1, 6)
  expect(speck(3000 - 92, 4000 - 92)).toBe(0)
})

test.each([1, 2, 3, 4, 5, 6, 7, 8])(
  'plates round skewed plan %i have the area of their ring',
  (seed) => {
    const plan = skewedPlan(seed)
    expect(plateFlat(kit, plan).area()).toBeCloseTo(ringByHand(plan), 1)
  },
)

/** An eave with its middle corner `offMm` out, and one that goes on over a wing, its second plate as far in. */
const outOfLine = (offMm: number): Roof[] => [
  makeRoof(
    [
      [0, 0],
      [4000, -offMm],
      [9000, 0],
      [9000, 6000],
      [0, 6000],
    ],
    Array<number>(5).fill(25),
  ),
  makeRoof(
    [
      [0, 0],
      [3000, 0],
      [3000, -2000],
      [6500, -2000],
      [6500, offMm],
      [11000, offMm],
      [11000, 6000],
      [0, 6000],
    ],
    Array<number>(8).fill(25),
  ),
]

// that the slope itself runs between its plates and not over each is not judged here
test.each([0.9, 0.4, -0.9])(
  'where plates %d mm out of line carry one slope, each rafter is cut to its own',
  (offMm) => {
    for (const roof of outOfLine(offMm)) {
      const spec = frameRoof(roof)
      const shared = spec.planes.filter((plane) => plane.edges.length > 1)
      expect(shared).toHaveLength(1)
      const all = dryFit(kit, roof, spec)
      const onPlates = ['overlap', 'seat', 'joint']
      const misfits = all.filter(
        ({ check, text }) => onPlates.includes(check) || /heel is not|its stand/.test(text),
      )
      expect(reportLines(misfits)).toEqual([])
    }
  },
)
