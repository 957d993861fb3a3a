import type { Angle } from '../../../shared/roof/roof-types.ts'
import {
  backingDeg,
  sawnPlane,
  shortSideSign,
  type Piece,
  type SawnPlane,
} from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { JudgeSettings, Site } from './site.ts'
import { dot, sub, tanDeg, type Vec } from './vec.ts'

const AGREES_MM = 0.02
const ON_FACE_MM = 0.05

const near = (value: number, step: number): number => Math.round(value / step) * step
const nearAngle = (angle: Angle, roundDeg: number): Angle => {
  const fromEdgeDeg = near(angle.fromEdgeDeg, roundDeg)
  return { fromEdgeDeg, fromSquareDeg: 90 - fromEdgeDeg }
}

const arrisFall = (piece: Piece, side: -1 | 1): number =>
  (piece.member.section.thicknessMm / 2) * tanDeg(backingDeg(piece.member, side))

/** The cut marked from its long point to the firm's millimetre, with both bevels to its half degree. */
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

/** Corners of the finished face: what a rough cut gapes or runs in at. */
const faceCorners = (piece: Piece, sawn: SawnPlane): Vec[] =>
  piece.own.filter((p) => Math.abs(dot(sawn.normal, sub(p, sawn.point))) < ON_FACE_MM)

/** How far the roughly marked cut stands off the joint's face at its corners, square to it. */
function worstOff(piece: Piece, sawn: SawnPlane, to: JudgeSettings): number {
  const { normal, point } = roughPlane(piece, sawn, to)
  const offs = faceCorners(piece, sawn).map((corner) => {
    const along = dot(normal, sub(point, corner)) / normal[0]
    return Math.abs(along * sawn.normal[0])
  })
  return Math.max(0, ...offs)
}

/** The published worst joint error is the one that rounding the published numbers really causes. */
export function checkRounding(complain: Complain, site: Site): void {
  const { spec, pieces, settings } = site
  const errors = pieces.flatMap((piece) =>
    piece.sawn.flatMap((sawn) => {
      const { against } = sawn.cut
      if (against === null) return []
      return [{ joint: [piece.member.mark, against], off: worstOff(piece, sawn, settings) }]
    }),
  )
  const worst = Math.max(0, ...errors.map((error) => error.off))
  const { worstMm, joint } = spec.rounding
  const out = worstMm - worst
  const marks = errors.find((error) => error.off === worst)?.joint ?? ['none']
  if (Math.abs(out) > AGREES_MM) {
    const text = `worst error by rounding is given as ${worstMm.toFixed(3)}, found ${worst.toFixed(3)} mm`
    complain({ check: 'rounding', marks, out, text })
  }
  const said = errors.filter((error) => error.joint.join() === joint?.join()).map((e) => e.off)
  const short = worst - Math.max(0, ...said)
  if (short > AGREES_MM) {
    complain({ check: 'rounding', marks, out: short, text: 'the worst joint is another one, mm' })
  }
}
