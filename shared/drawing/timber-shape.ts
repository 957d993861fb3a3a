import type { Cut, Member, Point2, Point3 } from '../roof/roof-types.ts'

/**
 * A place on a timber: along the top-edge centre line from the heel plumb line (a ridge: from its
 * first node) towards the head, across to the left looking from foot to head, and down square to the
 * edge.
 */
export type TimberPoint = { alongMm: number; acrossMm: number; downMm: number }

export type TimberAxes = { along: Point3; left: Point3; down: Point3 }

/** The three directions of a timber in space, each of unit length. */
export function timberAxes(member: Pick<Member, 'axis'>): TimberAxes {
  const { from, to } = member.axis
  const run = Math.hypot(to.x - from.x, to.y - from.y) || 1
  const length = Math.hypot(run, to.z - from.z)
  const ahead = { x: (to.x - from.x) / run, y: (to.y - from.y) / run }
  const cos = run / length
  const sin = (to.z - from.z) / length
  return {
    along: { x: ahead.x * cos, y: ahead.y * cos, z: sin },
    left: { x: -ahead.y, y: ahead.x, z: 0 },
    down: { x: ahead.x * sin, y: ahead.y * sin, z: -cos },
  }
}

/** Where a cut's plane meets the line that runs along the timber at this offset. */
export function cutAlongMm(member: Member, cut: Cut, acrossMm: number, downMm: number): number {
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
  member: Member,
  end: 'head' | 'foot',
  acrossMm: number,
  downMm: number,
): number {
  const reaches = endCuts(member, end).map((cut) => cutAlongMm(member, cut, acrossMm, downMm))
  if (reaches.length === 0) return end === 'head' ? member.setOutLengthMm : 0
  return end === 'head' ? Math.min(...reaches) : Math.max(...reaches)
}

/** A timber's cuts at one end; the tail of a rafter is its foot end. */
export function endCuts(member: Member, end: 'head' | 'foot'): Cut[] {
  return member.cuts.filter((cut) => (cut.end === 'head') === (end === 'head'))
}

/**
 * The timber seen from above its top edge, square to it: round its left side from foot to head and
 * back along its right, with the ridges between two cheeks as corners of their own.
 */
export function timberTopOutline(member: Member): TimberPoint[] {
  return [...timberTopEnd(member, 'head'), ...timberTopEnd(member, 'foot').reverse()]
}

/**
 * The corners of one end on the top, left to right: two arrises, and where two cheeks meet. Each is
 * where the tape reads it: along the top from the heel plumb line, on the arris of a backed top too.
 */
export function timberTopEnd(member: Member, end: 'head' | 'foot'): TimberPoint[] {
  const half = member.section.thicknessMm / 2
  const fallPerMm = Math.tan((member.pitchDeg * Math.PI) / 180)
  return [half, ...cheekMeetings(member, end), -half].map((acrossMm) => {
    const downMm = arrisFallMm(member, acrossMm)
    const alongMm = timberEndMm(member, end, acrossMm, downMm) + downMm * fallPerMm
    return { alongMm, acrossMm, downMm: 0 }
  })
}

/** How far below its centre line a backed top lies at this offset. */
export function arrisFallMm(member: Member, acrossMm: number): number {
  if (!member.backing) return 0
  const backingDeg = acrossMm > 0 ? member.backing.leftDeg : member.backing.rightDeg
  return Math.abs(acrossMm) * Math.tan((backingDeg * Math.PI) / 180)
}

/** A timber point seen in plan; the fall of a backed top is left out. */
export function timberPointInPlan(member: Member, point: TimberPoint): Point2 {
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
function cheekMeetings(member: Member, end: 'head' | 'foot'): number[] {
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
