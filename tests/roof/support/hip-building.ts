import type { FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { framedOnce } from './framed.ts'
import { creepersOn, cutsAt, hipFrom, planeOfEdge, rafterAtHead } from './members.ts'
import { makeRoof } from './roofs.ts'

export const INCH_MM = 25.4
export const FOOT_MM = 304.8
export const inch = (mm: number): number => mm / INCH_MM
export const foot = (mm: number): number => mm / FOOT_MM
export const degOfRise = (rise: number, run: number): number =>
  (Math.atan2(rise, run) * 180) / Math.PI

export type HipBuilding = {
  roof: Roof
  spec: FrameSpec
  hip: Member
  common: Member
  crown: Member
  sideCreepers: Member[]
  endCreepers: Member[]
  ridge: Member
}

/** A rectangle with hip ends: side slopes of one run and pitch, end slopes of another. */
export function hipBuilding(
  sidePitchDeg: number,
  sideRunMm: number,
  changes: Parameters<typeof makeRoof>[2] & { endPitchDeg?: number; ridgeMm?: number } = {},
): HipBuilding {
  const { endPitchDeg = sidePitchDeg, ridgeMm = 3600, ...rest } = changes
  const tan = (deg: number): number => Math.tan((deg * Math.PI) / 180)
  const endRunMm = (sideRunMm * tan(sidePitchDeg)) / tan(endPitchDeg)
  const [long, wide] = [ridgeMm + 2 * endRunMm, 2 * sideRunMm]
  const roof = makeRoof(
    [
      [0, 0],
      [long, 0],
      [long, wide],
      [0, wide],
    ],
    [sidePitchDeg, endPitchDeg, sidePitchDeg, endPitchDeg],
    rest,
  )
  const spec = framedOnce(roof)
  const hip = hipFrom(spec, roof.outline[1]!)
  const [side, end] = [planeOfEdge(spec, 0), planeOfEdge(spec, 1)]
  return {
    roof,
    spec,
    hip,
    common: rafterAtHead(spec, hip, side),
    crown: rafterAtHead(spec, hip, end),
    sideCreepers: creepersOn(spec, hip, side),
    endCreepers: creepersOn(spec, hip, end),
    ridge: spec.members.find((m) => m.role === 'ridge')!,
  }
}

const tanOf = (deg: number): number => Math.tan((deg * Math.PI) / 180)

/** Tangent of the edge bevel of a head cut: blade over tongue, as a square is laid on the timber. */
export const edgeTan = (member: Member): number =>
  tanOf(cutsAt(member, 'head')[0]!.edge.fromEdgeDeg)
export const faceTan = (member: Member): number =>
  tanOf(cutsAt(member, 'head')[0]!.face.fromEdgeDeg)
