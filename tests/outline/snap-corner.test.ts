import { expect, test } from 'vitest'
import { onGrid, snapCorner } from '../../shared/outline/snap-corner.ts'
import { lCorners } from './l-outline.ts'

const options = { gridMm: 100, reachMm: 150 }
const why = (snapped: ReturnType<typeof snapCorner>) => snapped.guides.map((g) => g.why.kind)

test('near to square with both neighbours a corner comes to rest exactly square', () => {
  const snapped = snapCorner(lCorners, 2, { x: 9080, y: 3940 }, options)
  expect(snapped.at).toEqual({ x: 9000, y: 4000 })
  expect(why(snapped)).toEqual(['square', 'square'])
})

test('square with a neighbour in a building turned on the page is square there too', () => {
  // Turned by the 3-4-5 triangle, so that every corner is a whole number.
  const turned = lCorners.map(({ x, y }) => ({ x: 0.8 * x - 0.6 * y, y: 0.6 * x + 0.8 * y }))
  const corner = turned[2]!
  const snapped = snapCorner(turned, 2, { x: corner.x + 60, y: corner.y - 50 }, options)
  expect(snapped.at.x).toBeCloseTo(corner.x, 6)
  expect(snapped.at.y).toBeCloseTo(corner.y, 6)
})

test('in line with one corner only, the side is a whole number of steps long', () => {
  const triangleAndMore = [
    { x: 0, y: 0 },
    { x: 10_000, y: 0 },
    { x: 12_000, y: 5000 },
    { x: 3000, y: 9000 },
  ]
  // Square to edge 1 at corner 2, 1230 up: on the line x = 10000, to the nearest 100.
  const snapped = snapCorner(triangleAndMore, 2, { x: 10_060, y: 1230 }, options)
  expect(snapped.at).toEqual({ x: 10_000, y: 1200 })
  expect(snapped.guides).toHaveLength(1)
})

test('away from every line a corner comes to the grid, as fine as it is set', () => {
  const far = { x: 6543, y: 5432 }
  expect(snapCorner(lCorners, 2, far, options)).toEqual({ at: { x: 6500, y: 5400 }, guides: [] })
  expect(snapCorner(lCorners, 2, far, { gridMm: 10, reachMm: 150 }).at).toEqual({
    x: 6540,
    y: 5430,
  })
  expect(onGrid({ x: -4, y: 4 }, 10)).toEqual({ x: 0, y: 0 })
})

test('a triangle has no side to be square to but can stand in line with its corners', () => {
  const triangle = lCorners.slice(0, 3)
  const snapped = snapCorner(triangle, 2, { x: 8950, y: 2460 }, options)
  expect(snapped.at).toEqual({ x: 9000, y: 2500 })
  expect(why(snapped)).toEqual(['in-line'])
})
