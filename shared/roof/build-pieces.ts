import type { Joint, Joints } from './clusters.ts'
import { slopeStations } from './layout.ts'
import type { Station } from './layout.ts'
import type { Piece } from './piece.ts'
import type { Border, Face, NodeLine, RoofLines, SquareSpan } from './roof-lines.ts'
import { squareLineSpan } from './roof-lines.ts'
import type { MemberRole, Point2, Roof, RoofSettings } from './roof-types.ts'
import { at, edgeUnder, slopeGradient, slopePoint } from './slopes.ts'
import type { PlateEdge, PlateLines, Slope } from './slopes.ts'
import { dot2, left2, length2, sub2 } from './vector.ts'

/** All that is known of a roof before any timber is cut. */
export type Ground = {
  roof: Roof
  settings: RoofSettings
  plates: PlateLines
  lines: RoofLines
  joints: Joints
}

type Start = Pick<Piece, 'role' | 'section' | 'foot' | 'head' | 'slopes'>

const rawPiece = (start: Start): Piece => {
  const run = sub2(start.head, start.foot)
  const planMm = length2(run)
  const dir = { x: run.x / planMm, y: run.y / planMm }
  const rise = start.head.z - start.foot.z
  return {
    id: 0,
    role: start.role,
    section: start.section,
    foot: start.foot,
    head: start.head,
    slopes: start.slopes,
    halfMm: start.section.thicknessMm / 2,
    dir,
    left: left2(dir),
    planMm,
    tan: rise / planMm,
    cos: planMm / Math.hypot(planMm, rise),
    fall: { left: 0, right: 0 },
    backed: false,
    dropMm: 0,
    edge: null,
    corner: null,
    line: null,
    headJoint: null,
    footJoint: null,
    footLine: null,
    tailPlanMm: 0,
    headCuts: [],
    footCuts: [],
  }
}

/** How a hip's or ridge's two slopes fall away on either side of it, per mm. */
const sideFalls = (ground: Ground, slopes: number[], left: { x: number; y: number }) => {
  const falls = slopes.map((s) => -dot2(slopeGradient(at(ground.plates.slopes, s)), left))
  return { left: Math.max(...falls), right: Math.max(...falls.map((f) => -f)) }
}

/** Plan distance from a plate corner along a hip's tail to the first of the two eaves' tail planes. */
const hipTailPlanMm = (ground: Ground, corner: number, dir: { x: number; y: number }): number => {
  const edges = [at(ground.plates.edges, corner - 1), at(ground.plates.edges, corner)]
  const reaches = edges.map((edge) => edge.overhangMm / Math.max(dot2(dir, edge.inward), 1e-6))
  return Math.min(...reaches)
}

const linePiece = (ground: Ground, line: NodeLine, index: number): Piece => {
  const { roof, lines, joints } = ground
  const role: MemberRole =
    line.kind === 'ridge' ? 'ridge' : line.kind === 'hip' ? 'hip' : 'broken-hip'
  const section = role === 'ridge' ? roof.sections.ridge : roof.sections.hip
  const foot = at(lines.nodes, line.from)
  const head = at(lines.nodes, line.to)
  const piece = rawPiece({ role, section, foot: foot.point, head: head.point, slopes: line.slopes })
  const fall = sideFalls(ground, line.slopes, piece.left)
  const backed = role !== 'ridge' && roof.hipTop === 'backed'
  return Object.assign(piece, {
    fall,
    backed,
    dropMm: backed ? 0 : Math.max(fall.left, fall.right) * piece.halfMm,
    line: index,
    corner: foot.corner,
    footJoint: at(joints.ofNode, line.from),
    headJoint: at(joints.ofNode, line.to),
    tailPlanMm: foot.corner === null ? 0 : hipTailPlanMm(ground, foot.corner, piece.dir),
  })
}

/** A foot this near to the plate line stands on it. */
const onPlateMm = 0.5

const lineIndex = (ground: Ground, slope: number, border: Border): number | null => {
  if (border.kind !== 'slope') return null
  const found = ground.lines.lines.findIndex(
    (line) =>
      line.kind !== 'eave' && line.slopes.includes(slope) && line.slopes.includes(border.slope),
  )
  return found < 0 ? null : found
}

const hasSlope = (ground: Ground, line: number | null, slope: number): boolean =>
  line !== null && at(ground.lines.lines, line).slopes.includes(slope)

const rafterRole = (ground: Ground, slope: number, joint: Joint | null, line: number | null) => {
  if (joint === null) {
    const kind = line === null ? 'ridge' : at(ground.lines.lines, line).kind
    return kind === 'ridge' ? 'common' : 'creeper'
  }
  if (joint.ridge !== null) return hasSlope(ground, joint.ridge, slope) ? 'common' : 'crown-end'
  if (joint.rising !== null) return hasSlope(ground, joint.rising, slope) ? 'creeper' : 'crown-end'
  return 'crown-end'
}

const rafterPiece = (ground: Ground, slope: Slope, face: Face, station: Station): Piece | null => {
  const { lines, joints, plates, roof } = ground
  const span = squareLineSpan(lines, slope, face, station.alongMm)
  if (span === null) return null
  const headLine = lineIndex(ground, slope.index, span.highBorder)
  // a rafter that runs to a ridge too short to be a timber ends in that joint
  const swallowedTo =
    headLine !== null && joints.swallowed.has(headLine)
      ? at(joints.ofNode, at(lines.lines, headLine).from)
      : null
  const jointIndex = station.joint ?? swallowedTo
  const joint = jointIndex === null ? null : at(joints.joints, jointIndex)
  const place = (inMm: number) => ({
    ...slopePoint(slope, station.alongMm, inMm),
    z: inMm * slope.tan,
  })
  const footLine = span.low > onPlateMm ? lineIndex(ground, slope.index, span.lowBorder) : null
  const edge: PlateEdge = edgeUnder(plates, slope, station.alongMm)
  const piece = rawPiece({
    role: footLine === null ? rafterRole(ground, slope.index, joint, headLine) : 'creeper',
    section: roof.sections.rafter,
    foot: place(footLine === null ? 0 : span.low),
    head: place(span.high),
    slopes: [slope.index],
  })
  return Object.assign(piece, {
    edge: footLine === null ? edge.index : null,
    footLine,
    headJoint: jointIndex,
    tailPlanMm: footLine === null ? edge.overhangMm : 0,
  })
}

/** How near a rafter may stand to a hip's corner: clear of its side at the plate, and of its tail where it leans back. */
const hipGapMm = (ground: Ground, slope: Slope, run: Point2, corner: Point2): number => {
  const { sections } = ground.roof
  const size = length2(run)
  const sine = dot2(slope.inward, run) / size
  const atStart = dot2(slope.along, sub2(corner, slope.origin)) < slope.lengthMm / 2
  const leansBack = Math.max(0, (dot2(slope.along, run) / size) * (atStart ? -1 : 1))
  const overhangMm = at(ground.plates.edges, at(slope.edges, atStart ? 0 : -1)).overhangMm
  return (
    sections.rafter.thicknessMm / 2 +
    sections.hip.thicknessMm / 2 / sine +
    (overhangMm * leansBack) / sine
  )
}

/**
 * Whether a rafter hung from a hip beyond its plate is worth cutting: its feathered foot clear of the
 * plate, and some of it of full section.
 */
const hangsClear = (ground: Ground, slope: Slope, span: SquareSpan): boolean => {
  const index = lineIndex(ground, slope.index, span.lowBorder)
  if (index === null) return false
  const { lines, roof } = ground
  const line = at(lines.lines, index)
  const run = sub2(at(lines.nodes, line.to).point, at(lines.nodes, line.from).point)
  const perAside = Math.abs(dot2(slope.inward, run) / dot2(slope.along, run))
  const featherMm = (roof.sections.rafter.thicknessMm / 2) * perAside
  const hipMm = (roof.sections.hip.thicknessMm / 2) * Math.hypot(1, perAside)
  const foot = span.low + hipMm
  return foot - featherMm >= roof.plateWidthMm && foot + featherMm < span.high
}

/** Whether a rafter `alongMm` along a slope's plate stands clear of the hips at both corners and is worth cutting. */
const clearOfCorners = (ground: Ground, slope: Slope, face: Face, alongMm: number): boolean => {
  const { lines, settings } = ground
  const span = squareLineSpan(lines, slope, face, alongMm)
  if (span === null) return false
  if ((span.high - span.low) * Math.hypot(1, slope.tan) < settings.minCreeperMm) return false
  if (alongMm < 0 || alongMm > slope.lengthMm) {
    return hangsClear(ground, slope, span)
  }
  return lines.lines.every((line) => {
    if (line.kind !== 'hip' || !line.slopes.includes(slope.index)) return true
    const corner = at(lines.nodes, line.from).point
    const run = sub2(at(lines.nodes, line.to).point, corner)
    const gap = Math.abs(dot2(slope.along, sub2(corner, slope.origin)) - alongMm)
    return gap >= hipGapMm(ground, slope, run, corner)
  })
}

/** Every timber of the roof with its set-out line, none cut yet: lines first, then rafters slope by slope. */
export const buildPieces = (ground: Ground): Piece[] => {
  const { roof, plates, lines, joints } = ground
  const pieces: Piece[] = []
  lines.lines.forEach((line, index) => {
    const isTimber = line.kind === 'ridge' || line.kind === 'hip' || line.kind === 'broken-hip'
    if (isTimber && !joints.swallowed.has(index)) pieces.push(linePiece(ground, line, index))
  })
  for (const slope of plates.slopes) {
    const face = at(lines.faces, slope.index)
    const isClear = (alongMm: number) => clearOfCorners(ground, slope, face, alongMm)
    for (const station of slopeStations(roof, plates, lines, joints, slope, face, isClear)) {
      const piece = rafterPiece(ground, slope, face, station)
      if (piece !== null) pieces.push(piece)
    }
  }
  pieces.forEach((piece, id) => (piece.id = id))
  return pieces
}
