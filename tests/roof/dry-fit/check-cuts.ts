import type { Cut } from '../../../shared/roof/roof-types.ts'
import { ANGLE_TOL_DEG, LENGTH_TOL_MM, expectNear } from './expect-near.ts'
import { backingOfSlopes } from './own-slopes.ts'
import {
  backingDeg,
  directionToBuilding,
  shortSideSign,
  toBuilding,
  type Piece,
  type SawnPlane,
} from './rebuild-member.ts'
import type { Complain, Complaint } from './report.ts'
import type { Site } from './site.ts'
import type { Backing } from './slopes.ts'
import {
  angleDeg,
  cosDeg,
  dot,
  length,
  sinDeg,
  sub,
  tanDeg,
  toDeg,
  toVec,
  type Vec,
} from './vec.ts'

const UNIT_TOL = 1e-9

type Check = Complaint['check']

/** How far the plane has moved along the bar at an arris: own coordinates, up is negative downwards. */
function alongAt(sawn: SawnPlane, left: number, up: number): number {
  const [a, l, u] = sawn.normal
  return sawn.point[0] - (l * left + u * up) / a
}

function checkAgainstSpace(complain: Complain, piece: Piece, sawn: SawnPlane): void {
  const { thicknessMm, depthMm } = piece.member.section
  const { point, normal } = sawn.cut.plane
  const n = toVec(normal)
  const marks = [piece.member.mark]
  if (Math.abs(length(n) - 1) > UNIT_TOL) {
    const text = `the normal of the ${sawn.cut.end} cut is not of length 1`
    complain({ check: 'cut plane', marks, out: length(n) - 1, text })
  }
  const off = length(sub(toBuilding(piece.pose, sawn.point), toVec(point)))
  if (off > LENGTH_TOL_MM) {
    const text = `the plane of the ${sawn.cut.end} cut is not given where it crosses the top centre line, mm`
    complain({ check: 'cut plane', marks, out: off, text })
  }
  const turn = angleDeg(n, directionToBuilding(piece.pose, sawn.normal))
  if (turn > ANGLE_TOL_DEG) {
    const text = `the ${sawn.cut.end} cut marked from its angles is turned off its plane, degrees`
    complain({ check: 'cut plane', marks, out: turn, text })
  }
  let worst = 0
  for (const left of [-thicknessMm / 2, thicknessMm / 2]) {
    for (const up of [0, -depthMm]) {
      const corner = toBuilding(piece.pose, [alongAt(sawn, left, up), left, up])
      const off = dot(n, sub(corner, toVec(point)))
      if (Math.abs(off) > Math.abs(worst)) worst = off
    }
  }
  if (Math.abs(worst) > LENGTH_TOL_MM) {
    const text = `the ${sawn.cut.end} cut marked from its numbers stands off its plane, mm`
    complain({ check: 'cut plane', marks, out: worst, text })
  }
}

function checkPoints(complain: Complain, piece: Piece, sawn: SawnPlane): void {
  const { cut } = sawn
  const half = piece.member.section.thicknessMm / 2
  const side = shortSideSign(cut)
  const reading = (sign: -1 | 1): number => {
    const fall = half * tanDeg(backingDeg(piece.member, sign))
    return alongAt(sawn, sign * half, -fall) + fall * tanDeg(piece.member.pitchDeg)
  }
  const long = reading(side === 1 ? -1 : 1)
  const short = reading(side === 1 ? 1 : -1)
  const check: Check = 'long and short points'
  const of = `of the ${cut.end} cut`
  const tol = LENGTH_TOL_MM
  expectNear(complain, piece, check, `long point ${of}`, cut.longPointFromHeelMm, long, tol)
  expectNear(complain, piece, check, `short point ${of}`, cut.shortPointFromHeelMm, short, tol)
}

function checkAngles(complain: Complain, piece: Piece, cut: Cut, sawMaxTiltDeg: number): void {
  const n = toVec(cut.plane.normal)
  const tilt = toDeg(Math.asin(Math.min(1, Math.abs(dot(n, piece.pose.left)))))
  const name = `blade tilt of the ${cut.end} cut`
  expectNear(complain, piece, 'numbers', name, cut.bladeTiltDeg, tilt, ANGLE_TOL_DEG)
  const marks = [piece.member.mark]
  if (cut.pastSaw !== tilt > sawMaxTiltDeg + 1e-9) {
    const text = `the ${cut.end} cut is ${cut.pastSaw ? '' : 'not '}called past the saw`
    complain({ check: 'numbers', marks, out: tilt - sawMaxTiltDeg, text })
  }
  for (const angle of [cut.face, cut.edge, cut.edgeOtherTop]) {
    if (angle === null) continue
    if (cut.longSide === 'none' && angle !== cut.face) {
      const of = `edge bevel of the square ${cut.end} cut`
      expectNear(complain, piece, 'numbers', of, angle.fromEdgeDeg, 90, ANGLE_TOL_DEG)
    }
    const sum = angle.fromEdgeDeg + angle.fromSquareDeg
    if (Math.abs(sum - 90) > 1e-9) {
      const text = `an angle of the ${cut.end} cut does not sum to 90`
      complain({ check: 'numbers', marks, out: sum - 90, text })
    }
  }
}

/**
 * The top edge of the other kind (square where this hip is backed) must give the other bevel. A valley
 * is marked on its square top; its other one is the dished top, planed or not.
 */
function checkOtherTop(complain: Complain, piece: Piece, sawn: SawnPlane, backed: Backing): void {
  const other = sawn.cut.edgeOtherTop
  const side = shortSideSign(sawn.cut)
  if (other === null || side === 0) return
  const { backing, role } = piece.member
  const planed = role === 'valley' || backing === null
  const deg = planed ? (side > 0 ? backed.leftDeg : backed.rightDeg) : 0
  const across: Vec = [0, side * cosDeg(deg), -sinDeg(deg)]
  const [a] = sawn.normal
  const rebuilt = toDeg(Math.atan2(1, dot(sawn.normal, across) / Math.abs(a)))
  const name = `edge bevel of the other top, ${sawn.cut.end} cut`
  expectNear(complain, piece, 'numbers', name, other.fromEdgeDeg, rebuilt, ANGLE_TOL_DEG)
}

/** Compares every marked cut with its plane in space, and what is said twice about it. */
export function checkCuts(complain: Complain, site: Site, piece: Piece): void {
  const backed = backingOfSlopes(piece, site.surface)
  for (const sawn of piece.sawn) {
    checkAgainstSpace(complain, piece, sawn)
    checkPoints(complain, piece, sawn)
    checkAngles(complain, piece, sawn.cut, site.settings.sawMaxTiltDeg)
    if (backed !== null) checkOtherTop(complain, piece, sawn, backed)
  }
}
