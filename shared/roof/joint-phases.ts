import { sidesAt, standSquare } from './broken-foot.ts'
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
  brokenFoot: 1,
  first: 1.5,
  common: 2,
  pair: 3,
  firstCrown: 4,
  crown: 5,
  side: 6,
  hip: 7,
  last: 7.5,
  creeper: 8,
} as const

/** From the joint towards the piece's body, in plan. */
export const bodyDirection = (piece: Piece, end: PieceEnd): Point2 =>
  end === 'head' ? scale2(piece.dir, -1) : piece.dir

export const turn = (from: Point2, to: Point2): number =>
  Math.atan2(cross2(from, to), dot2(from, to))

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

const crownPhases = (joint: Joint, crowns: Piece[], through: Piece | null): Map<Piece, number> => {
  const phase = new Map<Piece, number>(crowns.map((piece) => [piece, phases.crown]))
  if (through !== null) {
    const isFoot = joint.rising !== null
    // out of the joint, away from what runs through it
    const out = isFoot ? scale2(through.dir, -1) : outOfRidge(through, joint)
    const first = firstCrown(crowns, out, !isFoot)
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

const outOfRidge = (ridge: Piece, joint: Joint): Point2 =>
  dot2(sub2(joint.point, piecePoint(ridge, ridge.planMm / 2, 0)), ridge.dir) > 0
    ? ridge.dir
    : scale2(ridge.dir, -1)

const isRidgeAt = (piece: Piece, joint: number): boolean =>
  piece.role === 'ridge' && (piece.headJoint === joint || piece.footJoint === joint)

/** Side rafters at the foot of a broken hip butt the crown's sides; those square to it butt its own. */
const sidePhase = (piece: Piece, pieces: Piece[], way: JointWay): number => {
  const rising = pieces.find((p) => p.role === 'broken-hip' && p.footJoint === piece.headJoint)
  return rising !== undefined && standSquare(rising, sidesAt(rising, pieces), way.foot)
    ? phases.common
    : phases.side
}

const headPhase = (piece: Piece, pieces: Piece[], way: JointWay): number => {
  switch (piece.role) {
    case 'ridge':
      return phases.ridge
    case 'common':
      return phases.common
    case 'hip':
    case 'broken-hip':
      return phases.hip
    case 'crown-end':
      return phases.crown
    default:
      return piece.headJoint === null ? phases.creeper : sidePhase(piece, pieces, way)
  }
}

const wayOf = (ways: JointWays, joint: number | null): JointWay =>
  (joint === null ? null : ways.get(joint)) ?? usualWay

/** The pieces that reach each joint. */
const piecesByJoint = (ground: Ground, pieces: Piece[]): Piece[][] => {
  const reaching = ground.joints.joints.map((): Piece[] => [])
  for (const piece of pieces) {
    for (const joint of new Set([piece.headJoint, piece.footJoint])) {
      if (joint !== null) reaching[joint]?.push(piece)
    }
  }
  return reaching
}

const headPhases = (ground: Ground, pieces: Piece[], ways: JointWays): Map<Piece, number> => {
  const phaseOf = new Map<Piece, number>()
  piecesByJoint(ground, pieces).forEach((own, index) => {
    const way = wayOf(ways, index)
    const heads = own.filter((p) => p.headJoint === index)
    heads.forEach((piece) => phaseOf.set(piece, headPhase(piece, own, way)))
    const crowns = heads.filter((p) => p.role === 'crown-end')
    const through =
      own.find((p) => isRidgeAt(p, index)) ??
      own.find((p) => p.role === 'broken-hip' && p.footJoint === index) ??
      null
    const joint = at(ground.joints.joints, index)
    crownPhases(joint, crowns, through).forEach((phase, piece) => phaseOf.set(piece, phase))
    for (const piece of heads) {
      if (piece.id === way.first) phaseOf.set(piece, phases.first)
      if (piece.id === way.last) phaseOf.set(piece, phases.last)
    }
  })
  return phaseOf
}

/** Every end that meets other timber, first placed first. */
export const endJobs = (ground: Ground, pieces: Piece[], ways: JointWays): EndJob[] => {
  const phaseOf = headPhases(ground, pieces, ways)
  const jobs: EndJob[] = []
  for (const piece of pieces) {
    const phase = phaseOf.get(piece) ?? headPhase(piece, [], usualWay)
    jobs.push({ piece, end: 'head', phase, joint: piece.headJoint })
    if (piece.role === 'ridge') jobs.push({ piece, end: 'foot', phase, joint: piece.footJoint })
    if (piece.role === 'broken-hip') {
      jobs.push({ piece, end: 'foot', phase: phases.brokenFoot, joint: piece.footJoint })
    }
    if (piece.footLine !== null) {
      jobs.push({ piece, end: 'foot', phase: phases.creeper, joint: null })
    }
  }
  return jobs.sort((a, b) => a.phase - b.phase || a.piece.id - b.piece.id)
}
