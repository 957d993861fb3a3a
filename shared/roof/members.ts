import type { Ground } from './build-pieces.ts'
import { birdsmouthOf } from './birdsmouth.ts'
import { cutsOf, finishedTimber, timberOf } from './cuts.ts'
import type { DraftCut } from './cuts.ts'
import { endCorners, endReachMm, seatedReachMm } from './ends.ts'
import { setOutLengthMm } from './piece.ts'
import type { Piece } from './piece.ts'
import type { Cut, Member } from './roof-types.ts'
import type { Timber } from './bevel.ts'
import { degrees, point3 } from './vector.ts'

/** A member whose mark, and the marks it bears on, are still piece numbers. */
export type DraftMember = Omit<Member, 'mark' | 'cuts'> & {
  piece: Pick<Piece, 'id'>
  timber: Timber
  cuts: DraftCut[]
}

/** A rafter or a timber of a line: its numbers come from a piece of the frame. */
export type FrameDraft = DraftMember & {
  piece: Piece
  /** The timber with its top dished where it is. */
  finished: Timber
}

/** A long point nearer the middle than this is central. */
const centralMm = 0.05

const atHead = (cut: DraftCut) => cut.end === 'head'

/** The side of the head's long point, looking from foot to head. */
const handOf = (piece: Piece, timber: Timber, cuts: DraftCut[]): Member['hand'] => {
  const heads = cuts.filter(atHead)
  if (piece.role === 'ridge' || heads.length === 0) return null
  if (heads.every((cut) => cut.longSide === 'none')) return null
  const corners = endCorners(timber, heads, true)
  const tip = corners.reduce((a, b) => (b.alongMm > a.alongMm + 1e-5 ? b : a))
  if (Math.abs(tip.leftMm) < centralMm) return null
  return tip.leftMm > 0 ? 'left' : 'right'
}

const nearest = (distances: number[]): number => (distances.length > 0 ? Math.min(...distances) : 0)

/** How far the set-out end is from the nearest cut; negative where the piece runs past. */
const deductions = (piece: Piece, cuts: DraftCut[]) => {
  const setOut = setOutLengthMm(piece)
  const of = (end: Cut['end'], from: (alongMm: number) => number) =>
    nearest(cuts.filter((cut) => cut.end === end).map((cut) => from(cut.alongMm)))
  return {
    headDeductionMm: of('head', (alongMm) => setOut - alongMm),
    footDeductionMm: of('foot', (alongMm) => alongMm),
    tailLengthMm: of('tail', (alongMm) => -alongMm),
  }
}

const backingOf = (piece: Piece): Member['backing'] =>
  piece.backed || piece.dished
    ? {
        leftDeg: degrees(Math.atan(piece.fall.left * piece.cos)),
        rightDeg: degrees(Math.atan(piece.fall.right * piece.cos)),
      }
    : null

/** The numbers of one piece. `bears` gives the pieces that a joint cut lies against, most first. */
export const draftMember = (
  ground: Ground,
  piece: Piece,
  standMm: number,
  bears: (cut: DraftCut) => number[],
): FrameDraft => {
  const timber = timberOf(piece, standMm)
  const cuts = cutsOf(ground, piece, timber, standMm)
  const finished = finishedTimber(piece, timber)
  const isLong = cuts.some((cut) => cut.end === 'tail' && cut.listed === null)
  const allowanceMm = isLong ? ground.roof.tailAllowanceMm : 0
  const lowerCuts = cuts.filter((cut) => !atHead(cut))
  const upper = endReachMm(finished, cuts.filter(atHead), true)
  const lower =
    piece.tailCuts.length > 0
      ? seatedReachMm(finished, lowerCuts, standMm)
      : endReachMm(finished, lowerCuts, false)
  const cutLengthMm = upper - lower + allowanceMm
  const volumeM3 = (cutLengthMm * piece.section.thicknessMm * piece.section.depthMm) / 1_000_000_000
  const riseMm = piece.head.z - piece.foot.z
  const { headDeductionMm, footDeductionMm, tailLengthMm } = deductions(piece, cuts)
  return {
    piece,
    timber,
    finished,
    role: piece.role,
    hand: handOf(piece, timber, cuts),
    section: { ...piece.section },
    axis: {
      from: { ...timber.origin },
      to: point3(piece.head, piece.head.z + standMm - piece.dropMm),
    },
    riseMm,
    runMm: piece.planMm,
    pitchDeg: degrees(Math.atan(piece.tan)),
    setOutLengthMm: setOutLengthMm(piece),
    headDeductionMm,
    footDeductionMm,
    tailLengthMm,
    cutLengthMm,
    cuts: cuts.map((cut) => ({ ...cut, bears: bears(cut) })),
    birdsmouth: birdsmouthOf(ground, piece, standMm),
    backing: backingOf(piece),
    dropMm: piece.dropMm,
    planes: [...piece.slopes],
    weightKg: volumeM3 * ground.settings.densityKgM3,
  }
}
