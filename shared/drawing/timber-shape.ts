import type { Cut, Point2, Point3 } from '../roof/roof-types.ts'
import type { DrawnMember } from './timber-pose.ts'

/**
 * A place on a timber: along the top-edge centre line from the heel plumb line (a ridge: from its
 * first node) towards the head, across to the left looking from foot to head, and down square to the
 * edge.
 */
export type TimberPoint = { alongMm: number; acrossMm: number; downMm: number }

export type TimberAxes = { along: Point3; left: Point3; down: Point3 }

/** The three directions of a timber in space, each of unit length. */
export function timberAxes(member: Pick<DrawnMember, 'axis' | 'topNormal'>): TimberAxes {
  const { from, to } = member.axis
  const length = Math.hypot(to.x - from.x, to.y - from.y, to.z - from.z) || 1
  const along = {
    x: (to.x - from.x) / length,
    y: (to.y - from.y) / length,
    z: (to.z - from.z) / length,
  }
  // The sides of a timber are plumb unless its top lies in a slope.
  const left = unit(cross(member.topNormal ?? { x: 0, y: 0, z: 1 }, along))
  return { along, left, down: cross(left, along) }
}

function cross(a: Point3, b: Point3): Point3 {
  return { x: a.y * b.z - a.z * b.y, y: a.z * b.x - a.x * b.z, z: a.x * b.y - a.y * b.x }
}

function unit(a: Point3): Point3 {
  const length = Math.hypot(a.x, a.y, a.z) || 1
  return { x: a.x / length, y: a.y / length, z: a.z / length }
}

/** Where a cut's plane meets the line that runs along the timber at this offset. */
export function cutAlongMm(
  member: DrawnMember,
  cut: Cut,
  acrossMm: number,
  downMm: number,
): number {
  const axes = timberAxes(member)
  const { point, normal } = cut.plane
  const toPlane = {
    x: point.x - member.axis.from.x,
    y: point.y - member.axis.from.y,
    z: point.z - member.axis.from.z,
  }
  const offset = acrossMm * dot(normal, axes.left) + downMm * dot(normal, axes.down)
  return (dot(normal, toPlane) - offset) / dot(normal, axes.along)
}

/** Where the timber ends at this offset: the nearest of its cuts at that end. */
export function timberEndMm(
  member: DrawnMember,
  end: 'head' | 'foot',
  acrossMm: number,
  downMm: number,
): number {
  const reaches = endCuts(member, end).map((cut) => cutAlongMm(member, cut, acrossMm, downMm))
  if (reaches.length === 0) return end === 'head' ? member.setOutLengthMm : 0
  return end === 'head' ? Math.min(...reaches) : Math.max(...reaches)
}

/** A timber's cuts at one end; the tail of a rafter is its foot end. */
export function endCuts(member: DrawnMember, end: 'head' | 'foot'): Cut[] {
  return member.cuts.filter((cut) => (cut.end === 'head') === (end === 'head'))
}

/**
 * The timber seen from above its top edge, square to it: round its left side from foot to head and
 * back along its right, with the ridges between two cheeks as corners of their own.
 */
export function timberTopOutline(member: DrawnMember): TimberPoint[] {
  return [...timberTopEnd(member, 'head'), ...timberTopEnd(member, 'foot').reverse()]
}

/**
 * The corners of one end on the top, left to right: two arrises, and where two cheeks meet. Each is
 * where the tape reads it: along the top from the heel plumb line, on the arris of a backed top too.
 */
export function timberTopEnd(member: DrawnMember, end: 'head' | 'foot'): TimberPoint[] {
  const half = member.section.thicknessMm / 2
  const fallPerMm = Math.tan((member.pitchDeg * Math.PI) / 180)
  return [half, ...cheekMeetings(member, end), -half].map((acrossMm) => {
    const downMm = arrisFallMm(member, acrossMm)
    const alongMm = timberEndMm(member, end, acrossMm, downMm) + downMm * fallPerMm
    return { alongMm, acrossMm, downMm: 0 }
  })
}

export type TimberTop = 'square' | 'backed' | 'dished'

/** Backed: planed down towards its edges. Dished: down towards its middle, after it is cut. */
export function timberTop({ backing }: Pick<DrawnMember, 'backing'>): TimberTop {
  if (!backing) return 'square'
  return backing.leftDeg < 0 || backing.rightDeg < 0 ? 'dished' : 'backed'
}

/**
 * How far below its centre line a backed top lies at this offset. A dished one is marked and cut while
 * it is still square.
 */
export function arrisFallMm(member: DrawnMember, acrossMm: number): number {
  if (!member.backing || timberTop(member) === 'dished') return 0
  const backingDeg = acrossMm > 0 ? member.backing.leftDeg : member.backing.rightDeg
  return Math.abs(acrossMm) * Math.tan((backingDeg * Math.PI) / 180)
}

/** Depth of a dished top below its square one, square to the edge: in the middle and at its edges. */
export type DishDepths = { middleMm: number; leftMm: number; rightMm: number }

export function dishDepths(member: DrawnMember): DishDepths | null {
  const { backing } = member
  if (!backing || timberTop(member) !== 'dished') return null
  const middleMm = -member.dropMm * Math.cos((member.pitchDeg * Math.PI) / 180)
  const atEdge = (backingDeg: number) =>
    Math.max(
      0,
      middleMm - (member.section.thicknessMm / 2) * Math.tan((-backingDeg * Math.PI) / 180),
    )
  return { middleMm, leftMm: atEdge(backing.leftDeg), rightMm: atEdge(backing.rightDeg) }
}

/** A timber point seen in plan; the fall of a backed top is left out. */
export function timberPointInPlan(member: DrawnMember, point: TimberPoint): Point2 {
  const axes = timberAxes(member)
  const { from } = member.axis
  const at = (axis: 'x' | 'y') =>
    from[axis] +
    axes.along[axis] * point.alongMm +
    axes.left[axis] * point.acrossMm +
    axes.down[axis] * point.downMm
  return { x: at('x'), y: at('y') }
}

/** Offsets across the top, left to right, at which one cheek of an end gives way to the next. */
function cheekMeetings(member: DrawnMember, end: 'head' | 'foot'): number[] {
  const half = member.section.thicknessMm / 2
  const cuts = endCuts(member, end)
  const meetings = cuts.flatMap((a, i) =>
    cuts.slice(i + 1).flatMap((b) => {
      const gapAt = (acrossMm: number) =>
        cutAlongMm(member, a, acrossMm, 0) - cutAlongMm(member, b, acrossMm, 0)
      const change = gapAt(half) - gapAt(-half)
      if (Math.abs(change) < 1e-6) return []
      const acrossMm = -half - (gapAt(-half) / change) * 2 * half
      const isInside = Math.abs(acrossMm) < half - 1e-3
      const isTheEnd =
        Math.abs(cutAlongMm(member, a, acrossMm, 0) - timberEndMm(member, end, acrossMm, 0)) < 1e-3
      return isInside && isTheEnd ? [acrossMm] : []
    }),
  )
  return meetings.sort((a, b) => b - a)
}

function dot(a: Point3, b: Point3): number {
  return a.x * b.x + a.y * b.y + a.z * b.z
}

/**
 * From end to end along the top where a tape can be laid: both edges, and the middle where two cheeks
 * meet there. For timbers with no heel line to hook the tape on.
 */
export type EdgeLength = {
  place: 'left edge' | 'right edge' | 'along the top' | 'middle'
  fromMm: number
  toMm: number
}

const sameLengthMm = 0.05
/** A point of two cheeks that stands out less than this is none to measure to. */
const pointMm = 0.5

export function edgeLengths(member: DrawnMember): EdgeLength[] {
  const half = member.section.thicknessMm / 2
  const heads = timberTopEnd(member, 'head')
  const feet = timberTopEnd(member, 'foot')
  const at = (end: readonly TimberPoint[], acrossMm: number) =>
    end.find((point) => Math.abs(point.acrossMm - acrossMm) < 1e-6)?.alongMm ?? 0
  const along = (place: EdgeLength['place'], acrossMm: number): EdgeLength => ({
    place,
    fromMm: at(feet, acrossMm),
    toMm: at(heads, acrossMm),
  })
  const left = along('left edge', half)
  const right = along('right edge', -half)
  const isSquare =
    Math.abs(left.fromMm - right.fromMm) < sameLengthMm &&
    Math.abs(left.toMm - right.toMm) < sameLengthMm
  const edges: EdgeLength[] = isSquare ? [{ ...left, place: 'along the top' }] : [left, right]
  const middle: EdgeLength = {
    place: 'middle',
    fromMm: timberEndMm(member, 'foot', 0, 0),
    toMm: timberEndMm(member, 'head', 0, 0),
  }
  const hasPoint = heads.length > 2 || feet.length > 2
  const isOwn = edges.every((edge) =>
    [middle.fromMm - edge.fromMm, middle.toMm - edge.toMm].some((mm) => Math.abs(mm) > pointMm),
  )
  return hasPoint && isOwn ? [...edges, middle] : edges
}
