import { describe, expect, test } from 'vitest'

import corners from '../../fixtures/corners.json' with { type: 'json' }
import type { Cut, FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { example } from '../support/handbook.ts'
import { byMark, planeOfEdge } from '../support/members.ts'
import { rectangle } from '../support/plans.ts'
import { makeRoof } from '../support/roofs.ts'
import { cos, deg, framed, membersOf, rad, sin, tan, withSizes } from './sized.ts'

/** The cut of an edge's purlin against a hip or a valley. */
function cutAgainst(spec: FrameSpec, edge: number, role: 'hip' | 'valley', corner: number): Cut {
  const plane = planeOfEdge(spec, edge)
  for (const purlin of membersOf(spec, 'underpurlin')) {
    if (!purlin.planes.includes(plane)) continue
    for (const cut of purlin.cuts) {
      if (cut.against === null) continue
      const stands = byMark(spec, cut.against)
      if (stands.role === role && stands.planes.every((p) => planesAt(spec, corner).includes(p))) {
        return cut
      }
    }
  }
  throw new Error(`no underpurlin of edge ${edge} meets a ${role}`)
}

const planesAt = (spec: FrameSpec, corner: number): number[] => [
  planeOfEdge(spec, corner - 1),
  planeOfEdge(spec, corner),
]

type Given = (typeof corners.cases)[number]['in']

/** A building whose corner 1 is the one to be checked: a straight house with a skewed end. */
function hipHouse(given: Given): Roof {
  const wide = 6000
  const long = 24_000
  const outline = [
    [0, 0],
    [long, 0],
    [long - wide / Math.tan(rad(given.interior_deg)), wide],
    [0, wide],
  ] as const
  const { pitch1_deg: side, pitch2_deg: end } = given
  return makeRoof(outline, [side, end, side, 'gable'])
}

/** Two wings 6 m wide that meet at an inward corner, corner 1, gables at their far ends. */
function valleyHouse(given: Given): Roof {
  const [wide, long] = [6000, 15_000]
  const turn = rad(given.interior_deg)
  // from the inward corner: back along the first plate, and on along the second
  const back = [-1, 0] as const
  const on = [-Math.cos(turn), Math.sin(turn)] as const
  const out = [0, wide] as const
  const across = [-on[1] * wide, on[0] * wide] as const
  // where the far sides of both wings meet
  const reach = wide * Math.tan((turn - Math.PI) / 2)
  const outline = [
    [back[0] * long, 0],
    [0, 0],
    [on[0] * long, on[1] * long],
    [on[0] * long + across[0], on[1] * long + across[1]],
    [reach, wide],
    [back[0] * long + out[0], wide],
  ] as const
  const { pitch1_deg: first, pitch2_deg: second } = given
  return makeRoof(outline, [first, second, 'gable', second, first, 'gable'])
}

const settings = { maxRafterSpanMm: 1200 }
const spread = (deep: number) => ({ thicknessMm: 50, depthMm: deep })
const sized = (roof: Roof): Roof => {
  const roomy = { ...roof.sections, hip: spread(290), valley: spread(290), ridge: spread(290) }
  // rafters wide apart: only the rows' own bevels are looked at
  return withSizes({ ...roof, sections: roomy, maxSpacingMm: 1200 }, 'underpurlin')
}

describe('against hips and valleys of every kind', () => {
  // Source: tests/fixtures/corners.json, computed from 3-D vectors alone, outside this program: the angle
  // between a creeper's top arris and the hip, both in the slope. A purlin's arris is square to the
  // creeper's in that slope, so it makes the other part of the right angle.
  test.each(corners.cases.map((c) => [c.in, c.out] as const))('%o', (given, out) => {
    const valley = given.interior_deg > 180
    const spec = framed(sized(valley ? valleyHouse(given) : hipHouse(given)), settings)
    const role = valley ? 'valley' : 'hip'
    const cuts = [0, 1].map((edge) => cutAgainst(spec, edge, role, 1))
    expect(cuts[0]!.edge.fromEdgeDeg).toBeCloseTo(90 - out.creeper1_to_hip.edge_from_edge, 3)
    expect(cuts[1]!.edge.fromEdgeDeg).toBeCloseTo(90 - out.creeper2_to_hip.edge_from_edge, 3)
    // Second derivation: the plumb plane through the hip's plan line, across a face square to the slope;
    // tan of the face bevel is tan of the hip's plan angle over sin of the pitch, the tilt's sine the
    // product of both cosines (from memory; the printed forms are below).
    for (const [cut, pitch, plan] of [
      [cuts[0]!, given.pitch1_deg, out.hip_plan_from_plate1_deg],
      [cuts[1]!, given.pitch2_deg, out.hip_plan_from_plate2_deg],
    ] as const) {
      const face = Math.min(cut.face.fromEdgeDeg, 180 - cut.face.fromEdgeDeg)
      expect(face).toBeCloseTo(deg(Math.atan(Math.abs(tan(plan)) / sin(pitch))), 3)
      expect(sin(cut.bladeTiltDeg)).toBeCloseTo(Math.abs(cos(plan)) * cos(pitch), 5)
    }
  })
})

describe('at a square corner of equal pitch', () => {
  test.each([15, 22.5, 25, 30, 45])('at %d°', (pitch) => {
    // Source: steel-square practice for roof bevels as taught: purlin edge bevel by run and true length,
    // face bevel by rise and true length (roofing geometry course slides name both bevels; the figures
    // are from memory). From the edge: tan edge = length / run = 1 / cos, tan face = length / rise = 1 / sin.
    const roof = sized(makeRoof(rectangle(12_000, 8000), Array(4).fill(pitch)))
    const cut = cutAgainst(framed(roof, settings), 0, 'hip', 1)
    expect(tan(cut.edge.fromEdgeDeg)).toBeCloseTo(1 / cos(pitch), 6)
    expect(tan(cut.face.fromEdgeDeg)).toBeCloseTo(1 / sin(pitch), 6)
    expect(cut.bladeTiltDeg).toBeLessThan(45)
  })
})

test('7 in 12 and 9 in 12 at a corner of 135°: the purlin’s edge bevel as printed', () => {
  // Source: 'Square cut fascia: sample calculations' (web page of roof-geometry sketches, seen): main pitch
  // 7/12, adjacent 9/12, plan angle 135°; complement of the angle between hip and eave in the main slope,
  // P2m = arctan(cos SS / tan DD) = 4.93408°.
  const [main, adjacent] = [deg(Math.atan(7 / 12)), deg(Math.atan(9 / 12))]
  const given = { interior_deg: 135, pitch1_deg: main, pitch2_deg: adjacent } as Given
  const spec = framed(sized(hipHouse(given)), settings)
  const cut = cutAgainst(spec, 0, 'hip', 1)
  expect(cut.edge.fromSquareDeg).toBeCloseTo(4.93408, 4)
})

test('0.7 rise, called 35°: purlin cuts of the ready reckoner (reprinted TRADA Timber 2020 Yearbook, p. 169)', () => {
  // Source: tests/fixtures/handbook.json, rrr-35deg: purlin plumb cut 300 : 172, purlin edge cut 300 : 245,
  // blade and tongue on a square, good to 1 mm.
  example('rrr-35deg') // results.square_blade_tongue
  const roof = sized(makeRoof(rectangle(12_000, 8000), Array(4).fill(deg(Math.atan(0.7)))))
  const cut = cutAgainst(framed(roof, settings), 0, 'hip', 1)
  expect(Math.abs(300 / tan(cut.face.fromEdgeDeg) - 172)).toBeLessThan(1)
  expect(Math.abs(300 / tan(cut.edge.fromEdgeDeg) - 245)).toBeLessThan(1)
})
