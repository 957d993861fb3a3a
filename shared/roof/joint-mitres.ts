import type { Ground } from './build-pieces.ts'
import { bodyDirection, inLineRad, turn } from './joint-phases.ts'
import type { EndJob } from './joint-phases.ts'
import { gather } from './lists.ts'
import type { Piece, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { dot2, length2, sub2 } from './vector.ts'

/** Pieces whose centre lines miss the joint's centre by more than this share no mitre: the later one butts. */
const offCentreMm = 1

const runsThrough = (piece: Piece, centre: Point2): boolean =>
  Math.abs(dot2(piece.left, sub2(centre, piece.foot))) < offCentreMm

/** A mitre that two pieces share once; in-line pairs get theirs from both sides. */
const distinct = (cuts: PlanCut[]): PlanCut[] =>
  cuts.filter((cut, k) => !cuts.slice(0, k).some((c) => length2(sub2(c.normal, cut.normal)) < 1e-9))

/** Plumb planes between a piece and those of its own phase next to it round the joint. */
export const jointMitres = (
  ground: Ground,
  job: EndJob,
  jobs: EndJob[],
  placed: EndJob[],
): PlanCut[] => {
  if (job.joint === null) return []
  const centre = at(ground.joints.joints, job.joint).point
  const own = bodyDirection(job.piece, job.end)
  const round = [...placed, ...jobs.filter((j) => j.phase === job.phase)].filter(
    (j) => j.joint === job.joint && j.piece !== job.piece,
  )
  const cuts = gather([1, -1] as const, (sign) => {
    const angle = (j: EndJob) => {
      const a = sign * turn(own, bodyDirection(j.piece, j.end))
      return a < 0 ? a + 2 * Math.PI : a
    }
    const next = round.reduce<EndJob | null>(
      (a, b) => (a === null || angle(b) < angle(a) ? b : a),
      null,
    )
    if (next === null || next.phase !== job.phase || angle(next) > Math.PI + inLineRad) return []
    if (!runsThrough(job.piece, centre) || !runsThrough(next.piece, centre)) return []
    const half = angle(next) / 2
    const cos = Math.cos(half)
    const sin = sign * Math.sin(half)
    // along the mitre, out of the joint, then square to it on the far side of the piece
    const line = { x: own.x * cos - own.y * sin, y: own.x * sin + own.y * cos }
    const normal = sign === 1 ? { x: -line.y, y: line.x } : { x: line.y, y: -line.x }
    return [{ point: centre, normal, mitreWith: next.piece.id }]
  })
  return distinct(cuts)
}
