import { formatLength, type LengthUnits } from '../units/format-length.ts'
import type { Segment, TurnedBox } from './drawing-geometry.ts'
import { isInShape, segmentLength } from './drawing-geometry.ts'
import { drawingPaper } from './drawing-paper.ts'
import { overhangOutline } from './overhang-outline.ts'
import { cornerBox, type PlanCorner } from './plan-corners.ts'
import { type DimensionLabel, dimensionLabel } from './plan-dimension-labels.ts'
import { closedSides, offsetPx, outwardOf } from './plan-edges.ts'
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

export type PlanScaleBar = { segment: Segment; lengthMm: number; text: string }

const tickPx = 5

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
  for (const corner of corners) paper.addWord({ ...cornerBox(corner), leader: corner.leader })
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
