import { boxesMeet } from './convex.ts'
import type { Box } from './convex.ts'

/** Side of a square of the grid, mm: a few rafter bays. */
const squareMm = 2000

/** Squares in a row: more than any roof and its margins. */
const rowSquares = 1000

export type BoxGrid<T> = { near: (box: Box) => T[]; put: (item: T, box: Box) => void }

/** Things that lie in boxes of the plan, found by where they are. */
export const boxGrid = <T>(): BoxGrid<T> => {
  type Entry = { item: T; box: Box; foundBy: number }
  const squares = new Map<number, Entry[]>()
  let searches = 0
  const each = (box: Box, visit: (key: number) => void) => {
    for (let x = Math.floor(box.minX / squareMm); x <= Math.floor(box.maxX / squareMm); x++) {
      for (let y = Math.floor(box.minY / squareMm); y <= Math.floor(box.maxY / squareMm); y++) {
        visit(x * rowSquares + y)
      }
    }
  }
  return {
    near: (box) => {
      searches += 1
      const found: T[] = []
      each(box, (key) => {
        for (const entry of squares.get(key) ?? []) {
          if (entry.foundBy === searches || !boxesMeet(box, entry.box)) continue
          entry.foundBy = searches
          found.push(entry.item)
        }
      })
      return found
    },
    put: (item, box) => {
      const entry = { item, box, foundBy: 0 }
      each(box, (key) => {
        const list = squares.get(key)
        if (list === undefined) squares.set(key, [entry])
        else list.push(entry)
      })
    },
  }
}
