import type { Cut, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { backingOfSlopes } from './own-slopes.ts'
import {
  backingDeg,
  directionToBuilding,
  heelPoint,
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

/** The spec is exact, so what it says twice must agree to a hundredth of a millimetre. */
export const LENGTH_TOL_MM = 0.01
export const ANGLE_TOL_DEG = 0.001

/** A head's point this near the centre line is called central. */
const CENTRAL_MM = 0.1
const UNIT_TOL = 1e-9

type Check = Complaint['check']

function expectNear(
  complain: Complain,
  piece: Piece,
  check: Check,
  name: string,
  published: number,
  rebuilt: number,
  tolerance: number,
): void {
  const out = published - rebuilt
  if (Math.abs(out) <= tolerance) return
  const text = `${name} is given as ${published.toFixed(4)}, the timber has ${rebuilt.toFixed(4)}`
  complain({ check, marks: [piece.member.mark], out, text })
}

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

const sectionNames: Record<Member['role'], keyof Roof['sections']> = {
  ridge: 'ridge',
  hip: 'hip',
  'broken-hip': 'hip',
  valley: 'valley',
  common: 'rafter',
  'crown-end': 'rafter',
  creeper: 'rafter',
  'valley-creeper': 'rafter',
  'cripple-creeper': 'rafter',
  underpurlin: 'underpurlin',
  'collar-tie': 'collarTie',
  fascia: 'fascia',
  barge: 'barge',
}

/** Every member is of the timber typed in for its role. */
function checkSection(complain: Complain, piece: Piece, roof: Roof): void {
  const { role, section, mark } = piece.member
  const typed = roof.sections[sectionNames[role]]
  for (const key of ['thicknessMm', 'depthMm'] as const) {
    const out = section[key] - (typed?.[key] ?? 0)
    if (Math.abs(out) <= LENGTH_TOL_MM) continue
    const text = `its section's ${key} is not the one typed in, mm`
    complain({ check: 'numbers', marks: [mark], out, text })
  }
}

function checkLengths(complain: Complain, piece: Piece, tailAllowanceMm: number): void {
  const { member, own } = piece
  const { from, to } = member.axis
  const run = Math.hypot(to.x - from.x, to.y - from.y)
  const rise = to.z - from.z
  const near = (name: string, published: number, rebuilt: number, tol = LENGTH_TOL_MM): void =>
    expectNear(complain, piece, 'numbers', name, published, rebuilt, tol)
  near('run', member.runMm, run)
  near('rise', member.riseMm, rise)
  near('pitch', member.pitchDeg, toDeg(Math.atan2(rise, run)), ANGLE_TOL_DEG)
  near('set-out length', member.setOutLengthMm, Math.hypot(run, rise))
  const at = (end: Cut['end']): number[] =>
    member.cuts.filter((c) => c.end === end).map((c) => c.alongMm)
  const heads = at('head')
  const feet = at('foot')
  const tails = at('tail')
  if (heads.length === 0 || feet.length + tails.length === 0) {
    const text = 'is not cut at both ends'
    complain({ check: 'numbers', marks: [member.mark], out: 0, text })
    return
  }
  // To the nearest cut: two cheeks may cross the centre line at different places.
  near('head deduction', member.headDeductionMm, member.setOutLengthMm - Math.max(...heads))
  near('foot deduction', member.footDeductionMm, feet.length > 0 ? Math.min(...feet) : 0)
  near('tail', member.tailLengthMm, tails.length > 0 ? -Math.max(...tails) : 0)
  const alongs = own.map((p) => p[0])
  const allowance = tails.length > 0 ? tailAllowanceMm : 0
  near('cut length', member.cutLengthMm, Math.max(...alongs) - Math.min(...alongs) + allowance)
}

function checkBirdsmouth(complain: Complain, piece: Piece): void {
  const { member } = piece
  const mouth = member.birdsmouth
  if (mouth === null) return
  const depth = heelPoint(member)[2] + member.section.depthMm
  const near = (name: string, published: number, rebuilt: number, tol = LENGTH_TOL_MM): void =>
    expectNear(complain, piece, 'numbers', `birdsmouth ${name}`, published, rebuilt, tol)
  near('depth', mouth.depthMm, depth)
  near('seat', mouth.seatMm, depth / sinDeg(mouth.seatFromEdgeDeg))
  near('heel', mouth.heelMm, depth / sinDeg(mouth.heelFromEdgeDeg))
  near('seat angle', mouth.seatFromEdgeDeg, member.pitchDeg, ANGLE_TOL_DEG)
  near('heel angle', mouth.heelFromEdgeDeg, 90 - member.pitchDeg, ANGLE_TOL_DEG)
}

/**
 * How far left of the centre line the head reaches furthest; 0 when square across. Read as a tape
 * reads it, from the heel plumb line: a backed arris lies lower and so counts from further back.
 */
function headPointLeftMm(piece: Piece): number {
  const fromHeel = (p: Vec): number => p[0] - p[2] * tanDeg(piece.member.pitchDeg)
  const furthest = Math.max(...piece.own.map(fromHeel))
  const sides = piece.own.filter((p) => fromHeel(p) > furthest - 1e-5).map((p) => p[1])
  return (Math.min(...sides) + Math.max(...sides)) / 2
}

/** Hand is the side of that point; so near the centre that no tape tells, either will do. */
function checkHand(complain: Complain, piece: Piece): void {
  const left = headPointLeftMm(piece)
  const { hand, mark } = piece.member
  const side = left > 0 ? 'left' : 'right'
  const central = Math.abs(left) < 0.001
  const either = Math.abs(left) < CENTRAL_MM && hand === null
  const fits = central ? hand === null : either || hand === side
  if (fits) return
  const text = `hand is ${hand ?? 'none'}, the head's long point is this far left of centre, mm`
  complain({ check: 'numbers', marks: [mark], out: left, text })
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

/** Compares everything a spec says twice about one member, and its marked cuts with their planes. */
export function checkNumbers(complain: Complain, site: Site, piece: Piece): void {
  const backed = backingOfSlopes(piece, site.surface)
  for (const sawn of piece.sawn) {
    checkAgainstSpace(complain, piece, sawn)
    checkPoints(complain, piece, sawn)
    checkAngles(complain, piece, sawn.cut, site.settings.sawMaxTiltDeg)
    if (backed !== null) checkOtherTop(complain, piece, sawn, backed)
  }
  checkSection(complain, piece, site.roof)
  checkLengths(complain, piece, site.roof.tailAllowanceMm)
  checkBirdsmouth(complain, piece)
  checkHand(complain, piece)
}
