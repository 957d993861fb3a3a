import { clipConvex, convexOverlap, polygonSignedArea } from './convex.ts'
import type { Labelled } from './convex.ts'
import type { Ground } from './build-pieces.ts'
import type { PlanCut } from './piece.ts'
import type { SquareSpan } from './square-spans.ts'
import type { Point2 } from './roof-types.ts'
import type { SlopeGround, ValleySide } from './slope-ground.ts'
import { at, slopePoint } from './slopes.ts'
import type { PlateEdge, Slope } from './slopes.ts'
import { dot2, sub2 } from './vector.ts'

/** Where a rafter starts: on the plate line, its tail cut where it runs into valleys, or from a valley. */
export type RafterFoot =
  | {
      on: 'plate'
      edge: PlateEdge
      tailCuts: PlanCut[]
      overPlate: { fromMm: number; toMm: number }
    }
  | { on: 'valley'; valley: ValleySide; inMm: number }

/** Overlaps smaller than this in plan are touching faces. */
const touchMm2 = 0.01
/** Less of a rafter over a plate than this is nothing to cut a birdsmouth for. */
const overPlateMm2 = 1

/** The plate edge nearest along a slope's plate line: the one a rafter there stands on. */
export const nearestEdge = (ground: Ground, slope: Slope, alongMm: number): PlateEdge => {
  const off = (run: { fromMm: number; toMm: number }) =>
    Math.max(run.fromMm - alongMm, alongMm - run.toMm, 0)
  const nearest = slope.plateRuns.reduce((a, b) => (off(b) < off(a) ? b : a))
  return at(ground.plates.edges, nearest.edge)
}

/** Plates nearer than this to their slope's line lie on it. */
const onLineMm = 1e-3

/**
 * How far inside its slope's line the plate lies that a rafter stands on, where plates typed a little out
 * of line carry one slope; under 0 outside. Beyond the plates' ends the nearest one is run on.
 */
export const ownPlateMm = (ground: Ground, slope: Slope, alongMm: number): number => {
  const { from, inward } = nearestEdge(ground, slope, alongMm)
  const off = dot2(inward, sub2(from, slopePoint(slope, alongMm, 0)))
  const inMm = off / dot2(inward, slope.inward)
  return Math.abs(inMm) < onLineMm ? 0 : inMm
}

/** A rafter's plan from its tail to its head, before any cut. */
const rafterPlan = (
  ground: Ground,
  slope: Slope,
  alongMm: number,
  fromMm: number,
  toMm: number,
): Labelled<null> => {
  const half = ground.roof.sections.rafter.thicknessMm / 2
  return {
    points: [
      slopePoint(slope, alongMm - half, fromMm),
      slopePoint(slope, alongMm + half, fromMm),
      slopePoint(slope, alongMm + half, toMm),
      slopePoint(slope, alongMm - half, toMm),
    ],
    labels: [null, null, null, null],
  }
}

/** What is left of a rafter beside a valley, above its own plate line. */
const besideValley = (plan: Labelled<null>, slope: Slope, { side }: ValleySide): Labelled<null> => {
  const kept = clipConvex(plan, side.normal, dot2(side.normal, side.point), null)
  const out = { x: -slope.inward.x, y: -slope.inward.y }
  return clipConvex(kept, out, dot2(out, slope.origin), null)
}

/** Whether some of a rafter beside a valley lies over a plate: within the plate's width of both edges of the corner. */
const liesOverPlate = (
  ground: Ground,
  kept: Labelled<null>,
  slope: Slope,
  { otherEdge }: ValleySide,
): boolean => {
  const { plateWidthMm } = ground.roof
  let part = kept
  for (const edge of [{ from: slope.origin, inward: slope.inward }, otherEdge]) {
    part = clipConvex(part, edge.inward, dot2(edge.inward, edge.from) + plateWidthMm, null)
  }
  return polygonSignedArea(part.points) > overPlateMm2
}

/** Where a square line past the corner of a valley is over the plate, mm inside the slope's own plate line. */
const pastCorner = (ground: Ground, slope: Slope, alongMm: number, { otherEdge }: ValleySide) => {
  const { plateWidthMm } = ground.roof
  const start: Point2 = slopePoint(slope, alongMm, ownPlateMm(ground, slope, alongMm))
  const off = dot2(otherEdge.inward, sub2(start, otherEdge.from))
  const gain = dot2(otherEdge.inward, slope.inward)
  let fromMm = 0
  let toMm = plateWidthMm
  if (Math.abs(gain) < 1e-9) {
    if (off > plateWidthMm) toMm = 0
  } else if (gain > 0) toMm = Math.min(toMm, (plateWidthMm - off) / gain)
  else fromMm = Math.max(fromMm, (plateWidthMm - off) / gain)
  return fromMm < toMm ? { fromMm, toMm } : { fromMm: 0, toMm: 0 }
}

/**
 * Where a rafter on a square line that starts at a plate or a valley has its foot. Near a valley's
 * plate corner it stands on its slope's plate line while some of it is over a plate; its tail is cut
 * against the valley's side. mm inside the plate line.
 */
export const rafterFoot = (
  ground: Ground,
  { slope, valleys }: SlopeGround,
  alongMm: number,
  span: SquareSpan,
): RafterFoot | null => {
  const edge = nearestEdge(ground, slope, alongMm)
  const plan = rafterPlan(ground, slope, alongMm, -edge.overhangMm, span.high)
  const lowLine = span.lowBorder.kind === 'slope' ? span.lowBorder.line : null
  const met = valleys.filter(
    (v) => v.line === lowLine || polygonSignedArea(convexOverlap(plan.points, v.plan)) > touchMm2,
  )
  const hung = met.find((v) => !liesOverPlate(ground, besideValley(plan, slope, v), slope, v))
  if (hung !== undefined) {
    const facing = dot2(hung.side.normal, slope.inward)
    const start = sub2(hung.corner, slopePoint(slope, alongMm, 0))
    return { on: 'valley', valley: hung, inMm: dot2(hung.side.normal, start) / facing }
  }
  if (lowLine !== null && met.length === 0) return null
  const isPast = slope.plateRuns.every((r) => alongMm < r.fromMm || alongMm > r.toMm)
  const corner = met.find((v) => v.line === lowLine) ?? met[0]
  return {
    on: 'plate',
    edge,
    tailCuts: met.map((v) => ({ ...v.side, mitreWith: null })),
    overPlate:
      isPast && corner !== undefined
        ? pastCorner(ground, slope, alongMm, corner)
        : { fromMm: 0, toMm: ground.roof.plateWidthMm },
  }
}
