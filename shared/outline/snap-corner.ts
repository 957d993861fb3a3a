import type { Point2 } from '../roof/roof-types.ts'

/** A line a moved corner may snap to, and why. */
type SnapLine = { through: Point2; along: Point2; why: SnapReason }
export type SnapReason =
  | { kind: 'square'; edge: number }
  | { kind: 'straight'; edge: number }
  | { kind: 'in-line'; corner: number }

export type Snapped = {
  at: Point2
  /** From the point that is lined up with, to the corner. */
  guides: { from: Point2; why: SnapReason }[]
}

export type SnapOptions = {
  /** Lengths and places come in whole steps of this. */
  gridMm: number
  /** How far the corner is drawn to a line. */
  reachMm: number
}

/**
 * Where a corner dragged to `to` comes to rest: where two lines through its neighbours and the other
 * corners cross, on one such line with its side a whole number of steps long, or on the grid. Lines are:
 * square to the neighbouring sides, straight on from them, across or up the page from another corner.
 */
export function snapCorner(
  outline: readonly Point2[],
  corner: number,
  to: Point2,
  { gridMm, reachMm }: SnapOptions,
): Snapped {
  const near = snapLines(outline, corner)
    .map((line) => ({ line, offMm: distanceToLine(to, line) }))
    .filter(({ offMm }) => offMm <= reachMm)
    .sort((a, b) => rank(a.line) - rank(b.line) || a.offMm - b.offMm)
  const crossing = bestCrossing(
    near.map(({ line }) => line),
    to,
    reachMm,
  )
  if (crossing) return crossing
  const [best] = near
  if (!best) return { at: onGrid(to, gridMm), guides: [] }
  const at = steppedAlong(best.line, to, neighbourOn(outline, corner, best.line), gridMm)
  return { at, guides: [{ from: best.line.through, why: best.line.why }] }
}

export function onGrid({ x, y }: Point2, gridMm: number): Point2 {
  const step = (mm: number) => Math.round(mm / gridMm) * gridMm + 0
  return { x: step(x), y: step(y) }
}

function snapLines(outline: readonly Point2[], corner: number): SnapLine[] {
  const count = outline.length
  const index = (i: number) => (i + count) % count
  const own = (side: -1 | 1): SnapLine[] => {
    const [near, far] = [outline[index(corner + side)], outline[index(corner + 2 * side)]]
    if (!near || !far || count < 4) return []
    const along = unit({ x: near.x - far.x, y: near.y - far.y })
    if (!along) return []
    // The side beyond the neighbour: before it, the edge two back; after it, the edge one on.
    const edge = index(side === -1 ? corner - 2 : corner + 1)
    return [
      { through: near, along: { x: -along.y, y: along.x }, why: { kind: 'square', edge } },
      { through: near, along, why: { kind: 'straight', edge } },
    ]
  }
  const aligned = outline.flatMap((through, i): SnapLine[] =>
    i === corner
      ? []
      : [
          { through, along: { x: 1, y: 0 }, why: { kind: 'in-line', corner: i } },
          { through, along: { x: 0, y: 1 }, why: { kind: 'in-line', corner: i } },
        ],
  )
  return [...own(-1), ...own(1), ...aligned]
}

const ranks: Record<SnapReason['kind'], number> = { square: 0, straight: 1, 'in-line': 2 }
const rank = (line: SnapLine) => ranks[line.why.kind]

/** Of the crossings within reach, the one of the best lines; lines come best first. */
function bestCrossing(lines: readonly SnapLine[], to: Point2, reachMm: number): Snapped | null {
  for (const [i, one] of lines.entries()) {
    for (const other of lines.slice(i + 1)) {
      const at = crossingOf(one, other)
      if (!at || Math.hypot(at.x - to.x, at.y - to.y) > reachMm) continue
      const guides = [one, other].map(({ through, why }) => ({ from: through, why }))
      return { at, guides }
    }
  }
  return null
}

/** A crossing flatter than this (sine) says nothing about where a corner goes. */
const leastSine = 0.02

function crossingOf(one: SnapLine, other: SnapLine): Point2 | null {
  const sine = one.along.x * other.along.y - one.along.y * other.along.x
  if (Math.abs(sine) < leastSine) return null
  const [dx, dy] = [other.through.x - one.through.x, other.through.y - one.through.y]
  const reach = (dx * other.along.y - dy * other.along.x) / sine
  return { x: one.through.x + one.along.x * reach, y: one.through.y + one.along.y * reach }
}

/** The corner's neighbour that lies on a line, from which its side is measured. */
function neighbourOn(outline: readonly Point2[], corner: number, line: SnapLine): Point2 {
  const count = outline.length
  const neighbours = [outline[(corner + count - 1) % count], outline[(corner + 1) % count]]
  return neighbours.find((p) => p && distanceToLine(p, line) < 1e-6) ?? line.through
}

function steppedAlong(line: SnapLine, to: Point2, from: Point2, gridMm: number): Point2 {
  const reach = (to.x - from.x) * line.along.x + (to.y - from.y) * line.along.y
  const stepped = Math.round(reach / gridMm) * gridMm
  return { x: from.x + line.along.x * stepped + 0, y: from.y + line.along.y * stepped + 0 }
}

function distanceToLine(point: Point2, line: SnapLine): number {
  const [dx, dy] = [point.x - line.through.x, point.y - line.through.y]
  return Math.abs(dx * line.along.y - dy * line.along.x)
}

function unit({ x, y }: Point2): Point2 | null {
  const length = Math.hypot(x, y)
  return length > 0 ? { x: x / length, y: y / length } : null
}
