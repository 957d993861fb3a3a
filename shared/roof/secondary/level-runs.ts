import type { Face, RoofLines } from '../roof-lines.ts'
import { at, insideMm } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { dot2, sub2 } from '../vector.ts'

/**
 * A stretch of a level line inside a slope, mm along its plate, and the borders (places in the slope's
 * face) that it ends on; more than one where the timber on it is wide enough to meet several.
 */
export type LevelRun = { fromMm: number; toMm: number; fromBorders: number[]; toBorders: number[] }

type Crossing = { alongMm: number; border: number }

/** Where a level line `inMm` of plan inside a slope's plate lies in the slope, in order along the plate. */
export const levelRuns = (lines: RoofLines, slope: Slope, face: Face, inMm: number): LevelRun[] => {
  const crossings: Crossing[] = []
  face.nodes.forEach((id, border) => {
    const p = at(lines.nodes, id).point
    const q = at(lines.nodes, at(face.nodes, border + 1)).point
    const [low, high] = [insideMm(slope, p) - inMm, insideMm(slope, q) - inMm]
    // a corner on the line belongs to the side above it, so that crossings come in pairs
    if (low < 0 === high < 0) return
    const share = low / (low - high)
    const from = dot2(slope.along, sub2(p, slope.origin))
    const to = dot2(slope.along, sub2(q, slope.origin))
    crossings.push({ alongMm: from + (to - from) * share, border })
  })
  crossings.sort((a, b) => a.alongMm - b.alongMm)
  const runs: LevelRun[] = []
  for (let k = 0; k + 1 < crossings.length; k += 2) {
    const [from, to] = [at(crossings, k), at(crossings, k + 1)]
    runs.push({
      fromMm: from.alongMm,
      toMm: to.alongMm,
      fromBorders: [from.border],
      toBorders: [to.border],
    })
  }
  return runs
}

const joined = (a: number[], b: number[]): number[] => [...new Set([...a, ...b])]

/** The stretches that lie in all of several level lines' runs. */
export const sharedRuns = (lists: LevelRun[][]): LevelRun[] =>
  lists.reduce((kept, runs) =>
    kept.flatMap((a) =>
      runs.flatMap((b): LevelRun[] => {
        const [fromMm, toMm] = [Math.max(a.fromMm, b.fromMm), Math.min(a.toMm, b.toMm)]
        if (toMm <= fromMm) return []
        const fromBorders = joined(a.fromBorders, b.fromBorders)
        return [{ fromMm, toMm, fromBorders, toBorders: joined(a.toBorders, b.toBorders) }]
      }),
    ),
  )
