import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { heightOn, slopeOfEdge, type Slope } from './slopes.ts'

export type Plan = readonly [number, number]

/** A slope with its part of the plan, to the plate line, as the spec publishes it. */
export type Face = { slope: Slope; plan: Plan[] }

/**
 * The top of the roof over the plan, set-out planes only (add the stand): at each point the slope that
 * it lies under. Over an overhang a member keeps to its own slopes, run on.
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

export function distanceToStretch(a: Plan, b: Plan, x: number, y: number): number {
  const [nx, ny] = nearestOn(a, b, x, y)
  return Math.hypot(x - nx, y - ny)
}

/** How far outside a polygon a point is; 0 inside. */
export function distanceOff(polygon: readonly Plan[], x: number, y: number): number {
  return isInside(polygon, x, y) ? 0 : distanceToRim(polygon, x, y)
}

export function distanceToRim(polygon: readonly Plan[], x: number, y: number): number {
  const gaps = polygon.map((a, i) => distanceToStretch(a, polygon[(i + 1) % polygon.length]!, x, y))
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

/** Height of the set-out surface over a point of the plan, inside the outline. */
export function surfaceHeight(surface: Surface, x: number, y: number): number {
  return heightOn(faceAt(surface.faces, x, y).slope, x, y)
}

/** Level distance inward from the outline; under 0 outside. */
export function distanceInside(roof: Roof, x: number, y: number): number {
  const outline = planOutline(roof)
  const rim = distanceToRim(outline, x, y)
  return isInside(outline, x, y) ? rim : -rim
}
