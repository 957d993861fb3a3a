import type { DrawingPoint, Segment } from './drawing-geometry.ts'
import { pointAlong, segmentLength } from './drawing-geometry.ts'

/** An upright rectangle of the paper. */
export type PaperBounds = { left: number; right: number; top: number; bottom: number }

const squarePx = 32
/** Squares in a row: more than any drawing. */
const rowSquares = 100_000

/** Things on the paper, found by where they are, so that a dense plan is not searched whole. */
export type DrawingGrid<T> = {
  put: (item: T, bounds: PaperBounds) => void
  /** Whether any thing that lies near these bounds is so. */
  some: (bounds: PaperBounds, isSo: (item: T) => boolean) => boolean
}

export function drawingGrid<T>(): DrawingGrid<T> {
  const squares = new Map<number, T[]>()
  const keys = function* (bounds: PaperBounds): Generator<number> {
    const lastX = Math.floor(bounds.right / squarePx)
    const lastY = Math.floor(bounds.bottom / squarePx)
    for (let x = Math.floor(bounds.left / squarePx); x <= lastX; x++)
      for (let y = Math.floor(bounds.top / squarePx); y <= lastY; y++) yield x * rowSquares + y
  }
  return {
    put: (item, bounds) => {
      for (const key of keys(bounds)) {
        const square = squares.get(key)
        if (square) square.push(item)
        else squares.set(key, [item])
      }
    },
    some: (bounds, isSo) => {
      for (const key of keys(bounds)) if (squares.get(key)?.some(isSo)) return true
      return false
    },
  }
}

export function boundsOf(points: readonly DrawingPoint[]): PaperBounds {
  const bounds = { left: Infinity, right: -Infinity, top: Infinity, bottom: -Infinity }
  for (const { x, y } of points) {
    bounds.left = Math.min(bounds.left, x)
    bounds.right = Math.max(bounds.right, x)
    bounds.top = Math.min(bounds.top, y)
    bounds.bottom = Math.max(bounds.bottom, y)
  }
  return bounds
}

export function segmentBounds({ from, to }: Segment): PaperBounds {
  return {
    left: Math.min(from.x, to.x),
    right: Math.max(from.x, to.x),
    top: Math.min(from.y, to.y),
    bottom: Math.max(from.y, to.y),
  }
}

/** A long line in short pieces, so that a slanting one takes no more of the paper than it crosses. */
export function putSegment<T>(grid: DrawingGrid<T>, item: T, segment: Segment): void {
  const pieces = Math.max(1, Math.ceil(segmentLength(segment) / (2 * squarePx)))
  for (let i = 0; i < pieces; i++) {
    const from = pointAlong(segment, i / pieces)
    const to = pointAlong(segment, (i + 1) / pieces)
    grid.put(item, segmentBounds({ from, to }))
  }
}
