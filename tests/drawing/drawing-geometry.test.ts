import { describe, expect, test } from 'vitest'
import {
  boxesOverlap,
  segmentCrossesBox,
  uprightAngleDeg,
} from '../../shared/drawing/drawing-geometry.ts'

// Expected values follow from squares and their diagonals, worked by hand.
const box = (x: number, y: number, angleDeg = 0) => ({
  centre: { x, y },
  widthPx: 20,
  heightPx: 10,
  angleDeg,
})

describe('labels that must not run into one another', () => {
  test('side by side they touch and do not overlap; a px nearer they do', () => {
    expect(boxesOverlap(box(0, 0), box(20, 0))).toBe(false)
    expect(boxesOverlap(box(0, 0), box(19, 0))).toBe(true)
    expect(boxesOverlap(box(0, 0), box(0, 10))).toBe(false)
  })

  test('turned labels are judged by their own corners, not by an upright box round them', () => {
    // Two 20 × 10 labels at 45°, 12 apart square to their length, clear each other by 2.
    const shift = 12 / Math.SQRT2
    expect(boxesOverlap(box(0, 0, 45), box(-shift, shift, 45))).toBe(false)
    expect(boxesOverlap(box(0, 0, 45), box(shift, shift, 45))).toBe(true)
  })

  test('a timber that passes through a label is told from one that passes by', () => {
    const line = (y: number) => ({ from: { x: -50, y }, to: { x: 50, y } })
    expect(segmentCrossesBox(line(4.9), box(0, 0))).toBe(true)
    expect(segmentCrossesBox(line(5), box(0, 0))).toBe(false)
    expect(segmentCrossesBox(line(9.9), box(0, 0, 90))).toBe(true)
    expect(segmentCrossesBox({ from: { x: 11, y: 0 }, to: { x: 50, y: 0 } }, box(0, 0))).toBe(false)
  })
})

test('text along a timber reads from the left, and up a vertical one', () => {
  const towards = (x: number, y: number) => uprightAngleDeg({ from: { x: 0, y: 0 }, to: { x, y } })
  expect(towards(1, 0)).toBe(0)
  expect(towards(-1, 0)).toBe(0)
  expect(towards(0, 1)).toBe(-90)
  expect(towards(0, -1)).toBe(-90)
  expect(towards(-1, -1)).toBeCloseTo(45)
})
