import type { FrameSpec, Member, Roof } from '../../../shared/roof/roof-types.ts'
import { directionToOwn, type Piece, type Pose } from './rebuild-member.ts'
import { tanDeg, toDeg, unit, type Vec } from './vec.ts'

/** A set-out plane straight from what was typed: height over the plate at any point of the plan. */
export type Slope = {
  inward: readonly [number, number]
  cornerX: number
  cornerY: number
  tan: number
}

export function slopeOfEdge(roof: Roof, index: number): Slope {
  const edge = roof.edges[index]!
  if (edge.finish !== 'eave')
    throw new Error(`plate edge ${index} is a gable: no slope rises there`)
  const a = roof.outline[index]!
  const b = roof.outline[(index + 1) % roof.outline.length]!
  const size = Math.hypot(b.x - a.x, b.y - a.y)
  const inward = [-(b.y - a.y) / size, (b.x - a.x) / size] as const
  return { inward, cornerX: a.x, cornerY: a.y, tan: tanDeg(edge.pitchDeg) }
}

export function heightOn(slope: Slope, x: number, y: number): number {
  return slope.tan * distanceIn(slope, x, y)
}

/** Level distance inward from the eave's plate line. */
export function distanceIn(slope: Slope, x: number, y: number): number {
  return slope.inward[0] * (x - slope.cornerX) + slope.inward[1] * (y - slope.cornerY)
}

export function slopesOf(roof: Roof, spec: FrameSpec): Slope[] {
  return spec.planes.map((plane) => slopeOfEdge(roof, plane.edges[0]!))
}

/** A convex roof is everywhere under all of its slopes, so its surface is the lowest of them. */
export function lowest(slopes: readonly Slope[], x: number, y: number): number {
  return Math.min(...slopes.map((slope) => heightOn(slope, x, y)))
}

export const slopeNormal = (slope: Slope): Vec =>
  unit([-slope.tan * slope.inward[0], -slope.tan * slope.inward[1], 1])

export type Backing = { leftDeg: number; rightDeg: number }

/** Which of two slopes falls away to the left of a member, and how much each turns from square. */
export function backingFromSlopes(pose: Pose, slopes: readonly Slope[]): Backing {
  const falls = slopes.map((slope) => {
    const n = directionToOwn(pose, slopeNormal(slope))
    return toDeg(Math.atan2(n[1], n[2]))
  })
  return { leftDeg: Math.max(...falls), rightDeg: -Math.min(...falls) }
}

export const isAlongLine = (member: Member): boolean =>
  ['ridge', 'hip', 'broken-hip', 'valley'].includes(member.role)

export const ownSlopes = (piece: Piece, slopes: readonly Slope[]): Slope[] =>
  piece.member.planes.map((index) => slopes[index]!)
