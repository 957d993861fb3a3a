import type { FrameSpec, Member, Point3 } from '../roof/roof-types.ts'

/**
 * A timber with the way its top faces, where that is a slope's and not the plumb plane's through its
 * axis (underpurlins, fascias of square tails). It travels with the timber, which may be drawn without
 * its roof.
 */
export type PosedMember = Member & { topNormal: Point3 | null }

/** As much of a pose as the drawing functions need; a timber without it stands plumb. */
export type DrawnMember = Member & { topNormal?: Point3 | null | undefined }

type Planes = Pick<FrameSpec, 'planes'>

export function posedMember(spec: Planes, member: Member): PosedMember {
  const polygon = member.topInSlope ? spec.planes[member.planes[0] ?? -1]?.polygon : undefined
  return { ...member, topNormal: polygon ? upwardNormal(polygon) : null }
}

export function posedMemberOf(
  spec: Pick<FrameSpec, 'planes' | 'members'>,
  mark: string | null | undefined,
): PosedMember | null {
  const member = spec.members.find((one) => one.mark === mark)
  return member ? posedMember(spec, member) : null
}

/** Unit normal of a flat polygon in space, upward (Newell's sum, which no three corners decide alone). */
function upwardNormal(polygon: readonly Point3[]): Point3 | null {
  const sum = { x: 0, y: 0, z: 0 }
  polygon.forEach((a, i) => {
    const b = polygon[(i + 1) % polygon.length] ?? a
    sum.x += (a.y - b.y) * (a.z + b.z)
    sum.y += (a.z - b.z) * (a.x + b.x)
    sum.z += (a.x - b.x) * (a.y + b.y)
  })
  const length = Math.hypot(sum.x, sum.y, sum.z) * (sum.z < 0 ? -1 : 1)
  return length === 0 ? null : { x: sum.x / length, y: sum.y / length, z: sum.z / length }
}
