import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import type { Front, WaveCorner, WaveLoop } from './wavefront-types.ts'
import { add2, cross2, dot2, scale2, sub2 } from './vector.ts'

/**
 * Corners nearer together than this, or to another front, touch. Far above the noise of the sums
 * (corners of nearly parallel fronts run fast: 10⁷ mm a mm of height, at 10⁻¹¹ mm of noise), and far
 * below what a tape tells apart.
 */
export const touchMm = 0.001
/** What comes this near to a node takes part in it: no saw or tape tells the two apart. */
export const nearMm = 0.5
/** A corner that nears a front by less than this per mm of height does not come to it within a roof. */
const leastApproach = 1e-9
/** Fronts this near to antiparallel (sine) have no corner that can be followed. */
const leastSine = 1e-9

/** Next height at which a loop changes: front `join` shrinks to nothing, or corner `corner` reaches front `onto`. */
export type WaveEvent =
  { zMm: number; join: number } | { zMm: number; corner: number; onto: number }

/** How the corner between two following fronts moves, mm per mm of height. */
export const cornerVelocity = (
  before: Pick<Front, 'inward' | 'speed'>,
  after: Pick<Front, 'inward' | 'speed'>,
): Point2 => {
  const [a, b] = [before.inward, after.inward]
  const cosine = dot2(a, b)
  if (cosine > 0 && before.speed === after.speed) {
    return scale2(add2(a, b), before.speed / (1 + cosine))
  }
  const sine = cross2(a, b)
  if (Math.abs(sine) < leastSine) return scale2(a, before.speed)
  return {
    x: (before.speed * b.y - after.speed * a.y) / sine,
    y: (after.speed * a.x - before.speed * b.x) / sine,
  }
}

export const cornerAt = (corner: WaveCorner, zMm: number): Point2 =>
  add2(corner.point, scale2(corner.velocity, zMm - corner.fromMm))

const frontOf = (fronts: readonly Front[], loop: WaveLoop, k: number): Front =>
  at(fronts, at(loop.fronts, k))

/** Height at which front k of a loop has shrunk to nothing; Infinity when it does not shrink. */
const joinHeight = (fronts: readonly Front[], loop: WaveLoop, k: number): number => {
  const { along } = frontOf(fronts, loop, k)
  const [start, end] = [at(loop.corners, k), at(loop.corners, k + 1)]
  const rate = dot2(along, sub2(end.velocity, start.velocity))
  if (rate >= 0) return Infinity
  const lengthMm = dot2(along, sub2(cornerAt(end, loop.zMm), cornerAt(start, loop.zMm)))
  return loop.zMm + Math.max(0, lengthMm) / -rate
}

/** Height at which corner k of a loop comes to front j within its length; Infinity when it does not. */
const splitHeight = (
  fronts: readonly Front[],
  loop: WaveLoop,
  k: number,
  j: number,
  beforeMm: number,
): number => {
  const { along, inward } = frontOf(fronts, loop, j)
  const [corner, start, end] = [at(loop.corners, k), at(loop.corners, j), at(loop.corners, j + 1)]
  const rate = dot2(inward, sub2(corner.velocity, start.velocity))
  if (rate > -leastApproach) return Infinity
  const gapMm = dot2(inward, sub2(cornerAt(corner, loop.zMm), cornerAt(start, loop.zMm)))
  if (gapMm < -2 * nearMm) return Infinity
  const zMm = loop.zMm + Math.max(0, gapMm) / -rate
  if (zMm >= beforeMm) return Infinity
  const point = cornerAt(corner, zMm)
  const past = dot2(along, sub2(point, cornerAt(start, zMm)))
  const left = dot2(along, sub2(cornerAt(end, zMm), point))
  return past >= -touchMm && left >= -touchMm ? zMm : Infinity
}

/** The loop turns right at corner k: the only kind that can run into a front across the roof. */
const isReflex = (fronts: readonly Front[], loop: WaveLoop, k: number): boolean =>
  cross2(frontOf(fronts, loop, k - 1).along, frontOf(fronts, loop, k).along) < 0

/** The lowest event of a loop, or null when nothing of it moves. */
export const nextEvent = (fronts: readonly Front[], loop: WaveLoop): WaveEvent | null => {
  let best: WaveEvent | null = null
  let bestMm = Infinity
  const count = loop.fronts.length
  for (let k = 0; k < count; k++) {
    const zMm = joinHeight(fronts, loop, k)
    if (zMm >= bestMm) continue
    bestMm = zMm
    best = { zMm, join: k }
  }
  for (let k = 0; k < count; k++) {
    if (!isReflex(fronts, loop, k)) continue
    for (let j = 0; j < count; j++) {
      if (j === k || (j + 1) % count === k) continue
      const zMm = splitHeight(fronts, loop, k, j, bestMm)
      if (zMm >= bestMm) continue
      bestMm = zMm
      best = { zMm, corner: k, onto: j }
    }
  }
  return best
}
