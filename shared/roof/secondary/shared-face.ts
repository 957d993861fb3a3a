import { crossingAt, timberPoint } from '../bevel.ts'
import { convexOverlap, polygonSignedArea } from '../convex.ts'
import type { DraftMember } from '../members.ts'
import type { Point2, Point3 } from '../roof-types.ts'
import { cross3, dot3, unit3 } from '../vector.ts'

/** A face that shares less than this with another does not bear on it, mm². */
export const leastBearingMm2 = 10

/** Where a line along a timber, mm left of the top centre line, starts and ends at its cuts. */
export const timberEnds = ({ cuts }: DraftMember, leftMm = 0): [number, number] => {
  const reaches = (upper: boolean) =>
    cuts
      .filter((cut) => (cut.end === 'head') === upper)
      .map((cut) => crossingAt(cut.crossing, leftMm, 0))
  return [Math.max(...reaches(false)), Math.min(...reaches(true))]
}

/** One side face of a timber, its left or its right, between its cuts, as a polygon in space. */
export const sideFace = (member: DraftMember, side: 1 | -1): Point3[] => {
  const { timber } = member
  const left = side * timber.halfMm
  const bottom = timber.depthMm / timber.cos
  const [fromMm, toMm] = timberEnds(member, left)
  return [
    timberPoint(timber, fromMm, left, 0),
    timberPoint(timber, toMm, left, 0),
    timberPoint(timber, toMm, left, bottom),
    timberPoint(timber, fromMm, left, bottom),
  ]
}

const turnedLeft = (points: Point2[]): Point2[] =>
  polygonSignedArea(points) < 0 ? [...points].reverse() : points

/** Area that two convex faces share which both lie in a plane of this normal, mm². */
export const sharedFaceMm2 = (a: Point3[], b: Point3[], normal: Point3): number => {
  const helper = Math.abs(normal.z) < 0.9 ? { x: 0, y: 0, z: 1 } : { x: 1, y: 0, z: 0 }
  const right = unit3(cross3(helper, normal))
  const up = cross3(normal, right)
  const flat = (points: Point3[]) =>
    turnedLeft(points.map((p) => ({ x: dot3(p, right), y: dot3(p, up) })))
  return Math.abs(polygonSignedArea(convexOverlap(flat(a), flat(b))))
}
