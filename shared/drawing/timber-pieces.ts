import type { DrawingPoint } from './drawing-geometry.ts'
import type { TimberZone } from './timber-zones.ts'

const zigzagPx = 3

/**
 * A long shape cut into the pieces that are drawn, each end at a break closed by a standard break
 * line. Drawing coordinates; the zones are vertical bands.
 */
export function piecesBetweenBreaks(
  shape: readonly DrawingPoint[],
  zones: readonly TimberZone[],
): DrawingPoint[][] {
  return zones.flatMap((zone, i) => {
    const afterStart = i === 0 ? [...shape] : clipped(shape, zone.startPx, 1)
    const piece = i === zones.length - 1 ? afterStart : clipped(afterStart, zone.endPx, -1)
    if (piece.length < 3) return []
    const withStart = i === 0 ? piece : brokenAt(piece, zone.startPx)
    return [i === zones.length - 1 ? withStart : brokenAt(withStart, zone.endPx)]
  })
}

/** Keeps what lies right (side 1) or left (side −1) of a vertical line. */
function clipped(shape: readonly DrawingPoint[], atPx: number, side: 1 | -1): DrawingPoint[] {
  const inside = (p: DrawingPoint) => side * (p.x - atPx) >= 0
  return shape.flatMap((from, i) => {
    const to = shape[(i + 1) % shape.length] ?? from
    const kept = inside(from) ? [from] : []
    if (inside(from) === inside(to)) return kept
    const share = (atPx - from.x) / (to.x - from.x)
    return [...kept, { x: atPx, y: from.y + (to.y - from.y) * share }]
  })
}

function brokenAt(piece: readonly DrawingPoint[], atPx: number): DrawingPoint[] {
  return piece.flatMap((from, i) => {
    const to = piece[(i + 1) % piece.length] ?? from
    const isBreak = Math.abs(from.x - atPx) < 1e-6 && Math.abs(to.x - atPx) < 1e-6
    return isBreak ? [from, ...zigzag(from, to)] : [from]
  })
}

/** One sharp Z in the middle of a straight line. */
function zigzag(from: DrawingPoint, to: DrawingPoint): DrawingPoint[] {
  const y = (share: number) => from.y + (to.y - from.y) * share
  const sign = to.y > from.y ? 1 : -1
  return [
    { x: from.x, y: y(0.4) },
    { x: from.x + zigzagPx * sign, y: y(0.46) },
    { x: from.x - zigzagPx * sign, y: y(0.54) },
    { x: from.x, y: y(0.6) },
  ]
}
