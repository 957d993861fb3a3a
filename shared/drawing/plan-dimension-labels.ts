import type { DrawingPoint, Segment, TurnedBox } from './drawing-geometry.ts'
import { pointAlong, segmentLength, uprightAngleDeg } from './drawing-geometry.ts'
import type { DrawingPaper } from './drawing-paper.ts'
import { textWidthPx } from './text-size.ts'

/** The length of a plate in words; a fine line leads to its dimension where it stands off it. */
export type DimensionLabel = TurnedBox & { text: string; sizePx: number; leader: Segment | null }

/** A dimension line, which way is outward from the roof, and its wordings from the fullest down. */
export type DimensionWords = {
  owner: string
  line: Segment
  outward: DrawingPoint
  texts: readonly string[]
  /** Whether a place is over the roof, where its timbers and their marks stand. */
  isOverRoof: (box: TurnedBox) => boolean
}

export const dimensionTextPx = 12
const rowPx = 9
const shiftStepPx = 6
const fartherRowsPx = [23, 37, 51]
const aroundPx = [22, 34, 46, 60, 76]
const aroundTurnsDeg = [0, 30, -30, 60, -60, 85, -85]

/**
 * The first place with room: beside its line, along it, a row or two further out, and level beside it;
 * outside the roof and clear of all other lines if there is such a place, over one of them if not;
 * never over other words.
 */
export function dimensionLabel(words: DimensionWords, paper: DrawingPaper): DimensionLabel | null {
  let firstFree: DimensionLabel | null = null
  for (const place of labelPlaces(words)) {
    if (!paper.hasRoom(place)) continue
    if (!paper.isCrossed(place, words.owner) && !words.isOverRoof(place)) return place
    firstFree ??= place
  }
  return firstFree
}

function* labelPlaces(words: DimensionWords): Generator<DimensionLabel> {
  for (const text of words.texts) yield besideLine(words, text, 0, rowPx)
  const short = words.texts.at(-1) ?? ''
  const reachPx = (segmentLength(words.line) + widthOf(short)) / 2
  for (let shiftPx = shiftStepPx; shiftPx < reachPx; shiftPx += shiftStepPx)
    for (const side of [1, -1]) yield besideLine(words, short, side * shiftPx, rowPx)
  for (const offPx of fartherRowsPx)
    for (const shiftPx of [0, 16, -16, 34, -34]) yield besideLine(words, short, shiftPx, offPx)
  yield* levelAround(words, short)
}

function besideLine(
  { line, outward }: DimensionWords,
  text: string,
  shiftPx: number,
  offPx: number,
): DimensionLabel {
  const lengthPx = segmentLength(line) || 1
  const middle = pointAlong(line, 0.5)
  const centre = pointAlong(line, 0.5 + shiftPx / lengthPx)
  const isFar = offPx > rowPx
  const foot = { x: centre.x + outward.x * (offPx - 7), y: centre.y + outward.y * (offPx - 7) }
  return {
    text,
    sizePx: dimensionTextPx,
    centre: { x: centre.x + outward.x * offPx, y: centre.y + outward.y * offPx },
    widthPx: widthOf(text),
    heightPx: dimensionTextPx + 2,
    angleDeg: uprightAngleDeg(line),
    leader: isFar ? { from: foot, to: middle } : null,
  }
}

/** Level words round the middle of a short dimension, or round a quarter of it. */
function* levelAround(words: DimensionWords, text: string): Generator<DimensionLabel> {
  for (const share of [0.5, 0.25, 0.75]) yield* levelAroundPoint(words, text, share)
}

function* levelAroundPoint(
  { line, outward }: DimensionWords,
  text: string,
  share: number,
): Generator<DimensionLabel> {
  const middle = pointAlong(line, share)
  const outDeg = (Math.atan2(outward.y, outward.x) * 180) / Math.PI
  const widthPx = widthOf(text)
  for (const reachPx of aroundPx)
    for (const turnDeg of aroundTurnsDeg) {
      const turn = ((outDeg + turnDeg) * Math.PI) / 180
      const end = { x: middle.x + Math.cos(turn) * reachPx, y: middle.y + Math.sin(turn) * reachPx }
      const side = Math.abs(Math.cos(turn)) < 0.4 ? 0 : Math.sign(Math.cos(turn))
      const rise = side === 0 ? Math.sign(Math.sin(turn)) : 0
      yield {
        text,
        sizePx: dimensionTextPx,
        centre: { x: end.x + (side * (widthPx + 2)) / 2, y: end.y + rise * 8 },
        widthPx,
        heightPx: dimensionTextPx + 2,
        angleDeg: 0,
        leader: { from: end, to: middle },
      }
    }
}

function widthOf(text: string): number {
  return textWidthPx(text, dimensionTextPx) + 4
}
