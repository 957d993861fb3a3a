import { expect, test } from 'vitest'
import {
  edgeLengthMm,
  insideAngleDeg,
  outlineCrossings,
  outlineSignedArea2,
} from '../../shared/outline/outline-geometry.ts'
import {
  crossOutline,
  laidOutline,
  lOutline,
  tOutline,
  uOutline,
} from '../../shared/outline/wing-outlines.ts'

const xy = (outline: { x: number; y: number }[]) => outline.map(({ x, y }) => [x, y])

// Every outline here was laid out by hand on squared paper from the measures above it.
const lMeasures = { lengthMm: 9000, widthMm: 7000, frontWidthMm: 4000, sideWidthMm: 3500 }
const lCorners = [
  [0, 0],
  [9000, 0],
  [9000, 4000],
  [3500, 4000],
  [3500, 7000],
  [0, 7000],
]

test('an L has its inner corner where its wings meet', () => {
  const outline = lOutline(lMeasures)
  expect(xy(outline)).toEqual(lCorners)
  // Two rectangles: 9000 × 4000 and 3500 × 3000.
  expect(outlineSignedArea2(outline) / 2).toBe(46_500_000)
  expect(outline.map((_, i) => insideAngleDeg(outline, i))).toEqual([90, 90, 90, 270, 90, 90])
})

test('a T has its wing where it is measured from the end', () => {
  const measures = { lengthMm: 12_000, widthMm: 6000, wingWidthMm: 5000, projectionMm: 3000 }
  expect(xy(tOutline({ ...measures, fromLeftMm: 2000 }))).toEqual([
    [0, 0],
    [12_000, 0],
    [12_000, 6000],
    [7000, 6000],
    [7000, 9000],
    [2000, 9000],
    [2000, 6000],
    [0, 6000],
  ])
})

test('a U has two wings of their own lengths and widths', () => {
  const lengths = { lengthMm: 15_000, leftLengthMm: 9000, rightLengthMm: 8000 }
  const outline = uOutline({
    ...lengths,
    frontWidthMm: 5000,
    leftWidthMm: 4000,
    rightWidthMm: 4500,
  })
  expect(xy(outline)).toEqual([
    [0, 0],
    [15_000, 0],
    [15_000, 8000],
    [10_500, 8000],
    [10_500, 5000],
    [4000, 5000],
    [4000, 9000],
    [0, 9000],
  ])
})

test('a cross has a wing on either side of its main building', () => {
  const main = { lengthMm: 14_000, widthMm: 6000 }
  const outline = crossOutline({
    ...main,
    wingWidthMm: 5000,
    backMm: 3000,
    frontMm: 2000,
    fromLeftMm: 4500,
  })
  expect(xy(outline)).toEqual([
    [0, 2000],
    [4500, 2000],
    [4500, 0],
    [9500, 0],
    [9500, 2000],
    [14_000, 2000],
    [14_000, 8000],
    [9500, 8000],
    [9500, 11_000],
    [4500, 11_000],
    [4500, 8000],
    [0, 8000],
  ])
})

test('turned a quarter to the left the L stands on its end, its sides still its own', () => {
  const laid = laidOutline(lOutline(lMeasures), { turn: 'left', isMirrored: false })
  // Each point (x, y) comes to (7000 − y, x).
  expect(xy(laid.map(({ start }) => start))).toEqual([
    [7000, 0],
    [7000, 9000],
    [3000, 9000],
    [3000, 3500],
    [0, 3500],
    [0, 0],
  ])
  expect(laid.map(({ side }) => side)).toEqual([0, 1, 2, 3, 4, 5])
})

test.each(['none', 'left', 'half', 'right'] as const)(
  'mirrored and turned (%s) it still runs counter-clockwise and every side keeps its length',
  (turn) => {
    const own = lOutline(lMeasures)
    const laid = laidOutline(own, { turn, isMirrored: true })
    const outline = laid.map(({ start }) => start)
    expect(outlineSignedArea2(outline)).toBe(outlineSignedArea2(own))
    expect(laid.map(({ side }, k) => edgeLengthMm(outline, k) - edgeLengthMm(own, side))).toEqual([
      0, 0, 0, 0, 0, 0,
    ])
    expect(Math.min(...outline.map((p) => p.x))).toBe(0)
    expect(Math.min(...outline.map((p) => p.y))).toBe(0)
  },
)

test('edges that cross are found with the place they cross at', () => {
  const bowTie = [
    { x: 0, y: 0 },
    { x: 4000, y: 4000 },
    { x: 4000, y: 0 },
    { x: 0, y: 4000 },
  ]
  expect(outlineCrossings(bowTie)).toEqual([{ edges: [0, 2], at: { x: 2000, y: 2000 } }])
  expect(outlineCrossings(lOutline(lMeasures))).toEqual([])
})
