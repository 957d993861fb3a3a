import { formatLength, type LengthUnits } from '../units/format-length.ts'
import type { DrawingPoint, Segment, TurnedBox } from './drawing-geometry.ts'
import { boxesOverlap, pointAlong, segmentLength, uprightAngleDeg } from './drawing-geometry.ts'
import { edgeOutward, edgeOverhangMm } from './overhang-outline.ts'
import type { DrawableRoof, PlanView } from './plan-view.ts'
import { textWidthPx } from './text-size.ts'

export type PlanDimension = {
  /** Index of the plate edge. */
  edge: number
  lengthMm: number
  line: Segment
  ticks: Segment[]
  label: (TurnedBox & { text: string; sizePx: number }) | null
}

export type PlanCorner = { corner: number; at: DrawingPoint; radiusPx: number }

export type PlanScaleBar = { segment: Segment; lengthMm: number; text: string }

export const dimensionOffsetPx = 16
const tickPx = 5
const labelSizePx = 12
const cornerRadiusPx = 9
/** Beside its line, or one row further out where that is taken. */
const labelOffsetsPx = [9, 23]

/**
 * A dimension along every plate, outside the eaves. With corner numbers each says which edge it is.
 * The fullest wording that stands clear of the other words and the corners is taken.
 */
export function planDimensions(
  roof: DrawableRoof,
  view: PlanView,
  corners: readonly PlanCorner[],
  units: LengthUnits,
): PlanDimension[] {
  const taken: TurnedBox[] = corners.map(cornerBox)
  return [...roof.outline.keys()].map((i) => {
    const line = dimensionLine(roof, view, i)
    const edge = roof.indexes[i] ?? i
    const lengthMm = segmentLength(line) / view.pxPerMm
    const boxes = edgeTexts(edge, formatLength(lengthMm, units), corners.length > 0).flatMap(
      (text) =>
        labelOffsetsPx.map((offPx) => dimensionLabel(line, text, outwardOf(roof, i), offPx)),
    )
    const label = boxes.find((box) => !taken.some((other) => boxesOverlap(box, other))) ?? null
    if (label) taken.push(label)
    return { edge, lengthMm, line, ticks: slashTicks(line), label }
  })
}

export function cornerBox(corner: PlanCorner): TurnedBox {
  const sidePx = 2 * corner.radiusPx
  return { centre: corner.at, widthPx: sidePx, heightPx: sidePx, angleDeg: 0 }
}

/** Corner numbers outside the corners, clear of the dimensions. */
export function planCorners(roof: DrawableRoof, view: PlanView): PlanCorner[] {
  const count = roof.outline.length
  return roof.outline.map((corner, i) => {
    const before = outwardOf(roof, (i + count - 1) % count)
    const after = outwardOf(roof, i)
    const sum = { x: before.x + after.x, y: before.y + after.y }
    const length = Math.hypot(sum.x, sum.y) || 1
    const reachPx = Math.max(offsetPx(roof, view, i), offsetPx(roof, view, (i + count - 1) % count))
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

function offsetPx(roof: DrawableRoof, view: PlanView, i: number): number {
  return edgeOverhangMm(roof.edges[i]) * view.pxPerMm + dimensionOffsetPx
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

function dimensionLabel(line: Segment, text: string, outward: DrawingPoint, offPx: number) {
  const middle = pointAlong(line, 0.5)
  return {
    text,
    sizePx: labelSizePx,
    centre: { x: middle.x + outward.x * offPx, y: middle.y + outward.y * offPx },
    widthPx: textWidthPx(text, labelSizePx) + 4,
    heightPx: labelSizePx + 2,
    angleDeg: uprightAngleDeg(line),
  }
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
