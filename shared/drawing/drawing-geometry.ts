import type { Point2 } from '../roof/roof-types.ts'

/** Drawing coordinates: x to the right, y down, in px of the drawing's own width. */
export type DrawingPoint = Point2
export type Segment = { from: DrawingPoint; to: DrawingPoint }

/** A rectangle of any turn; what a label takes up. `angleDeg` is clockwise on screen. */
export type TurnedBox = {
  centre: DrawingPoint
  widthPx: number
  heightPx: number
  angleDeg: number
}

export function segmentLength(segment: Segment): number {
  return Math.hypot(segment.to.x - segment.from.x, segment.to.y - segment.from.y)
}

export function pointAlong(segment: Segment, fraction: number): DrawingPoint {
  return {
    x: segment.from.x + (segment.to.x - segment.from.x) * fraction,
    y: segment.from.y + (segment.to.y - segment.from.y) * fraction,
  }
}

/** The turn of text along a segment, chosen so that it never reads upside down: −90 < angle ≤ 90. */
export function uprightAngleDeg(segment: Segment): number {
  const angleDeg =
    (Math.atan2(segment.to.y - segment.from.y, segment.to.x - segment.from.x) * 180) / Math.PI
  // A vertical timber reads from its bottom up, like the spine of a drawing.
  if (angleDeg >= 89.9) return angleDeg - 180
  if (angleDeg < -90.1) return angleDeg + 180
  return angleDeg
}

export function boxCorners(box: TurnedBox): DrawingPoint[] {
  const turn = (box.angleDeg * Math.PI) / 180
  const cos = Math.cos(turn)
  const sin = Math.sin(turn)
  const halves: [number, number][] = [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
  ]
  return halves.map(([a, b]) => {
    const u = (a * box.widthPx) / 2
    const v = (b * box.heightPx) / 2
    return { x: box.centre.x + u * cos - v * sin, y: box.centre.y + u * sin + v * cos }
  })
}

/** Whether two convex shapes share area; touching edges do not count. */
export function convexShapesOverlap(a: DrawingPoint[], b: DrawingPoint[]): boolean {
  return !isSeparated(a, b) && !isSeparated(b, a)
}

export function boxesOverlap(a: TurnedBox, b: TurnedBox): boolean {
  const reach = Math.hypot(a.widthPx, a.heightPx) / 2 + Math.hypot(b.widthPx, b.heightPx) / 2
  if (Math.hypot(a.centre.x - b.centre.x, a.centre.y - b.centre.y) >= reach) return false
  return convexShapesOverlap(boxCorners(a), boxCorners(b))
}

/** Whether a segment runs through a box; along its edge does not count. */
export function segmentCrossesBox(segment: Segment, box: TurnedBox): boolean {
  const turn = (box.angleDeg * Math.PI) / 180
  const cos = Math.cos(turn)
  const sin = Math.sin(turn)
  const own = (p: DrawingPoint) => {
    const dx = p.x - box.centre.x
    const dy = p.y - box.centre.y
    return { x: dx * cos + dy * sin, y: dy * cos - dx * sin }
  }
  const from = own(segment.from)
  const to = own(segment.to)
  const acrossX = slabShare(from.x, to.x, box.widthPx / 2)
  const acrossY = slabShare(from.y, to.y, box.heightPx / 2)
  return Math.max(acrossX.enter, acrossY.enter, 0) < Math.min(acrossX.leave, acrossY.leave, 1)
}

/** The share of a segment, 0 to 1, at which it enters and leaves a band about nought. */
function slabShare(from: number, to: number, half: number): { enter: number; leave: number } {
  const step = to - from
  if (Math.abs(step) < 1e-9)
    return Math.abs(from) < half ? { enter: -Infinity, leave: Infinity } : { enter: 1, leave: 0 }
  const a = (-half - from) / step
  const b = (half - from) / step
  return { enter: Math.min(a, b), leave: Math.max(a, b) }
}

export function distanceToSegment(point: DrawingPoint, segment: Segment): number {
  const dx = segment.to.x - segment.from.x
  const dy = segment.to.y - segment.from.y
  const lengthSquared = dx * dx + dy * dy
  const raw =
    lengthSquared === 0
      ? 0
      : ((point.x - segment.from.x) * dx + (point.y - segment.from.y) * dy) / lengthSquared
  const foot = pointAlong(segment, Math.min(1, Math.max(0, raw)))
  return Math.hypot(point.x - foot.x, point.y - foot.y)
}

/** Whether a point lies within a closed shape, by how often a ray from it crosses the sides. */
export function isInShape(point: DrawingPoint, shape: readonly DrawingPoint[]): boolean {
  return shape.reduce((isIn, a, i) => {
    const b = shape[(i + 1) % shape.length] ?? a
    if (a.y > point.y === b.y > point.y) return isIn
    const crossX = a.x + ((b.x - a.x) * (point.y - a.y)) / (b.y - a.y)
    return crossX > point.x ? !isIn : isIn
  }, false)
}

/** `x y` pairs for an SVG `points` attribute. */
export function svgPoints(points: readonly DrawingPoint[]): string {
  return points.map((p) => `${roundPx(p.x)},${roundPx(p.y)}`).join(' ')
}

/** Whether two points come out at one place on the screen. */
export const isSamePx = (a: DrawingPoint, b: DrawingPoint): boolean =>
  roundPx(a.x) === roundPx(b.x) && roundPx(a.y) === roundPx(b.y)

export function roundPx(value: number): number {
  return Math.round(value * 100) / 100
}

/** Whether a side of `a` has all of `b` on its far side. */
function isSeparated(a: DrawingPoint[], b: DrawingPoint[]): boolean {
  return a.some((from, i) => {
    const to = a[(i + 1) % a.length] ?? from
    const normal = { x: to.y - from.y, y: from.x - to.x }
    const across = (p: DrawingPoint) => (p.x - from.x) * normal.x + (p.y - from.y) * normal.y
    const own = a.map(across)
    const others = b.map(across)
    return Math.min(...others) >= Math.max(...own) || Math.max(...others) <= Math.min(...own)
  })
}
