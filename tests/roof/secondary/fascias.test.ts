import { describe, expect, test } from 'vitest'

import type { Cut, FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { planeOfEdge } from '../support/members.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof, regularOutline } from '../support/roofs.ts'
import { cos, deg, endOf, framed, lPlan, membersOf, rad, sin, tan } from './sized.ts'
import { withSizes } from './sized.ts'

const fasciaOn = (spec: FrameSpec, edge: number): Member =>
  membersOf(spec, 'fascia').find((m) => m.planes.includes(planeOfEdge(spec, edge)))!

const hipRoof = (tail: Roof['tail'], pitches = [25, 25, 25, 25], overhangs?: number[]) => {
  const roof = withSizes(makeRoof(rectangle(9000, 6000), pitches, { tail }), 'fascia')
  roof.edges.forEach((edge, k) => (edge.overhangMm = overhangs?.[k] ?? edge.overhangMm))
  return roof
}

const eachCut = (spec: FrameSpec): Cut[] => membersOf(spec, 'fascia').flatMap((m) => m.cuts)

describe('plumb tails: level boards, plain mitres', () => {
  test('a rectangle’s boards are mitred at 45° and as long as plate, overhangs and thickness make them', () => {
    const spec = framed(hipRoof('plumb'))
    expect(membersOf(spec, 'fascia')).toHaveLength(4)
    for (const cut of eachCut(spec)) {
      expect(cut.edge.fromEdgeDeg).toBeCloseTo(45, 9)
      expect(cut.face.fromEdgeDeg).toBeCloseTo(90, 9)
      expect(cut.bladeTiltDeg).toBeCloseTo(45, 9)
      expect(cut.longSide).toBe('right')
    }
    expect(fasciaOn(spec, 0).cutLengthMm).toBeCloseTo(9000 + 2 * 450 + 2 * 30, 6)
    expect(fasciaOn(spec, 1).cutLengthMm).toBeCloseTo(6000 + 2 * 450 + 2 * 30, 6)
  })

  test('at the corners of an octagon the mitre is half of 135° on any pitch', () => {
    // the plain mitre of a corner is half its angle (common practice, no source)
    const roof = withSizes(makeRoof(regularOutline(8, 6000), Array(8).fill(30)), 'fascia')
    for (const cut of eachCut(framed(roof))) expect(cut.edge.fromEdgeDeg).toBeCloseTo(67.5, 6)
  })

  test('the back lies on the tails, the front arris of the top in line with the rafters’ tops', () => {
    // Second derivation: 450 + 30 mm out, the rafters' top plane lies (450 + 30) tan 25° under the stand.
    const spec = framed(hipRoof('plumb'))
    const board = fasciaOn(spec, 0)
    expect(board.axis.from.y).toBeCloseTo(-450 - 15, 6)
    expect(board.axis.from.z).toBeCloseTo(spec.standMm - 480 * tan(25), 6)
  })

  test('at an inward corner the mitre is long at the back', () => {
    const roof = withSizes(makeRoof(lPlan, Array(6).fill(25)), 'fascia')
    const spec = framed(roof)
    // edge 1 runs 4000 mm from an outward corner to the inward one: out 450 at one end, back 450 at
    // the other; its front 30 mm further out and back again
    const board = fasciaOn(spec, 1)
    expect(board.setOutLengthMm).toBeCloseTo(4000, 6)
    expect(board.cutLengthMm).toBeCloseTo(4000 + 2 * 15, 6)
    expect(board.cuts.map((cut) => cut.edge.fromEdgeDeg)).toEqual([
      expect.closeTo(45, 9),
      expect.closeTo(45, 9),
    ])
    expect(new Set(board.cuts.map((cut) => cut.longSide))).toEqual(new Set(['left', 'right']))
  })

  test('at a gable square, at the verge', () => {
    const roof = withSizes(makeRoof(rectangle(9000, 6000), [25, 'gable', 25, 'gable']), 'fascia')
    const [board] = membersOf(framed(roof), 'fascia')
    expect(board!.cutLengthMm).toBeCloseTo(9000 + 2 * 450, 6)
    expect(board!.cuts.map((cut) => [cut.longSide, cut.against])).toEqual([
      ['none', null],
      ['none', null],
    ])
  })

  test('two plates in one line with one overhang take one board', () => {
    const outline = [
      [0, 0],
      [4000, 0],
      [9000, 0],
      [9000, 6000],
      [0, 6000],
    ] as const
    const roof = withSizes(makeRoof(outline, Array(5).fill(25)), 'fascia')
    const spec = framed(roof)
    expect(membersOf(spec, 'fascia')).toHaveLength(4)
    expect(fasciaOn(spec, 0).cutLengthMm).toBeCloseTo(9000 + 2 * 480, 6)
  })
})

describe('square tails: canted boards', () => {
  // Source: 'Square cut fascia' (web pages of roof-geometry sketches, seen): fascia mitre, from square,
  // arctan(sin pitch / tan plan angle); angle between eave and hip in the slope arctan(tan plan angle / cos
  // pitch); fascia bevel arctan(cos mitre / tan of that angle). At equal pitches the plan angle is half the
  // corner.
  test.each([
    [18.43, 90],
    [25, 90],
    [deg(Math.atan(7 / 12)), 90],
    [25, 135],
    [40, 135],
    [30, 120],
  ])('%d° at a corner of %d°: face, edge and blade as printed', (pitch, corner) => {
    const plan = corner / 2
    const sides = Math.round(360 / (180 - corner))
    const outline = sides === 4 ? rectangle(6000, 6000) : regularOutline(sides, 6000)
    const roof = withSizes(
      makeRoof(outline, Array(sides).fill(pitch), { tail: 'square' }),
      'fascia',
    )
    const mitre = deg(Math.atan(sin(pitch) / tan(plan)))
    const eaveToHip = deg(Math.atan(tan(plan) / cos(pitch)))
    const bevel = deg(Math.atan(cos(mitre) / tan(eaveToHip)))
    for (const cut of eachCut(framed(roof))) {
      expect(Math.abs(90 - cut.face.fromEdgeDeg)).toBeCloseTo(mitre, 4)
      expect(cut.edge.fromEdgeDeg).toBeCloseTo(eaveToHip, 4)
      expect(cut.bladeTiltDeg).toBeCloseTo(bevel, 4)
    }
  })

  test('7 in 12 against 12 in 12: the two blades together turn by the printed 69.13°', () => {
    // Source: the same pages, worked example 7/12 and 12/12 at 90°: saw blade bevels 20.87 and 48.26, together
    // 69.13°, the turn from one board's face to the other's. The pages mitre along the hip; boards of one
    // thickness whose fronts are to meet take half of it each, which is what is cut here.
    const pitches = [7 / 12, 1, 7 / 12, 1].map((rise) => deg(Math.atan(rise)))
    const overhangs = [450, (450 * 7) / 12, 450, (450 * 7) / 12]
    const cut = endOf(fasciaOn(framed(hipRoof('square', pitches, overhangs)), 0), 'head')
    expect(2 * cut.bladeTiltDeg).toBeCloseTo(20.87208 + 48.25504, 2)
  })

  test('at unequal pitches the backs of both boards meet in one line, and so do their fronts', () => {
    // Second derivation: where each board's arris line crosses the other board's face plane.
    const pitches = [25, 35, 25, 35]
    const overhangs = [450, (450 * tan(25)) / tan(35), 450, (450 * tan(25)) / tan(35)]
    const spec = framed(hipRoof('square', pitches, overhangs))
    const [a, b] = [fasciaOn(spec, 0), fasciaOn(spec, 1)]
    const cut = endOf(a, 'head')
    const faceNormal = (m: Member, pitch: number) => {
      const [ux, uy] = [
        (m.axis.to.x - m.axis.from.x) / m.runMm,
        (m.axis.to.y - m.axis.from.y) / m.runMm,
      ]
      return { x: uy * cos(pitch), y: -ux * cos(pitch), z: -sin(pitch) }
    }
    const [na, nb] = [faceNormal(a, 25), faceNormal(b, 35)]
    const { normal, point } = cut.plane
    const along = (n: typeof na) => normal.x * n.x + normal.y * n.y + normal.z * n.z
    // the cut leans equally to both faces
    expect(Math.abs(along(na))).toBeCloseTo(Math.abs(along(nb)), 9)
    const off = (m: Member, n: typeof na) =>
      n.x * (point.x - m.axis.from.x) +
      n.y * (point.y - m.axis.from.y) +
      n.z * (point.z - m.axis.from.z)
    // and a point midway through one board is midway through the other
    expect(off(a, na)).toBeCloseTo(0, 6)
    expect(off(b, nb)).toBeCloseTo(0, 6)
  })

  test('the top lies in the rafters’ top plane, the back square to it through the overhang line', () => {
    const spec = framed(hipRoof('square'))
    const board = fasciaOn(spec, 0)
    // half the board's 30 mm down the slope from the overhang line
    const inside = -450 - 15 * Math.cos(rad(25))
    expect(board.topInSlope).toBe(true)
    expect(board.dropMm).toBe(0)
    expect(board.axis.from.y).toBeCloseTo(inside, 6)
    expect(board.axis.from.z).toBeCloseTo(spec.standMm + inside * tan(25), 6)
  })
})
