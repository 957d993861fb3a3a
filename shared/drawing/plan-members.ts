import type { MemberRole } from '../roof/roof-types.ts'
import type { DrawnMember } from './timber-pose.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import { distanceToSegment, segmentLength } from './drawing-geometry.ts'
import type { PlanView } from './plan-view.ts'
import { timberEndMm, timberPointInPlan, timberTopOutline } from './timber-shape.ts'

/** One timber in plan: its outline to scale, and its centre line from tail to head. */
export type PlanMember = {
  mark: string
  role: MemberRole
  outline: DrawingPoint[]
  centre: Segment
  /** Where the heel plumb line crosses the centre line; a ridge has none and gives its foot. */
  heel: DrawingPoint
  thicknessPx: number
}

export function planMember(member: DrawnMember, view: PlanView): PlanMember {
  const placeAt = (alongMm: number) =>
    view.place(timberPointInPlan(member, { alongMm, acrossMm: 0, downMm: 0 }))
  return {
    mark: member.mark,
    role: member.role,
    outline: timberTopOutline(member).map((p) => view.place(timberPointInPlan(member, p))),
    centre: {
      from: placeAt(timberEndMm(member, 'foot', 0, 0)),
      to: placeAt(timberEndMm(member, 'head', 0, 0)),
    },
    heel: placeAt(0),
    thicknessPx: member.section.thicknessMm * view.pxPerMm,
  }
}

/** The timber a finger meant: the nearest within reach, the shorter of two equally near. */
export function planMemberAt(
  members: readonly PlanMember[],
  point: DrawingPoint,
  reachPx: number,
): PlanMember | null {
  const near = members
    .map((member) => ({
      member,
      distancePx: distanceToSegment(point, member.centre),
      lengthPx: segmentLength(member.centre),
    }))
    .filter((one) => one.distancePx <= reachPx)
    .sort((a, b) => a.distancePx - b.distancePx || a.lengthPx - b.lengthPx)
  return near[0]?.member ?? null
}
