import type { Ground } from './build-pieces.ts'
import type { Joint } from './clusters.ts'
import { gather } from './lists.ts'
import { rawPiece } from './piece.ts'
import type { Piece } from './piece.ts'
import { nearestEdge, ownPlateMm, rafterFoot } from './plate-foot.ts'
import type { RafterFoot } from './plate-foot.ts'
import type { LineKind, MemberRole } from './roof-types.ts'
import type { HipCorner, SlopeGround } from './slope-ground.ts'
import { at, insideMm, slopePoint } from './slopes.ts'
import type { PlateEdge, Slope } from './slopes.ts'
import type { SquareSpan } from './square-spans.ts'
import { squareLineSpans } from './square-spans.ts'
import { dot2, point3, sub2 } from './vector.ts'

/**
 * Where a rafter stands on a slope's plate line, mm from the slope's first corner, and the joints near
 * its line; `flush` where it stands inside a gable.
 */
export type Station = { alongMm: number; joints: readonly number[]; flush?: true }

/** A rafter set just clear of a hip is clear of it, whatever the last digit says. */
const roundingMm = 1e-6

type FootPlace =
  | RafterFoot
  /** Beyond the end of a plate, hung from a hip that leans back. */
  | { on: 'hip'; line: number; inMm: number }
  /** On what stands at a joint. */
  | { on: 'joint'; joint: number; inMm: number }

/** The joint of a station that one end of a square line runs to; null where it ends elsewhere. */
const jointAt = (ground: Ground, slope: Slope, station: Station, inMm: number): number | null => {
  const { joints } = ground.joints
  const off = (index: number) => {
    const { point, radiusMm } = at(joints, index)
    const aside = Math.abs(dot2(slope.along, sub2(point, slope.origin)) - station.alongMm)
    // a rafter set further off than its own thickness does not end in that joint
    if (aside > radiusMm + ground.roof.sections.rafter.thicknessMm) return Infinity
    const away = Math.abs(insideMm(slope, point) - inMm)
    return away <= 1 + 4 * radiusMm + 3 * aside ? away : Infinity
  }
  const best = station.joints.reduce<number | null>(
    (a, b) => (a === null || off(b) < off(a) ? b : a),
    null,
  )
  return best === null || off(best) === Infinity ? null : best
}

/** The joint that a line too short to be a timber lies in. */
const swallowedBy = (ground: Ground, line: number | null): number | null =>
  line !== null && ground.joints.swallowed.has(line)
    ? at(ground.joints.ofNode, at(ground.lines.lines, line).from)
    : null

/**
 * Whether a rafter hung from a hip beyond its plate is worth cutting: its feathered foot clear of the
 * plate, and some of it of full section.
 */
const hangsClear = (ground: Ground, slope: Slope, span: SquareSpan, index: number): boolean => {
  const { lines, roof } = ground
  const line = at(lines.lines, index)
  const run = sub2(at(lines.nodes, line.to).point, at(lines.nodes, line.from).point)
  const perAside = Math.abs(dot2(slope.inward, run) / dot2(slope.along, run))
  const featherMm = (roof.sections.rafter.thicknessMm / 2) * perAside
  const hipMm = (roof.sections.hip.thicknessMm / 2) * Math.hypot(1, perAside)
  const foot = span.low + hipMm
  return foot - featherMm >= roof.plateWidthMm && foot + featherMm < span.high
}

const footPlace = (
  ground: Ground,
  own: SlopeGround,
  station: Station,
  span: SquareSpan,
): FootPlace | null => {
  const lowLine = span.lowBorder.kind === 'slope' ? span.lowBorder.line : null
  if (lowLine !== null) {
    const joint = jointAt(ground, own.slope, station, span.low) ?? swallowedBy(ground, lowLine)
    if (joint !== null) return { on: 'joint', joint, inMm: span.low }
    if (at(ground.lines.lines, lowLine).kind !== 'valley') {
      return hangsClear(ground, own.slope, span, lowLine)
        ? { on: 'hip', line: lowLine, inMm: span.low }
        : null
    }
  }
  const foot = rafterFoot(ground, own, station.alongMm, span)
  if (foot !== null || lowLine === null) return foot
  // a valley that starts in mid-roof
  return { on: 'hip', line: lowLine, inMm: span.low }
}

const isOf = (ground: Ground, line: number | null, slope: number): boolean =>
  line !== null && at(ground.lines.lines, line).slopes.includes(slope)

/** What a rafter's head meets: a ridge, a hip's side, or the end of what runs through a joint. */
const headMeets = (
  ground: Ground,
  slope: number,
  joint: Joint | null,
  kind: LineKind | null,
): 'ridge' | 'hip' | 'end' => {
  if (joint === null) return kind === 'ridge' || kind === null ? 'ridge' : 'hip'
  if (joint.ridges.length > 0) {
    return joint.ridges.some((line) => isOf(ground, line, slope)) ? 'ridge' : 'end'
  }
  return isOf(ground, joint.rising, slope) ? 'hip' : 'end'
}

const roleOf = (
  foot: FootPlace,
  footKind: LineKind | null,
  meets: 'ridge' | 'hip' | 'end',
): MemberRole => {
  if (foot.on === 'plate') {
    return meets === 'ridge' ? 'common' : meets === 'hip' ? 'creeper' : 'crown-end'
  }
  if (foot.on === 'hip' && footKind !== 'valley') return 'creeper'
  return meets === 'hip' ? 'cripple-creeper' : 'valley-creeper'
}

/** The hip whose corner leaves a rafter no room on the plate `alongMm` along a slope's plate line. */
const hipInTheWay = ({ hips }: SlopeGround, alongMm: number): HipCorner | undefined =>
  hips.find((hip) => Math.abs(hip.alongMm - alongMm) < hip.gapMm - roundingMm)

/** Where a rafter stands instead that only a hip's tail is in the way of: beside that tail; null elsewhere. */
export const besideTailMm = (own: SlopeGround, alongMm: number): number | null => {
  const hip = hipInTheWay(own, alongMm)
  if (hip === undefined || hip.plateSide * (alongMm - hip.alongMm) < hip.ownMm) return null
  return hip.alongMm + hip.plateSide * hip.gapMm
}

/**
 * Whether hips and valleys leave a rafter room: not where one that runs beside it takes half of its
 * length or more, so that it would have to be ripped.
 */
const hasRoom = (ground: Ground, own: SlopeGround, alongMm: number, span: SquareSpan): boolean => {
  const { rafter, hip, valley } = ground.roof.sections
  const asideMm = (rafter.thicknessMm + Math.max(hip.thicknessMm, valley.thicknessMm)) / 2
  const half = (span.high - span.low) / 2
  return [-asideMm, asideMm].every((mm) =>
    squareLineSpans(ground.lines, own.slope, own.face, alongMm + mm).some(
      ({ low, high }) => Math.min(high, span.high) - Math.max(low, span.low) > half,
    ),
  )
}

const rafterPiece = (
  ground: Ground,
  own: SlopeGround,
  station: Station,
  span: SquareSpan,
): Piece | null => {
  const { lines, joints, roof, settings } = ground
  const { slope } = own
  const foot = footPlace(ground, own, station, span)
  if (foot === null) return null
  if (foot.on === 'plate' && hipInTheWay(own, station.alongMm) !== undefined) return null
  if (station.flush !== true && !hasRoom(ground, own, station.alongMm, span)) return null
  const footMm = foot.on === 'plate' ? ownPlateMm(ground, slope, station.alongMm) : foot.inMm
  if ((span.high - footMm) * Math.hypot(1, slope.tan) < settings.minCreeperMm) return null
  const headLine = span.highBorder.line
  // a rafter that runs to a ridge too short to be a timber ends in that joint
  const headJoint = jointAt(ground, slope, station, span.high) ?? swallowedBy(ground, headLine)
  const joint = headJoint === null ? null : at(joints.joints, headJoint)
  const kindOf = (line: number | null) => (line === null ? null : at(lines.lines, line).kind)
  const footLine = foot.on === 'valley' ? foot.valley.line : foot.on === 'hip' ? foot.line : null
  const place = (inMm: number) => point3(slopePoint(slope, station.alongMm, inMm), inMm * slope.tan)
  const meets = headMeets(ground, slope.index, joint, kindOf(headLine))
  const piece = rawPiece({
    role: roleOf(foot, kindOf(footLine), meets),
    section: roof.sections.rafter,
    foot: place(footMm),
    head: place(span.high),
    slopes: [slope.index],
  })
  Object.assign(piece, {
    headJoint,
    onRidge: meets === 'ridge',
    footLine,
    footJoint: foot.on === 'joint' ? foot.joint : null,
  })
  if (foot.on !== 'plate') return piece
  const edge: PlateEdge = nearestEdge(ground, slope, station.alongMm)
  return Object.assign(piece, {
    edge: edge.index,
    tailPlanMm: edge.overhangMm,
    tailCuts: foot.tailCuts,
    overPlate: foot.overPlate,
  })
}

/** The rafters on one square line of a slope; none where none is worth cutting. */
export const raftersAt = (ground: Ground, own: SlopeGround, station: Station): Piece[] =>
  gather(squareLineSpans(ground.lines, own.slope, own.face, station.alongMm), (span) => {
    const piece = rafterPiece(ground, own, station, span)
    return piece === null ? [] : [piece]
  })

/** Whether a joint of a slope is where one of its square lines starts or ends, and not only touched in passing. */
export const reachesJoint = (ground: Ground, own: SlopeGround, station: Station): boolean =>
  squareLineSpans(ground.lines, own.slope, own.face, station.alongMm).some((span) => {
    const low =
      span.lowBorder.kind === 'slope' ? jointAt(ground, own.slope, station, span.low) : null
    return low !== null || jointAt(ground, own.slope, station, span.high) !== null
  })
