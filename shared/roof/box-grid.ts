import { boxesMeet } from './convex.ts'
import type { Box } from './convex.ts'

/** Side of a square of the grid, mm: a few rafter bays. */
const squareMm = 2000

/** Squares in a row: more than any roof and its margins. */
const rowSquares = 1000

export type BoxGrid<T> = { near: (box: Box) => T[]; put: (item: T, box: Box) => void }

/** Things that lie in boxes of the plan, found by where they are. */
export const boxGrid = <T>(): BoxGrid<T> => {
  type Entry = { item: T; box: Box }
  const squares = new Map<number, Entry[]>()
  const each = (box: Box, visit: (key: number) => void) => {
    for (let x = Math.floor(box.minX / squareMm); x <= Math.floor(box.maxX / squareMm); x++) {
      for (let y = Math.floor(box.minY / squareMm); y <= Math.floor(box.maxY / squareMm); y++) {
        visit(x * rowSquares + y)
      }
    }
  }
  return {
    near: (box) => {
      const found = new Set<Entry>()
      each(box, (key) => {
        for (const entry of squares.get(key) ?? []) {
          if (boxesMeet(box, entry.box)) found.add(entry)
        }
      })
      return Array.from(found, ({ item }) => item)
    },
    put: (item, box) => {
      const entry = { item, box }
      each(box, (key) => {
        const list = squares.get(key)
        if (list === undefined) squares.set(key, [entry])
        else list.push(entry)
      })
    },
  }
}
