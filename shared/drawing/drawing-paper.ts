import type { Segment, TurnedBox } from './drawing-geometry.ts'
import { boxCorners, convexShapesOverlap, segmentCrossesBox } from './drawing-geometry.ts'
import {
  boundsOf,
  drawingGrid,
  type PaperBounds,
  putSegment,
  segmentBounds,
} from './drawing-grid.ts'

/** A word of a drawing, with a fine line to what it names where it stands beside it. */
export type PaperWord = TurnedBox & { leader: Segment | null }

/** What is on the paper already: words, the fine lines to them, and the lines they must keep off. */
export type DrawingPaper = {
  addWord: (word: PaperWord) => void
  addLine: (segment: Segment, owner: string) => void
  /** Whether a word and its fine line stand clear of all other words and their fine lines. */
  hasRoom: (word: PaperWord) => boolean
  /** Whether a line of another owner runs through. */
  isCrossed: (box: TurnedBox, owner: string) => boolean
}

type Shape = { box: TurnedBox; bounds: PaperBounds; corners: ReturnType<typeof boxCorners> }
type Line = { segment: Segment; bounds: PaperBounds; owner: string }

const lineClearancePx = 1

/** `widthPx`, `heightPx`: nothing may be written off the paper. */
export function drawingPaper(size: { widthPx: number; heightPx: number }): DrawingPaper {
  const words = drawingGrid<Shape>()
  const leaders = drawingGrid<Line>()
  const lines = drawingGrid<Line>()
  const isOnPaper = ({ left, right, top, bottom }: PaperBounds) =>
    left >= 0 && top >= 0 && right <= size.widthPx && bottom <= size.heightPx
  const isLeaderClear = (leader: Segment) => {
    const bounds = segmentBounds(leader)
    return (
      !words.some(bounds, (word) => lineRunsThrough(leader, bounds, word)) &&
      !leaders.some(bounds, (other) => segmentsCross(leader, other.segment))
    )
  }
  return {
    addWord: (word) => {
      const shape = shapeOf(word)
      words.put(shape, shape.bounds)
      if (word.leader) putSegment(leaders, lineOf(word.leader, ''), word.leader)
    },
    addLine: (segment, owner) => putSegment(lines, lineOf(segment, owner), segment),
    hasRoom: (word) => {
      const shape = shapeOf(word)
      const { bounds } = shape
      if (!isOnPaper(bounds)) return false
      if (words.some(bounds, (other) => shapesOverlap(shape, other))) return false
      if (leaders.some(bounds, (one) => lineRunsThrough(one.segment, one.bounds, shape)))
        return false
      return word.leader === null || isLeaderClear(word.leader)
    },
    isCrossed: (box, owner) => {
      const inner = shapeOf({
        ...box,
        widthPx: box.widthPx - 2 * lineClearancePx,
        heightPx: box.heightPx - 2 * lineClearancePx,
      })
      return lines.some(
        inner.bounds,
        (line) => line.owner !== owner && lineRunsThrough(line.segment, line.bounds, inner),
      )
    },
  }
}

function shapeOf(box: TurnedBox): Shape {
  const corners = boxCorners(box)
  return { box, corners, bounds: boundsOf(corners) }
}

function lineOf(segment: Segment, owner: string): Line {
  return { segment, bounds: segmentBounds(segment), owner }
}

/** Upright bounds are told apart first: most things on a plan are nowhere near one another. */
function boundsMeet(a: PaperBounds, b: PaperBounds): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom
}

function shapesOverlap(a: Shape, b: Shape): boolean {
  return boundsMeet(a.bounds, b.bounds) && convexShapesOverlap(a.corners, b.corners)
}

function lineRunsThrough(segment: Segment, bounds: PaperBounds, { box, bounds: of }: Shape) {
  const isNear =
    bounds.left <= of.right &&
    of.left <= bounds.right &&
    bounds.top <= of.bottom &&
    of.top <= bounds.bottom
  return isNear && segmentCrossesBox(segment, box)
}

/** Whether two segments run through one another; touching ends do not count. */
export function segmentsCross(a: Segment, b: Segment): boolean {
  const side = (of: Segment, x: number, y: number) =>
    (of.to.x - of.from.x) * (y - of.from.y) - (of.to.y - of.from.y) * (x - of.from.x)
  const parts = (of: Segment, other: Segment) =>
    side(of, other.from.x, other.from.y) * side(of, other.to.x, other.to.y) < 0
  return parts(a, b) && parts(b, a)
}
