import type { Ground } from './build-pieces.ts'
import type { Joint } from './clusters.ts'
import { piecePoint } from './piece.ts'
import type { Piece, PieceEnd, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { halfObstacle, trimEnd } from './trim.ts'
import type { Obstacle } from './trim.ts'
import { add2, cross2, dot2, length2, scale2, sub2 } from './vector.ts'

/** An end of a piece in the order of placing: lower phases run through, higher ones butt. */
type EndJob = { piece: Piece; end: PieceEnd; phase: number; joint: number | null }

/** Directions that differ by less than this (radians) are in line. */
const inLineRad = 1e-3

const phases = {
  ridge: 0,
  brokenFoot: 1,
  common: 2,
  pair: 3,
  firstCrown: 4,
  crown: 5,
  side: 6,
  hip: 7,
  creeper: 8,
} as const

/** From the joint towards the piece's body, in plan. */
const bodyDirection = (piece: Piece, end: PieceEnd): Point2 =>
  end === 'head' ? scale2(piece.dir, -1) : piece.dir

const turn = (from: Point2, to: Point2): number => Math.atan2(cross2(from, to), dot2(from, to))

/** The crown that continues a ridge or a broken hip, if any: the one nearest its line, within 45°. */
const firstCrown = (crowns: Piece[], through: Point2, mustBeExact: boolean): Piece | null => {
  const off = (p: Piece) => Math.abs(turn(through, bodyDirection(p, 'head')))
  const best = crowns.reduce<Piece | null>((a, b) => (a === null || off(b) < off(a) ? b : a), null)
  if (best === null) return null
  return off(best) < (mustBeExact ? inLineRad : Math.PI / 4) ? best : null
}

/** The in-line pair of an apex with the lowest edge number, if two stand in line. */
const apexPair = (crowns: Piece[]): [Piece, Piece] | null => {
  for (const a of crowns) {
    const b = crowns.find((c) => Math.PI - Math.abs(turn(a.dir, c.dir)) < inLineRad)
    if (b !== undefined) return [a, b]
  }
  return null
}

const crownPhases = (joint: Joint, crowns: Piece[], through: Piece | null): Map<Piece, number> => {
  const phase = new Map<Piece, number>(crowns.map((piece) => [piece, phases.crown]))
  if (through !== null) {
    const isFoot = joint.rising !== null
    // out of the joint, away from what runs through it
    const out = isFoot ? scale2(through.dir, -1) : outOfRidge(through, joint)
    const first = firstCrown(crowns, out, !isFoot)
    if (first !== null) phase.set(first, phases.firstCrown)
    return phase
  }
  const pair = apexPair(crowns)
  if (pair === null) return phase
  for (const piece of crowns) {
    const square = Math.abs(dot2(piece.dir, pair[0].dir)) < inLineRad
    if (square) phase.set(piece, phases.firstCrown)
  }
  pair.forEach((piece) => phase.set(piece, phases.pair))
  return phase
}

const outOfRidge = (ridge: Piece, joint: Joint): Point2 =>
  dot2(sub2(joint.point, piecePoint(ridge, ridge.planMm / 2, 0)), ridge.dir) > 0
    ? ridge.dir
    : scale2(ridge.dir, -1)

const isRidgeAt = (piece: Piece, joint: number): boolean =>
  piece.role === 'ridge' && (piece.headJoint === joint || piece.footJoint === joint)

/** A side rafter nearer than this (cosine) to square with its broken hip stands to it as a common to a ridge. */
const squareSideCos = 0.5

/** Side rafters at the foot of a broken hip butt the crown's sides; those square to it butt its own. */
const sidePhase = (piece: Piece, joint: Joint, pieces: Piece[]): number => {
  const rising = pieces.find((p) => p.role === 'broken-hip' && p.line === joint.rising)
  if (rising === undefined) return phases.side
  return Math.abs(dot2(rising.dir, piece.dir)) < squareSideCos ? phases.common : phases.side
}

const headPhase = (ground: Ground, piece: Piece, pieces: Piece[]): number => {
  const joint = piece.headJoint === null ? null : at(ground.joints.joints, piece.headJoint)
  switch (piece.role) {
    case 'ridge':
      return phases.ridge
    case 'common':
      return phases.common
    case 'hip':
    case 'broken-hip':
      return phases.hip
    case 'crown-end':
      return phases.crown
    default:
      return joint === null ? phases.creeper : sidePhase(piece, joint, pieces)
  }
}

/** Every end that meets other timber, first placed first. */
const endJobs = (ground: Ground, pieces: Piece[]): EndJob[] => {
  const phaseOf = new Map<Piece, number>()
  pieces.forEach((piece) => phaseOf.set(piece, headPhase(ground, piece, pieces)))
  ground.joints.joints.forEach((joint, index) => {
    const crowns = pieces.filter((p) => p.role === 'crown-end' && p.headJoint === index)
    const through =
      pieces.find((p) => isRidgeAt(p, index)) ??
      pieces.find((p) => p.role === 'broken-hip' && p.footJoint === index) ??
      null
    crownPhases(joint, crowns, through).forEach((phase, piece) => phaseOf.set(piece, phase))
  })
  const jobs: EndJob[] = []
  for (const piece of pieces) {
    const phase = phaseOf.get(piece) ?? phases.creeper
    jobs.push({ piece, end: 'head', phase, joint: piece.headJoint })
    if (piece.role === 'ridge') jobs.push({ piece, end: 'foot', phase, joint: piece.footJoint })
    if (piece.role === 'broken-hip') {
      jobs.push({ piece, end: 'foot', phase: phases.brokenFoot, joint: piece.footJoint })
    }
    if (piece.footLine !== null) {
      jobs.push({ piece, end: 'foot', phase: phases.creeper, joint: null })
    }
  }
  return jobs.sort((a, b) => a.phase - b.phase || a.piece.id - b.piece.id)
}

/** The verge overhang of the gable that a ridge end stands on; null where it does not. */
const vergeMm = (ground: Ground, point: Point2): number | null => {
  for (const edge of ground.plates.edges) {
    if (edge.finish !== 'gable') continue
    const off = Math.abs(dot2(edge.inward, sub2(point, edge.from)))
    if (off < 1) return edge.overhangMm
  }
  return null
}

/** Ridges run half a rafter past the joint, or out to the verge; broken hips start half a rafter below theirs. */
const runPast = (ground: Ground, job: EndJob): PlanCut => {
  const { piece, end } = job
  const away = scale2(bodyDirection(piece, end), -1)
  const node = end === 'head' ? piece.head : piece.foot
  const past = vergeMm(ground, node) ?? ground.roof.sections.rafter.thicknessMm / 2
  return { point: add2(node, scale2(away, past)), normal: away, mitreWith: null }
}

/** Plumb planes between a piece and those of its own phase next to it round the joint. */
const mitres = (ground: Ground, job: EndJob, jobs: EndJob[], placed: EndJob[]): PlanCut[] => {
  if (job.joint === null) return []
  const joint = at(ground.joints.joints, job.joint)
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
    const half = angle(next) / 2
    const cos = Math.cos(half)
    const sin = sign * Math.sin(half)
    // along the mitre, out of the joint, then square to it on the far side of the piece
    const line = { x: own.x * cos - own.y * sin, y: own.x * sin + own.y * cos }
    const normal = sign === 1 ? { x: -line.y, y: line.x } : { x: line.y, y: -line.x }
    return [{ point: joint.point, normal, mitreWith: next.piece.id }]
  })
}

/** A mitre that two pieces share once; in-line pairs get theirs from both sides. */
const distinct = (cuts: PlanCut[]): PlanCut[] =>
  cuts.filter((cut, k) => !cuts.slice(0, k).some((c) => length2(sub2(c.normal, cut.normal)) < 1e-9))

/** When an end was placed; with null, the first end of that piece. */
export type PlacedAt = (piece: number, end: PieceEnd | null) => number

/**
 * Cuts all ends that meet other timber, in the order of who runs through and who butts; changes the
 * pieces' cut lists. Tails and birdsmouths are not touched.
 */
export const cutJoints = (ground: Ground, pieces: Piece[]): PlacedAt => {
  const jobs = endJobs(ground, pieces)
  const obstacles: Obstacle[] = []
  const placed: EndJob[] = []
  for (const job of jobs) {
    const runs = job.phase === phases.ridge || job.phase === phases.brokenFoot
    const cuts = runs
      ? [runPast(ground, job)]
      : trimEnd(job.piece, job.end, obstacles, distinct(mitres(ground, job, jobs, placed)))
    if (job.end === 'head') job.piece.headCuts = cuts
    else job.piece.footCuts = cuts
    obstacles.push(halfObstacle(job.piece, job.end))
    placed.push(job)
    const standsOnPlate = job.end === 'head' && job.piece.role !== 'ridge' && !hasFootJob(job.piece)
    if (standsOnPlate) obstacles.push(halfObstacle(job.piece, 'foot'))
  }
  const headAt = pieces.map(() => -1)
  const footAt = pieces.map(() => -1)
  placed.forEach(({ piece, end }, k) => ((end === 'head' ? headAt : footAt)[piece.id] = k))
  return (piece, end) => {
    const [head = -1, foot = -1] = [headAt[piece], footAt[piece]]
    if (end !== null) return end === 'head' ? head : foot
    return foot < 0 ? head : Math.min(head, foot)
  }
}

const hasFootJob = (piece: Piece): boolean => piece.role === 'broken-hip' || piece.footLine !== null
