import type { Point2 } from '../roof/roof-types.ts'

/** Twice the signed area of an outline, mm²; positive when it runs counter-clockwise. */
export function outlineSignedArea2(outline: readonly Point2[]): number {
  return outline.reduce((sum, p, i) => {
    const next = outline[(i + 1) % outline.length] ?? p
    return sum + p.x * next.y - next.x * p.y
  }, 0)
}

/**
 * A list of corners read the other way round from its first; `edgeOf[k]` is the old number of the edge
 * that now runs from corner k.
 */
export function outlineTurnedRound<Corner>(corners: readonly Corner[]): {
  corners: Corner[]
  edgeOf: number[]
} {
  const count = corners.length
  return {
    corners: corners.flatMap((_, k) => corners[(count - k) % count] ?? []),
    edgeOf: corners.map((_, k) => count - 1 - k),
  }
}

export function edgeLengthMm(outline: readonly Point2[], edge: number): number {
  const [from, to] = [outline[edge], outline[(edge + 1) % outline.length]]
  return from && to ? Math.hypot(to.x - from.x, to.y - from.y) : NaN
}

/**
 * The angle inside the building at a corner of a counter-clockwise outline, degrees: 90 at an outer
 * square corner, 270 at an inner one, 180 on a straight side.
 */
export function insideAngleDeg(outline: readonly Point2[], corner: number): number {
  const count = outline.length
  const [before, own, after] = [
    outline[(corner + count - 1) % count],
    outline[corner],
    outline[(corner + 1) % count],
  ]
  if (!before || !own || !after) return NaN
  const inDeg = (Math.atan2(own.y - before.y, own.x - before.x) * 180) / Math.PI
  const outDeg = (Math.atan2(after.y - own.y, after.x - own.x) * 180) / Math.PI
  return (((180 - (outDeg - inDeg)) % 360) + 360) % 360
}

/** Two edges that cross, and where. */
export type Crossing = { edges: [number, number]; at: Point2 }

/** Every pair of edges that cross between their ends; edges that share a corner do not count. */
export function outlineCrossings(outline: readonly Point2[]): Crossing[] {
  const count = outline.length
  const found: Crossing[] = []
  for (let i = 0; i < count; i++) {
    for (let j = i + 2; j < count; j++) {
      if (i === 0 && j === count - 1) continue
      const at = crossingOf(outline, i, j)
      if (at) found.push({ edges: [i, j], at })
    }
  }
  return found
}

function crossingOf(outline: readonly Point2[], i: number, j: number): Point2 | null {
  const [a, b] = [outline[i], outline[(i + 1) % outline.length]]
  const [c, d] = [outline[j], outline[(j + 1) % outline.length]]
  if (!a || !b || !c || !d) return null
  const [ux, uy, vx, vy] = [b.x - a.x, b.y - a.y, d.x - c.x, d.y - c.y]
  const turn = ux * vy - uy * vx
  if (turn === 0) return null
  const alongA = ((c.x - a.x) * vy - (c.y - a.y) * vx) / turn
  const alongC = ((c.x - a.x) * uy - (c.y - a.y) * ux) / turn
  const isWithin = (share: number) => share >= 0 && share <= 1
  return isWithin(alongA) && isWithin(alongC)
    ? { x: a.x + ux * alongA, y: a.y + uy * alongA }
    : null
}

/** To a hundredth of a mm, without noughts that say nothing: how a worked-out measure is written. */
export function mmText(mm: number): string {
  return String(Math.round(mm * 100) / 100 + 0)
}
