import type { Labelled } from './convex.ts'
import type { Piece, PieceEnd } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import type { Side } from './trim.ts'
import { dot2, left2, sub2 } from './vector.ts'

/** A side of a trimmed piece in plan, as a segment. */
type Segment = { piece: number; side: Side; from: Point2; to: Point2 }

/** Faces this near to one plane bear on each other. */
const bearingGapMm = 0.02
const leastBearingMm = 0.05

export const planSegments = (piece: number, plan: Labelled<Side>): Segment[] =>
  plan.points.flatMap((from, k) => {
    const side = at(plan.labels, k)
    return side.kind === 'open' ? [] : [{ piece, side, from, to: at(plan.points, k + 1) }]
  })

const isNear = (a: Segment, b: Segment): boolean =>
  Math.max(b.from.x, b.to.x) >= Math.min(a.from.x, a.to.x) - 1 &&
  Math.min(b.from.x, b.to.x) <= Math.max(a.from.x, a.to.x) + 1 &&
  Math.max(b.from.y, b.to.y) >= Math.min(a.from.y, a.to.y) - 1 &&
  Math.min(b.from.y, b.to.y) <= Math.max(a.from.y, a.to.y) + 1

/** How many mm of two faces lie on each other, in plan. */
const sharedMm = (a: Segment, b: Segment): number => {
  const run = sub2(a.to, a.from)
  const size = Math.hypot(run.x, run.y)
  if (size < leastBearingMm) return 0
  const dir = { x: run.x / size, y: run.y / size }
  const across = left2(dir)
  const s = dot2(dir, sub2(b.from, a.from))
  const t = dot2(dir, sub2(b.to, a.from))
  const low = Math.max(0, Math.min(s, t))
  const high = Math.min(size, Math.max(s, t))
  if (high - low < leastBearingMm) return 0
  // off plane where they overlap, since a long face reaches far beyond the cut
  const offFrom = dot2(across, sub2(b.from, a.from))
  const offTo = dot2(across, sub2(b.to, a.from))
  const off = (at: number) => Math.abs(offFrom + ((offTo - offFrom) * (at - s)) / (t - s))
  return Math.max(off(low), off(high)) > bearingGapMm ? 0 : high - low
}

/** Pieces that a piece's cut bears on, most bearing first: `mayBear` says who was placed before it. */
export const bearings = (
  segments: readonly Segment[],
  piece: Piece,
  end: PieceEnd,
  cut: number,
  mayBear: (other: number) => boolean,
): number[] => {
  const own = segments.find(
    (s) => s.piece === piece.id && s.side.kind === end && s.side.cut === cut,
  )
  if (own === undefined) return []
  const sums = new Map<number, number>()
  for (const other of segments) {
    if (other.piece === piece.id || !isNear(own, other) || !mayBear(other.piece)) continue
    const shared = sharedMm(own, other)
    if (shared > leastBearingMm) sums.set(other.piece, (sums.get(other.piece) ?? 0) + shared)
  }
  return [...sums].sort((a, b) => b[1] - a[1] || a[0] - b[0]).map(([id]) => id)
}
