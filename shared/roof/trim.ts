import { boxesMeet, clipConvex, convexOverlap, polygonBox, polygonSignedArea } from './convex.ts'
import type { Box, Labelled } from './convex.ts'
import { piecePoint } from './piece.ts'
import type { Piece, PieceEnd, PlanCut } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { dot2, scale2, sub2 } from './vector.ts'

/** What a side of a trimmed piece's plan is: a long side, a cut (by place in its list), or no face at all. */
export type Side = { kind: 'face' } | { kind: PieceEnd | 'tail'; cut: number } | { kind: 'open' }

/** Part of a piece that is already placed and in the way of later ones, in plan. */
export type Obstacle = {
  piece: number
  polygon: Labelled<Side>
  box: Box
  /** Of a timber not cut yet: the joints that it runs to, where it is no obstacle. */
  runsTo?: readonly (number | null)[]
}

/** The obstacles that may lie in a box. */
export type Near = (box: Box) => readonly Obstacle[]

/** Overlaps smaller than this in plan are touching faces. */
const touchMm2 = 0.01
/** A cut this near to parallel with the piece (cosine) is no end cut. */
const leastFacing = 0.02

/** The plan of a piece from `fromMm` to `toMm`, its sides faces and its ends open. */
const strip = (piece: Piece, fromMm: number, toMm: number): Labelled<Side> => {
  const face: Side = { kind: 'face' }
  const open: Side = { kind: 'open' }
  return {
    points: [
      piecePoint(piece, fromMm, -piece.halfMm),
      piecePoint(piece, toMm, -piece.halfMm),
      piecePoint(piece, toMm, piece.halfMm),
      piecePoint(piece, fromMm, piece.halfMm),
    ],
    labels: [face, open, face, open],
  }
}

const cutAway = (polygon: Labelled<Side>, cut: PlanCut, label: Side): Labelled<Side> =>
  clipConvex(polygon, cut.normal, dot2(cut.normal, cut.point), label)

/** How far past its set-out end a piece is drawn before it is trimmed. */
const reachPastMm = (piece: Piece): number => 12 * piece.halfMm + 400

/** How far out a tail is drawn: a hip's or valley's to its own tail lines, whose sides may reach past its middle. */
const tailReachMm = (piece: Piece): number =>
  piece.tailLines.length > 0 ? 2 * piece.tailPlanMm + 20 * piece.halfMm : piece.tailPlanMm

/** The plan of a piece with its cuts, from `fromMm` to `toMm`. */
const trimmedPlan = (piece: Piece, fromMm: number, toMm: number): Labelled<Side> => {
  let polygon = strip(piece, fromMm, toMm)
  for (const { normal, offset } of piece.tailLines) {
    polygon = clipConvex(polygon, normal, offset, { kind: 'open' })
  }
  piece.headCuts.forEach((cut, k) => (polygon = cutAway(polygon, cut, { kind: 'head', cut: k })))
  piece.footCuts.forEach((cut, k) => (polygon = cutAway(polygon, cut, { kind: 'foot', cut: k })))
  piece.tailCuts.forEach((cut, k) => (polygon = cutAway(polygon, cut, { kind: 'tail', cut: k })))
  return polygon
}

/** The whole plan of a piece, tail included. */
export const fullPlan = (piece: Piece): Labelled<Side> => {
  const past = reachPastMm(piece)
  const foot = piece.footCuts.length > 0 ? past : tailReachMm(piece)
  return trimmedPlan(piece, -foot, piece.planMm + (piece.headCuts.length > 0 ? past : 0))
}

/** One half of a piece, as an obstacle to those that come after it. */
export const halfObstacle = (piece: Piece, end: PieceEnd): Obstacle => {
  const past = reachPastMm(piece)
  const middle = piece.planMm / 2
  const polygon =
    end === 'head'
      ? trimmedPlan(piece, middle, piece.planMm + past)
      : trimmedPlan(piece, piece.footCuts.length > 0 ? -past : -tailReachMm(piece), middle)
  return { piece: piece.id, polygon, box: polygonBox(polygon.points) }
}

/** This much of a hip or valley at a joint is made with that joint. */
const jointMm = 400

/** A hip or valley between its joints, where nothing cuts it, as an obstacle to what is made at others; null where it is short. */
export const bodyObstacle = (piece: Piece): Obstacle | null => {
  const from = piece.corner === null ? jointMm : -tailReachMm(piece)
  const to = piece.planMm - jointMm
  if (to <= from) return null
  const polygon = trimmedPlan(piece, from, to)
  const runsTo = [piece.footJoint, piece.headJoint]
  return { piece: piece.id, polygon, box: polygonBox(polygon.points), runsTo }
}

/** The cut, in one of the obstacle's faces, that clears it and leaves most timber. */
const bestFace = (
  polygon: Labelled<Side>,
  obstacle: Obstacle,
  towardsBody: Point2,
): PlanCut | null => {
  let best: PlanCut | null = null
  let bestArea = touchMm2
  const { points, labels } = obstacle.polygon
  points.forEach((p, k) => {
    if (at(labels, k).kind === 'open') return
    const side = sub2(at(points, k + 1), p)
    const size = Math.hypot(side.x, side.y)
    if (size < 1e-6) return
    // outward of the obstacle, turned round: off the piece that is cut
    const normal = { x: -side.y / size, y: side.x / size }
    if (-dot2(normal, towardsBody) < leastFacing) return
    const cut: PlanCut = { point: p, normal, mitreWith: null }
    const left = polygonSignedArea(cutAway(polygon, cut, { kind: 'face' }).points)
    if (left > bestArea + touchMm2) {
      best = cut
      bestArea = left
    }
  })
  return best
}

/** Whether a polygon lies wholly beside a piece, on one side of it. */
const liesBeside = (piece: Piece, points: readonly Point2[]): boolean => {
  const asideMm = (p: Point2) => dot2(piece.left, sub2(p, piece.foot))
  return (
    points.every((p) => asideMm(p) > piece.halfMm) ||
    points.every((p) => asideMm(p) < -piece.halfMm)
  )
}

type Hit = { obstacle: Obstacle; nearest: number }

const hits = (piece: Piece, polygon: Labelled<Side>, near: Near, away: Point2): Hit[] => {
  const box = polygonBox(polygon.points)
  const found: Hit[] = []
  for (const obstacle of near(box)) {
    if (obstacle.piece === piece.id || !boxesMeet(box, obstacle.box)) continue
    if (liesBeside(piece, obstacle.polygon.points)) continue
    const shared = convexOverlap(polygon.points, obstacle.polygon.points)
    if (shared.length < 3 || polygonSignedArea(shared) < touchMm2) continue
    found.push({ obstacle, nearest: Math.min(...shared.map((p) => dot2(p, away))) })
  }
  return found.sort((a, b) => a.nearest - b.nearest)
}

/** Leaves out cuts that miss the timber which the others leave. */
const withoutMisses = (whole: Labelled<Side>, cuts: PlanCut[]): PlanCut[] => {
  let kept = cuts
  for (const cut of cuts) {
    const others = kept.filter((other) => other !== cut)
    const polygon = others.reduce((p, other) => cutAway(p, other, { kind: 'face' }), whole)
    const left = polygonSignedArea(cutAway(polygon, cut, { kind: 'face' }).points)
    if (polygonSignedArea(polygon.points) - left < touchMm2) kept = others
  }
  return kept
}

/** How far past `stop` a piece's centre line runs to the nearest of its cuts. */
const centreReachMm = (piece: Piece, cuts: PlanCut[], stop: Point2, away: Point2): number => {
  const reaches = cuts.map(
    (cut) => dot2(cut.normal, sub2(cut.point, stop)) / dot2(cut.normal, away),
  )
  return Math.min(reachPastMm(piece), ...reaches)
}

/**
 * The cuts of one end of a piece: its mitres, then a cheek in the face of each placed piece that it
 * would run into, nearest first; square through its set-out end where nothing stops it within
 * `allowPastMm` of there.
 */
export const trimEnd = (
  piece: Piece,
  end: PieceEnd,
  near: Near,
  mitres: PlanCut[],
  allowPastMm: number,
): PlanCut[] => {
  const away = end === 'head' ? piece.dir : scale2(piece.dir, -1)
  const past = reachPastMm(piece)
  const middle = piece.planMm / 2
  const whole =
    end === 'head' ? strip(piece, middle, piece.planMm + past) : strip(piece, -past, middle)
  let polygon = mitres.reduce((p, cut) => cutAway(p, cut, { kind: 'face' }), whole)
  const cuts = [...mitres]
  const clear = () => {
    for (let round = 0; round < 12; round++) {
      const facing = hits(piece, polygon, near, away)
      const cut = facing.reduce<PlanCut | null>(
        (found, hit) => found ?? bestFace(polygon, hit.obstacle, scale2(away, -1)),
        null,
      )
      if (cut === null) return
      cuts.push(cut)
      polygon = cutAway(polygon, cut, { kind: 'face' })
    }
  }
  clear()
  const stop = piecePoint(piece, end === 'head' ? piece.planMm : 0, 0)
  if (cuts.length === 0 || centreReachMm(piece, cuts, stop, away) > allowPastMm) {
    const square = { point: stop, normal: away, mitreWith: null }
    cuts.push(square)
    polygon = cutAway(polygon, square, { kind: 'face' })
    clear()
  }
  return withoutMisses(whole, cuts)
}
