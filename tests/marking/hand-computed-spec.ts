import type { Angle, Cut, FrameSpec, Member } from '../../shared/roof/roof-types.ts'
import { bareSpec, cutLinesOf } from '../roof/support/bare-spec.ts'

/**
 * A 3-4-5 roof worked by hand, so that every number is plain to check: run 3000, rise 2250, set-out length
 * 3750 (Pythagoras), pitch atan(3/4) = 36.8699°. Rafters 140 × 45; ridge 35 thick.
 */
export const pitchDeg = 36.8699

export const angle = (fromEdgeDeg: number): Angle => ({
  fromEdgeDeg,
  fromSquareDeg: 90 - fromEdgeDeg,
})

const plumb = angle(90 - pitchDeg)
const square = angle(90)

/** Unit normals of plumb faces square to the x axis, pointing off the head and off the tail. */
const headPlane = { point: { x: 2982.5, y: 0, z: 2236.9 }, normal: { x: 1, y: 0, z: 0 } }
const tailPlane = { point: { x: -450, y: 0, z: -337.5 }, normal: { x: -1, y: 0, z: 0 } }

export const headCut: Cut = {
  end: 'head',
  plane: headPlane,
  against: 'R1',
  alsoAgainst: [],
  // 3750 less half the ridge over the cosine: 17.5 / 0.8 = 21.875.
  alongMm: 3728.125,
  longSide: 'none',
  longPointFromHeelMm: 3728.125,
  shortPointFromHeelMm: 3728.125,
  face: plumb,
  edge: square,
  edgeOtherTop: null,
  bladeTiltDeg: 0,
  pastSaw: false,
}

export const tailCut: Cut = {
  ...headCut,
  end: 'tail',
  plane: tailPlane,
  against: null,
  // 450 / 0.8.
  alongMm: -562.5,
  longPointFromHeelMm: -562.5,
  shortPointFromHeelMm: -562.5,
}

export const common: Member = {
  mark: 'C1a',
  role: 'common',
  hand: null,
  section: { thicknessMm: 45, depthMm: 140 },
  axis: { from: { x: 0, y: 0, z: 115 }, to: { x: 3000, y: 0, z: 2365 } },
  riseMm: 2250,
  runMm: 3000,
  pitchDeg,
  setOutLengthMm: 3750,
  headDeductionMm: 21.875,
  footDeductionMm: 0,
  tailLengthMm: 562.5,
  cutLengthMm: 4374.6,
  cuts: [headCut, tailCut],
  birdsmouth: {
    seatMm: 60.2,
    heelMm: 45.1,
    depthMm: 36.1,
    standMm: 115.4,
    bearingMm: 60.2,
    heelOffsetMm: 0,
    seatFromEdgeDeg: pitchDeg,
    heelFromEdgeDeg: 90 - pitchDeg,
  },
  backing: null,
  dropMm: 0,
  planes: [0],
  weightKg: 15,
}

export const ridge: Member = {
  ...common,
  mark: 'R1',
  role: 'ridge',
  section: { thicknessMm: 35, depthMm: 190 },
  axis: { from: { x: 3000, y: -2000, z: 2350 }, to: { x: 3000, y: 2000, z: 2350 } },
  riseMm: 0,
  runMm: 4000,
  pitchDeg: 0,
  setOutLengthMm: 4000,
  tailLengthMm: 0,
  headDeductionMm: -22.5,
  footDeductionMm: -22.5,
  cutLengthMm: 4045,
  birdsmouth: null,
  dropMm: 13.1,
  cuts: [
    {
      ...headCut,
      against: null,
      plane: { point: { x: 3000, y: 2022.5, z: 2350 }, normal: { x: 0, y: 1, z: 0 } },
      alongMm: 4022.5,
      longPointFromHeelMm: 4022.5,
      shortPointFromHeelMm: 4022.5,
      face: square,
    },
    {
      ...headCut,
      end: 'foot',
      against: null,
      plane: { point: { x: 3000, y: -2022.5, z: 2350 }, normal: { x: 0, y: -1, z: 0 } },
      alongMm: -22.5,
      longPointFromHeelMm: -22.5,
      shortPointFromHeelMm: -22.5,
      face: square,
    },
  ],
}

/** Left-hand creeper: one cheek, long point on the left. */
export const creeperLeft: Member = {
  ...common,
  mark: 'CR1a',
  role: 'creeper',
  hand: 'left',
  cutLengthMm: 3000,
  cuts: [
    {
      ...headCut,
      against: 'H1a',
      alongMm: 2375,
      longSide: 'left',
      longPointFromHeelMm: 2403.1,
      shortPointFromHeelMm: 2346.9,
      edge: angle(38.6598),
      bladeTiltDeg: 45,
    },
    tailCut,
  ],
}

export const creeperRight: Member = {
  ...creeperLeft,
  mark: 'CR1b',
  hand: 'right',
  cuts: creeperLeft.cuts.map((cut) => (cut.end === 'head' ? { ...cut, longSide: 'right' } : cut)),
}

const hip: Member = { ...common, mark: 'H1a', role: 'hip' }

/** A spec of these members, with the ridge and the hip that they bear on. */
export function specOf(members: Member[], changes: Partial<FrameSpec> = {}): FrameSpec {
  const all = [...members, ridge, hip].filter(
    (m, i, list) => list.findIndex((other) => other.mark === m.mark) === i,
  )
  return bareSpec(all, { standMm: 115.4, cutLines: cutLinesOf(members), ...changes })
}
