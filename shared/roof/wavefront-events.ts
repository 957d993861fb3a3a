import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import type { Front, WaveCorner, WaveHit, WaveLoop } from './wavefront-types.ts'
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

/** Height at which front k of a loop has shrunk to nothing; Infinity when it does not shrink. */
const joinHeight = (fronts: readonly Front[], loop: WaveLoop, k: number): number => {
  const { along } = at(fronts, at(loop.fronts, k))
  const [start, end] = [at(loop.corners, k), at(loop.corners, k + 1)]
  const rate =
    along.x * (end.velocity.x - start.velocity.x) + along.y * (end.velocity.y - start.velocity.y)
  if (rate >= 0) return Infinity
  const lengthMm = dot2(along, sub2(cornerAt(end, loop.zMm), cornerAt(start, loop.zMm)))
  return loop.zMm + Math.max(0, lengthMm) / -rate
}

/** Height at which a corner comes to front j of a loop within its length; Infinity when it does not. */
const splitHeight = (
  fronts: readonly Front[],
  loop: WaveLoop,
  corner: WaveCorner,
  j: number,
  beforeMm: number,
): number => {
  const { along, inward } = at(fronts, at(loop.fronts, j))
  const start = at(loop.corners, j)
  const rate =
    inward.x * (corner.velocity.x - start.velocity.x) +
    inward.y * (corner.velocity.y - start.velocity.y)
  if (rate > -leastApproach) return Infinity
  const gapMm = dot2(inward, sub2(cornerAt(corner, loop.zMm), cornerAt(start, loop.zMm)))
  // a corner put down at a node may start a little beyond a front it is about to run into
  if (gapMm < -2 * nearMm) return Infinity
  const zMm = loop.zMm + Math.max(0, gapMm) / -rate
  if (zMm >= beforeMm) return Infinity
  const point = cornerAt(corner, zMm)
  const past = dot2(along, sub2(point, cornerAt(start, zMm)))
  if (past < -touchMm) return Infinity
  const left = dot2(along, sub2(cornerAt(at(loop.corners, j + 1), zMm), point))
  return left >= -touchMm ? zMm : Infinity
}

/** The loop turns right at corner k: the only kind that can run into a front across the roof. */
const isReflex = (fronts: readonly Front[], loop: WaveLoop, k: number): boolean =>
  cross2(
    at(fronts, at(loop.fronts, k === 0 ? loop.fronts.length - 1 : k - 1)).along,
    at(fronts, at(loop.fronts, k)).along,
  ) < 0

/** Where the corners of a loop are in it, and which of its fronts have an end that is new. */
type LoopIndex = { place: Map<WaveCorner, number>; fresh: number[] }

const indexLoop = (loop: WaveLoop): LoopIndex => {
  const place = new Map<WaveCorner, number>()
  loop.corners.forEach((corner, k) => place.set(corner, k))
  const isNew = (k: number) => at(loop.corners, k).fromMm === loop.zMm
  const fresh = loop.fronts.flatMap((_, j) => (isNew(j) || isNew(j + 1) ? [j] : []))
  return { place, fresh }
}

/** The front a hit was found on, if the loop still has it between the same two corners. */
const stillThere = (loop: WaveLoop, index: LoopIndex, hit: WaveHit): boolean => {
  if (hit.start === null) return true
  const j = index.place.get(hit.start)
  return j !== undefined && at(loop.corners, j + 1) === hit.end
}

/**
 * The first front that corner k runs into. What was found before holds while that front is there; only
 * fronts with a new end can then come sooner.
 */
const firstHit = (
  fronts: readonly Front[],
  loop: WaveLoop,
  index: LoopIndex,
  k: number,
): WaveHit => {
  const corner = at(loop.corners, k)
  const count = loop.fronts.length
  const known = corner.next
  const holds = known !== null && corner.fromMm !== loop.zMm && stillThere(loop, index, known)
  let best: WaveHit = holds ? known : { zMm: Infinity, start: null, end: null }
  const look = (j: number) => {
    if (j === k || (j + 1) % count === k) return
    const zMm = splitHeight(fronts, loop, corner, j, best.zMm)
    if (zMm < best.zMm) best = { zMm, start: at(loop.corners, j), end: at(loop.corners, j + 1) }
  }
  if (holds) index.fresh.forEach(look)
  else for (let j = 0; j < count; j++) look(j)
  corner.next = best
  return best
}

/** The lowest event of a loop, or null when nothing of it moves. */
export const nextEvent = (fronts: readonly Front[], loop: WaveLoop): WaveEvent | null => {
  const index = indexLoop(loop)
  let best: WaveEvent | null = null
  let bestMm = Infinity
  for (let k = 0; k < loop.fronts.length; k++) {
    const zMm = joinHeight(fronts, loop, k)
    if (zMm >= bestMm) continue
    bestMm = zMm
    best = { zMm, join: k }
  }
  for (let k = 0; k < loop.fronts.length; k++) {
    if (!isReflex(fronts, loop, k)) continue
    const { zMm, start } = firstHit(fronts, loop, index, k)
    const onto = start === null ? undefined : index.place.get(start)
    if (zMm >= bestMm || onto === undefined) continue
    bestMm = zMm
    best = { zMm: Math.max(zMm, loop.zMm), corner: k, onto }
  }
  return best
}
