import { timberPoint } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import { boxesMeet, polygonBox } from '../convex.ts'
import type { Box } from '../convex.ts'
import type { FrameDraft } from '../members.ts'
import type { Point3 } from '../roof-types.ts'
import { cross3, dot3, point3, unit2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { endFaces } from './end-faces.ts'
import type { EndFace } from './end-faces.ts'
import { standingStops } from './purlin-stops.ts'
import type { Stop } from './purlin-stops.ts'
import { timberEnds } from './shared-face.ts'

/** A timber between its two ends' faces. */
export type Trimmed = { from: EndFace<Stop>[]; to: EndFace<Stop>[] }

/** Solids that come no nearer than this have a gap between them; those that touch do, too. */
const touchMm = 1e-3
/** More obstacles than this on one length are no house's. */
const mostStops = 6

/** A standing timber as a straight bar, its ends at the furthest points of its arrises. */
export type Obstacle = { stands: FrameDraft; corners: Point3[]; axes: Point3[]; box: Box }

/** The timbers of the roof's lines, as what others must keep clear of. */
export const lineObstacles = (drafts: readonly FrameDraft[]): Obstacle[] =>
  drafts.filter((draft) => draft.piece.line !== null).map(obstacleOf)

const obstacleOf = (stands: FrameDraft): Obstacle => {
  const { timber } = stands
  const sides = [timber.halfMm, -timber.halfMm]
  const ends = sides.map((left) => timberEnds(stands, left))
  const from = Math.min(...ends.map(([mm]) => mm))
  const to = Math.max(...ends.map(([, mm]) => mm))
  const corners = [from, to].flatMap((along) =>
    sides.flatMap((left) =>
      [0, timber.depthMm / timber.cos].map((down) => timberPoint(timber, along, left, down)),
    ),
  )
  const level = unit2(timber.direction)
  const axes = [{ x: 0, y: 0, z: 1 }, timber.left, timber.up, point3(level, 0)]
  return { stands, corners, axes, box: polygonBox(corners) }
}

const isApart = (axis: Point3, a: Point3[], b: Point3[]): boolean => {
  const [onA, onB] = [a.map((p) => dot3(axis, p)), b.map((p) => dot3(axis, p))]
  return (
    Math.max(...onA) <= Math.min(...onB) + touchMm || Math.max(...onB) <= Math.min(...onA) + touchMm
  )
}

/** Whether a timber with such ends runs into a standing one: no face of either keeps them apart. */
export const runsInto = (
  timber: Timber,
  faces: readonly EndFace<{ plane: Plane }>[],
  { stands, corners, axes, box }: Obstacle,
): boolean => {
  const own = faces.flatMap((face) => face.corners)
  if (!boxesMeet(polygonBox(own), box)) return false
  const all = [
    ...axes,
    timber.left,
    timber.up,
    ...faces.map((face) => face.cut.plane.normal),
    cross3(timber.direction, stands.timber.direction),
  ]
  return !all.some((axis) => dot3(axis, axis) > 1e-6 && isApart(axis, own, corners))
}

/** Top centre length between the nearest corners of both ends. */
const clearMm = ({ from, to }: Trimmed): number =>
  Math.min(...to.flatMap((face) => face.alongMm)) -
  Math.max(...from.flatMap((face) => face.alongMm))

const trim = (timber: Timber, from: Stop[], to: Stop[]): Trimmed => ({
  from: endFaces(timber, from, false),
  to: endFaces(timber, to, true),
})

/**
 * A length of underpurlin between its stops, clear of the timbers it would run into: cut short, or in
 * two where one stands in its way with length to spare on both sides. Lengths under `leastMm` are left out.
 */
export const clearOf = (
  timber: Timber,
  from: Stop[],
  to: Stop[],
  obstacles: readonly Obstacle[],
  leastMm: number,
  stopsLeft = mostStops,
): Trimmed[] => {
  const whole = trim(timber, from, to)
  if (whole.from.length === 0 || whole.to.length === 0 || clearMm(whole) < leastMm) return []
  const hit = obstacles.find((one) => runsInto(timber, [...whole.from, ...whole.to], one))
  if (hit === undefined) return [whole]
  if (stopsLeft === 0) return []
  const next = (f: Stop[], t: Stop[]) => clearOf(timber, f, t, obstacles, leastMm, stopsLeft - 1)
  const longest = (parts: Trimmed[][]): Trimmed[] =>
    parts.reduce((a, b) => (lengthOf(b) > lengthOf(a) ? b : a), [])
  const short = longest(
    standingStops(hit.stands, timber, true).map((stop) => next(from, [...to, stop])),
  )
  const rest = longest(
    standingStops(hit.stands, timber, false).map((stop) => next([...from, stop], to)),
  )
  return [...short, ...rest]
}

const lengthOf = (parts: Trimmed[]): number =>
  parts.reduce((sum, part) => sum + Math.max(0, clearMm(part)), 0)
