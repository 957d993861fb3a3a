import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { distanceIn, heightOn, slopeOfEdge, type Slope } from './slopes.ts'

export type Plan = readonly [number, number]

/** A slope with its part of the plan, to the plate line, as the spec publishes it. */
export type Face = { slope: Slope; plan: Plan[] }

/**
 * The top of the roof over any point of the plan, set-out planes only (add the stand): inside the
 * outline the slope that the point lies under, outside it the slope whose overhang it is.
 */
export type Surface = { roof: Roof; faces: Face[]; slopes: Slope[] }

export function surfaceOf(roof: Roof, spec: FrameSpec): Surface {
  const faces = spec.planes.map((plane) => ({
    slope: slopeOfEdge(roof, plane.edges[0]!),
    plan: plane.polygon.map((p): Plan => [p.x, p.y]),
  }))
  return { roof, faces, slopes: faces.map((face) => face.slope) }
}

/** Crossings of a ray: inside when their number is odd. Any simple polygon. */
export function isInside(polygon: readonly Plan[], x: number, y: number): boolean {
  let inside = false
  polygon.forEach(([ax, ay], i) => {
    const [bx, by] = polygon[(i + 1) % polygon.length]!
    if (ay > y === by > y) return
    if (x < ax + ((bx - ax) * (y - ay)) / (by - ay)) inside = !inside
  })
  return inside
}

/** The nearest point of a stretch from a to b. */
export function nearestOn(a: Plan, b: Plan, x: number, y: number): Plan {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const share = ((x - a[0]) * dx + (y - a[1]) * dy) / (dx * dx + dy * dy)
  const t = Math.min(1, Math.max(0, share))
  return [a[0] + t * dx, a[1] + t * dy]
}

/** How far outside a polygon a point is; 0 inside. */
export function distanceOff(polygon: readonly Plan[], x: number, y: number): number {
  return isInside(polygon, x, y) ? 0 : distanceToRim(polygon, x, y)
}

export function distanceToRim(polygon: readonly Plan[], x: number, y: number): number {
  const gaps = polygon.map((a, i) => {
    const [nx, ny] = nearestOn(a, polygon[(i + 1) % polygon.length]!, x, y)
    return Math.hypot(x - nx, y - ny)
  })
  return Math.min(...gaps)
}

const planOutline = (roof: Roof): Plan[] => roof.outline.map((p): Plan => [p.x, p.y])

/** Which slope covers a point; the nearest when rounding puts it in none. Among some slopes only, when given. */
export function faceAt(faces: readonly Face[], x: number, y: number): Face {
  let [best, gap] = [faces[0]!, Infinity]
  for (const face of faces) {
    const off = distanceOff(face.plan, x, y)
    if (off < gap) [best, gap] = [face, off]
    if (gap === 0) break
  }
  return best
}

const isReflex = (before: Plan, corner: Plan, after: Plan): boolean =>
  (corner[0] - before[0]) * (after[1] - corner[1]) -
    (corner[1] - before[1]) * (after[0] - corner[0]) <
  0

/**
 * Over an overhang. Beside a corner two overhangs meet on the line that the hip or valley runs out
 * on: there the lower slope covers at an outward corner, the higher at an inward one. Past a gable
 * the roof runs on level, square to the wall.
 */
function heightOutside(surface: Surface, outline: readonly Plan[], x: number, y: number): number {
  const { roof } = surface
  const n = outline.length
  const at = (i: number): Plan => outline[(i + n) % n]!
  const edgeOf = (i: number) => roof.edges[(i + n) % n]!
  const gapTo = (i: number): number => {
    const [px, py] = nearestOn(at(i), at(i + 1), x, y)
    // where a gable and an eave are equally near, their corner, the eave has it
    return Math.hypot(x - px, y - py) + (edgeOf(i).finish === 'gable' ? 1e-6 : 0)
  }
  const gaps = outline.map((_, i) => gapTo(i))
  const edge = gaps.indexOf(Math.min(...gaps))
  const [px, py] = nearestOn(at(edge), at(edge + 1), x, y)
  if (edgeOf(edge).finish === 'gable') {
    const face = faceAt(surface.faces, px, py)
    return heightOn(face.slope, x, y)
  }
  const nearStart =
    Math.hypot(px - at(edge)[0], py - at(edge)[1]) <
    Math.hypot(px - at(edge + 1)[0], py - at(edge + 1)[1])
  const [corner, other] = nearStart ? [edge, edge - 1] : [edge + 1, edge + 1]
  const own = heightOn(slopeOfEdge(roof, edge), x, y)
  if (edgeOf(other).finish === 'gable') return own
  const next = heightOn(slopeOfEdge(roof, (other + n) % n), x, y)
  const reflex = isReflex(at(corner - 1), at(corner), at(corner + 1))
  return reflex ? Math.max(own, next) : Math.min(own, next)
}

/** Height of the set-out surface over any point of the plan, overhangs too. */
export function surfaceHeight(surface: Surface, x: number, y: number): number {
  const outline = planOutline(surface.roof)
  if (!isInside(outline, x, y) && distanceToRim(outline, x, y) > 1e-6) {
    return heightOutside(surface, outline, x, y)
  }
  return heightOn(faceAt(surface.faces, x, y).slope, x, y)
}

/** Level distance inward from the outline; under 0 outside. */
export function distanceInside(roof: Roof, x: number, y: number): number {
  const outline = planOutline(roof)
  const rim = distanceToRim(outline, x, y)
  return isInside(outline, x, y) ? rim : -rim
}

export const isOnPlateLine = (slope: Slope, x: number, y: number, looseMm: number): boolean =>
  Math.abs(distanceIn(slope, x, y)) <= looseMm
