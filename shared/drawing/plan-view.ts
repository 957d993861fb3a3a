import type { Point2, Roof } from '../roof/roof-types.ts'
import type { DrawingPoint } from './drawing-geometry.ts'
import { overhangOutline } from './overhang-outline.ts'

/** How plan millimetres (y up) come to drawing px (y down). */
export type PlanView = {
  widthPx: number
  heightPx: number
  pxPerMm: number
  place: (point: Point2) => DrawingPoint
}

export type PlanViewOptions = { widthPx: number; maxHeightPx: number; marginPx: number }

/** Fits the roof with its overhangs into the width, or into the height where that is less. */
export function planView(
  roof: Pick<Roof, 'outline' | 'edges'>,
  options: PlanViewOptions,
): PlanView {
  const reach = [...roof.outline, ...overhangOutline(roof)].filter(
    (p) => Number.isFinite(p.x) && Number.isFinite(p.y),
  )
  const left = Math.min(...reach.map((p) => p.x))
  const right = Math.max(...reach.map((p) => p.x))
  const low = Math.min(...reach.map((p) => p.y))
  const high = Math.max(...reach.map((p) => p.y))
  const spanMm = { x: Math.max(right - left, 1), y: Math.max(high - low, 1) }
  const roomPx = {
    x: Math.max(options.widthPx - 2 * options.marginPx, 40),
    y: Math.max(options.maxHeightPx - 2 * options.marginPx, 40),
  }
  const pxPerMm = Math.min(roomPx.x / spanMm.x, roomPx.y / spanMm.y)
  const leftPx = (options.widthPx - spanMm.x * pxPerMm) / 2
  return {
    widthPx: options.widthPx,
    heightPx: spanMm.y * pxPerMm + 2 * options.marginPx,
    pxPerMm,
    place: (point) => ({
      x: leftPx + (point.x - left) * pxPerMm,
      y: options.marginPx + (high - point.y) * pxPerMm,
    }),
  }
}

/** Which point of the plan lies under a point of the drawing. */
export function roofPointAt(view: PlanView, point: DrawingPoint): Point2 {
  const origin = view.place({ x: 0, y: 0 })
  return { x: (point.x - origin.x) / view.pxPerMm, y: (origin.y - point.y) / view.pxPerMm }
}

/** What can be drawn of an outline while it is being typed, each corner with its own index kept. */
export type DrawableRoof = Pick<Roof, 'outline' | 'edges'> & { indexes: number[] }

export function drawableRoof(roof: Pick<Roof, 'outline' | 'edges'>): DrawableRoof | null {
  const indexes = roof.outline.flatMap((p, i) =>
    Number.isFinite(p.x) && Number.isFinite(p.y) ? [i] : [],
  )
  if (indexes.length < 2) return null
  return {
    indexes,
    outline: indexes.map((i) => roof.outline[i] ?? { x: 0, y: 0 }),
    edges: indexes.map((i) => roof.edges[i] ?? { finish: 'gable', overhangMm: 0 }),
  }
}
