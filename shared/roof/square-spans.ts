import { gather } from './lists.ts'
import type { Border, Face, RoofLines } from './roof-lines.ts'
import { at, insideMm } from './slopes.ts'
import type { Slope } from './slopes.ts'
import { dot2, sub2 } from './vector.ts'

/** A square line's part in a slope: how far inside the plate line it starts and ends, mm, and what borders the slope there. */
export type SquareSpan = { low: number; high: number; lowBorder: Border; highBorder: Border }

/** A node this near to a square line lies on it. */
const onLineMm = 1e-6

type Crossing = { inMm: number; border: Border }

/**
 * All the parts of a slope's square line `alongMm` from the slope's first corner that lie in the slope,
 * lowest first. A line through a node counts as just beside it, on the side of the slope's middle.
 */
export const squareLineSpans = (
  lines: RoofLines,
  slope: Slope,
  face: Face,
  alongMm: number,
): SquareSpan[] => {
  const nudge = alongMm < slope.lengthMm / 2 ? -onLineMm : onLineMm
  const aside = face.nodes.map(
    (n) => dot2(slope.along, sub2(at(lines.nodes, n).point, slope.origin)) - alongMm,
  )
  const crossings = gather(face.nodes, (n, k): Crossing[] => {
    const [p, q] = [at(aside, k), at(aside, k + 1)]
    if (p + nudge > 0 === q + nudge > 0) return []
    const t = Math.min(1, Math.max(0, p / (p - q)))
    const [a, b] = [at(lines.nodes, n).point, at(lines.nodes, at(face.nodes, k + 1)).point]
    const inMm = insideMm(slope, a) * (1 - t) + insideMm(slope, b) * t
    return [{ inMm, border: at(face.borders, k) }]
  })
  crossings.sort((a, b) => a.inMm - b.inMm)
  const spans: SquareSpan[] = []
  for (let k = 0; k + 1 < crossings.length; k += 2) {
    const [low, high] = [at(crossings, k), at(crossings, k + 1)]
    if (high.inMm <= low.inMm) continue
    spans.push({
      low: low.inMm,
      high: high.inMm,
      lowBorder: low.border,
      highBorder: high.border,
    })
  }
  return spans
}
