import type { Segment, TurnedBox } from './drawing-geometry.ts'
import { boxesOverlap, segmentCrossesBox } from './drawing-geometry.ts'
import { boxBounds, drawingGrid, putSegment, segmentBounds } from './drawing-grid.ts'

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

const lineClearancePx = 1

/** `widthPx`, `heightPx`: nothing may be written off the paper. */
export function drawingPaper(size: { widthPx: number; heightPx: number }): DrawingPaper {
  const words = drawingGrid<TurnedBox>()
  const leaders = drawingGrid<Segment>()
  const lines = drawingGrid<{ segment: Segment; owner: string }>()
  const isOnPaper = (box: TurnedBox) => {
    const { left, right, top, bottom } = boxBounds(box)
    return left >= 0 && top >= 0 && right <= size.widthPx && bottom <= size.heightPx
  }
  return {
    addWord: (word) => {
      words.put(word, boxBounds(word))
      if (word.leader) putSegment(leaders, word.leader, word.leader)
    },
    addLine: (segment, owner) => putSegment(lines, { segment, owner }, segment),
    hasRoom: (word) => {
      const bounds = boxBounds(word)
      if (!isOnPaper(word)) return false
      if (words.some(bounds, (other) => boxesOverlap(word, other))) return false
      if (leaders.some(bounds, (leader) => segmentCrossesBox(leader, word))) return false
      const { leader } = word
      if (!leader) return true
      const along = segmentBounds(leader)
      return (
        !words.some(along, (other) => segmentCrossesBox(leader, other)) &&
        !leaders.some(along, (other) => segmentsCross(leader, other))
      )
    },
    isCrossed: (box, owner) => {
      const inner = {
        ...box,
        widthPx: box.widthPx - 2 * lineClearancePx,
        heightPx: box.heightPx - 2 * lineClearancePx,
      }
      return lines.some(
        boxBounds(box),
        (line) => line.owner !== owner && segmentCrossesBox(line.segment, inner),
      )
    },
  }
}

/** Whether two segments run through one another; touching ends do not count. */
export function segmentsCross(a: Segment, b: Segment): boolean {
  const side = (of: Segment, x: number, y: number) =>
    (of.to.x - of.from.x) * (y - of.from.y) - (of.to.y - of.from.y) * (x - of.from.x)
  const parts = (of: Segment, other: Segment) =>
    side(of, other.from.x, other.from.y) * side(of, other.to.x, other.to.y) < 0
  return parts(a, b) && parts(b, a)
}
