import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { Cut, FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import {
  bearingDeg,
  betweenDeg,
  bevelRows,
  type Corner,
  DEG,
  MM,
  rad,
  tanDeg,
  titled,
  valleyCorners,
} from '../support/corners.ts'
import { cutsAt, near, ofRole, planeOfEdge, rafterAtHead } from '../support/members.ts'
import { misfits, type Row } from '../support/misfits.ts'
import { makeRoof } from '../support/roofs.ts'

/**
 * Source: tests/fixtures/corners.json, the 8 corners that turn inwards; computed from 3-D vectors
 * alone, outside this program. Tolerances as stated there: 0.01 mm, 0.001°.
 *
 * What the list leaves unsaid: it gives backings without a sign. A slope whose plate and valley stand
 * at over 90° in plan rises away from the valley (backing under 0, the top is dished); under 90° it
 * falls away from it, which the dihedral of that case bears out (180 less one backing, plus the other).
 * Drops are given for hips only: those of a valley follow from its backings as a hip's do.
 */
type Side = 1 | 2
const sides: Side[] = [1, 2]
const planOf = ({ out }: Corner, side: Side): number => out[`hip_plan_from_plate${side}_deg`]

/**
 * Two wings, gabled at their far ends, whose ridges meet at one height over the valley's head. Long
 * enough that two creepers and more step along each side of it; the second wing's overhang levels
 * the eaves, so that both tail cheeks of the valley cross its centre line at one place.
 */
function wingsAt(corner: Corner, valleyTop: Roof['valleyTop']): Roof {
  const { in: given } = corner
  const least = Math.min(...sides.map((side) => Math.abs(Math.cos(rad(planOf(corner, side))))))
  const planMm = (3.9 * given.spacing_mm) / least
  const [wide1, wide2] = sides.map((side) => 2 * planMm * Math.sin(rad(planOf(corner, side))))
  const turn = rad(180 - given.interior_deg)
  const [along, in2] = [
    { x: Math.cos(turn), y: Math.sin(turn) },
    { x: -Math.sin(turn), y: Math.cos(turn) },
  ]
  const longMm = 8000
  const at = (alongMm: number, inMm: number): [number, number] => [
    along.x * alongMm + in2.x * inMm,
    along.y * alongMm + in2.y * inMm,
  ]
  const outer = (wide1! - in2.y * wide2!) / along.y
  const wing2 = [at(longMm, 0), at(longMm, wide2!), at(outer, wide2!)]
  const valley = { thicknessMm: given.hip_or_valley_thickness_mm, depthMm: 240 }
  const { pitch1_deg: one, pitch2_deg: two, overhang1_mm: overhangMm } = given
  const roof = makeRoof(
    [[-longMm, 0], [0, 0], ...wing2, [-longMm, wide1!]],
    [one, two, 'gable', two, one, 'gable'],
    {
      valleyTop,
      overhangMm,
      maxSpacingMm: given.spacing_mm,
      sections: {
        rafter: { thicknessMm: 45, depthMm: 140 },
        hip: valley,
        valley,
        ridge: { thicknessMm: 35, depthMm: 240 },
      },
    },
  )
  for (const edge of [1, 3]) roof.edges[edge]!.overhangMm = (overhangMm * tanDeg(one)) / tanDeg(two)
  return roof
}

type Built = { spec: FrameSpec; roof: Roof; valley: Member; corner: Corner }

function build(corner: Corner, valleyTop: Roof['valleyTop']): Built {
  const roof = wingsAt(corner, valleyTop)
  const spec = frameRoof(roof)
  const valley = ofRole(spec, 'valley').find((m) => near(m.axis.from, roof.outline[1]!))
  if (valley === undefined) throw new Error('no valley starts at the corner')
  return { spec, roof, valley, corner }
}

/** Pitch, plan angles, length, tail, dihedral. */
function valleyRows({ spec, roof, valley, corner: { in: given, out } }: Built): Row[] {
  const [before, corner, after] = [roof.outline[0]!, roof.outline[1]!, roof.outline[2]!]
  const bearing = bearingDeg(corner, valley.axis.to)
  const [back, on] = [bearingDeg(corner, before), bearingDeg(corner, after)]
  // plate 1 runs along y = 0
  const run1Mm = valley.axis.to.y
  const planes = [planeOfEdge(spec, 0), planeOfEdge(spec, 1)]
  const line = spec.lines.find(
    (l) => l.kind === 'valley' && planes.every((p) => l.planes.includes(p)),
  )
  const overhangMm = out.hip_overhang_length_mm_if_equal_overhang
  return [
    ['valley pitch', valley.pitchDeg, out.hip_pitch_deg, DEG],
    ['plan angle to plate 1', betweenDeg(bearing, back), out.hip_plan_from_plate1_deg, DEG],
    ['plan angle to plate 2', betweenDeg(bearing, on), out.hip_plan_from_plate2_deg, DEG],
    ['per metre of run', (valley.setOutLengthMm / run1Mm) * 1000, out.hip_length_per_m_of_run1, MM],
    ['tail cheeks', cutsAt(valley, 'tail').length, 2, 0],
    ['tail length', valley.tailLengthMm, overhangMm, MM],
    ...cutsAt(valley, 'tail').map((cut): Row => ['overhang', -cut.alongMm, overhangMm, MM]),
    ['dihedral', line?.dihedralDeg ?? NaN, out.dihedral_deg, DEG],
    ['interior angle built', 360 - betweenDeg(back, on), given.interior_deg, DEG],
  ]
}

/** Heel and seat: square across, moved out along the valley until it clears both plate faces. */
function birdsmouthRows({ spec, valley, corner }: Built): Row[] {
  const half = corner.in.hip_or_valley_thickness_mm / 2
  const pitch = corner.out.hip_pitch_deg
  // half the thickness at a square corner; where a plate and the valley stand at under 90° it is clear
  const offset = Math.max(...sides.map((side) => -half / tanDeg(planOf(corner, side))))
  const stand = spec.standMm - valley.dropMm
  const heel = valley.section.depthMm / Math.cos(rad(pitch)) - stand + offset * tanDeg(pitch)
  const { birdsmouth } = valley
  if (birdsmouth === null) return [['the valley has a birdsmouth', 0, 1, 0]]
  return [
    ['heel offset', birdsmouth.heelOffsetMm, offset, MM],
    ['plumb cut', birdsmouth.heelFromEdgeDeg, 90 - pitch, DEG],
    ['seat cut', birdsmouth.seatFromEdgeDeg, pitch, DEG],
    ['height over plate', birdsmouth.standMm, stand, MM],
    ['heel', birdsmouth.heelMm, heel, MM],
    ['seat', birdsmouth.seatMm, heel / tanDeg(pitch), MM],
    ['top over the corner', valley.axis.from.z, stand, MM],
    ['foot deduction', valley.footDeductionMm, 0, 0],
  ]
}

/** Square: down until neither arris is proud. Dished: up until the higher arris meets its slope. */
function topRows({ roof, valley, corner }: Built): Row[] {
  const { out, in: given } = corner
  const signed = sides.map((side) =>
    planOf(corner, side) > 90 ? -out[`backing${side}_deg`] : out[`backing${side}_deg`],
  )
  const aside = given.hip_or_valley_thickness_mm / 2 / Math.cos(rad(out.hip_pitch_deg))
  const drops = signed.map((deg) => aside * tanDeg(deg))
  const opening = 180 - Math.abs(signed[0]! + signed[1]!)
  const between: Row = ['the list’s dihedral from its backings', opening, out.dihedral_deg, DEG]
  if (roof.valleyTop === 'square') {
    return [
      between,
      ['no backing', +(valley.backing === null), 1, 0],
      ['drop', valley.dropMm, Math.max(0, ...drops), MM],
    ]
  }
  // the valley rises away from the corner with slope 1 on its left (plate 1 runs into the corner)
  return [
    between,
    ['backing 1', valley.backing?.leftDeg ?? NaN, signed[0]!, DEG],
    ['backing 2', valley.backing?.rightDeg ?? NaN, signed[1]!, DEG],
    ['drop under 0', +(valley.dropMm < 0), 1, 0],
    ['drop', valley.dropMm, Math.min(...drops), MM],
  ]
}

/**
 * The cheeks of the head, marked on a square top whether it is dished afterwards or not. The list gives
 * the cheek that lies in the side of a rafter of slope 1 or 2. Such a cheek is found where a rafter stands
 * at the head, and at a square corner, where each ridge runs as the other slope's rafters do. A ridge
 * stands square to its own rafters: in plan, in its slope, and under the blade the angles make up 90°;
 * across a square top at the valley's pitch the two tangents make cos².
 */
function cheekRows({ roof, valley, corner: { out } }: Built, side: Side): Row[] {
  const [from, to] = side === 1 ? [roof.outline[0]!, roof.outline[1]!] : roof.outline.slice(1, 3)
  const plateDeg = bearingDeg(from!, to!)
  const turnFrom = (cut: Cut): number => {
    const { x, y } = cut.plane.normal
    const deg = betweenDeg(bearingDeg({ x: 0, y: 0 }, { x, y }), plateDeg)
    return Math.min(deg, 180 - deg)
  }
  const heads = cutsAt(valley, 'head')
  const inRafter = heads.find((cut) => turnFrom(cut) < 1e-6)
  const onRidge = heads.find((cut) => turnFrom(cut) > 90 - 1e-6)
  const listed = out[`hip_to_rafter${side}`]
  const inRoof = out[`hip_to_rafter${side}_in_roof_plane_deg`]
  const rows: Row[] = [
    ['head cheeks', heads.length, 2, 0],
    [`a cheek on slope ${side}`, +(inRafter !== undefined || onRidge !== undefined), 1, 0],
  ]
  if (inRafter !== undefined) {
    rows.push(...bevelRows(`cheek as rafter ${side}`, inRafter, inRafter.edge.fromEdgeDeg, listed))
  }
  if (onRidge !== undefined) {
    const square = Math.cos(rad(out.hip_pitch_deg)) ** 2 / tanDeg(listed.edge_from_edge)
    rows.push(
      ...bevelRows(`cheek on ridge ${side}`, onRidge, onRidge.edge.fromEdgeDeg, {
        face_from_edge: listed.face_from_edge,
        edge_from_edge: (Math.atan(square) * 180) / Math.PI,
        tilt: 90 - listed.tilt,
      }),
    )
  }
  const own = onRidge ?? inRafter
  const expected = onRidge === undefined ? inRoof : 90 - inRoof
  rows.push([`cheek ${side}, roof plane`, own?.edgeOtherTop?.fromEdgeDeg ?? NaN, expected, DEG])
  return rows
}

/** Cuts of a slope's rafters against the valley, at one end of them. */
const onValley = ({ spec, valley }: Built, side: Side, end: Cut['end']) =>
  spec.members
    .filter((m) => m.planes[0] === planeOfEdge(spec, side - 1) && m.planes.length === 1)
    .flatMap((member) =>
      cutsAt(member, end)
        .filter((cut) => cut.against === valley.mark)
        .map((cut) => ({ member, cut })),
    )
    .sort((a, b) => b.member.setOutLengthMm - a.member.setOutLengthMm)

/**
 * Creepers from the valley to the ridge, and the rafter beside the valley's foot whose tail runs into
 * it; where the valley leans over its own plate, creepers from the plate up to the valley, stepping
 * down from the rafter at its head.
 */
function creeperRows(built: Built, side: Side): Row[] {
  const { spec, valley, corner } = built
  const { out } = corner
  const rises = planOf(corner, side) > 90
  const creepers = onValley(built, side, rises ? 'foot' : 'head')
  const tails = onValley(built, side, 'tail')
  const lengths = creepers.map(({ member }) => member.setOutLengthMm)
  if (!rises)
    lengths.unshift(rafterAtHead(spec, valley, planeOfEdge(spec, side - 1)).setOutLengthMm)
  const rows: Row[] = [
    [`two creepers or more on slope ${side}`, +(creepers.length >= 2), 1, 0],
    [`differences on slope ${side}`, +(lengths.length >= 3), 1, 0],
    [`a tail against the valley on slope ${side}`, tails.length, rises ? 1 : 0, 0],
  ]
  for (const { member, cut } of [...creepers, ...tails]) {
    const name = `${member.role} ${member.mark} on slope ${side}`
    rows.push(...bevelRows(name, cut, cut.edge.fromEdgeDeg, out[`creeper${side}_to_hip`]))
  }
  for (const { member } of creepers) {
    const found = rises ? member.footDeductionMm : member.headDeductionMm
    const deduction = out[`creeper${side}_deduction_mm_along_length`]
    rows.push([`${member.mark}, deduction`, found, deduction, MM])
    rows.push([
      `${member.mark}, role`,
      +(member.role === (rises ? 'valley-creeper' : 'creeper')),
      1,
      0,
    ])
  }
  lengths.slice(1).forEach((mm, k) => {
    const difference = out[`creeper${side}_difference_mm`]
    rows.push([`difference ${k + 1} on slope ${side}`, lengths[k]! - mm, difference, MM])
  })
  return rows
}

test('there are 8 valley corners', () => {
  expect(valleyCorners).toHaveLength(8)
})

describe.each(['square', 'dished'] as const)('a valley with its top %s', (valleyTop) => {
  describe.each(titled(valleyCorners))('over a %s° corner, slopes of %s° and %s°', (...given) => {
    const built = build(given[3], valleyTop)

    test('has the pitch, length and tail of the line its two planes meet in', () => {
      expect(misfits(valleyRows(built))).toEqual([])
    })

    test('has its heel moved out to clear both plate faces, and its seat at its pitch', () => {
      expect(misfits(birdsmouthRows(built))).toEqual([])
    })

    test('has its backing and drop', () => {
      expect(misfits(topRows(built))).toEqual([])
    })

    test('has the cheeks of its head', () => {
      expect(misfits(sides.flatMap((side) => cheekRows(built, side)))).toEqual([])
    })

    test('takes creepers of one bevel, one deduction and one difference a side', () => {
      expect(misfits(sides.flatMap((side) => creeperRows(built, side)))).toEqual([])
    })
  })
})
