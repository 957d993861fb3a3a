import { timberPoint, topFall } from './bevel.ts'
import type { Timber } from './bevel.ts'
import type { DraftCut } from './cuts.ts'
import type { Point3 } from './roof-types.ts'
import { dot3, planeCrossing, sub3 } from './vector.ts'

/** A corner of a timber's end: where it is and how far off the centre line. */
export type EndCorner = { leftMm: number; alongMm: number; point: Point3 }

type Level = 'top' | 'bottom'

const downMm = (timber: Timber, leftMm: number, level: Level): number =>
  level === 'top' ? topFall(timber, leftMm) : timber.depthMm / timber.cos

const crossingMm = (timber: Timber, cut: DraftCut, leftMm: number, level: Level): number =>
  planeCrossing(
    cut.plane,
    timberPoint(timber, 0, leftMm, downMm(timber, leftMm, level)),
    timber.direction,
  )

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
  const step = inner - gapAt(outer)
  if (Math.abs(step) < 1e-12) return null
  const share = inner / step
  return share > 0 && share < 1 ? share * outer : null
}

/** Offsets off the centre line at which an end can have a corner. */
const offsets = (timber: Timber, cuts: DraftCut[], level: Level): number[] => {
  const found = [timber.halfMm, 0, -timber.halfMm]
  cuts.forEach((a, k) => {
    for (const b of cuts.slice(k + 1)) {
      for (const half of [1, -1] as const) {
        const leftMm = meetingMm(timber, a, b, level, half)
        if (leftMm !== null) found.push(leftMm)
      }
    }
  })
  return found
}

/** The corners of one end of a timber, of its top or bottom, cut by all cuts of that end. */
export const endCorners = (
  timber: Timber,
  cuts: DraftCut[],
  upper: boolean,
  level: Level,
): EndCorner[] =>
  offsets(timber, cuts, level).map((leftMm) => {
    const reaches = cuts.map((cut) => crossingMm(timber, cut, leftMm, level))
    const alongMm = upper ? Math.min(...reaches) : Math.max(...reaches)
    return {
      leftMm,
      alongMm,
      point: timberPoint(timber, alongMm, leftMm, downMm(timber, leftMm, level)),
    }
  })

/** Furthest reach of a timber's end along its own axis, mm from its origin. */
export const endReachMm = (timber: Timber, cuts: DraftCut[], upper: boolean): number => {
  const corners = [
    ...endCorners(timber, cuts, upper, 'top'),
    ...endCorners(timber, cuts, upper, 'bottom'),
  ]
  const reaches = corners.map(({ point }) => dot3(timber.direction, sub3(point, timber.origin)))
  return upper ? Math.max(...reaches) : Math.min(...reaches)
}
