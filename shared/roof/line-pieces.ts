import type { Ground } from './build-pieces.ts'
import { gather } from './lists.ts'
import { rawPiece } from './piece.ts'
import type { Piece } from './piece.ts'
import type { RidgeChain } from './ridge-chains.ts'
import type { NodeLine } from './roof-lines.ts'
import type { Point2 } from './roof-types.ts'
import { at, slopeGradient } from './slopes.ts'
import type { PlateEdge } from './slopes.ts'
import { dot2, length2, radians, scale2, sub2 } from './vector.ts'

/**
 * How the slopes of a ridge, hip or valley fall away on either side of it, per mm; under 0 where they
 * rise. Over a ridge or hip the lowest slope is the roof, over a valley the highest.
 */
const sideFalls = (ground: Ground, slopes: number[], left: Point2, isValley: boolean) => {
  const falls = slopes.map((s) => -dot2(slopeGradient(at(ground.plates.slopes, s)), left))
  const other = falls.map((f) => -f)
  return isValley
    ? { left: Math.min(...falls), right: Math.min(...other) }
    : { left: Math.max(...falls), right: Math.max(...other) }
}

/** Plan distance from a plate corner along a hip's or valley's tail to the first of the two eaves' tail planes. */
const tailPlanMm = (ground: Ground, corner: number, dir: Point2): number => {
  const edges = [at(ground.plates.edges, corner - 1), at(ground.plates.edges, corner)]
  const reaches = edges.map((edge) => edge.overhangMm / Math.max(dot2(dir, edge.inward), 1e-6))
  return Math.min(...reaches)
}

/**
 * Drop of a top: down until no arris stands over its own slopes; under 0 for a dished valley, whose
 * blank stands higher until planing each half down leaves it in its slope.
 */
const dropOf = (piece: Piece): number => {
  if (piece.backed) return 0
  const { left, right } = piece.fall
  if (piece.dished) return Math.min(left, right, 0) * piece.halfMm
  return Math.max(left, right, 0) * piece.halfMm
}

/** The plane of an eave's tails where a hip's or valley's top meets it, as a line in plan: its normal and offset. */
const tailLine = (
  ground: Ground,
  edge: PlateEdge,
  piece: Piece,
): { normal: Point2; offset: number } => {
  const out = scale2(edge.inward, -1)
  const { tan } = piece
  const lean = ground.roof.tail === 'square' ? Math.tan(radians(edge.pitchDeg)) : 0
  // the top over a point p stands at dir · (p − foot) × tan − drop, the eave's line at −overhang × its own tangent
  const normal = sub2(out, scale2(piece.dir, lean * tan))
  const size = length2(normal)
  const level = edge.overhangMm * Math.tan(radians(edge.pitchDeg)) - piece.dropMm
  const offset =
    dot2(out, edge.from) + edge.overhangMm + lean * (level - tan * dot2(piece.dir, piece.foot))
  return { normal: scale2(normal, 1 / size), offset: offset / size }
}

/** The timber of a hip, broken hip or valley. */
export const creasePiece = (ground: Ground, line: NodeLine, index: number): Piece => {
  const { roof, lines, joints } = ground
  const role = line.kind === 'valley' ? 'valley' : line.kind === 'hip' ? 'hip' : 'broken-hip'
  const section = role === 'valley' ? roof.sections.valley : roof.sections.hip
  const foot = at(lines.nodes, line.from)
  const head = at(lines.nodes, line.to)
  const piece = rawPiece({ role, section, foot: foot.point, head: head.point, slopes: line.slopes })
  Object.assign(piece, {
    fall: sideFalls(ground, line.slopes, piece.left, role === 'valley'),
    backed: role !== 'valley' && roof.hipTop === 'backed',
    dished: role === 'valley' && roof.valleyTop === 'dished',
    line: index,
    corner: foot.corner,
    footJoint: at(joints.ofNode, line.from),
    headJoint: at(joints.ofNode, line.to),
    tailPlanMm: foot.corner === null ? 0 : tailPlanMm(ground, foot.corner, piece.dir),
  })
  Object.assign(piece, { dropMm: dropOf(piece) })
  if (foot.corner === null) return piece
  const edges = [at(ground.plates.edges, foot.corner - 1), at(ground.plates.edges, foot.corner)]
  return Object.assign(piece, { tailLines: edges.map((edge) => tailLine(ground, edge, piece)) })
}

const ridgePiece = (ground: Ground, chain: RidgeChain): Piece => {
  const { roof, lines, joints } = ground
  const own = chain.lines.map((index) => at(lines.lines, index))
  const slopes = [...new Set(own.flatMap((line) => line.slopes))]
  const piece = rawPiece({
    role: 'ridge',
    section: roof.sections.ridge,
    foot: at(lines.nodes, chain.from).point,
    head: at(lines.nodes, chain.to).point,
    slopes,
  })
  const falls = own.map((line) => sideFalls(ground, line.slopes, piece.left, false))
  Object.assign(piece, {
    fall: {
      left: Math.max(...falls.map((f) => f.left)),
      right: Math.max(...falls.map((f) => f.right)),
    },
    line: at(chain.lines, 0),
    footJoint: at(joints.ofNode, chain.from),
    headJoint: at(joints.ofNode, chain.to),
    through: [...chain.through],
  })
  return Object.assign(piece, { dropMm: dropOf(piece) })
}

/** Ridges, hips, broken hips and valleys with their set-out lines, in the order of the roof's lines. */
export const linePieces = (ground: Ground): Piece[] => {
  const { lines, joints } = ground
  return gather(lines.lines, (line, index): Piece[] => {
    if (joints.swallowed.has(index) || joints.pinched.has(index)) return []
    if (line.kind === 'ridge') {
      const chain = joints.chains.find((c) => Math.min(...c.lines) === index)
      return chain === undefined ? [] : [ridgePiece(ground, chain)]
    }
    const isCrease = line.kind === 'hip' || line.kind === 'broken-hip' || line.kind === 'valley'
    return isCrease ? [creasePiece(ground, line, index)] : []
  })
}
