import type { Point2, Roof } from './roof-types.ts'
import { add2, cross2, distance2, dot2, left2, radians, scale2, sub2, unit2 } from './vector.ts'

/** One plate edge in plan; `inward` points into the building. */
export type PlateEdge = {
  index: number
  from: Point2
  to: Point2
  along: Point2
  inward: Point2
  lengthMm: number
  finish: 'eave' | 'gable'
  overhangMm: number
  pitchDeg: number
}

/** One slope in plan: its plate line, its pitch, and the plate edges it rises from, in order. */
export type Slope = {
  index: number
  edges: number[]
  origin: Point2
  along: Point2
  inward: Point2
  lengthMm: number
  pitchDeg: number
  tan: number
}

export type PlateLines = { edges: PlateEdge[]; slopes: Slope[] }

/** Three corners are in one line when the middle one is this near to the line of the outer two. */
export const straightCornerMm = 0.5

/** The item at `index`, going round; only for lists that are not empty. */
export const at = <T>(list: readonly T[], index: number): T => {
  const item = list[((index % list.length) + list.length) % list.length]
  if (item === undefined) throw new RangeError(`nothing at ${index} of ${list.length}`)
  return item
}

/** Distance of the corner between two following edges from the line of their outer ends; outward positive. */
export const cornerOffLineMm = (before: Point2, corner: Point2, after: Point2): number => {
  const chord = sub2(after, before)
  const size = Math.hypot(chord.x, chord.y)
  if (size === 0) return 0
  return cross2(sub2(corner, before), chord) / size
}

const plateEdges = (roof: Roof): PlateEdge[] =>
  roof.edges.map((edge, index) => {
    const from = at(roof.outline, index)
    const to = at(roof.outline, index + 1)
    const along = unit2(sub2(to, from))
    return {
      index,
      from,
      to,
      along,
      inward: left2(along),
      lengthMm: distance2(from, to),
      finish: edge.finish,
      overhangMm: edge.overhangMm,
      pitchDeg: edge.finish === 'eave' ? edge.pitchDeg : 90,
    }
  })

/** Whether the corner before edge `index` lies in the middle of one slope. */
const runsOn = (edges: PlateEdge[], index: number): boolean => {
  const before = at(edges, index - 1)
  const edge = at(edges, index)
  return (
    before.finish === 'eave' &&
    edge.finish === 'eave' &&
    before.pitchDeg === edge.pitchDeg &&
    dot2(before.along, edge.along) > 0 &&
    Math.abs(cornerOffLineMm(before.from, edge.from, edge.to)) < straightCornerMm
  )
}

const slopeOf = (edges: PlateEdge[], members: number[]): Omit<Slope, 'index'> => {
  const first = at(edges, at(members, 0))
  const last = at(edges, at(members, members.length - 1))
  const along = unit2(sub2(last.to, first.from))
  return {
    edges: members,
    origin: first.from,
    along,
    inward: left2(along),
    lengthMm: distance2(first.from, last.to),
    pitchDeg: first.pitchDeg,
    tan: Math.tan(radians(first.pitchDeg)),
  }
}

/**
 * The plate edges and slopes of an outline without problems; collinear eaves of one pitch are one slope.
 * Slopes are in the order of their lowest edge.
 */
export const plateLines = (roof: Roof): PlateLines => {
  const edges = plateEdges(roof)
  const groups: number[][] = []
  for (const edge of edges) {
    if (edge.finish === 'gable' || runsOn(edges, edge.index)) continue
    const members = [edge.index]
    let next = edge.index + 1
    while (runsOn(edges, next) && members.length < edges.length) {
      members.push(next % edges.length)
      next += 1
    }
    groups.push(members)
  }
  groups.sort((a, b) => Math.min(...a) - Math.min(...b))
  return { edges, slopes: groups.map((members, index) => ({ index, ...slopeOf(edges, members) })) }
}

/** Horizontal distance inside the plate line of a slope; negative outside. */
export const insideMm = (line: { origin: Point2; inward: Point2 }, p: Point2): number =>
  dot2(line.inward, sub2(p, line.origin))

/** Height of a slope's set-out plane over (or under) a point of the plan. */
export const slopeHeightMm = (slope: Slope, p: Point2): number => slope.tan * insideMm(slope, p)

/** How the set-out plane climbs, per mm of plan, as a plan vector. */
export const slopeGradient = (slope: Slope): Point2 => scale2(slope.inward, slope.tan)

/** The point of the plate line `alongMm` from the slope's first corner, `inMm` inside it. */
export const slopePoint = (slope: Slope, alongMm: number, inMm: number): Point2 =>
  add2(slope.origin, add2(scale2(slope.along, alongMm), scale2(slope.inward, inMm)))

/** The plate edge of a slope that a rafter stands on, `alongMm` from the slope's first corner. */
export const edgeUnder = (lines: PlateLines, slope: Slope, alongMm: number): PlateEdge => {
  const point = slopePoint(slope, alongMm, 0)
  const found = slope.edges.find((index) => {
    const edge = at(lines.edges, index)
    return dot2(edge.along, sub2(point, edge.from)) <= edge.lengthMm
  })
  return at(lines.edges, found ?? at(slope.edges, slope.edges.length - 1))
}
