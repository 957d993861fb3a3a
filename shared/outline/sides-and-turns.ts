import type { Point2 } from '../roof/roof-types.ts'

/**
 * An outline walked side by side: so far, then turn. Degrees to the left are positive; a heading of 0 goes
 * to the right of the page, 90 up it.
 */
export type WalkSide = { lengthMm: number; turnLeftDeg: number }

/** Plans are rounded: an end this near to its start, mm, is the start. */
export const closedMm = 1

export type Walk = {
  /** Where each side starts; counter-clockwise or clockwise as walked. */
  corners: Point2[]
  /** From the end of the last side back to the start. */
  gapMm: number
  gap: Point2
  isClosed: boolean
  /** Turn at the end of the last side, and at the end of the side that would close it, to go back to the start. */
  closing: { turnLeftDeg: number; lastTurnLeftDeg: number }
}

/** Walks sides from a start. The last side ends at the start when the outline closes. */
export function walkOfSides(
  sides: readonly WalkSide[],
  start: Point2 = { x: 0, y: 0 },
  startDeg = 0,
): Walk {
  let at = start
  let headingDeg = startDeg
  const starts: Point2[] = []
  for (const { lengthMm, turnLeftDeg } of sides) {
    starts.push(at)
    const { cos, sin } = exactTurn(headingDeg)
    at = { x: at.x + lengthMm * cos, y: at.y + lengthMm * sin }
    headingDeg += turnLeftDeg
  }
  const gap = { x: start.x - at.x, y: start.y - at.y }
  const gapMm = Math.hypot(gap.x, gap.y)
  const isClosed = sides.length > 2 && gapMm <= closedMm
  const gapDeg = (Math.atan2(gap.y, gap.x) * 180) / Math.PI
  const lastDeg = headingDeg - (sides.at(-1)?.turnLeftDeg ?? 0)
  return {
    corners: isClosed || sides.length === 0 ? starts : [...starts, at],
    gapMm,
    gap,
    isClosed,
    closing: {
      turnLeftDeg: turnWithin180(gapDeg - lastDeg),
      lastTurnLeftDeg: turnWithin180(startDeg - gapDeg),
    },
  }
}

/** An outline as it would be walked: the first side from corner 1, one turn at the end of each side. */
export function sidesOfOutline(outline: readonly Point2[]): {
  startDeg: number
  sides: WalkSide[]
} {
  const headings = outline.map((from, i) => {
    const to = outline[(i + 1) % outline.length] ?? from
    return (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI
  })
  const sides = outline.map((from, i): WalkSide => {
    const next = (i + 1) % outline.length
    const to = outline[next] ?? from
    return {
      lengthMm: Math.hypot(to.x - from.x, to.y - from.y),
      turnLeftDeg: turnWithin180((headings[next] ?? 0) - (headings[i] ?? 0)),
    }
  })
  return { startDeg: headings[0] ?? 0, sides }
}

/** The same turn, over −180° and up to 180°. */
function turnWithin180(deg: number): number {
  const turn = ((deg % 360) + 360) % 360
  return turn > 180 ? turn - 360 : turn
}

/** Square turns stay exactly square, however often a walk turns. */
function exactTurn(deg: number): { cos: number; sin: number } {
  const quarter = (((deg % 360) + 360) % 360) / 90
  if (Number.isInteger(quarter)) {
    return { cos: [1, 0, -1, 0][quarter] ?? 1, sin: [0, 1, 0, -1][quarter] ?? 0 }
  }
  const rad = (deg * Math.PI) / 180
  return { cos: Math.cos(rad), sin: Math.sin(rad) }
}
