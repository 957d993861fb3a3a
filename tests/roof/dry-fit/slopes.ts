import type { Member, Roof } from '../../../shared/roof/roof-types.ts'
import { toDeg, tanDeg, unit, type Vec } from './vec.ts'

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

/** Distance along the plate line from the slope's corner, counter-clockwise. */
export function distanceAlong(slope: Slope, x: number, y: number): number {
  return slope.inward[1] * (x - slope.cornerX) - slope.inward[0] * (y - slope.cornerY)
}

export const slopeNormal = (slope: Slope): Vec =>
  unit([-slope.tan * slope.inward[0], -slope.tan * slope.inward[1], 1])

export type Backing = { leftDeg: number; rightDeg: number }

/** How far a slope turns down from square on the side it lies on; under 0 where it rises away. */
export function backingFromSlopes(
  left: Vec,
  up: Vec,
  slopes: { left: Slope; right: Slope },
): Backing {
  const fall = (slope: Slope, sign: 1 | -1): number => {
    const n = slopeNormal(slope)
    const across = n[0] * left[0] + n[1] * left[1] + n[2] * left[2]
    return toDeg(Math.atan2(sign * across, n[0] * up[0] + n[1] * up[1] + n[2] * up[2]))
  }
  return { leftDeg: fall(slopes.left, 1), rightDeg: fall(slopes.right, -1) }
}

const alongLine: readonly Member['role'][] = ['ridge', 'hip', 'broken-hip', 'valley']
const rafters: readonly Member['role'][] = [
  'common',
  'crown-end',
  'creeper',
  'valley-creeper',
  'cripple-creeper',
]

/** Members that lie under a line between two slopes. */
export const isAlongLine = (member: Member): boolean => alongLine.includes(member.role)
/** Members that lie in one slope, square to its plate. */
export const isRafter = (member: Member): boolean => rafters.includes(member.role)
/** Members between two slopes with a top that can be planed into both. */
export const isHipLike = (member: Member): boolean => isAlongLine(member) && member.role !== 'ridge'
/** Part of the frame; the others lie beside it. */
export const isFrameMember = (member: Member): boolean => isRafter(member) || isAlongLine(member)
