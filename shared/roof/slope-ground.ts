import type { Ground } from './build-pieces.ts'
import type { Face, NodeLine } from './roof-lines.ts'
import { creasePiece } from './line-pieces.ts'
import type { Point2 } from './roof-types.ts'
import { at, slopeGradient } from './slopes.ts'
import type { PlateEdge, Slope } from './slopes.ts'
import { add2, dot2, left2, scale2, sub2, unit2 } from './vector.ts'
import { fullPlan } from './trim.ts'

/** A valley that borders a slope and starts at a plate corner, seen from that slope. */
export type ValleySide = {
  line: number
  corner: Point2
  dir: Point2
  /** Plumb plane of the valley's side on this slope: normal into the valley. */
  side: { point: Point2; normal: Point2 }
  /** The other plate edge of its corner. */
  otherEdge: PlateEdge
  /** The valley's timber in plan, tail included. */
  plan: Point2[]
}

/**
 * A hip that borders a slope and starts at a plate corner: how near to that corner a rafter may stand,
 * how near to it the hip itself is all that stands there, and on which side of it the plate is.
 */
export type HipCorner = { alongMm: number; gapMm: number; ownMm: number; plateSide: 1 | -1 }

/** A hip that leans back further than this, per mm, leaves the corner that it starts from to a rafter. */
const leavesCorner = 1 / 6

/** What a slope's rafters have to mind: looked up once a slope. */
export type SlopeGround = {
  slope: Slope
  face: Face
  valleys: ValleySide[]
  hips: HipCorner[]
  /** Reach of the slope along its plate line. */
  fromMm: number
  toMm: number
}

const runOf = (ground: Ground, line: NodeLine): Point2 =>
  sub2(at(ground.lines.nodes, line.to).point, at(ground.lines.nodes, line.from).point)

const alongOf = (slope: Slope, p: Point2): number => dot2(slope.along, sub2(p, slope.origin))

/** How near a rafter may stand to a hip's corner: clear of its side at the plate, and of its tail where it leans back. */
const hipCorner = (ground: Ground, slope: Slope, line: NodeLine): HipCorner => {
  const { sections } = ground.roof
  const corner = at(ground.lines.nodes, line.from).point
  const run = unit2(runOf(ground, line))
  const alongMm = alongOf(slope, corner)
  const starts = slope.plateRuns.find((r) => Math.abs(r.fromMm - alongMm) < 1)
  const ends = slope.plateRuns.find((r) => Math.abs(r.toMm - alongMm) < 1)
  const sine = dot2(slope.inward, run)
  const plateSide = starts === undefined ? -1 : 1
  const leansBack = Math.max(0, -plateSide * dot2(slope.along, run))
  const edge = (starts ?? ends ?? at(slope.plateRuns, 0)).edge
  const { overhangMm } = at(ground.plates.edges, edge)
  const bareMm = sections.rafter.thicknessMm / 2 + sections.hip.thicknessMm / 2 / sine
  const gapMm = bareMm + (overhangMm * leansBack) / sine
  const ownMm = leansBack / sine > leavesCorner ? 0 : bareMm
  return { alongMm, gapMm, ownMm, plateSide }
}

const valleySide = (
  ground: Ground,
  slope: Slope,
  line: NodeLine,
  index: number,
  corner: number,
): ValleySide | null => {
  const { plates, roof } = ground
  const from = at(ground.lines.nodes, line.from).point
  const dir = unit2(runOf(ground, line))
  const left = left2(dir)
  const other = at(plates.slopes, line.slopes.find((s) => s !== slope.index) ?? slope.index)
  const rises = dot2(sub2(slopeGradient(slope), slopeGradient(other)), left)
  const into = scale2(left, rises > 0 ? -1 : 1)
  // where the slope does not rise off its valley its rafters run up to it, not from it
  if (dot2(into, slope.inward) > -1e-6) return null
  const halfMm = roof.sections.valley.thicknessMm / 2
  const edges = [at(plates.edges, corner - 1), at(plates.edges, corner)]
  return {
    line: index,
    corner: { x: from.x, y: from.y },
    dir,
    side: { point: add2(from, scale2(into, -halfMm)), normal: into },
    otherEdge: edges.find((e) => !slope.edges.includes(e.index)) ?? at(edges, 0),
    plan: fullPlan(creasePiece(ground, line, index)).points,
  }
}

/** Hips, valleys and reach of one slope. */
export const slopeGround = (ground: Ground, slope: Slope): SlopeGround => {
  const { lines, joints } = ground
  const face = at(lines.faces, slope.index)
  const own = new Set(
    face.borders.flatMap((border) => (border.kind === 'slope' ? [border.line] : [])),
  )
  const valleys: ValleySide[] = []
  const hips: HipCorner[] = []
  for (const index of [...own].sort((a, b) => a - b)) {
    const line = at(lines.lines, index)
    const { corner } = at(lines.nodes, line.from)
    if (corner === null || joints.swallowed.has(index)) continue
    if (line.kind === 'hip') hips.push(hipCorner(ground, slope, line))
    if (line.kind !== 'valley') continue
    const side = valleySide(ground, slope, line, index, corner)
    if (side !== null) valleys.push(side)
  }
  const alongs = face.nodes.map((n) => alongOf(slope, at(lines.nodes, n).point))
  return { slope, face, valleys, hips, fromMm: Math.min(...alongs), toMm: Math.max(...alongs) }
}
