import { boxesMeet } from './convex.ts'
import type { Box } from './convex.ts'
import type { Near, Obstacle } from './trim.ts'

/** Side of a square of the grid, mm: a few rafter bays. */
const squareMm = 2000

/** Timbers already placed, found by where they are. */
export const obstacleGrid = (): { near: Near; put: (obstacle: Obstacle, slot: string) => void } => {
  const squares = new Map<string, Obstacle[]>()
  const each = (box: Box, visit: (key: string) => void) => {
    for (let x = Math.floor(box.minX / squareMm); x <= Math.floor(box.maxX / squareMm); x++) {
      for (let y = Math.floor(box.minY / squareMm); y <= Math.floor(box.maxY / squareMm); y++) {
        visit(`${x} ${y}`)
      }
    }
  }
  return {
    near: (box) => {
      const found = new Set<Obstacle>()
      each(box, (key) => {
        for (const obstacle of squares.get(key) ?? []) {
          if (boxesMeet(box, obstacle.box)) found.add(obstacle)
        }
      })
      return [...found]
    },
    put: (obstacle) =>
      each(obstacle.box, (key) => {
        const list = squares.get(key)
        if (list === undefined) squares.set(key, [obstacle])
        else list.push(obstacle)
      }),
  }
}
