import { describe, expect, test } from 'vitest'

import { frameRoof } from '../../../shared/roof/frame-roof.ts'
import type { FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import {
  bearingDeg,
  betweenDeg,
  bevelRows,
  type Corner,
  DEG,
  hipCorners,
  MM,
  rad,
  tanDeg,
  titled,
} from '../support/corners.ts'
import {
  cheekAgainst,
  creepersOn,
  cutsAt,
  hipFrom,
  planeOfEdge,
  rafterAtHead,
} from '../support/members.ts'
import { misfits, type Row } from '../support/misfits.ts'
import { makeRoof } from '../support/roofs.ts'

/**
 * Source: tests/fixtures/corners.json, the 49 corners that turn outwards; computed from 3-D vectors
 * alone, outside this program. Tolerances as stated there: 0.01 mm, 0.001°. The 8 that turn inwards
 * are in valley-corners.test.ts.
 */
/**
 * A building with level ridge and gable at x = 0, whose other end meets the first side at the
 * corner to be checked. Wide enough that two creepers step down on each side of that hip. The end's
 * overhang levels the eaves, so that both tail cheeks of the hip are there to be read.
 */
function buildingWith({ in: given, out }: Corner, hipTop: Roof['hipTop']): Roof {
  const widest = Math.max(out.hip_plan_from_plate1_deg, out.hip_plan_from_plate2_deg)
  const hipPlan = (2.9 * given.spacing_mm) / Math.cos(rad(widest))
  const width = 2 * hipPlan * Math.sin(rad(out.hip_plan_from_plate1_deg))
  const long = 2 * hipPlan + 1200
  const outline: [number, number][] = [
    [0, 0],
    [long, 0],
    [long - width / Math.tan(rad(given.interior_deg)), width],
    [0, width],
  ]
  const { pitch1_deg: side, pitch2_deg: end } = given
  const thick = given.hip_or_valley_thickness_mm
  const hip = { thicknessMm: thick, depthMm: 240 }
  const rafter = { thicknessMm: 45, depthMm: 140 }
  const ridge = { thicknessMm: 35, depthMm: 240 }
  const roof = makeRoof(outline, [side, end, side, 'gable'], {
    hipTop,
    maxSpacingMm: given.spacing_mm,
    overhangMm: given.overhang1_mm,
    sections: { rafter, hip, valley: hip, ridge },
  })
  roof.edges[1]!.overhangMm = (given.overhang1_mm * tanDeg(side)) / tanDeg(end)
  return roof
}

/** Bevels of one cheek of the hip; square-topped and backed edge bevels change places by hipTop. */
function cheekRows(spec: FrameSpec, hip: Member, roof: Roof, corner: Corner, side: 1 | 2): Row[] {
  const cheek = cheekAgainst(spec, hip, planeOfEdge(spec, side - 1))
  const other = cheek.edgeOtherTop?.fromEdgeDeg ?? NaN
  const own = cheek.edge.fromEdgeDeg
  const [square, backed] = roof.hipTop === 'lowered' ? [own, other] : [other, own]
  const { out } = corner
  const inRoof =
    side === 1 ? out.hip_to_rafter1_in_roof_plane_deg : out.hip_to_rafter2_in_roof_plane_deg
  return [
    ...bevelRows(`cheek ${side}`, cheek, square, out[`hip_to_rafter${side}`]),
    [`cheek ${side}, edge bevel in the roof plane`, backed, inRoof, DEG],
  ]
}

function creeperRows(spec: FrameSpec, hip: Member, corner: Corner, side: 1 | 2): Row[] {
  const plane = planeOfEdge(spec, side - 1)
  const creepers = creepersOn(spec, hip, plane)
  const { out } = corner
  const difference = out[`creeper${side}_difference_mm`]
  const deduction = out[`creeper${side}_deduction_mm_along_length`]
  const lengths = [rafterAtHead(spec, hip, plane), ...creepers].map((m) => m.setOutLengthMm)
  const rows: Row[] = [[`creepers on slope ${side}: two or more`, +(creepers.length >= 2), 1, 0]]
  creepers.forEach((creeper, i) => {
    const name = `creeper ${creeper.mark} on slope ${side}`
    const cut = cutsAt(creeper, 'head')[0]!
    rows.push(...bevelRows(name, cut, cut.edge.fromEdgeDeg, out[`creeper${side}_to_hip`]))
    rows.push([`${name}, difference`, lengths[i]! - lengths[i + 1]!, difference, MM])
    rows.push([`${name}, deduction`, creeper.headDeductionMm, deduction, MM])
  })
  return rows
}

function hipRows(spec: FrameSpec, hip: Member, roof: Roof, { in: given, out }: Corner): Row[] {
  const planes = [planeOfEdge(spec, 0), planeOfEdge(spec, 1)]
  const [corner, before, after] = [roof.outline[1]!, roof.outline[0]!, roof.outline[2]!]
  const bearing = bearingDeg(corner, hip.axis.to)
  const [back, on] = [bearingDeg(corner, before), bearingDeg(corner, after)]
  const run1 = rafterAtHead(spec, hip, planes[0]!).runMm
  const line = spec.lines.find((l) => l.kind === 'hip' && planes.every((p) => l.planes.includes(p)))
  const tail1 = cutsAt(hip, 'tail').map((cut) => -cut.alongMm)
  const overhang = out.hip_overhang_length_mm_if_equal_overhang
  const nearestTail = tail1.sort((a, b) => Math.abs(a - overhang) - Math.abs(b - overhang))[0]
  const plan1 = betweenDeg(bearing, back)
  const plan2 = betweenDeg(bearing, on)
  return [
    ['hip pitch', hip.pitchDeg, out.hip_pitch_deg, DEG],
    ['plan angle to plate 1', plan1, out.hip_plan_from_plate1_deg, DEG],
    ['plan angle to plate 2', plan2, out.hip_plan_from_plate2_deg, DEG],
    ['per metre of run', (hip.setOutLengthMm / run1) * 1000, out.hip_length_per_m_of_run1, MM],
    ['overhang along the hip', nearestTail ?? NaN, overhang, MM],
    ['dihedral', line?.dihedralDeg ?? NaN, out.dihedral_deg, DEG],
    ['interior angle built', betweenDeg(back, on), given.interior_deg, DEG],
  ]
}

/** Backed: the bevel of each side. Lowered: the larger of the two drops (roof.md: no arris proud). */
function topRows(spec: FrameSpec, hip: Member, corner: Corner): Row[] {
  const { out } = corner
  // The hip rises away from the corner with slope 1 on its left (plate 1 runs into the corner).
  if (hip.backing !== null) {
    const half = corner.in.hip_or_valley_thickness_mm / 2
    const dropOf = (deg: number): number => (half * tanDeg(deg)) / Math.cos(rad(hip.pitchDeg))
    return [
      ['backing 1', hip.backing.leftDeg, out.backing1_deg, DEG],
      ['backing 2', hip.backing.rightDeg, out.backing2_deg, DEG],
      ['drop 1 from backing', dropOf(hip.backing.leftDeg), out.drop1_mm ?? NaN, MM],
      ['drop 2 from backing', dropOf(hip.backing.rightDeg), out.drop2_mm ?? NaN, MM],
      ['drop of a backed hip', hip.dropMm, 0, 0],
    ]
  }
  const drop = Math.max(out.drop1_mm ?? NaN, out.drop2_mm ?? NaN)
  return [
    ['drop', hip.dropMm, drop, MM],
    ['top under the stand', spec.standMm - hip.axis.from.z, drop, MM],
  ]
}

test('there are 49 hip corners', () => {
  expect(hipCorners).toHaveLength(49)
})

describe.each(['lowered', 'backed'] as const)('hips %s', (hipTop) => {
  test.each(titled(hipCorners))(
    'a hip over a %s° corner between slopes of %s° and %s° has the bevels of its two planes',
    (_angle, _pitch1, _pitch2, corner) => {
      const roof = buildingWith(corner, hipTop)
      const spec = frameRoof(roof)
      const hip = hipFrom(spec, roof.outline[1]!)
      const rows = [
        ...hipRows(spec, hip, roof, corner),
        ...topRows(spec, hip, corner),
        ...cheekRows(spec, hip, roof, corner, 1),
        ...cheekRows(spec, hip, roof, corner, 2),
        ...creeperRows(spec, hip, corner, 1),
        ...creeperRows(spec, hip, corner, 2),
      ]
      expect(misfits(rows)).toEqual([])
    },
  )
})
