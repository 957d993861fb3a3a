import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import type { Complain } from './report.ts'
import { distanceIn, heightOn, type Slope } from './slopes.ts'
import { cosDeg } from './vec.ts'

const LOOSE_MM = 0.01

/** Set-out length of a rafter that starts on a slope's plate line at (x, y): up to the next slope. */
function setOutAt(slope: Slope, others: readonly Slope[], x: number, y: number, pitchDeg: number) {
  const [ix, iy] = slope.inward
  const runs = others.map((other) => {
    const start = heightOn(other, x, y)
    const rise = heightOn(other, x + ix, y + iy) - start
    return slope.tan > rise ? start / (slope.tan - rise) : Infinity
  })
  return Math.min(...runs) / cosDeg(pitchDeg)
}

/** A slope's plate line from corner to corner, all its edges together. */
function plateLine(roof: Roof, edges: readonly number[]): { along: [number, number][] } {
  const ends = edges.flatMap((i) => [
    roof.outline[i]!,
    roof.outline[(i + 1) % roof.outline.length]!,
  ])
  return { along: ends.map((p): [number, number] => [p.x, p.y]) }
}

/** No bay wider than the spacing, none left out up to the shortest creeper, rafters flush in gables. */
export function checkLayout(
  complain: Complain,
  roof: Roof,
  spec: FrameSpec,
  slopes: readonly Slope[],
  minCreeperMm: number,
): void {
  spec.planes.forEach((plane, index) => {
    const slope = slopes[index]!
    const others = slopes.filter((s) => s !== slope)
    const [dx, dy] = [slope.inward[1], -slope.inward[0]]
    const alongOf = (x: number, y: number): number =>
      (x - slope.cornerX) * dx + (y - slope.cornerY) * dy
    const corners = plateLine(roof, plane.edges).along.map(([x, y]) => alongOf(x, y))
    const [start, end] = [Math.min(...corners), Math.max(...corners)]
    const rafters = spec.members
      .filter((m) => ['common', 'creeper', 'crown-end'].includes(m.role) && m.planes[0] === index)
      .filter((m) => Math.abs(distanceIn(slope, m.axis.from.x, m.axis.from.y)) < LOOSE_MM)
      .sort((a, b) => alongOf(a.axis.from.x, a.axis.from.y) - alongOf(b.axis.from.x, b.axis.from.y))
    const places = rafters.map((m) => alongOf(m.axis.from.x, m.axis.from.y))
    const say = (marks: string[], text: string, out: number): void =>
      complain({ check: 'layout', marks, out, text })
    const atCorner = (roof.sections.rafter.thicknessMm + roof.sections.hip.thicknessMm) / 2
    if (places.length === 0) return say([`slope ${index}`], 'has no rafters', 0)
    places.slice(1).forEach((place, i) => {
      const bay = place - places[i]!
      if (bay <= roof.maxSpacingMm + LOOSE_MM && bay > roof.sections.rafter.thicknessMm) return
      say([rafters[i]!.mark, rafters[i + 1]!.mark], 'bay between them, mm', bay)
    })
    for (const [place, mark, step] of [
      [places[0]!, rafters[0]!.mark, -roof.maxSpacingMm],
      [places.at(-1)!, rafters.at(-1)!.mark, roof.maxSpacingMm],
    ] as const) {
      const next = place + step
      if (next < start + atCorner || next > end - atCorner) continue
      const x = slope.cornerX + next * dx
      const y = slope.cornerY + next * dy
      const missing = setOutAt(slope, others, x, y, plane.pitchDeg)
      if (missing > minCreeperMm + LOOSE_MM)
        say([mark], 'a rafter is missing beside it, mm', missing)
    }
  })
}
