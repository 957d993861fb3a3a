import { boxGrid } from './box-grid.ts'
import type { BoxGrid } from './box-grid.ts'
import type { Box, Labelled } from './convex.ts'
import { gather } from './lists.ts'
import type { Piece, PieceEnd } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { fullPlan } from './trim.ts'
import type { Side } from './trim.ts'
import { add2, cross2, distance2, dot2, left2, length2, scale2, sub2 } from './vector.ts'

/** A side of a trimmed piece in plan, as a segment. */
export type Segment = { piece: number; side: Side; from: Point2; to: Point2 }

/** Faces this near to one plane bear on each other: what the agreement calls a closed joint. */
const bearingGapMm = 0.2
const leastBearingMm = 0.25
/** Faces that turn from each other by more than this (tangent, two degrees) only touch along an edge. */
const mostTurn = 0.035
/** Less of a face than this only touches a corner. */
const leastShare = 0.025

export const planSegments = (piece: number, plan: Labelled<Side>): Segment[] =>
  gather(plan.points, (from, k) => {
    const side = at(plan.labels, k)
    return side.kind === 'open' ? [] : [{ piece, side, from, to: at(plan.points, k + 1) }]
  })

/** The sides of all pieces, by piece and by where they are. */
export type SegmentIndex = { ofPiece: Segment[][]; grid: BoxGrid<Segment> }

const boxOf = ({ from, to }: Segment, growMm: number): Box => ({
  minX: Math.min(from.x, to.x) - growMm,
  minY: Math.min(from.y, to.y) - growMm,
  maxX: Math.max(from.x, to.x) + growMm,
  maxY: Math.max(from.y, to.y) + growMm,
})

export const segmentIndex = (pieces: readonly Piece[]): SegmentIndex => {
  const ofPiece = pieces.map((piece) => planSegments(piece.id, fullPlan(piece)))
  const grid = boxGrid<Segment>()
  for (const segments of ofPiece) {
    for (const segment of segments) grid.put(segment, boxOf(segment, 0))
  }
  return { ofPiece, grid }
}

/** Where along a's side two faces lie on each other in plan, with no more than the gap between; null where they do not. */
export const sharedRange = (a: Segment, b: Segment): [number, number] | null => {
  const run = sub2(a.to, a.from)
  const size = Math.hypot(run.x, run.y)
  if (size < leastBearingMm) return null
  const dir = { x: run.x / size, y: run.y / size }
  const across = left2(dir)
  const s = dot2(dir, sub2(b.from, a.from))
  const t = dot2(dir, sub2(b.to, a.from))
  // going round both pieces one way, faces that look at each other run against each other
  if (t >= s) return null
  let low = Math.max(0, Math.min(s, t))
  let high = Math.min(size, Math.max(s, t))
  if (high - low < leastBearingMm) return null
  // b's distance off a's plane runs straight from one end of b to the other
  const offFrom = dot2(across, sub2(b.from, a.from))
  const slope = (dot2(across, sub2(b.to, a.from)) - offFrom) / (t - s)
  if (Math.abs(slope) > mostTurn) return null
  const ends = [bearingGapMm, -bearingGapMm].map((gap) => s + (gap - offFrom) / slope)
  if (Math.abs(slope) > 1e-9) {
    low = Math.max(low, Math.min(...ends))
    high = Math.min(high, Math.max(...ends))
  } else if (Math.abs(offFrom) > bearingGapMm) return null
  return high - low < Math.max(leastBearingMm, leastShare * size) ? null : [low, high]
}

/** Top and underside of a piece over a point of the plan, but for the common height over plate. */
const heights = (piece: Piece, p: Point2): [number, number] => {
  const off = sub2(p, piece.foot)
  const centre = piece.foot.z - piece.dropMm + dot2(off, piece.dir) * piece.tan
  const aside = dot2(off, piece.left)
  const fall = (aside > 0 ? piece.fall.left : piece.fall.right) * Math.abs(aside)
  const top = piece.backed ? centre - fall : piece.dished ? centre + piece.dropMm - fall : centre
  return [centre - piece.section.depthMm / piece.cos, top]
}

/** Area on which two faces bear, mm²: their shared run in plan times the height they share. */
const bearingMm2 = (pieces: readonly Piece[], own: Segment, other: Segment): number => {
  const range = sharedRange(own, other)
  if (range === null) return 0
  const [a, b] = [at(pieces, own.piece), at(pieces, other.piece)]
  const run = sub2(own.to, own.from)
  const size = Math.hypot(run.x, run.y)
  const heightAt = (mm: number): number => {
    const p = add2(own.from, scale2(run, mm / size))
    const [lowA, topA] = heights(a, p)
    const [lowB, topB] = heights(b, p)
    return Math.max(0, Math.min(topA, topB) - Math.max(lowA, lowB))
  }
  const [low, high] = range
  const mean = (heightAt(low) + 4 * heightAt((low + high) / 2) + heightAt(high)) / 6
  return (high - low) * mean
}

/** A cheek all but in one plane with the one beside it lies on what that one bears on, as far as they part by less. */
const partMm = 0.001

/** A cut's side of the plan, drawn out over the cheeks beside it while it stays in their plane. */
const drawnOut = (own: Segment, ofPiece: readonly Segment[]): Segment => {
  const run = sub2(own.to, own.from)
  const dir = scale2(run, 1 / length2(run))
  const beside = (end: Point2, atStart: boolean): number => {
    const next = ofPiece.find(
      (s) =>
        s !== own &&
        s.side.kind === own.side.kind &&
        distance2(atStart ? s.to : s.from, end) < leastBearingMm / 10,
    )
    if (next === undefined) return 0
    const far = sub2(atStart ? next.from : next.to, end)
    const aside = Math.abs(cross2(dir, far))
    return length2(far) * Math.min(1, partMm / Math.max(aside, 1e-12))
  }
  return {
    ...own,
    from: sub2(own.from, scale2(dir, beside(own.from, true))),
    to: add2(own.to, scale2(dir, beside(own.to, false))),
  }
}

type MayBear = (other: number) => boolean

/** Area on which a cut of a piece bears on each other piece, mm². */
const bearingAreas = (
  pieces: readonly Piece[],
  segments: SegmentIndex,
  own: Segment,
  mayBear: MayBear,
): Map<number, number> => {
  const face = drawnOut(own, segments.ofPiece[own.piece] ?? [])
  const sums = new Map<number, number>()
  for (const other of segments.grid.near(boxOf(face, 1))) {
    if (other.piece === own.piece) continue
    if (other.side.kind !== 'face' && !mayBear(other.piece)) continue
    const shared = bearingMm2(pieces, face, other)
    if (shared > 0) sums.set(other.piece, (sums.get(other.piece) ?? 0) + shared)
  }
  return sums
}

/**
 * Pieces that a piece's cut bears on, most bearing first: on the sides of any, and on the cuts of those
 * placed before it, as `mayBear` says.
 */
export const bearings = (
  pieces: readonly Piece[],
  segments: SegmentIndex,
  piece: Piece,
  end: PieceEnd | 'tail',
  cut: number,
  mayBear: MayBear,
): number[] => {
  const own = segments.ofPiece[piece.id]?.find((s) => s.side.kind === end && s.side.cut === cut)
  if (own === undefined) return []
  return [...bearingAreas(pieces, segments, own, mayBear)]
    .sort((a, b) => b[1] - a[1] || a[0] - b[0])
    .map(([id]) => id)
}

/** An end that bears over less than this share of its faces hangs by a corner. No source. */
const leastHeld = 1 / 8

const anyMayBear: MayBear = () => true

/** Whether next to nothing holds an end of a piece, whatever was placed first. */
export const hangsByCorner = (
  pieces: readonly Piece[],
  segments: SegmentIndex,
  piece: Piece,
  end: PieceEnd,
): boolean => {
  const faces = (segments.ofPiece[piece.id] ?? []).filter((s) => s.side.kind === end)
  let [borneMm2, faceMm2] = [0, 0]
  for (const face of faces) {
    faceMm2 += (length2(sub2(face.to, face.from)) * piece.section.depthMm) / piece.cos
    bearingAreas(pieces, segments, face, anyMayBear).forEach((mm2) => (borneMm2 += mm2))
  }
  return faceMm2 > 0 && borneMm2 < leastHeld * faceMm2
}

/** Faces that share less than this touch by a corner's tip. */
const tipMm2 = 25

/** Pieces that the free end of a plumb tail stands hard against, though it is not cut for them. */
export const tailTouches = (
  pieces: readonly Piece[],
  segments: SegmentIndex,
  piece: Piece,
): number[] => {
  const { points, labels } = fullPlan(piece)
  return gather(points, (from, k): number[] => {
    if (at(labels, k).kind !== 'open') return []
    const face: Segment = {
      piece: piece.id,
      side: { kind: 'open' },
      from,
      to: at(points, k + 1),
    }
    const areas = bearingAreas(pieces, segments, face, anyMayBear)
    return [...areas].filter(([, mm2]) => mm2 > tipMm2).map(([id]) => id)
  })
}
