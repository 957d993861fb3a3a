import { finishProblems, isEdge } from './finish-problems.ts'
import type { Point2, RoofProblem } from './roof-types.ts'
import { at } from './slopes.ts'
import { add2, cross2, distance2, dot2, scale2, sub2 } from './vector.ts'

const leastEdgeMm = 300
const mostMm = 100_000
/** Walls nearer together than this, outside to outside, touch. */
const leastGapMm = 10
/** A corner that folds back by more than this (cosine of its turn): sharper than 2°. */
const foldedCos = -0.9994

type Corner = { x: number; y: number }

const isPoint = (value: unknown): value is Corner => {
  if (typeof value !== 'object' || value === null || !('x' in value) || !('y' in value))
    return false
  const { x, y } = value
  return Number.isFinite(x) && Number.isFinite(y)
}

/** Twice the signed area of a corner triple; positive when c lies left of a to b. */
const side = (a: Point2, b: Point2, c: Point2): number => cross2(sub2(b, a), sub2(c, a))

const onSegment = (a: Point2, b: Point2, p: Point2): boolean =>
  Math.min(a.x, b.x) <= p.x &&
  p.x <= Math.max(a.x, b.x) &&
  Math.min(a.y, b.y) <= p.y &&
  p.y <= Math.max(a.y, b.y)

/** Whether two edges cross or touch. */
const segmentsMeet = (a: Point2, b: Point2, c: Point2, d: Point2): boolean => {
  const [s1, s2, s3, s4] = [side(a, b, c), side(a, b, d), side(c, d, a), side(c, d, b)]
  if (s1 * s2 < 0 && s3 * s4 < 0) return true
  return (
    (s1 === 0 && onSegment(a, b, c)) ||
    (s2 === 0 && onSegment(a, b, d)) ||
    (s3 === 0 && onSegment(c, d, a)) ||
    (s4 === 0 && onSegment(c, d, b))
  )
}

const cornerCountProblems = (outline: unknown, edges: unknown[]): RoofProblem[] => {
  if (!Array.isArray(outline) || outline.length < 3) {
    return [{ path: 'outline', message: 'A roof needs at least 3 corners: add corners.' }]
  }
  if (outline.length > 64) {
    return [{ path: 'outline', message: 'A roof can have 64 corners at most: take some out.' }]
  }
  if (edges.length !== outline.length) {
    const message = `There are ${outline.length} corners and ${edges.length} edges: give each corner one edge.`
    return [{ path: 'edges', message }]
  }
  return outline.flatMap((corner: unknown, k) =>
    isPoint(corner)
      ? []
      : [{ path: `outline.${k}`, message: `Corner ${k + 1}: give its x and y in mm.` }],
  )
}

const sizeProblems = (corners: Point2[]): RoofProblem[] => {
  const span = (values: number[]) => Math.max(...values) - Math.min(...values)
  const across = Math.max(span(corners.map((c) => c.x)), span(corners.map((c) => c.y)))
  if (across > mostMm) {
    const message = 'The outline is over 100 m long or wide: check that the corners are in mm.'
    return [{ path: 'outline', message }]
  }
  const far = corners.findIndex((c) => Math.max(Math.abs(c.x), Math.abs(c.y)) > 10 * mostMm)
  if (far >= 0) {
    const message = `Corner ${far + 1} is over 1 km from zero: measure from a point near the building.`
    return [{ path: `outline.${far}`, message }]
  }
  return corners.flatMap((corner, k) => {
    const next = (k + 1) % corners.length
    const lengthMm = distance2(corner, at(corners, next))
    if (lengthMm >= leastEdgeMm) return []
    return [
      {
        path: `outline.${next}`,
        message: `Edge ${k + 1} is ${Math.round(lengthMm)} mm long, under 300 mm: move corner ${k + 1} or ${next + 1}.`,
      },
    ]
  })
}

const pointToSegmentMm = (p: Point2, a: Point2, b: Point2): number => {
  const run = sub2(b, a)
  const t = Math.min(1, Math.max(0, dot2(sub2(p, a), run) / dot2(run, run)))
  return distance2(p, add2(a, scale2(run, t)))
}

const segmentsApartMm = (a: Point2, b: Point2, c: Point2, d: Point2): number =>
  segmentsMeet(a, b, c, d)
    ? 0
    : Math.min(
        pointToSegmentMm(a, c, d),
        pointToSegmentMm(b, c, d),
        pointToSegmentMm(c, a, b),
        pointToSegmentMm(d, a, b),
      )

const foldProblems = (corners: Point2[]): RoofProblem[] =>
  corners.flatMap((corner, k) => {
    const [before, after] = [sub2(corner, at(corners, k - 1)), sub2(at(corners, k + 1), corner)]
    const cosine = dot2(before, after) / Math.sqrt(dot2(before, before) * dot2(after, after))
    if (cosine > foldedCos) return []
    const other = ((k - 1 + corners.length) % corners.length) + 1
    const message = `Edges ${other} and ${k + 1} touch: the plan doubles back on itself at corner ${k + 1}. Move corner ${k + 1}.`
    return [{ path: `outline.${k}`, message }]
  })

const crossingProblems = (corners: Point2[]): RoofProblem[] => {
  const count = corners.length
  for (let i = 0; i < count; i++) {
    for (let j = i + 2; j < count; j++) {
      if (i === 0 && j === count - 1) continue
      const [a, b] = [at(corners, i), at(corners, i + 1)]
      const [c, d] = [at(corners, j), at(corners, j + 1)]
      const apartMm = segmentsApartMm(a, b, c, d)
      if (apartMm >= leastGapMm) continue
      const way =
        apartMm > 0
          ? `are ${Math.round(apartMm)} mm apart, under ${leastGapMm} mm: move them apart, or draw them as one wall. A courtyard cannot be drawn this way.`
          : 'cross or touch: put the corners in order round the building. A courtyard cannot be drawn by running back along a wall.'
      return [{ path: `outline.${j}`, message: `Edges ${i + 1} and ${j + 1} ${way}` }]
    }
  }
  return foldProblems(corners)
}

const turnProblems = (corners: Point2[]): RoofProblem[] => {
  const area = corners.reduce((sum, c, k) => sum + cross2(c, at(corners, k + 1)), 0)
  if (area < 0) {
    const message =
      'The corners run clockwise: enter them counter-clockwise, with the building on your left as you go round.'
    return [{ path: 'outline', message }]
  }
  return []
}

/** What is wrong with the corners and with eaves and gables as placed; takes any value. */
export const outlineProblems = (outline: unknown, edges: unknown[]): RoofProblem[] => {
  const counted = cornerCountProblems(outline, edges)
  if (counted.length > 0 || !Array.isArray(outline)) return counted
  const corners = outline.filter(isPoint)
  for (const problems of [sizeProblems, crossingProblems, turnProblems]) {
    const found = problems(corners)
    if (found.length > 0) return found
  }
  const known = edges.filter(isEdge)
  return known.length === edges.length ? finishProblems(corners, known) : []
}
