import { crossingAt, crossingOf, timberPoint } from '../bevel.ts'
import type { Crossing, Timber } from '../bevel.ts'
import { clipConvex } from '../convex.ts'
import type { Labelled } from '../convex.ts'
import type { Point2, Point3 } from '../roof-types.ts'
import { at } from '../slopes.ts'
import { cross3, dot3 } from '../vector.ts'
import type { Plane } from '../vector.ts'

/** One sawn face of a timber's end: its corners in space, and how far along the timber each lies. */
export type EndFace<T> = { cut: T; corners: Point3[]; alongMm: number[] }

/** A face smaller than this is a corner's tip that no saw would find, mm². */
const leastFaceMm2 = 25
/** Two planes that cross a timber this near to each other are one. */
const samePlaneMm = 1e-6

/** The cross-section of a timber: x is mm left of the centre line, y mm down under the top. */
const sectionOf = (timber: Timber): Labelled<null> => {
  const bottom = timber.depthMm / timber.cos
  const half = timber.halfMm
  const points = [
    { x: half, y: 0 },
    { x: half, y: bottom },
    { x: -half, y: bottom },
    { x: -half, y: 0 },
  ]
  return { points: points.reverse(), labels: points.map(() => null) }
}

/** The part of the section where one crossing is nearer than another; all of it where they are one. */
const whereNearer = (part: Labelled<null>, own: Crossing, other: Crossing, sign: number) => {
  const normal = {
    x: sign * (own.perLeft - other.perLeft),
    y: sign * (own.perDown - other.perDown),
  }
  const size = Math.hypot(normal.x, normal.y)
  const offset = sign * (other.baseMm - own.baseMm)
  if (size < 1e-9) return offset >= -samePlaneMm ? part : { points: [], labels: [] }
  return clipConvex(part, { x: normal.x / size, y: normal.y / size }, offset / size, null)
}

export const faceAreaMm2 = (corners: Point3[]): number => {
  const first = corners[0]
  if (first === undefined) return 0
  let sum: Point3 = { x: 0, y: 0, z: 0 }
  corners.forEach((p, k) => {
    const q = at(corners, k + 1)
    const a = { x: p.x - first.x, y: p.y - first.y, z: p.z - first.z }
    const b = { x: q.x - first.x, y: q.y - first.y, z: q.z - first.z }
    const c = cross3(a, b)
    sum = { x: sum.x + c.x, y: sum.y + c.y, z: sum.z + c.z }
  })
  return Math.sqrt(dot3(sum, sum)) / 2
}

const isTwin = (a: Crossing, b: Crossing): boolean =>
  Math.abs(a.baseMm - b.baseMm) < samePlaneMm &&
  Math.abs(a.perLeft - b.perLeft) < 1e-9 &&
  Math.abs(a.perDown - b.perDown) < 1e-9

/** The part of a timber's section on which one of some planes ends it: corners mm left and mm down. */
const ownPart = (timber: Timber, crossings: Crossing[], k: number, upper: boolean): Point2[] => {
  const own = at(crossings, k)
  if (crossings.some((other, n) => n < k && isTwin(own, other))) return []
  const sign = upper ? 1 : -1
  return crossings.reduce(
    (left, other, n) => (n === k ? left : whereNearer(left, own, other, sign)),
    sectionOf(timber),
  ).points
}

/** The corners of one cut's face among all cuts of its end: mm off the centre line and mm down under the top. */
export const sectionCorners = (
  timber: Timber,
  cuts: readonly { crossing: Crossing }[],
  cut: { crossing: Crossing },
  upper: boolean,
): { leftMm: number; downMm: number }[] => {
  const crossings = cuts.map(({ crossing }) => crossing)
  const part = ownPart(timber, crossings, crossings.indexOf(cut.crossing), upper)
  return part.map(({ x, y }) => ({ leftMm: x, downMm: y }))
}

/** The faces that some planes leave at a timber's end; planes that find no timber give none. */
export const endFaces = <T extends { plane: Plane }>(
  timber: Timber,
  cuts: readonly T[],
  upper: boolean,
): EndFace<T>[] => {
  const crossings = cuts.map((cut) => crossingOf(cut.plane, timber))
  return cuts.flatMap((cut, k): EndFace<T>[] => {
    const part = ownPart(timber, crossings, k, upper)
    const alongMm = part.map(({ x, y }) => crossingAt(at(crossings, k), x, y))
    const corners = part.map(({ x, y }, n) => timberPoint(timber, at(alongMm, n), x, y))
    return faceAreaMm2(corners) < leastFaceMm2 ? [] : [{ cut, corners, alongMm }]
  })
}

/** The whole section of a timber in a plane, as a polygon in space. */
export const planeSection = (timber: Timber, plane: Plane): Point3[] => {
  const crossing = crossingOf(plane, timber)
  return sectionOf(timber).points.map(({ x, y }) =>
    timberPoint(timber, crossingAt(crossing, x, y), x, y),
  )
}

/** Furthest reach of an end's faces along the timber's own axis, mm from its origin. */
export const facesReachMm = (
  timber: Timber,
  faces: readonly EndFace<unknown>[],
  upper: boolean,
): number => {
  const reaches = faces.flatMap(({ corners }) =>
    corners.map((p) => {
      const { origin, direction } = timber
      return dot3(direction, { x: p.x - origin.x, y: p.y - origin.y, z: p.z - origin.z })
    }),
  )
  return upper ? Math.max(...reaches) : Math.min(...reaches)
}
