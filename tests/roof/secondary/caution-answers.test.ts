import { describe, expect, test } from 'vitest'

import type { Caution, CautionCode, Roof, RoofSettings } from '../../../shared/roof/roof-types.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { cos, framed, lPlan, sin, tan } from './sized.ts'

const said = (roof: Roof, code: CautionCode, settings?: Partial<RoofSettings>): Caution[] =>
  framed(roof, settings).cautions.filter((c) => c.code === code)

/** The roof with one field set, by its path. */
function withField(roof: Roof, path: string, value: number): Roof {
  const copy = structuredClone(roof) as unknown as Record<string, unknown>
  const keys = path.split('.')
  const last = keys.pop()!
  const parent = keys.reduce((at, key) => at[key] as Record<string, unknown>, copy)
  parent[last] = value
  return copy as unknown as Roof
}

const lowered = (roof: Roof): Roof => ({ ...roof, hipTop: 'lowered' })
const section = (thicknessMm: number, depthMm: number) => ({ thicknessMm, depthMm })

/** Roofs that raise a caution, and whose typed answer must take it away. */
const raising: [string, CautionCode, Roof, Partial<RoofSettings>?][] = (() => {
  const hip = makeRoof(rectangle(9000, 6000), Array(4).fill(30))
  const l = makeRoof(lPlan, Array(6).fill(35))
  const shallow = (name: 'ridge' | 'hip' | 'valley'): Roof => ({
    ...l,
    sections: { ...l.sections, [name]: section(35, 140) },
  })
  const unequal = makeRoof(lPlan, [25, 32, 25, 25, 25, 25])
  const long = makeRoof(rectangle(5000, 4000), [30, 30, 30, 30], { overhangMm: 900 })
  const low = makeRoof(rectangle(9000, 6000), Array(4).fill(12))
  const tiles = { covering: { name: 'concrete or clay tiles', minPitchDeg: 15 } }
  const thick = { ...lowered(hip), sections: { ...hip.sections, hip: section(120, 240) } }
  return [
    ['a ridge shallower than the cut on it', 'section-shallow', shallow('ridge')],
    ['a hip shallower than the cut on it', 'section-shallow', shallow('hip')],
    ['a valley shallower than the cut on it', 'section-shallow', shallow('valley')],
    ['eaves not level at an outward and an inward corner', 'eaves-not-level', unequal],
    ['a birdsmouth over a third', 'birdsmouth-deep', { ...hip, standMm: 90 }],
    ['an overhang long for the span', 'overhang-long', long],
    ['a pitch under what tiles take', 'pitch-below-covering', low, tiles],
    ['a thick hip lowered a long way', 'hip-thin-over-seat', thick],
  ]
})()

describe('what a caution names answers it', () => {
  test.each(raising)('%s', (_name, code, roof, settings) => {
    const [caution] = said(roof, code, settings)
    expect(caution?.answers?.length).toBeGreaterThan(0)
    for (const { path, value } of caution!.answers!) {
      if (code === 'pitch-below-covering' || code === 'overhang-long') continue
      const answered = said(withField(roof, path, value), code, settings)
      expect(answered.map((c) => c.text)).not.toContain(caution!.text)
    }
    // those that name one field for each edge are answered by all of them together
    const every = said(roof, code, settings).flatMap((c) => c.answers ?? [])
    const all = every.reduce((at, { path, value }) => withField(at, path, value), roof)
    if (code === 'pitch-below-covering' || code === 'overhang-long') {
      expect(said(all, code, settings)).toEqual([])
    }
  })

  test.each(raising)('%s: the words name the same figure', (_name, code, roof, settings) => {
    for (const caution of said(roof, code, settings)) {
      for (const { value } of caution.answers ?? []) {
        if (code !== 'pitch-below-covering') expect(caution.remedy).toContain(` ${value} mm`)
        else expect(caution.text).toContain(`${value.toFixed(1)}°`)
      }
    }
  })
})

describe('full bearing', () => {
  test('a millimetre less than what full bearing needs is still too shallow', () => {
    const l = makeRoof(lPlan, Array(6).fill(35))
    const roof = { ...l, sections: { ...l.sections, valley: section(35, 140) } }
    const [caution] = said(roof, 'section-shallow')
    const { path, value } = caution!.answers![0]!
    // the plumb cut of a 140 mm rafter at 35°, square to a valley at atan(tan 35 / √2): by hand
    const valley = (Math.atan(tan(35) / Math.SQRT2) * 180) / Math.PI
    expect(path).toBe('sections.valley.depthMm')
    expect(value).toBe(Math.ceil((140 / cos(35)) * cos(valley)))
    expect(said(withField(roof, path, value - 1), 'section-shallow')).toHaveLength(1)
    expect(said(withField(roof, path, value), 'section-shallow')).toEqual([])
  })

  test('a valley is called a valley, a hip a hip', () => {
    const l = makeRoof(lPlan, Array(6).fill(35))
    const both = { ...l.sections, hip: section(35, 140), valley: section(35, 140) }
    const texts = said({ ...l, sections: both }, 'section-shallow').map((c) => c.text)
    expect(texts).toHaveLength(2)
    expect(texts[0]).toMatch(/^The hip is 15\d mm deep plumb/)
    expect(texts[1]).toMatch(/^The valley is 15\d mm deep plumb/)
  })
})

describe('eaves', () => {
  test('an inward corner is named so, with an overhang for both edges', () => {
    // edge 2 at 32° and edge 3 at 25° meet at the inward corner 3: 450 tan 32 / tan 25 = 603, 450 tan 25 / tan 32 = 336
    const roof = makeRoof(lPlan, [25, 32, 25, 25, 25, 25])
    const inward = said(roof, 'eaves-not-level').find((c) => c.text.includes('inward corner 3'))
    expect(inward?.answers).toEqual([
      { path: 'edges.1.overhangMm', value: Math.round((450 * tan(25)) / tan(32)), unit: 'mm' },
      { path: 'edges.2.overhangMm', value: Math.round((450 * tan(32)) / tan(25)), unit: 'mm' },
    ])
  })

  test('an overhang is long beyond 30 % of the span along the rafter', () => {
    // Source of the 30 %: AS 1684.2, as quoted by a secondary page. 2000 / cos 30 = 2309 mm of span,
    // 30 % of it 693 mm along the rafter, 600 mm level.
    const roof = makeRoof(rectangle(5000, 4000), Array(4).fill(30), { overhangMm: 650 })
    const [caution] = said(roof, 'overhang-long')
    const most = 600
    expect(caution?.answers?.map((a) => a.value)).toEqual([most, most, most, most])
    expect(
      said(
        makeRoof(rectangle(5000, 4000), Array(4).fill(30), { overhangMm: most }),
        'overhang-long',
      ),
    ).toEqual([])
  })
})

describe('a narrow recess', () => {
  // a U whose court is 950 mm wide: two overhangs of 450 leave 50 mm, two boards of 30 mm want 60
  const court = [
    [0, 0],
    [4000, 0],
    [4000, 2000],
    [4950, 2000],
    [4950, 0],
    [9000, 0],
    [9000, 6000],
    [0, 6000],
  ] as const
  const recessed = (overhangMm: number): Roof => {
    const roof = makeRoof(court, Array(8).fill(25), { overhangMm })
    return { ...roof, sections: { ...roof.sections, fascia: section(30, 190) } }
  }

  test('no boards are set out where they would run together, and the overhang that leaves room is named', () => {
    const spec = framed(recessed(450))
    // five of eight eaves are left
    expect(spec.members.filter((m) => m.role === 'fascia')).toHaveLength(5)
    const [caution] = said(recessed(450), 'eaves-meet')
    expect(caution?.text).toContain('edges 2 and 4 meet over edge 3')
    // (950 − 2 × 30) / 2
    expect(caution?.answers?.map((a) => [a.path, a.value])).toEqual([
      ['edges.1.overhangMm', 445],
      ['edges.3.overhangMm', 445],
    ])
    const answered = framed(recessed(445))
    expect(answered.members.filter((m) => m.role === 'fascia')).toHaveLength(8)
    expect(answered.cautions.map((c) => c.code)).not.toContain('eaves-meet')
  })
})

describe('thickness and height', () => {
  test('a deeper hip has no more over its seat, so a thickness is named', () => {
    // a lowered hip drops sin-free: half its thickness times the slope's fall across it, tan 30 / √2 a side
    const hip = makeRoof(rectangle(9000, 6000), Array(4).fill(30), { hipTop: 'lowered' })
    const thick = (t: number, d: number): Roof => ({
      ...hip,
      sections: { ...hip.sections, hip: section(t, d) },
    })
    expect(said(thick(120, 240), 'hip-thin-over-seat')).toHaveLength(1)
    expect(said(thick(120, 400), 'hip-thin-over-seat')).toHaveLength(1)
    const value = said(thick(120, 240), 'hip-thin-over-seat')[0]!.answers![0]!.value
    const spec = framed(thick(value, 240))
    const hipPitch = (Math.atan(tan(30) / Math.SQRT2) * 180) / Math.PI
    const drop = ((value / 2) * tan(30)) / Math.SQRT2
    // within the 5 mm that nobody minds
    expect((spec.standMm - drop) * cos(hipPitch)).toBeGreaterThan(spec.standMm * cos(30) - 5)
  })

  test('the height over plate that leaves two thirds of a rafter: 2/3 of its plumb depth', () => {
    const roof = { ...makeRoof(rectangle(9000, 6000), Array(4).fill(30)), standMm: 90 }
    const [caution] = said(roof, 'birdsmouth-deep')
    expect(caution?.answers).toEqual([
      { path: 'standMm', value: Math.ceil(((2 / 3) * 140) / cos(30)), unit: 'mm' },
    ])
    expect(sin(30)).toBeCloseTo(0.5, 12)
  })
})

test('an ordinary roof with every timber typed raises no caution but long boards', () => {
  const roof = makeRoof(rectangle(9000, 6000), Array(4).fill(25))
  const sections = {
    ...roof.sections,
    underpurlin: section(75, 150),
    collarTie: section(35, 90),
    fascia: section(30, 190),
    barge: section(30, 190),
  }
  const codes = new Set(framed({ ...roof, sections }).cautions.map((c) => c.code))
  expect([...codes]).toEqual(['longer-than-stock'])
})
