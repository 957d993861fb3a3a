import { afterAll, beforeAll, describe, expect, test } from 'vitest'

import { demoRoofs } from '../../../server/db/demo/demo-roofs.ts'
import { roofOfForm } from '../../../shared/revisions/roof-of-form.ts'
import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import { defaultSettings } from '../../../shared/roof/roof-settings.ts'
import type { FrameSpec, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'
import { allReferences, referenceRoof } from '../support/roofs.ts'
import { furtherRoofs } from './further-roofs.ts'
import { rectilinearHouse, skewedHouse, type House } from './random-houses.ts'
import { randomBuilding, randomRoof } from './random-roofs.ts'
import { reportLines } from './report.ts'
import { loadSolidKit, type SolidKit } from './solid-kit.ts'
import { dryFit } from './stand-up.ts'

/**
 * The dry fit (Proof): every member is sawn again from the published numbers of its spec, stood up
 * with the plates, and judged by manifold-3d: cuts where their planes are, no two pieces in one
 * place, joints closed, tops under their slopes, seats flat. No figure of our own is compared with.
 *
 * `PROOF=1` runs every roof in every way and 300 random ones; otherwise a sample.
 */
const proof = process.env['PROOF'] === '1'

let kit: SolidKit
beforeAll(async () => {
  kit = await loadSolidKit()
})

function specFits(roof: Roof, spec: FrameSpec): void {
  expect(reportLines(dryFit(kit, roof, spec))).toEqual([])
}

function fits(roof: Roof, settings: RoofSettings = defaultSettings): void {
  specFits(roof, frameRoof(roof, settings))
}

const ways = [
  { hipTop: 'backed', tail: 'plumb', valleyTop: 'square' },
  { hipTop: 'lowered', tail: 'plumb', valleyTop: 'dished' },
  { hipTop: 'backed', tail: 'square', valleyTop: 'dished' },
  { hipTop: 'lowered', tail: 'square', valleyTop: 'square' },
] as const

const beside = {
  underpurlin: { thicknessMm: 45, depthMm: 90 },
  collarTie: { thicknessMm: 35, depthMm: 90 },
  fascia: { thicknessMm: 20, depthMm: 180 },
  barge: { thicknessMm: 20, depthMm: 180 },
}

const trimmed = (roof: Roof): Roof => ({ ...roof, sections: { ...roof.sections, ...beside } })
/** Spans short enough for rows of underpurlins. */
const shortSpans = { ...defaultSettings, maxRafterSpanMm: 1700 }

describe('the reference roofs go together from their numbers alone', () => {
  for (const [index, roof] of allReferences.entries()) {
    const chosen = proof ? ways : [ways[index % ways.length]!]
    test.each(chosen)(`${roof.title}: hips $hipTop, tails $tail, valleys $valleyTop`, (way) => {
      fits(referenceRoof(roof, way))
    })
  }

  const chosen = proof ? allReferences : allReferences.filter((roof) => roof.id.startsWith('T-'))
  for (const roof of chosen) {
    test.each(['plumb', 'square'] as const)(
      `${roof.title}: purlins, ties, boards, tails %s`,
      (tail) => {
        fits(trimmed(referenceRoof(roof, { tail })), shortSpans)
      },
    )
  }
})

describe('the demo roofs go together from their numbers alone', () => {
  const shown = Object.entries(demoRoofs).filter((_, i) => proof || i % 4 === 3)
  test.each(shown)('%s', (_name, form) => {
    // a new firm's brickwork stands 110 off the plate
    const read = roofOfForm(form, { brickOffsetMm: 110, settings: defaultSettings })
    if (read.roof === null) throw new Error(JSON.stringify(read.problems))
    fits(read.roof)
  })
})

const sample = [
  'rectangle with four different pitches',
  'splayed end, steep splays',
  'octagon turret',
  'skew quadrilateral',
]

describe('further roofs go together from their numbers alone', () => {
  for (const [name, build] of Object.entries(furtherRoofs)) {
    if (!proof && !sample.includes(name)) continue
    const chosen = proof ? ways : [ways[0]]
    test.each(chosen)(`${name}: hips $hipTop, tails $tail`, (way) => {
      fits({ ...build(), ...way })
    })
  }
})

const seeds = (proofCount: number, count: number): number[] =>
  Array.from({ length: proof ? proofCount : count }, (_, i) => i + 1)

describe('any plan goes together from its numbers alone', () => {
  const houses: House[] = []
  const fitsAs = (house: House): void => {
    houses.push(house)
    specFits(house.roof, house.spec)
  }
  afterAll(() => {
    const refused = houses.flatMap((house) => house.refused)
    console.info(`${refused.length} plans refused beside ${houses.length} houses`)
    for (const reason of refused) console.info(`  ${reason}`)
  })

  test.each(seeds(110, 4))('house with square corners %i', (seed) => {
    fitsAs(rectilinearHouse(seed))
  })
  test.each(seeds(100, 4))('skewed house %i', (seed) => {
    fitsAs(skewedHouse(seed))
  })
  test('few houses are refused, and each with a reason', () => {
    const refused = houses.flatMap((house) => house.refused)
    expect(refused.filter((reason) => reason.length < 20)).toEqual([])
    expect(refused.length).toBeLessThanOrEqual(0.15 * houses.length)
  })
  test.each(seeds(20, 1))('purlins, ties and boards on house %i', (seed) => {
    const { roof } = seed % 2 === 0 ? rectilinearHouse(seed) : skewedHouse(seed)
    fits(trimmed(roof), shortSpans)
  })
  test.each(seeds(45, 2))('random convex plan %i', (seed) => {
    fits(randomRoof(seed))
  })
  test.each(seeds(45, 2))('random end on a straight building %i', (seed) => {
    fits(randomBuilding(seed))
  })
})
