import type { Roof } from '../../../shared/roof/roof-types.ts'
import { distanceAlong, distanceIn } from './slopes.ts'
import { nearestOn, type Face } from './surface.ts'

/** A place on a slope: mm along its plate line, mm level inward from it. */
export type OnSlope = { along: number; inward: number }

/** One border of a slope's part of the plan. */
export type Border = { a: OnSlope; b: OnSlope; isVerge: boolean; isPlate: boolean }

/** A stretch that is in the slope, of a level line (`low`, `high` along) or of a square one (inward). */
export type Strip = { low: number; high: number; lowBorder: Border; highBorder: Border }

const ON_LINE_MM = 0.5

function isOnGable(roof: Roof, x: number, y: number): boolean {
  return roof.edges.some((edge, i) => {
    if (edge.finish !== 'gable') return false
    const [a, b] = [roof.outline[i]!, roof.outline[(i + 1) % roof.outline.length]!]
    const [nx, ny] = nearestOn([a.x, a.y], [b.x, b.y], x, y)
    return Math.hypot(x - nx, y - ny) < ON_LINE_MM
  })
}

export function bordersOf(roof: Roof, face: Face): Border[] {
  const place = (x: number, y: number): OnSlope => ({
    along: distanceAlong(face.slope, x, y),
    inward: distanceIn(face.slope, x, y),
  })
  return face.plan.map(([ax, ay], i) => {
    const [bx, by] = face.plan[(i + 1) % face.plan.length]!
    const [a, b] = [place(ax, ay), place(bx, by)]
    return {
      a,
      b,
      isVerge: isOnGable(roof, (ax + bx) / 2, (ay + by) / 2),
      isPlate: Math.abs(a.inward) < ON_LINE_MM && Math.abs(b.inward) < ON_LINE_MM,
    }
  })
}

type Axis = 'along' | 'inward'

function strips(borders: readonly Border[], fixed: Axis, value: number): Strip[] {
  const free: Axis = fixed === 'along' ? 'inward' : 'along'
  const crossings = borders
    .filter(({ a, b }) => a[fixed] > value !== b[fixed] > value)
    .map((border) => {
      const { a, b } = border
      const share = (value - a[fixed]) / (b[fixed] - a[fixed])
      return { at: a[free] + share * (b[free] - a[free]), border }
    })
    .sort((a, b) => a.at - b.at)
  const found: Strip[] = []
  for (let i = 0; i + 1 < crossings.length; i += 2) {
    const [low, high] = [crossings[i]!, crossings[i + 1]!]
    found.push({ low: low.at, high: high.at, lowBorder: low.border, highBorder: high.border })
  }
  return found
}

/** Where a slope is at one height: stretches of its level line. */
export const levelStrips = (borders: readonly Border[], inward: number): Strip[] =>
  strips(borders, 'inward', inward)

/** Where a rafter could stand at one place along: stretches of its square line. */
export const squareStrips = (borders: readonly Border[], along: number): Strip[] =>
  strips(borders, 'along', along)
