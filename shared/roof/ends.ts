import { crossingAt, timberPoint, topFall } from './bevel.ts'
import type { Timber } from './bevel.ts'
import type { DraftCut } from './cuts.ts'
import { gather } from './lists.ts'
import type { Point3 } from './roof-types.ts'

/** A corner of a timber's end: where it is and how far off the centre line. */
type EndCorner = { leftMm: number; alongMm: number; point: Point3 }

type Level = 'top' | 'bottom'

const downMm = (timber: Timber, leftMm: number, level: Level): number =>
  level === 'top' ? topFall(timber, leftMm) : timber.depthMm / timber.cos

const crossingMm = (timber: Timber, cut: DraftCut, leftMm: number, level: Level): number =>
  crossingAt(cut.crossing, leftMm, downMm(timber, leftMm, level))

/** Cuts that cross the centre line this near to each other meet on it. */
const centralGapMm = 1e-6

/** Where two cuts of an end meet across the timber, on one half of it; null outside that half. */
const meetingMm = (
  timber: Timber,
  a: DraftCut,
  b: DraftCut,
  level: Level,
  half: 1 | -1,
): number | null => {
  const outer = half * timber.halfMm
  const gapAt = (leftMm: number) =>
    crossingMm(timber, a, leftMm, level) - crossingMm(timber, b, leftMm, level)
  const inner = gapAt(0)
  if (Math.abs(inner) < centralGapMm) return 0
  const step = inner - gapAt(outer)
  if (Math.abs(step) < 1e-12) return null
  const share = inner / step
  return share > 0 && share < 1 ? share * outer : null
}

const isRidged = ({ arrisFall, dishMm = 0 }: Timber): boolean =>
  arrisFall.left > 0 || arrisFall.right > 0 || dishMm > 0

/** Offsets off the centre line at which an end can have a corner. */
const offsets = (timber: Timber, cuts: DraftCut[], level: Level): number[] => {
  const found =
    level === 'top' && isRidged(timber)
      ? [timber.halfMm, 0, -timber.halfMm]
      : [timber.halfMm, -timber.halfMm]
  for (let i = 0; i < cuts.length; i++) {
    for (let j = i + 1; j < cuts.length; j++) {
      const [a, b] = [cuts[i], cuts[j]]
      if (a === undefined || b === undefined) continue
      const left = meetingMm(timber, a, b, level, 1)
      const right = meetingMm(timber, a, b, level, -1)
      if (left !== null) found.push(left)
      if (right !== null) found.push(right)
    }
  }
  return found
}

/** How far a line of the timber runs to the cuts of one end. */
const endAlongMm = (
  timber: Timber,
  cuts: DraftCut[],
  upper: boolean,
  leftMm: number,
  level: Level,
) => {
  let alongMm = upper ? Infinity : -Infinity
  for (const cut of cuts) {
    const reach = crossingMm(timber, cut, leftMm, level)
    alongMm = upper ? Math.min(alongMm, reach) : Math.max(alongMm, reach)
  }
  return alongMm
}

/** Whether an end has a corner there: at an arris, on the ridge of a backed top, or where two of the cuts that govern meet. */
const isCorner = (timber: Timber, cuts: DraftCut[], leftMm: number, alongMm: number): boolean => {
  if (Math.abs(leftMm) === timber.halfMm || (leftMm === 0 && isRidged(timber))) return true
  const near = (cut: DraftCut) =>
    Math.abs(crossingMm(timber, cut, leftMm, 'top') - alongMm) < centralGapMm
  return cuts.filter(near).length > 1
}

/** The corners of one end of a timber's top, cut by all cuts of that end. */
export const endCorners = (timber: Timber, cuts: DraftCut[], upper: boolean): EndCorner[] =>
  gather(offsets(timber, cuts, 'top'), (leftMm) => {
    const alongMm = endAlongMm(timber, cuts, upper, leftMm, 'top')
    if (!isCorner(timber, cuts, leftMm, alongMm)) return []
    const point = timberPoint(timber, alongMm, leftMm, topFall(timber, leftMm))
    return [{ leftMm, alongMm, point }]
  })

/** The corners of one cut's face, among all cuts of its end: mm off the centre line and plumb under the top. */
export const faceCorners = (
  timber: Timber,
  cuts: DraftCut[],
  cut: DraftCut,
  upper: boolean,
): { leftMm: number; downMm: number }[] =>
  gather(['top', 'bottom'] as const, (level) =>
    offsets(timber, cuts, level)
      .filter((leftMm) => {
        const beyond =
          crossingMm(timber, cut, leftMm, level) - endAlongMm(timber, cuts, upper, leftMm, level)
        return Math.abs(beyond) < centralGapMm
      })
      .map((leftMm) => ({ leftMm, downMm: downMm(timber, leftMm, level) })),
  )

/** Furthest reach of a timber's end along its own axis, mm from its origin. */
export const endReachMm = (timber: Timber, cuts: DraftCut[], upper: boolean): number => {
  let furthest = upper ? -Infinity : Infinity
  for (const level of ['top', 'bottom'] as const) {
    for (const leftMm of offsets(timber, cuts, level)) {
      // a point plumb below the top lies further towards the foot, measured along the timber
      const back = timber.sin * downMm(timber, leftMm, level)
      const reach = endAlongMm(timber, cuts, upper, leftMm, level) - back
      furthest = upper ? Math.max(furthest, reach) : Math.min(furthest, reach)
    }
  }
  return furthest
}

/**
 * Reach of the lower end of a rafter whose tail may be cut off inside its heel line, by a plumb cut:
 * what its seat has taken there reaches no further. mm from its origin.
 */
export const seatedReachMm = (timber: Timber, cuts: DraftCut[], standMm: number): number => {
  const { halfMm, sin, cos } = timber
  const whole = timber.depthMm / cos
  const alongAt = (leftMm: number, level: Level) => endAlongMm(timber, cuts, false, leftMm, level)
  const underAt = (alongMm: number) =>
    alongMm - sin * (alongMm > 0 ? Math.min(whole, standMm + alongMm * sin) : whole)
  const tops = offsets(timber, cuts, 'top').map((left) => alongAt(left, 'top'))
  const bottoms = offsets(timber, cuts, 'bottom').map((left) => alongAt(left, 'bottom'))
  const [left, right] = [alongAt(halfMm, 'bottom'), alongAt(-halfMm, 'bottom')]
  // where the cut crosses the heel line the timber still has its whole depth
  if (Math.min(left, right) < 0 && Math.max(left, right) > 0) bottoms.push(0)
  return Math.min(...tops, ...bottoms.map(underAt))
}
