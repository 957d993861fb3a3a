import { describe, expect, test } from 'vitest'

import { purlinRowsMm } from '../../../shared/roof/secondary/underpurlins.ts'
import type { FrameSpec, Member } from '../../../shared/roof/roof-types.ts'
import { byMark, planeOfEdge } from '../support/members.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { cos, endOf, framed, lPlan, membersOf, sin, tan, withSizes } from './sized.ts'

const hipRoof = (pitchDeg = 25) =>
  withSizes(makeRoof(rectangle(12_000, 8000), Array(4).fill(pitchDeg)), 'underpurlin')

const purlinsOn = (spec: FrameSpec, edge: number): Member[] =>
  membersOf(spec, 'underpurlin').filter((m) => m.planes.includes(planeOfEdge(spec, edge)))

describe('rows', () => {
  test('one row halves a rafter of 4127 mm that may span 3600', () => {
    // Source: residential roofing slides, 18°, half span 3.925 m: true length 4.127, underpurlin at
    // 2.064 (tests/fixtures/handbook.json, au-residential-18deg; printed to the millimetre).
    expect(purlinRowsMm(4127, 3600)).toHaveLength(1)
    expect(Math.abs(purlinRowsMm(4127, 3600)[0]! - 2064)).toBeLessThan(1)
  })

  test('a rafter that may span its whole length needs none, one a millimetre longer needs one', () => {
    expect(purlinRowsMm(3600, 3600)).toEqual([])
    expect(purlinRowsMm(3601, 3600)).toEqual([1800.5])
  })

  test('two rows leave three equal spans', () => {
    expect(purlinRowsMm(4200, 1500)).toEqual([1400, 2800])
  })

  test('a row on every slope of a 12.0 × 8.0 m hip roof at 25°, and the span caution is gone', () => {
    // commons are 4000 / cos 25° = 4413.5 mm, over the 3600 mm of the settings
    const bare = framed(makeRoof(rectangle(12_000, 8000), [25, 25, 25, 25]))
    const spec = framed(hipRoof())
    expect(membersOf(bare, 'underpurlin')).toEqual([])
    expect(bare.cautions.map((c) => c.code)).toContain('rafter-span-long')
    expect(membersOf(spec, 'underpurlin')).toHaveLength(4)
    expect(spec.cautions.map((c) => c.code)).not.toContain('rafter-span-long')
  })

  test('no rafter spans further than the setting between plate, rows and head', () => {
    // Second derivation: crossings of the rafters' and the rows' plan lines, not the engine's own rows.
    const spec = framed(withSizes(makeRoof(lPlan, Array(6).fill(30)), 'underpurlin'), {
      maxRafterSpanMm: 1300,
    })
    const rafters = spec.members.filter((m) => m.planes.length === 1 && m.role !== 'underpurlin')
    expect(rafters.length).toBeGreaterThan(60)
    for (const rafter of rafters) {
      const { from, to } = rafter.axis
      const pitch = rafter.pitchDeg
      const held = membersOf(spec, 'underpurlin')
        .filter((p) => p.planes[0] === rafter.planes[0])
        .flatMap((p) => {
          // the rafter's plan line is square to the row's
          const ux = (p.axis.to.x - p.axis.from.x) / p.runMm
          const uy = (p.axis.to.y - p.axis.from.y) / p.runMm
          const along = (from.x - p.axis.from.x) * ux + (from.y - p.axis.from.y) * uy
          if (along < 0 || along > p.runMm) return []
          const plan = Math.abs((p.axis.from.x - from.x) * uy - (p.axis.from.y - from.y) * ux)
          return [(plan - 140 * sin(pitch)) / cos(pitch)]
        })
      const top = Math.hypot(to.x - from.x, to.y - from.y) / cos(pitch)
      const places = [0, ...held.filter((mm) => mm > 0 && mm < top), top].sort((a, b) => a - b)
      const spans = places.slice(1).map((mm, k) => mm - places[k]!)
      expect(Math.max(...spans), rafter.mark).toBeLessThan(1300 + 0.01)
    }
  })
})

describe('where they lie', () => {
  test('their top lies on the undersides of the rafters: 140 mm square under the rafters’ top plane', () => {
    // Second derivation: distance of the axis from the plane through the slope's set-out, raised by the
    // stand, by hand: (z − stand − inside × tan) × cos.
    for (const pitch of [15, 25, 40]) {
      const spec = framed(hipRoof(pitch))
      for (const purlin of purlinsOn(spec, 0)) {
        const { from } = purlin.axis
        const under = (from.z - spec.standMm - from.y * tan(pitch)) * cos(pitch)
        expect(under).toBeCloseTo(-140, 6)
        expect(purlin.topInSlope).toBe(true)
        expect(purlin.pitchDeg).toBe(0)
      }
    }
  })

  test('between two hips, centre to centre: the plate less twice the row’s plan distance from it', () => {
    // row at half of 4413.5 along the rafter, its centre line 140 mm square under the rafters' top
    const inside = 2000 + 140 * sin(25)
    const [long] = purlinsOn(framed(hipRoof()), 0)
    const [short] = purlinsOn(framed(hipRoof()), 1)
    expect(long!.setOutLengthMm).toBeCloseTo(12_000 - 2 * inside, 6)
    expect(short!.setOutLengthMm).toBeCloseTo(8000 - 2 * inside, 6)
    // half the hip's 35 mm, taken off along the purlin at 45°
    expect(long!.headDeductionMm).toBeCloseTo(17.5 * Math.SQRT2, 6)
    expect(long!.footDeductionMm).toBeCloseTo(17.5 * Math.SQRT2, 6)
  })

  test('between a hip and a valley: shorter on the outer side, longer on the inner side of an L', () => {
    const spec = framed(withSizes(makeRoof(lPlan, Array(6).fill(30)), 'underpurlin'), {
      maxRafterSpanMm: 2000,
    })
    // edge 1 runs 4000 mm from an outward corner to the inward one: what it loses at the hip it
    // gains at the valley
    const [purlin] = purlinsOn(spec, 1)
    expect(purlin!.setOutLengthMm).toBeCloseTo(4000, 6)
    const kinds = purlin!.cuts.map((cut) => byMark(spec, cut.against).role)
    expect(kinds.sort()).toEqual(['hip', 'valley'])
  })

  test('at a gable square, at the outer face of its wall', () => {
    const roof = withSizes(makeRoof(rectangle(9000, 8000), [25, 'gable', 25, 25]), 'underpurlin')
    const spec = framed(roof)
    const [purlin] = purlinsOn(spec, 0)
    const foot = endOf(purlin!, 'foot')
    expect(purlin!.axis.from.x).toBeCloseTo(9000, 6)
    expect([foot.longSide, foot.face.fromEdgeDeg, foot.edge.fromEdgeDeg]).toEqual(['none', 90, 90])
    expect(foot.against).toBeNull()
  })

  test('a hip at one end and a gable at the other make a pair, left and right hand', () => {
    const roof = withSizes(makeRoof(rectangle(9000, 8000), [25, 'gable', 25, 25]), 'underpurlin')
    const line = framed(roof).cutLines.find((l) => l.role === 'underpurlin' && l.quantity === 2)
    expect([line?.left, line?.right]).toEqual([1, 1])
  })

  test('a ridge that comes out under the slope stops the row on both sides', () => {
    // the ridge of a 4 m wing runs half a rafter past its end, 2000 + 22.5 inside the body's plate; a row at
    // two thirds of 3310 mm, 90 mm thick, starts 2000 + 140 sin 25° − 45 cos 25° = 2018 inside it
    const tPlan = [
      [0, 0],
      [12_000, 0],
      [12_000, 6000],
      [8000, 6000],
      [8000, 9000],
      [4000, 9000],
      [4000, 6000],
      [0, 6000],
    ] as const
    const bare = makeRoof(tPlan, Array(8).fill(25))
    const underpurlin = { thicknessMm: 90, depthMm: 190 }
    const roof = { ...bare, sections: { ...bare.sections, underpurlin } }
    const spec = framed(roof, { maxRafterSpanMm: 1150 })
    const ridges = membersOf(spec, 'ridge').map((m) => m.mark)
    const stopped = membersOf(spec, 'underpurlin').flatMap((m) =>
      m.cuts.filter((cut) => cut.against !== null && ridges.includes(cut.against)),
    )
    expect(stopped).toHaveLength(2)
  })
})
