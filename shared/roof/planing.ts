import { crossingAt, timberPoint, topFall } from './bevel.ts'
import { roofSurface } from './eaves.ts'
import { boxesMeet, polygonBox } from './convex.ts'
import type { Box } from './convex.ts'
import { endCorners } from './ends.ts'
import { gather } from './lists.ts'
import type { FrameDraft } from './members.ts'
import type { RoofLines } from './roof-lines.ts'
import type { Planing, Point2, Point3 } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateLines } from './slopes.ts'
import { cross2, sub2 } from './vector.ts'

/** Less than this over a slope is no work for a plane. */
const leastOffMm = 0.1
/** A corner this near to the centre line counts for both sides. */
const centreMm = 1e-6

/** A place of a timber's top that may stand over the roof. */
type Place = { end: 'head' | 'foot'; leftMm: number; point: Point3 }

const cornerPlaces = ({ finished, cuts }: FrameDraft): Place[] =>
  gather(['head', 'foot'] as const, (end) => {
    const own = cuts.filter((cut) => cut.end === end)
    if (own.length === 0) return []
    return endCorners(finished, own, end === 'head').map(({ leftMm, point }) => ({
      end,
      leftMm,
      point,
    }))
  })

type Stretch = { from: Point2; to: Point2; box: Box }

const stretch = (from: Point2, to: Point2): Stretch => ({ from, to, box: polygonBox([from, to]) })

/** Where two stretches of the plan cross, as a share of the first; null where they do not. */
const crossingShare = (a: Stretch, b: Stretch): number | null => {
  const run = sub2(a.to, a.from)
  const other = sub2(b.to, b.from)
  const size = cross2(run, other)
  if (Math.abs(size) < 1e-9) return null
  const off = sub2(b.from, a.from)
  const share = cross2(off, other) / size
  const along = cross2(off, run) / size
  return share > 0 && share < 1 && along >= 0 && along <= 1 ? share : null
}

/** Where the arrises and the middle of a top pass over valleys: between its corners a top stands proud only there. */
const valleyPlaces = (draft: FrameDraft, valleys: readonly Stretch[]): Place[] => {
  const { finished, cuts, setOutLengthMm } = draft
  if (valleys.length === 0) return []
  return gather([finished.halfMm, 0, -finished.halfMm], (leftMm) => {
    const down = topFall(finished, leftMm)
    let [low, high] = [-Infinity, Infinity]
    for (const { end, crossing } of cuts) {
      const alongMm = crossingAt(crossing, leftMm, down)
      if (end === 'head') high = Math.min(high, alongMm)
      else low = Math.max(low, alongMm)
    }
    if (!(low < high) || high - low === Infinity) return []
    const top = stretch(
      timberPoint(finished, low, leftMm, down),
      timberPoint(finished, high, leftMm, down),
    )
    return gather(valleys, (valley): Place[] => {
      const share = boxesMeet(top.box, valley.box) ? crossingShare(top, valley) : null
      if (share === null) return []
      const alongMm = low + share * (high - low)
      const point = timberPoint(finished, alongMm, leftMm, down)
      return [{ end: alongMm > setOutLengthMm / 2 ? 'head' : 'foot', leftMm, point }]
    })
  })
}

/**
 * Parts of tops that stand over a neighbouring slope (ridge ends, apexes, the foot of a broken hip,
 * heads that reach over a valley), with the plumb height to plane off, mm, by end and side.
 */
export const planingOf = (
  drafts: FrameDraft[],
  plates: PlateLines,
  lines: RoofLines,
  standMm: number,
  markOf: Map<number, string>,
): Planing[] => {
  const surfaceMm = roofSurface(plates, lines)
  const valleys = lines.lines
    .filter(({ kind }) => kind === 'valley')
    .map(({ from, to }) => stretch(at(lines.nodes, from).point, at(lines.nodes, to).point))
  return gather(drafts, (draft) => {
    const mark = markOf.get(draft.piece.id) ?? ''
    const overs = [...cornerPlaces(draft), ...valleyPlaces(draft, valleys)]
      .map(({ end, leftMm, point }) => ({
        end,
        leftMm,
        overMm: point.z - standMm - surfaceMm(point),
      }))
      .filter(({ overMm }) => overMm > leastOffMm)
    if (overs.length === 0) return []
    return gather(['head', 'foot'] as const, (end) =>
      gather(['left', 'right'] as const, (side): Planing[] => {
        const sign = side === 'left' ? 1 : -1
        const own = overs.filter((o) => o.end === end && o.leftMm * sign >= -centreMm)
        if (own.length === 0) return []
        return [{ mark, end, side, offMm: Math.max(...own.map((o) => o.overMm)) }]
      }),
    )
  })
}
