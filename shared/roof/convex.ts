import type { Point2 } from './roof-types.ts'

/** A convex polygon, counter-clockwise; `labels[k]` names the side from point k to point k + 1. */
export type Labelled<L> = { points: Point2[]; labels: L[] }

export type Box = { minX: number; minY: number; maxX: number; maxY: number }

/** Points nearer than this to a clipping line lie on it: float noise at 100 m, nothing a saw sees. */
const onLineMm = 1e-7

/** Keeps the part with normal · p ≤ offset; the new side carries `label`. May come back empty. */
export const clipConvex = <L>(
  polygon: Labelled<L>,
  normal: Point2,
  offset: number,
  label: L,
): Labelled<L> => {
  const { points, labels } = polygon
  if (points.every((p) => normal.x * p.x + normal.y * p.y - offset <= onLineMm)) return polygon
  const count = points.length
  const outPoints: Point2[] = []
  const outLabels: L[] = []
  for (let k = 0; k < count; k++) {
    const p = points[k]
    const q = points[(k + 1) % count]
    const own = labels[k]
    if (p === undefined || q === undefined || own === undefined) continue
    const fp = normal.x * p.x + normal.y * p.y - offset
    const fq = normal.x * q.x + normal.y * q.y - offset
    const pIn = fp <= onLineMm
    const qIn = fq <= onLineMm
    if (pIn) {
      outPoints.push(p)
      outLabels.push(own)
    }
    if (pIn !== qIn) {
      const t = fp / (fp - fq)
      outPoints.push({ x: p.x + (q.x - p.x) * t, y: p.y + (q.y - p.y) * t })
      outLabels.push(pIn ? label : own)
    }
  }
  return { points: outPoints, labels: outLabels }
}

/** Area, counter-clockwise positive, in the square of the points' unit. */
export const polygonSignedArea = (points: readonly Point2[]): number => {
  const first = points[0]
  if (first === undefined) return 0
  let twice = 0
  for (let k = 1; k + 1 < points.length; k++) {
    const p = points[k]
    const q = points[k + 1]
    if (p === undefined || q === undefined) continue
    twice += (p.x - first.x) * (q.y - first.y) - (p.y - first.y) * (q.x - first.x)
  }
  return twice / 2
}

/** The smallest upright rectangle round some points. */
export const polygonBox = (points: readonly Point2[]): Box => {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity }
  for (const p of points) {
    box.minX = Math.min(box.minX, p.x)
    box.minY = Math.min(box.minY, p.y)
    box.maxX = Math.max(box.maxX, p.x)
    box.maxY = Math.max(box.maxY, p.y)
  }
  return box
}

export const grownBox = (box: Box, byMm: number): Box => ({
  minX: box.minX - byMm,
  minY: box.minY - byMm,
  maxX: box.maxX + byMm,
  maxY: box.maxY + byMm,
})

export const boxesMeet = (a: Box, b: Box): boolean =>
  a.minX <= b.maxX && b.minX <= a.maxX && a.minY <= b.maxY && b.minY <= a.maxY

/** What two convex polygons share, as plain points. */
export const convexOverlap = (a: readonly Point2[], b: readonly Point2[]): Point2[] => {
  let shared: Labelled<null> = { points: [...a], labels: a.map(() => null) }
  for (let k = 0; k < b.length && shared.points.length > 2; k++) {
    const p = b[k]
    const q = b[(k + 1) % b.length]
    if (p === undefined || q === undefined) continue
    const normal = { x: q.y - p.y, y: p.x - q.x }
    const size = Math.hypot(normal.x, normal.y)
    if (size < onLineMm) continue
    const out = { x: normal.x / size, y: normal.y / size }
    shared = clipConvex(shared, out, out.x * p.x + out.y * p.y, null)
  }
  return shared.points
}
