import type { Point2, Roof, RoofEdge } from '../roof/roof-types.ts'

type EdgeLine = { point: Point2; along: Point2 }

const parallelSine = 1e-6

/**
 * The line of the tails and verges in plan: every plate edge moved out by its own overhang.
 * Where neighbours run on in one line with different overhangs, the line steps at the corner.
 * Counter-clockwise, mm.
 */
export function overhangOutline(roof: Pick<Roof, 'outline' | 'edges'>): Point2[] {
  return outlineMovedOut(roof.outline, (i) => edgeOverhangMm(roof.edges[i]))
}

/** An outline with every edge moved out (or in, below nought) by its own distance. */
export function outlineMovedOut(
  outline: readonly Point2[],
  distanceMm: (edge: number) => number,
): Point2[] {
  const lines = outline.map((_, i) => movedOutEdge(outline, i, distanceMm(i)))
  return lines.flatMap((line, i) => {
    const before = lines[(i + lines.length - 1) % lines.length] ?? line
    const crossing = lineCrossing(before, line)
    if (crossing) return [crossing]
    const corner = outline[i]
    return corner ? [footOnLine(corner, before), footOnLine(corner, line)] : []
  })
}

/** Outward unit normal of plate edge i of a counter-clockwise outline. */
export function edgeOutward(outline: readonly Point2[], i: number): Point2 {
  const from = outline[i]
  const to = outline[(i + 1) % outline.length]
  if (!from || !to) return { x: 0, y: 0 }
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1
  return { x: (to.y - from.y) / length, y: (from.x - to.x) / length }
}

export function edgeOverhangMm(edge: RoofEdge | undefined): number {
  const overhangMm = edge?.overhangMm ?? 0
  return Number.isFinite(overhangMm) ? Math.max(0, overhangMm) : 0
}

function movedOutEdge(outline: readonly Point2[], i: number, distanceMm: number): EdgeLine {
  const outward = edgeOutward(outline, i)
  const corner = outline[i] ?? { x: 0, y: 0 }
  return {
    point: { x: corner.x + outward.x * distanceMm, y: corner.y + outward.y * distanceMm },
    along: { x: -outward.y, y: outward.x },
  }
}

function lineCrossing(a: EdgeLine, b: EdgeLine): Point2 | null {
  const sine = a.along.x * b.along.y - a.along.y * b.along.x
  if (Math.abs(sine) < parallelSine) return null
  const dx = b.point.x - a.point.x
  const dy = b.point.y - a.point.y
  const reach = (dx * b.along.y - dy * b.along.x) / sine
  return { x: a.point.x + a.along.x * reach, y: a.point.y + a.along.y * reach }
}

function footOnLine(point: Point2, line: EdgeLine): Point2 {
  const reach = (point.x - line.point.x) * line.along.x + (point.y - line.point.y) * line.along.y
  return { x: line.point.x + line.along.x * reach, y: line.point.y + line.along.y * reach }
}
