import type { Cut, FrameSpec, Member, MemberRole, Point2 } from '../../../shared/roof/roof-types.ts'

export const near = (a: Point2, b: Point2, mm = 0.5): boolean =>
  Math.hypot(a.x - b.x, a.y - b.y) < mm

export const ofRole = (spec: FrameSpec, ...roles: MemberRole[]): Member[] =>
  spec.members.filter((m) => roles.includes(m.role))

/** The slope that rises from a plate edge, as an index into `spec.planes`. */
export function planeOfEdge(spec: FrameSpec, edge: number): number {
  const index = spec.planes.findIndex((plane) => plane.edges.includes(edge))
  if (index < 0) throw new Error(`no slope rises from plate edge ${edge}`)
  return index
}

export function hipFrom(spec: FrameSpec, corner: Point2): Member {
  const hip = ofRole(spec, 'hip').find((m) => near(m.axis.from, corner))
  if (hip === undefined) throw new Error(`no hip starts at ${corner.x}, ${corner.y}`)
  return hip
}

export const cutsAt = (member: Member, end: Cut['end']): Cut[] =>
  member.cuts.filter((cut) => cut.end === end)

export function byMark(spec: FrameSpec, mark: string | null): Member {
  const member = spec.members.find((m) => m.mark === mark)
  if (member === undefined) throw new Error(`no member is marked ${mark}`)
  return member
}

/** Rafters of one slope that end on a member, longest first. */
export function creepersOn(spec: FrameSpec, on: Member, plane: number): Member[] {
  return ofRole(spec, 'creeper')
    .filter((m) => m.planes[0] === plane)
    .filter((m) => cutsAt(m, 'head').some((cut) => cut.against === on.mark))
    .sort((a, b) => b.setOutLengthMm - a.setOutLengthMm)
}

/** The rafter of one slope that stands at the head of a hip: a centring rafter or a crown end. */
export function rafterAtHead(spec: FrameSpec, hip: Member, plane: number): Member {
  const found = ofRole(spec, 'common', 'crown-end').find(
    (m) => m.planes[0] === plane && near(m.axis.to, hip.axis.to),
  )
  if (found === undefined) throw new Error(`no rafter of slope ${plane} stands at ${hip.mark}`)
  return found
}

/** The cheek of a hip's head that lies in the side face of a rafter of the given slope. */
export function cheekAgainst(spec: FrameSpec, hip: Member, plane: number): Cut {
  const cheek = cutsAt(hip, 'head').find(
    (cut) => cut.against !== null && byMark(spec, cut.against).planes.includes(plane),
  )
  if (cheek === undefined) throw new Error(`${hip.mark} has no cheek on slope ${plane}`)
  return cheek
}
