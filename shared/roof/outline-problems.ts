import type { Point2, RoofProblem } from './roof-types.ts'
import { at, cornerOffLineMm, straightCornerMm } from './slopes.ts'
import { cross2, distance2, dot2, sub2, unit2 } from './vector.ts'

const leastEdgeMm = 300
const mostMm = 100_000
/** A gable this near to square with its slopes (cosine) is square: 0.1°. */
const squareCos = 0.00175

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

const crossingProblems = (corners: Point2[]): RoofProblem[] => {
  const count = corners.length
  for (let i = 0; i < count; i++) {
    for (let j = i + 1; j < count; j++) {
      const [a, b] = [at(corners, i), at(corners, i + 1)]
      const [c, d] = [at(corners, j), at(corners, j + 1)]
      const follows = j === i + 1
      const wraps = i === 0 && j === count - 1
      const meet = follows
        ? side(a, b, d) === 0 && dot2(sub2(b, a), sub2(d, b)) < 0
        : wraps
          ? side(c, d, b) === 0 && dot2(sub2(d, c), sub2(b, a)) < 0
          : segmentsMeet(a, b, c, d)
      if (!meet) continue
      const message = `Edges ${i + 1} and ${j + 1} cross or touch: put the corners in order round the building.`
      return [{ path: `outline.${j}`, message }]
    }
  }
  return []
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

type LooseEdge = { finish?: unknown; pitchDeg?: unknown }

const isEdge = (value: unknown): value is LooseEdge => typeof value === 'object' && value !== null

/** Whether the plan turns inwards at corner `k`. */
const turnsInwards = (corners: Point2[], k: number): boolean =>
  cornerOffLineMm(at(corners, k - 1), at(corners, k), at(corners, k + 1)) <= -straightCornerMm

const gableProblem = (corners: Point2[], edges: LooseEdge[], k: number): string | null => {
  const [before, after] = [at(edges, k - 1), at(edges, k + 1)]
  const name = `Edge ${k + 1} is a gable`
  if (before.finish === 'gable' || after.finish === 'gable') {
    return `${name} that no slope meets at both ends: make the edge before it and the edge after it eaves.`
  }
  const inwards = [k, k + 1].find((n) => turnsInwards(corners, n))
  if (inwards !== undefined) {
    const corner = (inwards % corners.length) + 1
    return `${name}, but the plan turns inwards at its corner ${corner}: make edge ${k + 1} an eave, or move corner ${corner} out.`
  }
  const direction = (n: number) => unit2(sub2(at(corners, n + 1), at(corners, n)))
  const own = direction(k)
  const askew = [k - 1, k + 1].find((n) => Math.abs(dot2(own, direction(n))) > squareCos)
  if (askew === undefined) return null
  const other = ((askew + corners.length) % corners.length) + 1
  return `${name}, but not square to the slope of edge ${other}: make them square, or make edge ${k + 1} an eave.`
}

const finishProblems = (corners: Point2[], edges: LooseEdge[]): RoofProblem[] => {
  if (edges.every((edge) => edge.finish === 'gable')) {
    const message = 'Every edge is a gable: give at least two facing edges an eave and a pitch.'
    return [{ path: 'edges.0.finish', message }]
  }
  return edges.flatMap((edge, k) => {
    if (edge.finish === 'gable') {
      const message = gableProblem(corners, edges, k)
      return message === null ? [] : [{ path: `edges.${k}.finish`, message }]
    }
    const before = at(edges, k - 1)
    const off = cornerOffLineMm(at(corners, k - 1), at(corners, k), at(corners, k + 1))
    const straight = Math.abs(off) < straightCornerMm
    if (!straight || before.finish === 'gable' || before.pitchDeg === edge.pitchDeg) return []
    const other = ((k - 1 + edges.length) % edges.length) + 1
    const message = `Edges ${other} and ${k + 1} run in one line with two pitches: give both the same pitch.`
    return [{ path: `edges.${k}.pitchDeg`, message }]
  })
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
