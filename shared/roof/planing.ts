import type { FrameDraft } from './members.ts'
import { endCorners } from './ends.ts'
import type { Planing } from './roof-types.ts'
import type { RoofLines } from './roof-lines.ts'
import { roofSurface } from './eaves.ts'
import type { PlateLines } from './slopes.ts'

/** Less than this over a slope is no work for a plane. */
const leastOffMm = 0.1

/**
 * Top corners that stand over a neighbouring slope (ridge ends, apexes, the foot of a broken hip),
 * with the plumb height to plane off, mm, by end and side. A corner on the centre line counts for both.
 */
export const planingOf = (
  drafts: FrameDraft[],
  plates: PlateLines,
  lines: RoofLines,
  standMm: number,
  markOf: Map<number, string>,
): Planing[] => {
  const surfaceMm = roofSurface(plates, lines)
  return drafts.flatMap((draft) =>
    (['head', 'foot'] as const).flatMap((end) => {
      const cuts = draft.cuts.filter((cut) => cut.end === end)
      if (cuts.length === 0) return []
      const { finished } = draft
      const corners = endCorners(finished, cuts, end === 'head').map((corner) => ({
        leftMm: corner.leftMm,
        overMm: corner.point.z - standMm - surfaceMm(corner.point),
      }))
      return (['left', 'right'] as const).flatMap((side): Planing[] => {
        const sign = side === 'left' ? 1 : -1
        const own = corners.filter((corner) => corner.leftMm * sign >= -1e-6)
        const offMm = Math.max(...own.map((corner) => corner.overMm))
        const mark = markOf.get(draft.piece.id) ?? ''
        return offMm > leastOffMm ? [{ mark, end, side, offMm }] : []
      })
    }),
  )
}
