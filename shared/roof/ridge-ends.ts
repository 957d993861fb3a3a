import type { Ground } from './build-pieces.ts'
import { convexOverlap, polygonBox, polygonSignedArea } from './convex.ts'
import { bodyDirection, phases } from './joint-phases.ts'
import type { EndJob } from './joint-phases.ts'
import { gather } from './lists.ts'
import type { Piece, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import type { Near } from './trim.ts'
import { add2, cross2, dot2, left2, scale2, sub2 } from './vector.ts'

/** A ridge end this near to a gable's line stands on it. */
const onGableMm = 1
/** Overlaps smaller than this in plan are touching faces. */
const touchMm2 = 0.01
/** A ridge's end stands at least this clear of another one on its side. */
const leastClearMm = 1
/** A ridge end can be kept back as far as this from its node by what passes there. */
const backMm = 300

/** The verge overhang of the gable that a ridge end stands on; null where it does not. */
const vergeMm = (ground: Ground, ridge: Piece, point: Point2): number | null => {
  for (const edge of ground.plates.edges) {
    if (edge.finish !== 'gable') continue
    if (Math.abs(dot2(edge.along, ridge.dir)) > Math.SQRT1_2) continue
    const off = sub2(point, edge.from)
    const along = dot2(edge.along, off)
    const isBeside = along < -onGableMm || along > edge.lengthMm + onGableMm
    if (!isBeside && Math.abs(dot2(edge.inward, off)) < onGableMm) return edge.overhangMm
  }
  return null
}

/**
 * How far past its node a ridge must run so that another one bears fully on its side there and its end
 * still stands clear of that one's far side, mm.
 */
const coverMm = (ground: Ground, job: EndJob, away: Point2, other: EndJob): number => {
  const { piece, end } = job
  const node = end === 'head' ? piece.head : piece.foot
  const start = other.end === 'head' ? other.piece.head : other.piece.foot
  const out = bodyDirection(other.piece, other.end)
  const turn = cross2(away, out)
  if (Math.abs(turn) < 1e-6) return 0
  // where the other's centre line crosses the side that it bears on, then half of it further
  const off = sub2(start, node)
  const aside = Math.sign(turn) * piece.halfMm - cross2(away, off)
  const centre = dot2(away, off) + (aside / turn) * dot2(away, out)
  const half = ground.roof.sections.rafter.thicknessMm / 2
  return centre + other.piece.halfMm / Math.abs(turn) + Math.max(leastClearMm, half - piece.halfMm)
}

const stripOf = (start: Point2, end: Point2, along: Point2, halfMm: number): Point2[] => {
  const aside = scale2(left2(along), halfMm)
  return [sub2(start, aside), sub2(end, aside), add2(end, aside), add2(start, aside)]
}

/** Whether a ridge's end, as cut, would run into another ridge between that one's ends. */
export const runsInto = ({ piece, end }: EndJob, cut: PlanCut, other: Piece): boolean => {
  if (piece === other) return false
  const away = end === 'head' ? piece.dir : scale2(piece.dir, -1)
  const own = stripOf(
    sub2(cut.point, scale2(away, 3 * piece.halfMm)),
    cut.point,
    away,
    piece.halfMm,
  )
  const shared = convexOverlap(own, stripOf(other.foot, other.head, other.dir, other.halfMm))
  return polygonSignedArea(shared) > touchMm2
}

/** How far past its node a ridge can run before it meets a hip or valley that passes, mm. */
const clearMm = (piece: Piece, node: Point2, away: Point2, pastMm: number, near: Near): number => {
  const [start, end] = [add2(node, scale2(away, -backMm)), add2(node, scale2(away, pastMm))]
  const own = stripOf(start, end, away, piece.halfMm)
  let clear = pastMm
  for (const { polygon } of near(polygonBox(own))) {
    const shared = convexOverlap(own, polygon.points)
    if (polygonSignedArea(shared) < touchMm2) continue
    clear = Math.min(clear, ...shared.map((p) => dot2(sub2(p, node), away)))
  }
  return clear
}

/**
 * Where a ridge that butts nothing ends: out to the verge on a gable, otherwise half a rafter past its
 * joint, further where another ridge or a rafter beside the joint bears on its side there, and short of
 * a hip or valley in `near` that passes.
 */
export const ridgeEnd = (
  ground: Ground,
  job: EndJob,
  jobs: readonly EndJob[],
  near: Near,
): PlanCut => {
  const { piece, end, joint } = job
  const away = scale2(bodyDirection(piece, end), -1)
  const node = end === 'head' ? piece.head : piece.foot
  const butting = jobs.filter(
    (other) => other.phase === phases.ridgeButt && other.joint === joint && joint !== null,
  )
  const commons = jobs.filter(
    (other) =>
      other.piece.onRidge && other.end === 'head' && other.joint === joint && joint !== null,
  )
  const wanted = Math.max(
    ground.roof.sections.rafter.thicknessMm / 2,
    ...butting.map((other) => coverMm(ground, job, away, other)),
    ...commons
      .filter((other) => other.piece.slopes.some((slope) => piece.slopes.includes(slope)))
      .map((other) => dot2(away, sub2(other.piece.head, node)) + other.piece.halfMm),
  )
  const past = vergeMm(ground, piece, node) ?? clearMm(piece, node, away, wanted, near)
  return { point: add2(node, scale2(away, past)), normal: away, mitreWith: null }
}

/** The ends of ridges at a joint, and both ways of one that runs through, as ends already placed. */
export const ridgeDirections = (pieces: readonly Piece[], joints: readonly number[]): EndJob[] =>
  gather(pieces, (piece) => {
    if (piece.role !== 'ridge') return []
    return gather(joints, (joint): EndJob[] => {
      const ends: EndJob['end'][] = piece.through.includes(joint)
        ? ['head', 'foot']
        : piece.headJoint === joint
          ? ['head']
          : piece.footJoint === joint
            ? ['foot']
            : []
      return ends.map((end) => ({ piece, end, phase: phases.ridge, joint }))
    })
  })
