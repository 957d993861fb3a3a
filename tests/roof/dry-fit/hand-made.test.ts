import { expect, test } from 'vitest'

import type {
  Angle,
  Cut,
  FrameSpec,
  Member,
  Roof,
  RoofPlane,
} from '../../../shared/roof/roof-types.ts'
import { makeRoof } from '../support/roofs.ts'
import { reportLines } from './report.ts'
import { loadSolidKit } from './solid-kit.ts'
import { dryFit } from './stand-up.ts'

/**
 * A small gable worked out by hand with sine, cosine and tangent of 25°, no part of it from the
 * program: the dry fit must accept it, and must complain once a length is a millimetre out.
 */
const RAD = Math.PI / 180
const [sin, cos, tan] = [Math.sin(25 * RAD), Math.cos(25 * RAD), Math.tan(25 * RAD)]
const RUN = 2000
const STAND = 113
const HEEL = 140 / cos - STAND
const RIDGE_HALF = 17.5
const HEAD = (RUN - RIDGE_HALF) / cos

const roof: Roof = makeRoof(
  [
    [0, 0],
    [645, 0],
    [645, 2 * RUN],
    [0, 2 * RUN],
  ],
  [25, 'gable', 25, 'gable'],
  { standMm: STAND, overhangMm: 300 },
)

const angle = (deg: number): Angle => ({ fromEdgeDeg: deg, fromSquareDeg: 90 - deg })

function squareCut(
  end: Cut['end'],
  along: number,
  against: string | null,
  plane: Cut['plane'],
): Cut {
  const deg = against === null && plane.normal.y === 0 ? 90 : 65
  return {
    end,
    plane,
    against,
    alsoAgainst: [],
    alongMm: along,
    longSide: 'none',
    longPointFromHeelMm: along,
    shortPointFromHeelMm: along,
    face: angle(deg),
    edge: angle(90),
    edgeOtherTop: null,
    bladeTiltDeg: 0,
    pastSaw: false,
  }
}

const kilograms = (thick: number, deep: number, long: number): number =>
  (thick * deep * long * 550) / 1e9

function common(mark: string, x: number, way: 1 | -1): Member {
  const heelY = way > 0 ? 0 : 2 * RUN
  const tail = 300 / cos
  const cutLengthMm = HEAD + tail + 140 * tan
  return {
    mark,
    role: 'common',
    hand: null,
    section: { thicknessMm: 45, depthMm: 140 },
    axis: { from: { x, y: heelY, z: STAND }, to: { x, y: RUN, z: STAND + RUN * tan } },
    riseMm: RUN * tan,
    runMm: RUN,
    pitchDeg: 25,
    setOutLengthMm: RUN / cos,
    headDeductionMm: RIDGE_HALF / cos,
    footDeductionMm: 0,
    tailLengthMm: tail,
    cutLengthMm,
    cuts: [
      squareCut('head', HEAD, 'R1', {
        point: { x, y: RUN - way * RIDGE_HALF, z: STAND + (RUN - RIDGE_HALF) * tan },
        normal: { x: 0, y: way, z: 0 },
      }),
      squareCut('tail', -tail, null, {
        point: { x, y: heelY - way * 300, z: STAND - 300 * tan },
        normal: { x: 0, y: -way, z: 0 },
      }),
    ],
    birdsmouth: {
      seatMm: HEEL / tan,
      heelMm: HEEL,
      depthMm: HEEL * cos,
      standMm: STAND,
      bearingMm: Math.min(90, HEEL / tan),
      heelOffsetMm: 0,
      seatFromEdgeDeg: 25,
      heelFromEdgeDeg: 65,
    },
    backing: null,
    dropMm: 0,
    planes: [way > 0 ? 0 : 1],
    weightKg: kilograms(45, 140, cutLengthMm),
  }
}

function ridge(): Member {
  const dropMm = RIDGE_HALF * tan
  const z = RUN * tan + STAND - dropMm
  const end = (name: Cut['end'], along: number, x: number): Cut =>
    squareCut(name, along, null, {
      point: { x: along, y: RUN, z },
      normal: { x, y: 0, z: 0 },
    })
  return {
    mark: 'R1',
    role: 'ridge',
    hand: null,
    section: { thicknessMm: 35, depthMm: 190 },
    axis: { from: { x: 0, y: RUN, z }, to: { x: 645, y: RUN, z } },
    riseMm: 0,
    runMm: 645,
    pitchDeg: 0,
    setOutLengthMm: 645,
    headDeductionMm: -300,
    footDeductionMm: -300,
    tailLengthMm: 0,
    cutLengthMm: 1245,
    cuts: [end('foot', -300, -1), end('head', 945, 1)],
    birdsmouth: null,
    backing: null,
    dropMm,
    planes: [0, 1],
    weightKg: kilograms(35, 190, 1245),
  }
}

function handMade(): FrameSpec {
  const members = [
    ridge(),
    common('C1', 22.5, 1),
    common('C2', 622.5, 1),
    common('C3', 22.5, -1),
    common('C4', 622.5, -1),
  ]
  const areaM2 = (645 * RUN) / cos / 1e6
  const slope = { pitchDeg: 25, areaM2, areaWithEavesM2: areaM2 }
  const half = (from: number, to: number): RoofPlane['polygon'] => [
    { x: from, y: from === 0 ? 0 : 2 * RUN, z: 0 },
    { x: to, y: from === 0 ? 0 : 2 * RUN, z: 0 },
    { x: to, y: RUN, z: RUN * tan },
    { x: from, y: RUN, z: RUN * tan },
  ]
  const sum = (from: Member[], key: 'cutLengthMm' | 'weightKg'): number =>
    from.reduce((total, m) => total + m[key], 0)
  const groups = [members.slice(0, 1), members.slice(1)]
  return {
    standMm: STAND,
    planes: [
      { ...slope, edges: [0], polygon: half(0, 645) },
      { ...slope, edges: [2], polygon: half(645, 0) },
    ],
    lines: [],
    members,
    cutLines: groups.map((group) => ({
      mark: group[0]!.mark,
      role: group[0]!.role,
      section: group[0]!.section,
      cutLengthMm: group[0]!.cutLengthMm,
      quantity: group.length,
      left: 0,
      right: 0,
      members: group.map((m) => m.mark),
    })),
    totals: {
      roofAreaM2: 2 * areaM2,
      roofAreaWithEavesM2: 2 * areaM2,
      ridgeMm: 0,
      hipMm: 0,
      valleyMm: 0,
      eaveMm: 0,
      vergeMm: 0,
      bySection: groups.map((group) => ({
        section: group[0]!.section,
        pieces: group.length,
        lengthMm: sum(group, 'cutLengthMm'),
        weightKg: sum(group, 'weightKg'),
      })),
    },
    cautions: [],
    planing: [],
    // Half a degree marks 65° and 90° exactly; what is left is the head's long point, square to the cut.
    rounding: { worstMm: Math.abs(HEAD - Math.round(HEAD)) * cos, joint: ['C1', 'R1'] },
  }
}

test('a gable worked out by hand goes together', async () => {
  const kit = await loadSolidKit()
  expect(Math.abs(sin / cos - tan)).toBeLessThan(1e-12)
  expect(reportLines(dryFit(kit, roof, handMade()))).toEqual([])
})

test('a common a millimetre long shares timber with the ridge, and one short leaves its joint open', async () => {
  const kit = await loadSolidKit()
  const checksWith = (moreMm: number): string[] => {
    const spec = handMade()
    spec.members[1]!.cuts[0]!.alongMm += moreMm
    return dryFit(kit, roof, spec).map((c) => c.check)
  }
  expect(checksWith(1)).toContain('overlap')
  expect(checksWith(-1)).toContain('joint')
})
