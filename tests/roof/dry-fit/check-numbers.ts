import type { Cut, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { ANGLE_TOL_DEG, LENGTH_TOL_MM, expectNear } from './expect-near.ts'
import { heelPoint, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { sinDeg, tanDeg, toDeg, type Vec } from './vec.ts'

/** A head's point this near the centre line is called central. */
const CENTRAL_MM = 0.1

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

/** Compares everything a spec says twice about one member. */
export function checkNumbers(complain: Complain, site: Site, piece: Piece): void {
  checkSection(complain, piece, site.roof)
  checkLengths(complain, piece, site.roof.tailAllowanceMm)
  checkBirdsmouth(complain, piece)
  checkHand(complain, piece)
}
