import { describe, expect, test } from 'vitest'

import type { Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { cos, framed, lPlan, membersOf, tan, withSizes } from './sized.ts'

/** Every figure here is worked out by hand from the plan; common mensuration, no source. */
const coveringOf = (roof: Roof, settings?: Partial<RoofSettings>) =>
  framed(roof, settings).totals.covering!

/** True length of a square-cornered hip or valley for one plan unit across each slope. */
const hipSlope = (pitch: number): number => Math.hypot(Math.SQRT2, tan(pitch))

describe('a 9.0 × 6.0 m hip roof at 25°, overhangs 450', () => {
  const roof = makeRoof(rectangle(9000, 6000), Array(4).fill(25))

  test('covering is the plan out to the tails over the cosine, underlay the same', () => {
    const area = (9.9 * 6.9) / cos(25)
    expect(coveringOf(roof).coveringAreaM2).toBeCloseTo(area, 6)
    expect(coveringOf(roof).underlayAreaM2).toBeCloseTo(area, 6)
  })

  test('battens are the area over the gauge; none are counted without one', () => {
    const { battenMm } = coveringOf(roof, { battenGaugeMm: 330 })
    expect(battenMm).toBeCloseTo((9900 * 6900) / cos(25) / 330, 3)
    expect(coveringOf(roof).battenMm).toBeNull()
  })

  test('ridge and hips, the hips down to the corner of the tail lines', () => {
    expect(coveringOf(roof).ridgeCappingMm).toBeCloseTo(3000, 6)
    expect(coveringOf(roof).hipCappingMm).toBeCloseTo(4 * 3450 * hipSlope(25), 6)
    expect(coveringOf(roof).valleyLiningMm).toBe(0)
  })

  test('gutters along the tails; the fascia as they are until its boards are set out', () => {
    expect(coveringOf(roof).gutterMm).toBeCloseTo(2 * (9900 + 6900), 6)
    expect(coveringOf(roof).fasciaMm).toBeCloseTo(2 * (9900 + 6900), 6)
    const sized = withSizes(roof, 'fascia')
    // each board 30 mm longer at both ends
    expect(coveringOf(sized).fasciaMm).toBeCloseTo(2 * (9900 + 6900) + 8 * 30, 6)
    expect(coveringOf(sized).gutterMm).toBeCloseTo(2 * (9900 + 6900), 6)
    expect(coveringOf(sized).bargeMm).toBe(0)
  })
})

describe('a 9.0 × 6.0 m gable roof at 25° and 35°, verges 450', () => {
  const roof = makeRoof(rectangle(9000, 6000), [25, 'gable', 35, 'gable'])
  // ridge where x tan 25 = (6000 − x) tan 35
  const ridge = (6000 * tan(35)) / (tan(25) + tan(35))

  test('the ridge runs out to the verges, gutters stop there', () => {
    expect(coveringOf(roof).ridgeCappingMm).toBeCloseTo(9900, 6)
    expect(coveringOf(roof).gutterMm).toBeCloseTo(2 * 9900, 6)
    expect(coveringOf(roof).hipCappingMm).toBe(0)
  })

  test('covering reaches verges and tails', () => {
    const area = (9.9 * (ridge + 450)) / cos(25) + (9.9 * (6450 - ridge)) / cos(35)
    expect(coveringOf(roof).coveringAreaM2).toBeCloseTo(area / 1000, 6)
  })

  test('barges from tail line to apex along the slope; their cut lengths once set out', () => {
    const slope = (ridge + 450) / cos(25) + (6450 - ridge) / cos(35)
    expect(coveringOf(roof).bargeMm).toBeCloseTo(2 * slope, 6)
    const spec = framed(withSizes(roof, 'barge'))
    const cut = membersOf(spec, 'barge').reduce((sum, m) => sum + m.cutLengthMm, 0)
    expect(spec.totals.covering!.bargeMm).toBeCloseTo(cut, 9)
    // a plumb cut's two ends reach 190 tan further than its top edge
    expect(cut).toBeCloseTo(2 * slope + 2 * 190 * (tan(25) + tan(35)), 6)
  })
})

describe('an L at 25°, overhangs 450', () => {
  const roof = makeRoof(lPlan, Array(6).fill(25))

  test('the valley lining runs on to the inward corner of the tail lines', () => {
    // both wings' rises are shared up to half the narrower one, 5 m: the valley's plan run is 2500 across
    // each slope, and 450 more below the plate
    const { valleyLiningMm } = coveringOf(roof)
    expect(valleyLiningMm).toBeCloseTo((2500 + 450) * hipSlope(25), 6)
  })

  test('gutters follow the tail lines round: the plan’s 44 m and eight overhangs less what turns inward', () => {
    // five outward corners add 450 to both edges, the inward one takes 450 from both
    expect(coveringOf(roof).gutterMm).toBeCloseTo(44_000 + 5 * 900 - 900, 6)
  })

  test('covering is the plan out to the tails over the cosine', () => {
    // the 120 m² of body and wings, a strip of 450 round 44 m, and four corner squares more than inward ones
    const plan = 5 * 4 + 12 * 6 + 0.45 * 44 + 4 * 0.45 ** 2
    expect(coveringOf(roof).coveringAreaM2).toBeCloseTo(plan / cos(25), 6)
  })
})

test('timber by section counts the timbers beside the frame', () => {
  const bare = framed(makeRoof(rectangle(9000, 6000), Array(4).fill(25)))
  const sized = framed(withSizes(makeRoof(rectangle(9000, 6000), Array(4).fill(25)), 'fascia'))
  const pieces = (spec: typeof bare) =>
    spec.totals.bySection.reduce((sum, total) => sum + total.pieces, 0)
  expect(pieces(sized) - pieces(bare)).toBe(4)
})
