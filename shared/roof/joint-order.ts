import { brokenFootCut, sidesAt } from './broken-foot.ts'
import type { Ground } from './build-pieces.ts'
import { bodyDirection, endJobs, inLineRad, phases, turn } from './joint-phases.ts'
import type { EndJob } from './joint-phases.ts'
import type { Piece, PieceEnd, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { halfObstacle, trimEnd } from './trim.ts'
import type { Obstacle } from './trim.ts'
import { add2, distance2, dot2, length2, scale2, sub2 } from './vector.ts'

type State = { pieces: Piece[]; jobs: EndJob[]; placed: EndJob[]; obstacles: Obstacle[] }

/** The verge overhang of the gable that a ridge end stands on; null where it does not. */
const vergeMm = (ground: Ground, point: Point2): number | null => {
  for (const edge of ground.plates.edges) {
    if (edge.finish !== 'gable') continue
    const off = Math.abs(dot2(edge.inward, sub2(point, edge.from)))
    if (off < 1) return edge.overhangMm
  }
  return null
}

/** Ridges run half a rafter past the joint, or out to the verge. */
const ridgeEnd = (ground: Ground, { piece, end }: EndJob): PlanCut => {
  const away = scale2(bodyDirection(piece, end), -1)
  const node = end === 'head' ? piece.head : piece.foot
  const past = vergeMm(ground, node) ?? ground.roof.sections.rafter.thicknessMm / 2
  return { point: add2(node, scale2(away, past)), normal: away, mitreWith: null }
}

/** Trims an end; it may run past its set-out end as far as its joint's centre and a little more. */
const trimmed = (ground: Ground, job: EndJob, obstacles: Obstacle[], cuts: PlanCut[]) => {
  const { piece, end, joint } = job
  const set = end === 'head' ? piece.head : piece.foot
  const toCentre = joint === null ? 0 : distance2(set, at(ground.joints.joints, joint).point)
  return trimEnd(piece, end, obstacles, cuts, toCentre + 3 * piece.halfMm)
}

const cutsOfEnd = (ground: Ground, job: EndJob, state: State): PlanCut[] => {
  const { jobs, placed, obstacles, pieces } = state
  if (job.phase === phases.ridge) return [ridgeEnd(ground, job)]
  if (job.phase === phases.brokenFoot) {
    const isCrown = (j: EndJob) => j.phase === phases.firstCrown && j.joint === job.joint
    const crown = jobs.find(isCrown)?.piece ?? null
    return [brokenFootCut(job.piece, crown, sidesAt(job.piece, pieces))]
  }
  return trimmed(ground, job, obstacles, distinct(mitres(ground, job, jobs, placed)))
}

/** Pieces whose centre lines miss the joint's centre by more than this share no mitre: the later one butts. */
const offCentreMm = 1

const runsThrough = (piece: Piece, centre: Point2): boolean =>
  Math.abs(dot2(piece.left, sub2(centre, piece.foot))) < offCentreMm

/** Plumb planes between a piece and those of its own phase next to it round the joint. */
const mitres = (ground: Ground, job: EndJob, jobs: EndJob[], placed: EndJob[]): PlanCut[] => {
  if (job.joint === null) return []
  const centre = at(ground.joints.joints, job.joint).point
  const own = bodyDirection(job.piece, job.end)
  const round = [...placed, ...jobs.filter((j) => j.phase === job.phase)].filter(
    (j) => j.joint === job.joint && j.piece !== job.piece,
  )
  return ([1, -1] as const).flatMap((sign) => {
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
}

/** A mitre that two pieces share once; in-line pairs get theirs from both sides. */
const distinct = (cuts: PlanCut[]): PlanCut[] =>
  cuts.filter((cut, k) => !cuts.slice(0, k).some((c) => length2(sub2(c.normal, cut.normal)) < 1e-9))

const endCuts = ({ piece, end }: EndJob): PlanCut[] =>
  end === 'head' ? piece.headCuts : piece.footCuts

const isShared = (cut: PlanCut, job: EndJob, jobs: EndJob[]): boolean =>
  jobs.some(
    (mate) =>
      mate.piece.id === cut.mitreWith &&
      mate.joint === job.joint &&
      endCuts(mate).some((c) => c.mitreWith === job.piece.id),
  )

/** When an end was placed; with null, the first end of that piece. */
type PlacedAt = (piece: number, end: PieceEnd | null) => number

/**
 * Cuts all ends that meet other timber, in the order of who runs through and who butts; changes the
 * pieces' cut lists. Tails and birdsmouths are not touched.
 */
export const cutJoints = (ground: Ground, pieces: Piece[]): PlacedAt => {
  const jobs = endJobs(ground, pieces)
  const obstacles: Obstacle[] = []
  const placed: EndJob[] = []
  const slots = new Map<EndJob, number>()
  const place = (job: EndJob, cuts: PlanCut[]) => {
    if (job.end === 'head') job.piece.headCuts = cuts
    else job.piece.footCuts = cuts
    const obstacle = halfObstacle(job.piece, job.end)
    const known = slots.get(job)
    if (known !== undefined) obstacles[known] = obstacle
    else slots.set(job, obstacles.push(obstacle) - 1)
  }
  jobs.forEach((job, k) => {
    place(job, cutsOfEnd(ground, job, { pieces, jobs, placed, obstacles }))
    placed.push(job)
    const hasFoot = jobs.some((j) => j.piece === job.piece && j.end === 'foot')
    if (!hasFoot) obstacles.push(halfObstacle(job.piece, 'foot'))
    if (jobs[k + 1]?.phase === job.phase) return
    // a mitre whose mate found something else to bear on is no mitre
    for (const done of jobs.filter((j) => j.phase === job.phase)) {
      const cuts = endCuts(done)
      const kept = cuts.filter((cut) => cut.mitreWith !== null && isShared(cut, done, jobs))
      if (cuts.every((cut) => cut.mitreWith === null || kept.includes(cut))) continue
      place(done, trimmed(ground, done, obstacles, kept))
    }
  })
  const headAt = pieces.map(() => -1)
  const footAt = pieces.map(() => -1)
  placed.forEach(({ piece, end }, k) => ((end === 'head' ? headAt : footAt)[piece.id] = k))
  return (piece, end) => {
    const [head = -1, foot = -1] = [headAt[piece], footAt[piece]]
    if (end !== null) return end === 'head' ? head : foot
    return foot < 0 ? head : Math.min(head, foot)
  }
}
