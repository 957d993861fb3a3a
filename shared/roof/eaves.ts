import { polygonBox, polygonSignedArea } from './convex.ts'
import type { Box } from './convex.ts'
import type { Face, RoofLines } from './roof-lines.ts'
import type { Point2 } from './roof-types.ts'
import { at, slopeHeightMm } from './slopes.ts'
import type { PlateEdge, PlateLines, Slope } from './slopes.ts'
import { add2, cross2, distance2, dot2, radians, scale2, sub2 } from './vector.ts'
import { cornerVelocity } from './wavefront-events.ts'

const moving = (edge: PlateEdge) => ({
  inward: edge.inward,
  speed: edge.finish === 'gable' ? 0 : 1 / Math.tan(radians(edge.pitchDeg)),
})

const fallMm = (edge: PlateEdge): number => edge.overhangMm * Math.tan(radians(edge.pitchDeg))

/** Where the tail lines of two edges cross. */
const tailCrossing = (a: PlateEdge, b: PlateEdge): Point2 => {
  const [p, q] = [a, b].map((edge) => add2(edge.from, scale2(edge.inward, -edge.overhangMm)))
  if (p === undefined || q === undefined) return a.from
  const t = cross2(sub2(q, p), b.along) / cross2(a.along, b.along)
  return add2(p, scale2(a.along, t))
}

/**
 * The outer corners of an edge's overhang at one of its ends, from the plate line outwards. It ends on
 * the hip's, valley's or gable's line run on outwards; at a hip also on the other eave's tail line,
 * where that comes first.
 */
const endOfOverhang = (plates: PlateLines, edge: PlateEdge, atStart: boolean): Point2[] => {
  const corner = atStart ? edge.from : edge.to
  const other = at(plates.edges, edge.index + (atStart ? -1 : 1))
  const [before, after] = atStart ? [other, edge] : [edge, other]
  const velocity = cornerVelocity(moving(before), moving(after))
  const out = (downMm: number) => sub2(corner, scale2(velocity, downMm))
  const isHip = other.finish === 'eave' && cross2(before.along, after.along) > 0
  if (!isHip || fallMm(other) >= fallMm(edge)) return [out(fallMm(edge))]
  return [out(fallMm(other)), tailCrossing(edge, other)]
}

const squareOut = (edge: PlateEdge, p: Point2): Point2 =>
  add2(p, scale2(edge.inward, -edge.overhangMm))

/** The overhang of each plate edge of a slope, in plan. */
const eaveStrips = (plates: PlateLines, slope: Slope): Point2[][] =>
  slope.plateRuns.map((run, k) => {
    const edge = at(plates.edges, run.edge)
    const [before, after] = [slope.plateRuns[k - 1], slope.plateRuns[k + 1]]
    const follows = (a: number | undefined, b: number | undefined) =>
      a !== undefined && b !== undefined && (a + 1) % plates.edges.length === b
    const start = follows(before?.edge, run.edge)
      ? [squareOut(edge, edge.from)]
      : endOfOverhang(plates, edge, true)
    const end = follows(run.edge, after?.edge)
      ? [squareOut(edge, edge.to)]
      : endOfOverhang(plates, edge, false)
    return [edge.to, edge.from, ...start, ...end.reverse()]
  })

/** What a slope has beyond a gable or a high wall (`face` border k), its tail or side overhang with it. */
const gableStrip = (plates: PlateLines, lines: RoofLines, face: Face, k: number): Point2[] => {
  const border = at(face.borders, k)
  if (border.kind !== 'plate') return []
  const gable = at(plates.edges, border.edge)
  if (gable.finish !== 'gable') return []
  const [before, after] = [at(face.borders, k - 1), at(face.borders, k + 1)]
  const end = (n: number, next: Face['borders'][number], way: 1 | -1): Point2 => {
    const place = at(lines.nodes, at(face.nodes, n)).point
    if (next.kind !== 'plate') return place
    const edge = at(plates.edges, next.edge)
    if (edge.finish === 'gable' && lines.lines[border.line ?? -1]?.kind !== 'ridge') return place
    return add2(place, scale2(gable.along, way * edge.overhangMm))
  }
  const [start, finish] = [end(k, before, -1), end(k + 1, after, 1)]
  return [start, squareOut(gable, start), squareOut(gable, finish), finish]
}

/** A slope in plan with its overhangs, as pieces that do not overlap: to the plate line, eaves, verges. */
const slopePieces = (plates: PlateLines, lines: RoofLines, slope: Slope): Point2[][] => {
  const face = at(lines.faces, slope.index)
  return [
    face.nodes.map((n) => at(lines.nodes, n).point),
    ...eaveStrips(plates, slope),
    ...face.borders.map((_, k) => gableStrip(plates, lines, face, k)),
  ]
}

/** Plan area of a slope with its overhangs, each plate edge carrying its own, square mm. */
export const planAreaWithEavesMm2 = (plates: PlateLines, lines: RoofLines, slope: Slope): number =>
  slopePieces(plates, lines, slope).reduce(
    (sum, piece) => sum + Math.abs(polygonSignedArea(piece)),
    0,
  )

const distanceToSide = (p: Point2, a: Point2, b: Point2): number => {
  const side = sub2(b, a)
  const size = dot2(side, side)
  const t = size === 0 ? 0 : Math.min(1, Math.max(0, dot2(sub2(p, a), side) / size))
  return distance2(p, add2(a, scale2(side, t)))
}

const isInside = (points: readonly Point2[], p: Point2): boolean => {
  let inside = false
  points.forEach((a, k) => {
    const b = at(points, k + 1)
    if (a.y > p.y === b.y > p.y) return
    const x = a.x + ((b.x - a.x) * (p.y - a.y)) / (b.y - a.y)
    if (x > p.x) inside = !inside
  })
  return inside
}

/** 0 inside a polygon or on its sides, otherwise the distance to its nearest side, mm. */
const distanceToPolygon = (points: readonly Point2[], p: Point2): number => {
  if (isInside(points, p)) return 0
  let nearest = Infinity
  points.forEach((a, k) => {
    nearest = Math.min(nearest, distanceToSide(p, a, at(points, k + 1)))
  })
  return nearest
}

/** How far a point lies beside a box at least; not over 0 inside. */
const asideMm = (box: Box, p: Point2): number =>
  Math.max(box.minX - p.x, p.x - box.maxX, box.minY - p.y, p.y - box.maxY)

type Covered = { slope: Slope; piece: Point2[]; box: Box }

/** The slope over (or overhanging) a point of the plan; the nearest one beyond all overhangs. */
const slopeOver = (covered: readonly Covered[], p: Point2): Slope => {
  const over = covered.find(
    ({ piece, box }) => asideMm(box, p) <= 0 && distanceToPolygon(piece, p) === 0,
  )
  if (over !== undefined) return over.slope
  let nearest = at(covered, 0).slope
  let leastMm = Infinity
  for (const { slope, piece, box } of covered) {
    if (asideMm(box, p) >= leastMm) continue
    const awayMm = distanceToPolygon(piece, p)
    if (awayMm >= leastMm) continue
    nearest = slope
    leastMm = awayMm
  }
  return nearest
}

/** The roof's surface: set-out height over any point of the plan, mm over the plate; overhangs included. */
export const roofSurface = (plates: PlateLines, lines: RoofLines): ((p: Point2) => number) => {
  const covered = plates.slopes.flatMap((slope) =>
    slopePieces(plates, lines, slope)
      .filter((piece) => piece.length > 2)
      .map((piece): Covered => ({ slope, piece, box: polygonBox(piece) })),
  )
  return (p) => slopeHeightMm(slopeOver(covered, p), p)
}
