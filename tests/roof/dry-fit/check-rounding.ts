import type { Angle } from '../../../shared/roof/roof-types.ts'
import {
  backingDeg,
  sawnPlane,
  shortSideSign,
  toBuilding,
  type Piece,
  type SawnPlane,
} from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { JudgeSettings, Site } from './site.ts'
import { dot, sub, tanDeg, toVec, type Vec } from './vec.ts'

const AGREES_MM = 0.02

const near = (value: number, step: number): number => Math.round(value / step) * step
const nearAngle = (angle: Angle, roundDeg: number): Angle => {
  const fromEdgeDeg = near(angle.fromEdgeDeg, roundDeg)
  return { fromEdgeDeg, fromSquareDeg: 90 - fromEdgeDeg }
}

const arrisFall = (piece: Piece, side: -1 | 1): number =>
  (piece.member.section.thicknessMm / 2) * Math.max(0, tanDeg(backingDeg(piece.member, side)))

/** The cut marked from its long point to the millimetre, with both bevels to the half degree. */
function roughPlane(piece: Piece, { cut }: SawnPlane, to: JudgeSettings): SawnPlane {
  const { member } = piece
  const long = shortSideSign(cut) === 1 ? -1 : 1
  const fall = arrisFall(piece, long)
  const along = near(cut.longPointFromHeelMm, to.roundMm) - fall * tanDeg(member.pitchDeg)
  const rough = {
    ...cut,
    face: nearAngle(cut.face, to.roundDeg),
    edge: nearAngle(cut.edge, to.roundDeg),
  }
  const left = (long * member.section.thicknessMm) / 2
  return { ...sawnPlane(member, rough), point: [along, left, -fall] }
}

/** How far the roughly marked cut stands off its true plane at the four arrises of the bar. */
function worstOff(piece: Piece, sawn: SawnPlane, to: JudgeSettings): number {
  const { normal, point } = roughPlane(piece, sawn, to)
  const { thicknessMm, depthMm } = piece.member.section
  const offs = ([-1, 1] as const).flatMap((side) =>
    [-arrisFall(piece, side), -depthMm].map((up) => {
      const left = (side * thicknessMm) / 2
      const along =
        point[0] - (normal[1] * (left - point[1]) + normal[2] * (up - point[2])) / normal[0]
      const corner: Vec = toBuilding(piece.pose, [along, left, up])
      const { plane } = sawn.cut
      return Math.abs(dot(toVec(plane.normal), sub(corner, toVec(plane.point))))
    }),
  )
  return Math.max(...offs)
}

/** The published worst joint error is the one that rounding the published numbers really causes. */
export function checkRounding(complain: Complain, site: Site): void {
  const { spec, pieces, settings } = site
  let worst = 0
  let joint = ['none']
  for (const piece of pieces) {
    for (const sawn of piece.sawn) {
      if (sawn.cut.against === null) continue
      const off = worstOff(piece, sawn, settings)
      if (off <= worst) continue
      worst = off
      joint = [piece.member.mark, sawn.cut.against]
    }
  }
  const out = spec.rounding.worstMm - worst
  if (Math.abs(out) <= AGREES_MM) return
  const text = `worst error by rounding is given as ${spec.rounding.worstMm.toFixed(3)}, found ${worst.toFixed(3)} mm`
  complain({ check: 'rounding', marks: joint, out, text })
}
