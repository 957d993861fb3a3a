import type { Point2 } from './roof-types.ts'
import { add2, cross2, dot2, scale2, sub2 } from './vector.ts'
import type { Wave } from './wavefront-types.ts'

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

/** A part of a slope's plate line that a plate lies under, mm from the slope's first corner. */
export type PlateRun = { fromMm: number; toMm: number; edge: number }

/**
 * One slope in plan: its plate line, its pitch, and the plate edges it rises from, in order along that
 * line. The edges need not follow each other: the slopes on both sides of a wing can grow together.
 */
export type Slope = {
  index: number
  edges: number[]
  plateRuns: PlateRun[]
  origin: Point2
  along: Point2
  inward: Point2
  lengthMm: number
  pitchDeg: number
  tan: number
}

/** `wave`: the creases between the slopes, not yet read into lines; `slopeOf`: slope of each of its fronts, null for a gable. */
export type PlateLines = {
  edges: PlateEdge[]
  slopes: Slope[]
  wave: Wave
  slopeOf: (number | null)[]
}

/**
 * Three corners are in one line when the middle one is this near to the line of the outer two: a plan
 * turned and read off in whole millimetres is that far out.
 */
export const straightCornerMm = 1

/** The item at `index`, going round; only for lists that are not empty. */
export const at = <T>(list: readonly T[], index: number): T => {
  const isWithin = index >= 0 && index < list.length
  const item = list[isWithin ? index : ((index % list.length) + list.length) % list.length]
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

/** The plate edge of a slope that a rafter stands on, or the nearest, `alongMm` from the slope's first corner. */
export const edgeUnder = (lines: PlateLines, slope: Slope, alongMm: number): PlateEdge => {
  const off = (run: PlateRun) => Math.max(run.fromMm - alongMm, alongMm - run.toMm)
  const nearest = slope.plateRuns.reduce((a, b) => (off(b) < off(a) ? b : a))
  return at(lines.edges, nearest.edge)
}
