import { isRisingAt, sidesAt, standSquare } from './broken-foot.ts'
import type { FootWay } from './broken-foot.ts'
import type { Ground } from './build-pieces.ts'
import type { Joint } from './clusters.ts'
import { piecePoint } from './piece.ts'
import type { Piece, PieceEnd } from './piece.ts'
import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { cross2, dot2, scale2, sub2 } from './vector.ts'

/** An end of a piece in the order of placing: lower phases run through, higher ones butt. */
export type EndJob = { piece: Piece; end: PieceEnd; phase: number; joint: number | null }

/** How the pieces of a joint are ordered: the usual way, but for one that goes before the others or after them. */
export type JointWay = { foot: FootWay; first: number | null; last: number | null }

export const usualWay: JointWay = { foot: 'usual', first: null, last: null }

/** The way of each joint that is not made the usual way. */
export type JointWays = ReadonlyMap<number, JointWay>

/** Directions that differ by less than this (radians) are in line. */
export const inLineRad = 1e-3

export const phases = {
  ridge: 0,
  /** Ridges that butt the side of one that runs through. */
  ridgeButt: 0.5,
  brokenFoot: 1,
  first: 1.5,
  common: 2,
  pair: 3,
  firstCrown: 4,
  crown: 5,
  side: 6,
  hip: 7,
  /** Feet of broken hips and valleys that stand on what is there. */
  riser: 7.2,
  last: 7.5,
  creeper: 8,
} as const

/** From the joint towards the piece's body, in plan. */
export const bodyDirection = (piece: Piece, end: PieceEnd): Point2 =>
  end === 'head' ? scale2(piece.dir, -1) : piece.dir

export const turn = (from: Point2, to: Point2): number =>
  Math.atan2(cross2(from, to), dot2(from, to))

/** The pieces at a joint, as its order sees them. */
type JointPieces = {
  joint: Joint
  index: number
  own: Piece[]
  /** The ridge that runs through, or furthest. */
  ridge: Piece | null
  /** What starts here and climbs on, where others bear on its foot. */
  foot: Piece | null
  way: JointWay
}

/** The crown that continues a ridge or a broken hip, if any: the one nearest its line, within 45°. */
const firstCrown = (crowns: Piece[], through: Point2, mustBeExact: boolean): Piece | null => {
  const off = (p: Piece) => Math.abs(turn(through, bodyDirection(p, 'head')))
  const best = crowns.reduce<Piece | null>((a, b) => (a === null || off(b) < off(a) ? b : a), null)
  if (best === null) return null
  return off(best) < (mustBeExact ? inLineRad : Math.PI / 4) ? best : null
}

/** The in-line pair of an apex with the lowest edge number, if two stand in line. */
const apexPair = (crowns: Piece[]): [Piece, Piece] | null => {
  for (const a of crowns) {
    const b = crowns.find((c) => Math.PI - Math.abs(turn(a.dir, c.dir)) < inLineRad)
    if (b !== undefined) return [a, b]
  }
  return null
}

const outOfRidge = (ridge: Piece, joint: Joint): Point2 =>
  dot2(sub2(joint.point, piecePoint(ridge, ridge.planMm / 2, 0)), ridge.dir) > 0
    ? ridge.dir
    : scale2(ridge.dir, -1)

const crownPhases = ({ joint, index, ridge, foot }: JointPieces, crowns: Piece[]) => {
  const phase = new Map<Piece, number>(crowns.map((piece) => [piece, phases.crown]))
  if (ridge !== null) {
    if (ridge.through.includes(index)) return phase
    const first = firstCrown(crowns, outOfRidge(ridge, joint), true)
    if (first !== null) phase.set(first, phases.firstCrown)
    return phase
  }
  if (foot !== null) {
    // out of the joint, away from what climbs on
    const first = firstCrown(crowns, scale2(foot.dir, -1), false)
    if (first !== null) phase.set(first, phases.firstCrown)
    return phase
  }
  const pair = apexPair(crowns)
  if (pair === null) return phase
  for (const piece of crowns) {
    const square = Math.abs(dot2(piece.dir, pair[0].dir)) < inLineRad
    if (square) phase.set(piece, phases.firstCrown)
  }
  pair.forEach((piece) => phase.set(piece, phases.pair))
  return phase
}

const isRafter = (piece: Piece): boolean => piece.line === null

const sharesSlope = (piece: Piece, other: Piece | null): boolean =>
  other !== null && piece.slopes.some((slope) => other.slopes.includes(slope))

/** Where a rafter's head belongs: on the ridge's side, beside what climbs on, or at the end of either. */
const rafterPhase = (piece: Piece, { own, ridge, way }: JointPieces, rising: Piece | null) => {
  if (ridge !== null) return sharesSlope(piece, ridge) ? phases.common : phases.crown
  if (rising === null || !sharesSlope(piece, rising)) return phases.crown
  // side rafters at the foot of a broken hip butt the crown's sides; those square to it butt its own
  return standSquare(rising, sidesAt(rising, own), way.foot) ? phases.common : phases.side
}

/** Phases of the heads and feet that meet at one joint, but for ridges. */
const phasesAt = (at: JointPieces): Map<Piece, number> => {
  const { own, index, way, ridge, foot } = at
  const phaseOf = new Map<Piece, number>()
  const isHead = (p: Piece) => p.headJoint === index
  const rising = own.find((p) => isRisingAt(p, index)) ?? null
  const rafters = own.filter((p) => isRafter(p) && isHead(p))
  rafters.forEach((p) => phaseOf.set(p, rafterPhase(p, at, rising)))
  crownPhases(
    at,
    rafters.filter((p) => phaseOf.get(p) === phases.crown),
  ).forEach((phase, piece) => phaseOf.set(piece, phase))
  for (const piece of own) {
    if (piece.role === 'ridge') continue
    if (!isRafter(piece)) {
      const footPhase = piece === foot ? phases.brokenFoot : phases.riser
      phaseOf.set(piece, isHead(piece) ? phases.hip : footPhase)
    } else if (!isHead(piece)) phaseOf.set(piece, ridge === null ? phases.riser : phases.firstCrown)
    if (piece === foot) continue
    if (piece.id === way.first) phaseOf.set(piece, phases.first)
    if (piece.id === way.last) phaseOf.set(piece, phases.last)
  }
  return phaseOf
}

/** Whether what climbs on from a joint stands on what is there, instead of others on its foot. */
const standsThere = (joint: Joint, rising: Piece, way: JointWay): boolean =>
  joint.ridges.length > 0 ||
  way.foot === 'stand' ||
  (way.foot === 'usual' && rising.role === 'valley')

/** The joints that a piece ends at or runs through. */
const reaches = ({ headJoint, footJoint, through }: Piece): number[] => {
  const found: number[] = []
  for (const joint of [headJoint, footJoint, ...through]) {
    if (joint !== null && !found.includes(joint)) found.push(joint)
  }
  return found
}

/** The pieces that reach each joint. */
const piecesByJoint = (ground: Ground, pieces: Piece[], ways: JointWays): JointPieces[] => {
  const reaching = ground.joints.joints.map((): Piece[] => [])
  for (const piece of pieces) for (const joint of reaches(piece)) reaching[joint]?.push(piece)
  return ground.joints.joints.map((joint, index) => {
    const own = at(reaching, index)
    const way = ways.get(index) ?? usualWay
    const [line] = joint.ridges
    const chain = ground.joints.chains.find((c) => line !== undefined && c.lines.includes(line))
    const ridge = own.find((p) => p.role === 'ridge' && p.line === chain?.lines[0]) ?? null
    const rising = own.find((p) => p.line !== null && p.line === joint.rising) ?? null
    const foot = rising !== null && !standsThere(joint, rising, way) ? rising : null
    return { joint, index, own, ridge, foot, way }
  })
}

/** Every end that meets other timber, first placed first. */
export const endJobs = (ground: Ground, pieces: Piece[], ways: JointWays): EndJob[] => {
  const joints = piecesByJoint(ground, pieces, ways)
  const phasesOf = joints.map((at) =>
    at.own.length === 0 ? new Map<Piece, number>() : phasesAt(at),
  )
  const phaseAt = (piece: Piece, joint: number | null): number => {
    if (piece.role === 'ridge') {
      const through = joint === null ? null : (joints[joint]?.ridge ?? null)
      return through === null || through === piece ? phases.ridge : phases.ridgeButt
    }
    if (joint !== null) return phasesOf[joint]?.get(piece) ?? phases.creeper
    return piece.onRidge ? phases.common : phases.creeper
  }
  const jobs: EndJob[] = []
  for (const piece of pieces) {
    const add = (end: PieceEnd, joint: number | null) =>
      jobs.push({ piece, end, phase: phaseAt(piece, joint), joint })
    add('head', piece.headJoint)
    if (piece.role === 'ridge' || piece.footJoint !== null) add('foot', piece.footJoint)
    else if (piece.footLine !== null) {
      jobs.push({ piece, end: 'foot', phase: phases.creeper, joint: null })
    }
  }
  return jobs.sort((a, b) => a.phase - b.phase || a.piece.id - b.piece.id)
}
