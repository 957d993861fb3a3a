import { expect, test } from 'vitest'
import { sidesOfOutline, walkOfSides } from '../../shared/outline/sides-and-turns.ts'
import { lCorners } from './l-outline.ts'

const side = (lengthMm: number, turnLeftDeg: number) => ({ lengthMm, turnLeftDeg })

// Outlines laid out by hand on squared paper, in metres.
test('six sides of an L, five turns left and one right, come back to where they began', () => {
  const walk = walkOfSides([
    side(9000, 90),
    side(4000, 90),
    side(5000, -90),
    side(3000, 90),
    side(4000, 90),
    side(7000, 90),
  ])
  expect(walk.isClosed).toBe(true)
  expect(walk.gapMm).toBe(0)
  expect(walk.corners).toEqual(lCorners)
})

test('a side left out leaves a gap as long as that side, straight back to the start', () => {
  const walk = walkOfSides([side(9000, 90), side(6000, 90), side(9000, 90)])
  expect(walk.isClosed).toBe(false)
  expect(walk.gapMm).toBe(6000)
  expect(walk.closing).toEqual({ turnLeftDeg: 90, lastTurnLeftDeg: 90 })
  expect(walk.corners).toHaveLength(4)
})

test('a 3-4-5 triangle closes with a side of five and its own angles', () => {
  const walk = walkOfSides([side(4000, 90), side(3000, 0)])
  expect(walk.gapMm).toBeCloseTo(5000, 6)
  // 180° less the angle between the sides of three and five: atan(4/3).
  expect(walk.closing.turnLeftDeg).toBeCloseTo(180 - 53.1301, 3)
  expect(walk.closing.lastTurnLeftDeg).toBeCloseTo(180 - 36.8699, 3)
})

test('a plan rounded to the millimetre still closes', () => {
  // A regular octagon's sides are 2485.28 mm at 6000 mm across; the plan says 2485.
  const sides = Array.from({ length: 8 }, () => side(2485, 45))
  expect(walkOfSides(sides).isClosed).toBe(true)
  const rounded = [side(4243, 135), side(3000, 90), side(3000, 0)]
  // The diagonal of 3000 by 3000 is 4242.64.
  expect(walkOfSides(rounded)).toMatchObject({ isClosed: true })
  expect(walkOfSides([side(4250, 135), side(3000, 90), side(3000, 0)]).isClosed).toBe(false)
})

test('square turns stay square however many there are', () => {
  const zigzag = Array.from({ length: 30 }, (_, i) => side(1000.1, i % 2 ? -90 : 90))
  for (const { x, y } of walkOfSides(zigzag).corners) {
    expect(Math.abs(x / 1000.1 - Math.round(x / 1000.1))).toBeLessThan(1e-9)
    expect(Math.abs(y / 1000.1 - Math.round(y / 1000.1))).toBeLessThan(1e-9)
  }
})

test('an outline read as sides and walked again is the same outline', () => {
  const outline = [
    { x: 500, y: 200 },
    { x: 8200, y: 0 },
    { x: 8900, y: 5600 },
    { x: 4000, y: 4100 },
    { x: 300, y: 6400 },
  ]
  const { sides, startDeg } = sidesOfOutline(outline)
  const { corners, isClosed } = walkOfSides(sides, outline[0], startDeg)
  expect(isClosed).toBe(true)
  for (const [i, corner] of outline.entries()) {
    expect(corners[i]!.x).toBeCloseTo(corner.x, 6)
    expect(corners[i]!.y).toBeCloseTo(corner.y, 6)
  }
})
