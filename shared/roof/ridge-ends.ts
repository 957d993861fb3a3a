import type { Ground } from './build-pieces.ts'
import { bodyDirection, phases } from './joint-phases.ts'
import type { EndJob } from './joint-phases.ts'
import type { Piece, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { add2, cross2, dot2, scale2, sub2 } from './vector.ts'

/** A ridge end this near to a gable's line stands on it. */
const onGableMm = 1

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

/** How far past its node a ridge must run so that another timber from that node bears fully on its side, mm. */
const coverMm = (ridge: Piece, away: Point2, other: EndJob): number => {
  const out = bodyDirection(other.piece, other.end)
  const aside = Math.abs(cross2(away, out))
  if (aside < 1e-6) return 0
  return (ridge.halfMm * dot2(away, out) + other.piece.halfMm) / aside
}

/**
 * Where a ridge that butts nothing ends: out to the verge on a gable, otherwise half a rafter past its
 * joint, or further where another ridge bears on its side there.
 */
export const ridgeEnd = (ground: Ground, job: EndJob, jobs: readonly EndJob[]): PlanCut => {
  const { piece, end, joint } = job
  const away = scale2(bodyDirection(piece, end), -1)
  const node = end === 'head' ? piece.head : piece.foot
  const butting = jobs.filter(
    (other) => other.phase === phases.ridgeButt && other.joint === joint && joint !== null,
  )
  const past =
    vergeMm(ground, piece, node) ??
    Math.max(
      ground.roof.sections.rafter.thicknessMm / 2,
      ...butting.map((other) => coverMm(piece, away, other)),
    )
  return { point: add2(node, scale2(away, past)), normal: away, mitreWith: null }
}

/** The ends of ridges at a joint, and both ways of one that runs through, as ends already placed. */
export const ridgeDirections = (pieces: readonly Piece[], joints: readonly number[]): EndJob[] =>
  pieces.flatMap((piece) => {
    if (piece.role !== 'ridge') return []
    return joints.flatMap((joint): EndJob[] => {
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
