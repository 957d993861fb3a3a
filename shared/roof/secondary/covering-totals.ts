import type { BesideGround } from './beside-ground.ts'
import type { NodeLine } from '../roof-lines.ts'
import type {
  CoveringTotals,
  LineKind,
  Member,
  MemberRole,
  Point2,
  RoofPlane,
} from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { PlateEdge } from '../slopes.ts'
import { distance2, distance3, dot2, scale2, sub2, unit2 } from '../vector.ts'
import { tailLineMm } from './tail-lines.ts'

/** A gable that a line's end faces less squarely than this (cosine) is beside it, not before it. */
const leastFacing = 0.1

const sum = (mm: number[]): number => mm.reduce((total, one) => total + one, 0)

/** How far a line runs on below its foot, or out past its end, in plan, to an edge's outer line. */
const reachMm = (edge: PlateEdge, out: { x: number; y: number }): number =>
  edge.overhangMm / Math.max(-dot2(edge.inward, out), 1e-6)

/** Gables whose verges meet in a node. */
const gablesAt = (ground: BesideGround, node: number): PlateEdge[] => {
  const { lines, plates } = ground
  const gables = lines.faces.flatMap((face) =>
    face.borders.flatMap((border, k) => {
      const touches = at(face.nodes, k) === node || at(face.nodes, k + 1) === node
      if (!touches || border.kind !== 'plate') return []
      const edge = at(plates.edges, border.edge)
      return edge.finish === 'gable' ? [edge] : []
    }),
  )
  return [...new Set(gables)]
}

/** True length of a ridge, with its ends run out to the verge lines. */
const ridgeLengthMm = (ground: BesideGround, line: NodeLine): number => {
  const [from, to] = [line.from, line.to].map((node) => at(ground.lines.nodes, node).point)
  if (from === undefined || to === undefined) return 0
  const along = unit2(sub2(to, from))
  const past = (node: number, out: Point2) =>
    gablesAt(ground, node)
      .filter((gable) => -dot2(gable.inward, out) > leastFacing)
      .map((gable) => reachMm(gable, out))
  const ends = [...past(line.from, scale2(along, -1)), ...past(line.to, along)]
  return distance3(from, to) + sum(ends)
}

/** True length of a hip or valley, run on down from its plate corner to the tail lines by `choose`. */
const slopingLengthMm = (
  ground: BesideGround,
  line: NodeLine,
  choose: (...mm: number[]) => number,
): number => {
  const { lines, plates } = ground
  const from = at(lines.nodes, line.from)
  const to = at(lines.nodes, line.to)
  const lengthMm = distance3(from.point, to.point)
  if (from.corner === null) return lengthMm
  const down = unit2(sub2(from.point, to.point))
  const eaves = [at(plates.edges, from.corner - 1), at(plates.edges, from.corner)]
  const tailMm = choose(...eaves.map((edge) => reachMm(edge, down)))
  return lengthMm * (1 + tailMm / distance2(from.point, to.point))
}

const linesOf = (ground: BesideGround, ...kinds: LineKind[]): NodeLine[] =>
  ground.lines.lines.filter((line) => kinds.includes(line.kind))

/** Verges from the tail line of the eave at their foot up to the apex, along the slope. */
const vergesMm = (ground: BesideGround): number =>
  sum(linesOf(ground, 'verge').map((line) => slopingVergeMm(ground, line)))

const slopingVergeMm = (ground: BesideGround, line: NodeLine): number => {
  const { lines, plates } = ground
  const from = at(lines.nodes, line.from)
  const to = at(lines.nodes, line.to)
  const lengthMm = distance3(from.point, to.point)
  const { corner } = from
  if (corner === null) return lengthMm
  const eave = [at(plates.edges, corner - 1), at(plates.edges, corner)].find(
    (edge) => edge.finish === 'eave',
  )
  if (eave === undefined) return lengthMm
  const down = unit2(sub2(from.point, to.point))
  return lengthMm * (1 + reachMm(eave, down) / distance2(from.point, to.point))
}

/**
 * What covers and trims the roof: areas m², lengths mm, by the definitions in `CoveringTotals`. All are
 * net and true (on the slope); boards count where they are set out.
 */
export const coveringTotals = (
  ground: BesideGround,
  planes: RoofPlane[],
  members: Member[],
): CoveringTotals => {
  const { plates, settings } = ground
  const coveringAreaM2 = sum(planes.map((plane) => plane.areaWithEavesM2))
  const gaugeMm = settings.battenGaugeMm
  const eaves = plates.edges.filter((edge) => edge.finish === 'eave')
  const gutterMm = sum(eaves.map((edge) => tailLineMm(plates, edge.index)))
  const boardsMm = (role: MemberRole) =>
    sum(members.filter((m) => m.role === role).map((m) => m.cutLengthMm))
  const { fascia, barge } = ground.roof.sections
  return {
    coveringAreaM2,
    underlayAreaM2: coveringAreaM2,
    battenMm: gaugeMm === undefined ? null : (coveringAreaM2 * 1_000_000) / gaugeMm,
    ridgeCappingMm: sum(linesOf(ground, 'ridge').map((line) => ridgeLengthMm(ground, line))),
    hipCappingMm: sum(
      linesOf(ground, 'hip', 'broken-hip').map((line) => slopingLengthMm(ground, line, Math.min)),
    ),
    valleyLiningMm: sum(
      linesOf(ground, 'valley').map((line) => slopingLengthMm(ground, line, Math.max)),
    ),
    gutterMm,
    fasciaMm: fascia === undefined ? gutterMm : boardsMm('fascia'),
    bargeMm: barge === undefined ? vergesMm(ground) : boardsMm('barge'),
  }
}
