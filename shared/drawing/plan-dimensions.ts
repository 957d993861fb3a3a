import { formatLength, type LengthUnits } from '../units/format-length.ts'
import type { DrawingPoint, Segment, TurnedBox } from './drawing-geometry.ts'
import { isInShape, pointAlong, segmentLength } from './drawing-geometry.ts'
import { drawingPaper } from './drawing-paper.ts'
import { edgeOutward, edgeOverhangMm, overhangOutline } from './overhang-outline.ts'
import { type DimensionLabel, dimensionLabel } from './plan-dimension-labels.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'

export type PlanDimension = {
  /** Index of the plate edge. */
  edge: number
  lengthMm: number
  line: Segment
  ticks: Segment[]
  /** Null only where a drawing is too small for it; drawn larger it shows. */
  label: DimensionLabel | null
}

export type PlanCorner = { corner: number; at: DrawingPoint; radiusPx: number }

export type PlanScaleBar = { segment: Segment; lengthMm: number; text: string }

export const dimensionOffsetPx = 16
const tickPx = 5
const cornerRadiusPx = 9

/**
 * A dimension along every plate, outside the eaves. With corner numbers each says which edge it is.
 * Long sides are written first; a short one has more places to go.
 */
export function planDimensions(
  roof: DrawableRoof,
  view: PlanView,
  corners: readonly PlanCorner[],
  units: LengthUnits,
): PlanDimension[] {
  const paper = drawingPaper(view)
  for (const corner of corners) paper.addWord({ ...cornerBox(corner), leader: null })
  const tails = overhangOutline(roof).map(view.place)
  for (const side of closedSides(tails)) paper.addLine(side, 'tails')
  const isOverRoof = (box: TurnedBox) => isInShape(box.centre, tails)
  const dimensions = [...roof.outline.keys()].map((i): PlanDimension => {
    const line = dimensionLine(roof, view, i)
    paper.addLine(line, `${i}`)
    const lengthMm = segmentLength(line) / view.pxPerMm
    return { edge: roof.indexes[i] ?? i, lengthMm, line, ticks: slashTicks(line), label: null }
  })
  const longFirst = [...dimensions.keys()].sort(
    (a, b) => (dimensions[b]?.lengthMm ?? 0) - (dimensions[a]?.lengthMm ?? 0),
  )
  for (const i of longFirst) {
    const dimension = dimensions[i]
    if (!dimension) continue
    const { edge, lengthMm, line } = dimension
    const texts = edgeTexts(edge, formatLength(lengthMm, units), corners.length > 0)
    const words = { owner: `${i}`, line, outward: outwardOf(roof, i), texts, isOverRoof }
    dimension.label = dimensionLabel(words, paper)
    if (dimension.label) paper.addWord(dimension.label)
  }
  return dimensions
}

export function cornerBox(corner: PlanCorner): TurnedBox {
  const sidePx = 2 * corner.radiusPx
  return { centre: corner.at, widthPx: sidePx, heightPx: sidePx, angleDeg: 0 }
}

/** Corner numbers outside the corners, clear of the dimensions; in an inward corner close to it. */
export function planCorners(roof: DrawableRoof, view: PlanView): PlanCorner[] {
  const count = roof.outline.length
  return roof.outline.map((corner, i) => {
    const previous = (i + count - 1) % count
    const before = outwardOf(roof, previous)
    const after = outwardOf(roof, i)
    const sum = { x: before.x + after.x, y: before.y + after.y }
    const length = Math.hypot(sum.x, sum.y) || 1
    const widestPx = (px: (edge: number) => number) => Math.max(px(i), px(previous))
    const reachPx = isInward(before, after)
      ? widestPx((edge) => overhangPx(roof, view, edge)) * (2 / length)
      : widestPx((edge) => offsetPx(roof, view, edge))
    const at = view.place(corner)
    return {
      corner: roof.indexes[i] ?? i,
      at: {
        x: at.x + (sum.x / length) * (reachPx + cornerRadiusPx),
        y: at.y + (sum.y / length) * (reachPx + cornerRadiusPx),
      },
      radiusPx: cornerRadiusPx,
    }
  })
}

/** Whether the outline turns into the roof between two edges; outward normals, y down. */
function isInward(before: DrawingPoint, after: DrawingPoint): boolean {
  return before.x * after.y - before.y * after.x > 1e-6
}

/** One, two or five metres (or tens), whichever comes nearest to a thumb's width. */
export function planScaleBar(view: PlanView): PlanScaleBar {
  const wantedMm = 80 / view.pxPerMm
  const steps = [100, 200, 500, 1000, 2000, 5000, 10000, 20000, 50000]
  const lengthMm = steps.reduce((best, step) =>
    Math.abs(Math.log(step / wantedMm)) < Math.abs(Math.log(best / wantedMm)) ? step : best,
  )
  const text = lengthMm >= 1000 ? `${lengthMm / 1000} m` : `${lengthMm} mm`
  return {
    segment: { from: { x: 0, y: 0 }, to: { x: lengthMm * view.pxPerMm, y: 0 } },
    lengthMm,
    text,
  }
}

function dimensionLine(roof: DrawableRoof, view: PlanView, i: number): Segment {
  const outward = outwardOf(roof, i)
  const reachPx = offsetPx(roof, view, i)
  const moved = (index: number) => {
    const at = view.place(roof.outline[index % roof.outline.length] ?? { x: 0, y: 0 })
    return { x: at.x + outward.x * reachPx, y: at.y + outward.y * reachPx }
  }
  return { from: moved(i), to: moved(i + 1) }
}

/** Clear of the tails; where two wings stand close together, no further than half way between. */
function offsetPx(roof: DrawableRoof, view: PlanView, i: number): number {
  return Math.min(overhangPx(roof, view, i) + dimensionOffsetPx, freePx(roof, view, i) / 2)
}

function overhangPx(roof: DrawableRoof, view: PlanView, i: number): number {
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

function closedSides(corners: readonly DrawingPoint[]): Segment[] {
  return corners.map((from, i) => ({ from, to: corners[(i + 1) % corners.length] ?? from }))
}

/** Outward in drawing coordinates, y down. */
function outwardOf(roof: DrawableRoof, i: number): DrawingPoint {
  const outward = edgeOutward(roof.outline, i)
  return { x: outward.x, y: -outward.y }
}

function edgeTexts(edge: number, length: string, numbered: boolean): string[] {
  if (!numbered) return [length]
  return [`Edge ${edge + 1} · ${length}`, `${edge + 1} · ${length}`]
}

/** A builder's slash at each end, turned 45° from the line. */
function slashTicks(line: Segment): Segment[] {
  const length = segmentLength(line) || 1
  const along = { x: (line.to.x - line.from.x) / length, y: (line.to.y - line.from.y) / length }
  const slash = { x: along.x - along.y, y: along.y + along.x }
  return [line.from, line.to].map((end) => ({
    from: { x: end.x - (slash.x * tickPx) / 2, y: end.y - (slash.y * tickPx) / 2 },
    to: { x: end.x + (slash.x * tickPx) / 2, y: end.y + (slash.y * tickPx) / 2 },
  }))
}
