import type { Point2 } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { PlateEdge, PlateLines } from '../slopes.ts'
import { add2, cross2, dot2, scale2, sub2 } from '../vector.ts'

/** Edges that turn less than this (sine) run on in one line. */
const straightSine = 1e-3

/** The line at an edge's overhang: the tail line of an eave, the verge line of a gable. */
const outerPoint = (edge: PlateEdge): Point2 =>
  add2(edge.from, scale2(edge.inward, -edge.overhangMm))

export const runsStraightOn = (before: PlateEdge, after: PlateEdge): boolean =>
  Math.abs(cross2(before.along, after.along)) < straightSine && dot2(before.along, after.along) > 0

/**
 * The end of an edge's outer line at the corner before it: where it crosses the outer line of the edge
 * before; square off the corner where the two run on in one line.
 */
const outerCorner = (edge: PlateEdge, other: PlateEdge, corner: Point2): Point2 => {
  const turn = cross2(edge.along, other.along)
  if (Math.abs(turn) < straightSine) return add2(corner, scale2(edge.inward, -edge.overhangMm))
  const own = outerPoint(edge)
  const alongMm = cross2(sub2(outerPoint(other), own), other.along) / turn
  return add2(own, scale2(edge.along, alongMm))
}

/** An edge's outer line in plan, from corner to corner of the roof's own outline; under 0 long where its neighbours' lines cross before it. */
const outerLine = (plates: PlateLines, index: number) => {
  const edge = at(plates.edges, index)
  const from = outerCorner(edge, at(plates.edges, index - 1), edge.from)
  const to = outerCorner(edge, at(plates.edges, index + 1), edge.to)
  return { from, to, lengthMm: dot2(sub2(to, from), edge.along) }
}

/** Length of an edge's tail or verge line, mm; 0 where its neighbours leave none of it. */
export const tailLineMm = (plates: PlateLines, index: number): number =>
  Math.max(0, outerLine(plates, index).lengthMm)

/** Slack on what two boards face to face need. */
const roomMm = 0.01

/**
 * Edges at the back of a recess, between two inward corners, over which the eaves on both sides come
 * nearer together than two boards of this thickness.
 */
export const eavesThatMeet = (plates: PlateLines, boardMm: number): number[] =>
  plates.edges.flatMap((edge, k) => {
    const [before, after] = [at(plates.edges, k - 1), at(plates.edges, k + 1)]
    const isRecess = cross2(before.along, edge.along) < 0 && cross2(edge.along, after.along) < 0
    return isRecess && outerLine(plates, k).lengthMm < 2 * boardMm - roomMm ? [k] : []
  })
