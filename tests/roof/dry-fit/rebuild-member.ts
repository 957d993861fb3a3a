import type { Cut, Member } from '../../../shared/roof/roof-types.ts'
import { slopeNormal, type Slope } from './slopes.ts'
import { boxOf, solidVertices, type Box, type Solid, type SolidKit } from './solid-kit.ts'
import { add, combine, cosDeg, cross, dot, scale, sinDeg, sub, unit, type Vec } from './vec.ts'

/**
 * A member sawn again from the published numbers of its spec alone.
 *
 * Own coordinates: [along the top edge towards the head, to the left, up out of the top edge],
 * from `axis.from`. `cut.plane` is not looked at here; it is compared afterwards.
 */
export type Pose = { origin: Vec; along: Vec; left: Vec; up: Vec }

/** Kept timber lies where normal · p <= normal · point. Own coordinates. */
export type SawnPlane = { cut: Cut; normal: Vec; point: Vec }

export type Piece = {
  member: Member
  pose: Pose
  sawn: SawnPlane[]
  solid: Solid
  /** Corners of the finished piece, own coordinates and in the building. */
  own: Vec[]
  corners: Vec[]
  box: Box
}

/** Stands plumb, or lies with its top in its slope where the spec says so. */
export function poseOf(member: Member, slopes: readonly Slope[]): Pose {
  const { from, to } = member.axis
  const plan = unit([to.x - from.x, to.y - from.y, 0])
  const plumb: Vec = [0, 0, 1]
  const origin: Vec = [from.x, from.y, from.z]
  const along = combine([cosDeg(member.pitchDeg), plan], [sinDeg(member.pitchDeg), plumb])
  if (member.topInSlope === true) {
    const up = slopeNormal(slopes[member.planes[0]!]!)
    return { origin, along, left: cross(up, along), up }
  }
  const up = combine([-sinDeg(member.pitchDeg), plan], [cosDeg(member.pitchDeg), plumb])
  return { origin, along, left: cross(plumb, plan), up }
}

export const toBuilding = (pose: Pose, p: Vec): Vec =>
  add(pose.origin, directionToBuilding(pose, p))
export const directionToBuilding = (pose: Pose, v: Vec): Vec =>
  combine([v[0], pose.along], [v[1], pose.left], [v[2], pose.up])
export const toOwn = (pose: Pose, p: Vec): Vec => directionToOwn(pose, sub(p, pose.origin))
export const directionToOwn = (pose: Pose, v: Vec): Vec => [
  dot(v, pose.along),
  dot(v, pose.left),
  dot(v, pose.up),
]

/** +1 left, -1 right, 0 when the cut is square across. */
export function shortSideSign(cut: Cut): -1 | 0 | 1 {
  if (cut.longSide === 'none') return 0
  return cut.longSide === 'right' ? 1 : -1
}

/**
 * How the top of one side is planed where the cuts are marked: a slope that rises away from the
 * centre leaves it square, and a valley is marked on its square top before it is dished.
 */
export function backingDeg(member: Member, sideSign: -1 | 0 | 1): number {
  if (member.backing === null || sideSign === 0 || member.role === 'valley') return 0
  return Math.max(0, sideSign > 0 ? member.backing.leftDeg : member.backing.rightDeg)
}

/**
 * The plane from the two lines that are marked: down the side face (face angle, from the arris
 * towards the foot) and across the top (edge angle, from the long point back into the timber; on a
 * backed top in the backed face of the short side), through the top centre line at `alongMm`.
 */
export function sawnPlane(member: Member, cut: Cut): SawnPlane {
  const off = cut.end === 'head' ? 1 : -1
  const faceDeg = cut.face.fromEdgeDeg
  const downFace: Vec = [-cosDeg(faceDeg), 0, -sinDeg(faceDeg)]
  const side = shortSideSign(cut)
  const backing = backingDeg(member, side)
  const acrossTop: Vec = [0, side * cosDeg(backing), -sinDeg(backing)]
  const edgeDeg = cut.edge.fromEdgeDeg
  const marked: Vec =
    side === 0
      ? [0, 1, 0]
      : combine([-off * cosDeg(edgeDeg), [1, 0, 0]], [sinDeg(edgeDeg), acrossTop])
  const raw = unit(cross(downFace, marked))
  return { cut, normal: raw[0] * off > 0 ? raw : scale(raw, -1), point: [cut.alongMm, 0, 0] }
}

const keep = (solid: Solid, normal: Vec, point: Vec): Solid =>
  solid.trimByPlane([-normal[0], -normal[1], -normal[2]], -dot(normal, point))

function blank(kit: SolidKit, member: Member, sawn: readonly SawnPlane[]): Solid {
  const { thicknessMm, depthMm } = member.section
  const spare = 12 * thicknessMm + 4 * depthMm
  const reach = [0, member.setOutLengthMm, ...sawn.map((s) => s.point[0])]
  const start = Math.min(...reach) - spare
  const end = Math.max(...reach) + spare
  const bar = kit.Manifold.cube([end - start, thicknessMm, depthMm]).translate([
    start,
    -thicknessMm / 2,
    -depthMm,
  ])
  if (member.backing === null) return bar
  const { leftDeg, rightDeg } = member.backing
  const toLeft: Vec = [0, sinDeg(leftDeg), cosDeg(leftDeg)]
  const toRight: Vec = [0, -sinDeg(rightDeg), cosDeg(rightDeg)]
  if (member.role !== 'valley') return keep(keep(bar, toLeft, [0, 0, 0]), toRight, [0, 0, 0])
  // dished: what stands over both slopes goes, and they meet under the bar's top by its rise
  const middle: Vec = [0, 0, member.dropMm * cosDeg(member.pitchDeg)]
  const over = keep(keep(bar, scale(toLeft, -1), middle), scale(toRight, -1), middle)
  return bar.subtract(over)
}

/** Where heel and seat cut meet: at the plate's outer top edge. Own coordinates. */
export function heelPoint(member: Member): Vec {
  const mouth = member.birdsmouth
  if (mouth === null) return [0, 0, 0]
  const { heelFromEdgeDeg, standMm, heelOffsetMm } = mouth
  const level: Vec = [cosDeg(member.pitchDeg), 0, -sinDeg(member.pitchDeg)]
  const down: Vec = [-cosDeg(heelFromEdgeDeg), 0, -sinDeg(heelFromEdgeDeg)]
  return combine([standMm, down], [-heelOffsetMm, level])
}

function cutBirdsmouth(kit: SolidKit, member: Member, solid: Solid): Solid {
  const mouth = member.birdsmouth
  if (mouth === null) return solid
  const corner = heelPoint(member)
  const { seatFromEdgeDeg, heelFromEdgeDeg } = mouth
  const inboard: Vec = [sinDeg(heelFromEdgeDeg), 0, -cosDeg(heelFromEdgeDeg)]
  const belowSeat: Vec = [-sinDeg(seatFromEdgeDeg), 0, -cosDeg(seatFromEdgeDeg)]
  const size = 4 * (member.setOutLengthMm + member.section.depthMm * 20)
  const wedge = kit.Manifold.cube([size, size, size], true)
    .trimByPlane([...inboard], dot(inboard, corner))
    .trimByPlane([...belowSeat], dot(belowSeat, corner))
  return solid.subtract(wedge)
}

export function rebuildMember(kit: SolidKit, member: Member, slopes: readonly Slope[]): Piece {
  const sawn = member.cuts.map((cut) => sawnPlane(member, cut))
  const sawnBar = sawn.reduce(
    (solid, plane) => keep(solid, plane.normal, plane.point),
    blank(kit, member, sawn),
  )
  const ownSolid = cutBirdsmouth(kit, member, sawnBar)
  const pose = poseOf(member, slopes)
  const own = solidVertices(ownSolid)
  const corners = own.map((p) => toBuilding(pose, p))
  const { along: a, left: l, up: u, origin: o } = pose
  const solid = ownSolid.transform([...a, 0, ...l, 0, ...u, 0, ...o, 1])
  return { member, pose, sawn, solid, own, corners, box: boxOf(corners, 0) }
}
