import type { DrawnMember } from './timber-pose.ts'
import { formatLength, type LengthUnits } from '../units/format-length.ts'
import { bevelDialsOf } from './bevel-dials.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import type { BirdsmouthPoints } from './timber-outline.ts'
import { birdsmouthPoints, timberEndLines, timberSideOutline } from './timber-outline.ts'
import { piecesBetweenBreaks } from './timber-pieces.ts'
import type { MeasuringPoint } from './timber-points.ts'
import { measuringPoints } from './timber-points.ts'
import {
  arrisFallMm,
  dishDepths,
  timberEndMm,
  timberTop,
  timberTopOutline,
} from './timber-shape.ts'
import { dimensionWishes } from './timber-dimensions.ts'
import type { TimberCallout, TimberDimension } from './timber-texts.ts'
import { dimensionRowPx, placeCallouts, placeDimensions } from './timber-texts.ts'
import { calloutWishes, timberTexts, topLetters } from './timber-callouts.ts'
import type { TimberLetter, TimberText } from './timber-callouts.ts'
import { layoutFor, zoneWishes, type TimberLayout } from './timber-layout.ts'
import type { TimberScale } from './timber-zones.ts'
import { timberScale } from './timber-zones.ts'

export type TimberDrawingOptions = { widthPx: number; units: LengthUnits }

/** One timber in top view over side view, foot to the left, in px of the drawing's own width. */
export type TimberDrawing = {
  widthPx: number
  heightPx: number
  scale: TimberScale
  topPieces: DrawingPoint[][]
  sidePieces: DrawingPoint[][]
  /** Cut lines down the side. */
  lines: (Segment & { isHidden: boolean })[]
  /** The middle and the near arris of a backed top. */
  fineLines: Segment[]
  /** Set-out lines: the heel plumb line squared over the top and down the side. */
  setOutLines: Segment[]
  points: { at: DrawingPoint; isLong: boolean }[]
  dimensions: TimberDimension[]
  callouts: TimberCallout[]
  letters: TimberLetter[]
  texts: TimberText[]
}

const sideMarginPx = 26
const edgeWordsPx = 20
const largestDepthPx = 128

export function timberDrawing(member: DrawnMember, options: TimberDrawingOptions): TimberDrawing {
  const mouth = birdsmouthPoints(member)
  const points = [...measuringPoints(member, 'foot'), ...measuringPoints(member, 'head')]
  const scale = timberScale(zoneWishes(member, mouth), {
    startPx: sideMarginPx,
    endPx: options.widthPx - sideMarginPx,
    maxPxPerMm: largestDepthPx / Math.max(member.section.depthMm, 40),
  })
  const rows = placeDimensions(
    dimensionWishes(member, points, scale, options.units),
    options.widthPx,
  )
  const layout = layoutFor(member, scale, rows.heightPx + edgeWordsPx)
  const dials = bevelDialsOf(member)
  const wordsY = layout.sideY + layout.sideHeightPx + 14
  const words = placeCallouts(
    calloutWishes(member, mouth, dials, layout, options.units),
    wordsY,
    options.widthPx,
  )
  const wholeY = wordsY + words.heightPx + dimensionRowPx
  return {
    widthPx: options.widthPx,
    heightPx: wholeY + 8,
    scale,
    topPieces: piecesBetweenBreaks(timberTopOutline(member).map(layout.top), scale.zones),
    sidePieces: piecesBetweenBreaks(timberSideOutline(member).map(layout.side), scale.zones),
    lines: [...faceLines(member, layout), ...dishLines(member, layout)],
    fineLines: topShapeLines(member, layout),
    setOutLines: setOutLines(member, mouth, layout),
    points: points.flatMap((point) => pointDots(point, layout)),
    dimensions: [
      ...rows.dimensions.map((d) => ({ ...d, fromY: layout.topY - 2, toY: layout.topY - 2 })),
      wholeLength(member, layout, wholeY, options),
    ],
    callouts: words.callouts,
    letters: topLetters(member, dials, layout),
    texts: timberTexts(member, mouth, dials, layout, options.units),
  }
}

function wholeLength(
  member: DrawnMember,
  layout: TimberLayout,
  lineY: number,
  options: TimberDrawingOptions,
): TimberDimension {
  const outline = timberSideOutline(member).map(layout.side)
  const fromX = Math.min(...outline.map((p) => p.x))
  const toX = Math.max(...outline.map((p) => p.x))
  return {
    text: `cut length ${formatLength(member.cutLengthMm, options.units)}`,
    fromX,
    toX,
    lineY,
    textX: (fromX + toX) / 2,
    fromY: layout.sideY + layout.sideHeightPx + 2,
    toY: layout.sideY + layout.sideHeightPx + 2,
    isMain: false,
  }
}

function faceLines(member: DrawnMember, layout: TimberLayout): TimberDrawing['lines'] {
  const ends = (['foot', 'head'] as const).flatMap((end) => timberEndLines(member, end))
  return ends.map((line) => ({
    from: layout.side(line.from),
    to: layout.side(line.to),
    isHidden: line.isHidden,
  }))
}

/** Along the timber, broken where it is broken: the middle and near arris of a backed top, or a dish. */
function topShapeLines(member: DrawnMember, layout: TimberLayout): Segment[] {
  if (timberTop(member) === 'square') return []
  const dish = dishDepths(member)
  const arrisMm = dish?.rightMm ?? arrisFallMm(member, -member.section.thicknessMm / 2)
  const middle = [timberEndMm(member, 'foot', 0, 0), timberEndMm(member, 'head', 0, 0)]
  const near = (['foot', 'head'] as const).map(
    (end) => timberEndLines(member, end)[0]?.from.alongMm ?? 0,
  )
  const run = ([fromMm = 0, toMm = 0]: number[], y: number): Segment[] =>
    layout.scale.zones.map((zone) => ({
      from: { x: Math.max(zone.startPx, layout.scale.xPx(fromMm)), y },
      to: { x: Math.min(zone.endPx, layout.scale.xPx(toMm)), y },
    }))
  return [
    ...run(middle, layout.topY + layout.topHeightPx / 2),
    ...run(near, layout.side({ alongMm: 0, downMm: arrisMm }).y),
  ]
}

/** The bottom of a dish, out of sight behind the side. */
function dishLines(member: DrawnMember, layout: TimberLayout): TimberDrawing['lines'] {
  const dish = dishDepths(member)
  if (!dish) return []
  const { y } = layout.side({ alongMm: 0, downMm: dish.middleMm })
  const ends = (['foot', 'head'] as const).map((end) =>
    layout.scale.xPx(timberEndMm(member, end, 0, dish.middleMm)),
  )
  const [footX = 0, headX = 0] = ends
  return layout.scale.zones.map((zone) => ({
    from: { x: Math.max(zone.startPx, footX), y },
    to: { x: Math.min(zone.endPx, headX), y },
    isHidden: true,
  }))
}

function setOutLines(
  member: DrawnMember,
  mouth: BirdsmouthPoints | null,
  layout: TimberLayout,
): Segment[] {
  const half = member.section.thicknessMm / 2
  const over = (alongMm: number): Segment => ({
    from: layout.top({ alongMm, acrossMm: half, downMm: 0 }),
    to: layout.top({ alongMm, acrossMm: -half, downMm: 0 }),
  })
  const down = (alongMm: number): Segment => ({
    from: layout.side({ alongMm, downMm: 0 }),
    to: layout.side({ alongMm, downMm: member.section.depthMm }),
  })
  if (member.role === 'ridge')
    return [0, member.setOutLengthMm].flatMap((alongMm) => [over(alongMm), down(alongMm)])
  if (!mouth) return []
  const heelLine = { from: layout.side(mouth.heelTop), to: layout.side(mouth.corner) }
  if (mouth.heelTop.alongMm === 0) return [over(0), heelLine]
  return [over(0), over(mouth.heelTop.alongMm), heelLine]
}

function pointDots(point: MeasuringPoint, layout: TimberLayout): TimberDrawing['points'] {
  return point.places.map((place) => ({
    at: layout.top(place),
    isLong: point.name === 'long point' || point.name === 'cut',
  }))
}
