import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import { pointAlong } from './drawing-geometry.ts'
import { edgeOutward, edgeOverhangMm } from './overhang-outline.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'

/** From the plates to their dimensions, beyond the tails. */
const dimensionOffsetPx = 16

/** Clear of the tails; where two wings stand close together, no further than half way between. */
export function offsetPx(roof: DrawableRoof, view: PlanView, i: number): number {
  return Math.min(overhangPx(roof, view, i) + dimensionOffsetPx, freePx(roof, view, i) / 2)
}

export function overhangPx(roof: DrawableRoof, view: PlanView, i: number): number {
  return edgeOverhangMm(roof.edges[i]) * view.pxPerMm
}

/** How far it is outward from the middle of a plate to the next one, square to it. */
function freePx(roof: DrawableRoof, view: PlanView, i: number): number {
  const sides = closedSides(roof.outline.map(view.place))
  const own = sides[i]
  if (!own) return Infinity
  const outward = outwardOf(roof, i)
  const middle = pointAlong(own, 0.5)
  const farPx = view.widthPx + view.heightPx
  const ray = {
    from: { x: middle.x + outward.x, y: middle.y + outward.y },
    to: { x: middle.x + outward.x * farPx, y: middle.y + outward.y * farPx },
  }
  const hits = sides.flatMap((side) => {
    const share = crossingShare(ray, side)
    return share === null ? [] : [share * farPx]
  })
  return Math.min(Infinity, ...hits)
}

function crossingShare(ray: Segment, side: Segment): number | null {
  const way = { x: ray.to.x - ray.from.x, y: ray.to.y - ray.from.y }
  const along = { x: side.to.x - side.from.x, y: side.to.y - side.from.y }
  const sine = way.x * along.y - way.y * along.x
  if (Math.abs(sine) < 1e-9) return null
  const off = { x: side.from.x - ray.from.x, y: side.from.y - ray.from.y }
  const share = (off.x * along.y - off.y * along.x) / sine
  const onSide = (off.x * way.y - off.y * way.x) / sine
  return share > 0 && onSide >= 0 && onSide <= 1 ? share : null
}

export function closedSides(corners: readonly DrawingPoint[]): Segment[] {
  return corners.map((from, i) => ({ from, to: corners[(i + 1) % corners.length] ?? from }))
}

/** Outward in drawing coordinates, y down. */
export function outwardOf(roof: DrawableRoof, i: number): DrawingPoint {
  const outward = edgeOutward(roof.outline, i)
  return { x: outward.x, y: -outward.y }
}
