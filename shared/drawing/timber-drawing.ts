import type { Member } from '../roof/roof-types.ts'
import { formatLength, type LengthUnits } from '../units/format-length.ts'
import { bevelDialsOf } from './bevel-dials.ts'
import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import type { BirdsmouthPoints } from './timber-outline.ts'
import { birdsmouthPoints, timberEndLines, timberSideOutline } from './timber-outline.ts'
import { piecesBetweenBreaks } from './timber-pieces.ts'
import type { MeasuringPoint } from './timber-points.ts'
import { measuringPoints, measuringPointWords } from './timber-points.ts'
import { timberTopOutline } from './timber-shape.ts'
import type { DimensionWish, TimberCallout, TimberDimension } from './timber-texts.ts'
import { dimensionRowPx, placeCallouts, placeDimensions } from './timber-texts.ts'
import { calloutWishes, edgeTexts, endLetters } from './timber-callouts.ts'
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
  /** Cut lines down the side, and the middle of a backed top. */
  lines: (Segment & { isHidden: boolean })[]
  /** Set-out lines: the heel plumb line squared over the top and down the side. */
  setOutLines: Segment[]
  points: { at: DrawingPoint; isLong: boolean }[]
  dimensions: TimberDimension[]
  callouts: TimberCallout[]
  letters: TimberLetter[]
  texts: TimberText[]
}

const sideMarginPx = 28
const edgeWordsPx = 20
const largestDepthPx = 128

export function timberDrawing(member: Member, options: TimberDrawingOptions): TimberDrawing {
  const mouth = birdsmouthPoints(member)
  const points = [...measuringPoints(member, 'foot'), ...measuringPoints(member, 'head')]
  const scale = timberScale(zoneWishes(member, mouth, options.units), {
    startPx: sideMarginPx,
    endPx: options.widthPx - sideMarginPx,
    maxPxPerMm: largestDepthPx / Math.max(member.section.depthMm, 40),
  })
  const rows = placeDimensions(pointDimensions(member, points, scale, options), options.widthPx)
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
    lines: faceLines(member, layout),
    setOutLines: setOutLines(member, mouth, layout),
    points: points.flatMap((point) => pointDots(point, layout)),
    dimensions: [
      ...rows.dimensions.map((d) => ({ ...d, fromY: layout.topY - 2, toY: layout.topY - 2 })),
      wholeLength(member, layout, wholeY, options),
    ],
    callouts: words.callouts,
    letters: endLetters(member, dials, layout),
    texts: edgeTexts(member, mouth, layout, options.units),
  }
}

/** Every reading of the tape, from the heel plumb line; a ridge is read from its first node. */
function pointDimensions(
  _member: Member,
  points: readonly MeasuringPoint[],
  scale: TimberScale,
  options: TimberDrawingOptions,
): DimensionWish[] {
  return points.map((point) => ({
    text: `${measuringPointWords(point)} ${formatLength(Math.abs(point.alongMm), options.units)}`,
    from: { x: scale.xPx(0), y: 0 },
    to: { x: scale.xPx(point.alongMm), y: 0 },
    isMain: point.end === 'head' && (point.name === 'long point' || point.name === 'cut'),
  }))
}

function wholeLength(
  member: Member,
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

function faceLines(member: Member, layout: TimberLayout): TimberDrawing['lines'] {
  const ends = (['foot', 'head'] as const).flatMap((end) => timberEndLines(member, end))
  return ends.map((line) => ({
    from: layout.side(line.from),
    to: layout.side(line.to),
    isHidden: line.isHidden,
  }))
}

function setOutLines(
  member: Member,
  mouth: BirdsmouthPoints | null,
  layout: TimberLayout,
): Segment[] {
  const half = member.section.thicknessMm / 2
  const across = (acrossMm: number) => layout.top({ alongMm: 0, acrossMm, downMm: 0 })
  const over: Segment = { from: across(half), to: across(-half) }
  if (!mouth) return [over]
  return [over, { from: layout.side(mouth.heelTop), to: layout.side(mouth.corner) }]
}

function pointDots(point: MeasuringPoint, layout: TimberLayout): TimberDrawing['points'] {
  return point.places.map((place) => ({
    at: layout.top(place),
    isLong: point.name === 'long point' || point.name === 'cut',
  }))
}
