import type { DrawingPoint, Segment, TurnedBox } from './drawing-geometry.ts'
import { drawingPaper } from './drawing-paper.ts'
import { offsetPx, outwardOf, overhangPx } from './plan-edges.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'

/** A corner's number in a ring; a fine line leads to the corner where it stands further off. */
export type PlanCorner = {
  corner: number
  at: DrawingPoint
  radiusPx: number
  leader: Segment | null
}

const radiusPx = 9
const furtherPx = [12, 24, 38, 54]
const turnsDeg = [0, 35, -35, 65, -65, 90, -90]

export function cornerBox(corner: Pick<PlanCorner, 'at' | 'radiusPx'>): TurnedBox {
  const sidePx = 2 * corner.radiusPx
  return { centre: corner.at, widthPx: sidePx, heightPx: sidePx, angleDeg: 0 }
}

/**
 * Corner numbers outside the corners, clear of the dimensions; in an inward corner close to it. Where
 * corners crowd, a number stands further off with a fine line to its corner; one with no room at all
 * shows when the plan is drawn larger.
 */
export function planCorners(roof: DrawableRoof, view: PlanView): PlanCorner[] {
  const paper = drawingPaper(view)
  return [...roof.outline.keys()].flatMap((i) => {
    for (const place of cornerPlaces(roof, view, i)) {
      const word = { ...cornerBox(place), leader: place.leader }
      if (!paper.hasRoom(word)) continue
      paper.addWord(word)
      return [place]
    }
    return []
  })
}

function* cornerPlaces(roof: DrawableRoof, view: PlanView, i: number): Generator<PlanCorner> {
  const { at, outward, reachPx } = cornerGround(roof, view, i)
  const place = (offPx: number, turnDeg: number): DrawingPoint => {
    const turn = (turnDeg * Math.PI) / 180
    const x = outward.x * Math.cos(turn) - outward.y * Math.sin(turn)
    const y = outward.x * Math.sin(turn) + outward.y * Math.cos(turn)
    return { x: at.x + x * offPx, y: at.y + y * offPx }
  }
  const corner = roof.indexes[i] ?? i
  yield { corner, at: place(reachPx + radiusPx, 0), radiusPx, leader: null }
  for (const morePx of furtherPx)
    for (const turnDeg of turnsDeg) {
      const offPx = reachPx + radiusPx + morePx
      const from = place(offPx - radiusPx, turnDeg)
      yield { corner, at: place(offPx, turnDeg), radiusPx, leader: { from, to: at } }
    }
}

/** The corner, the way out of the roof from it, and how far the eaves and dimensions reach that way. */
function cornerGround(roof: DrawableRoof, view: PlanView, i: number) {
  const previous = (i + roof.outline.length - 1) % roof.outline.length
  const before = outwardOf(roof, previous)
  const after = outwardOf(roof, i)
  const sum = { x: before.x + after.x, y: before.y + after.y }
  const length = Math.hypot(sum.x, sum.y) || 1
  const widestPx = (px: (edge: number) => number) => Math.max(px(i), px(previous))
  const reachPx = isInward(before, after)
    ? widestPx((edge) => overhangPx(roof, view, edge)) * (2 / length)
    : widestPx((edge) => offsetPx(roof, view, edge))
  return {
    at: view.place(roof.outline[i] ?? { x: 0, y: 0 }),
    outward: { x: sum.x / length, y: sum.y / length },
    reachPx,
  }
}

/** Whether the outline turns into the roof between two edges; outward normals, y down. */
function isInward(before: DrawingPoint, after: DrawingPoint): boolean {
  return before.x * after.y - before.y * after.x > 1e-6
}
