import { piecePoint } from './piece.ts'
import type { Piece, PlanCut } from './piece.ts'
import { add2, cross2, dot2, length2, scale2 } from './vector.ts'

/**
 * How the foot of a broken hip is made where the usual way would leave a head open: `fitted` and
 * `flush` slant the foot from where the one side rafter leaves its side to where the other does (a
 * little past, or just there), `parted` halves the turn to the crown end with the side rafters on its
 * own sides, `crown` lets the side rafters bear on the crown end, `sides` on its own sides; `stand`
 * cuts it last, to stand on what is there.
 */
export type FootWay = 'usual' | 'stand' | 'fitted' | 'flush' | 'parted' | 'sides' | 'crown'

/** Side rafters nearer than this (cosine) to square with their broken hip stand to it as commons to a ridge. */
const squareSideCos = 0.35
/** Where timbers part at a slant beside a joint they stand this share of a thickness apart, so that one clear face bears. */
const clearShare = 1 / 30

/** Whether a piece starts at a joint and climbs on from there. */
export const isRisingAt = (piece: Piece, joint: number): boolean =>
  (piece.role === 'broken-hip' || piece.role === 'valley') && piece.footJoint === joint

/** The rafters of a broken hip's own two slopes that meet it at its foot. */
export const sidesAt = (broken: Piece, pieces: Piece[]): Piece[] =>
  pieces.filter(
    (p) =>
      p.line === null &&
      p.headJoint !== null &&
      p.headJoint === broken.footJoint &&
      p.slopes.some((slope) => broken.slopes.includes(slope)),
  )

/** Whether the side rafters bear on the broken hip's own sides: usually where they come in about square. */
export const standSquare = (broken: Piece, sides: Piece[], way: FootWay): boolean => {
  if (sides.length === 0 || way === 'crown') return false
  if (way !== 'usual') return true
  return sides.every((p) => Math.abs(dot2(p.dir, broken.dir)) < squareSideCos)
}

/** Turn in plan between a broken hip and the crown end that carries its line on, radians, 0 when in line. */
const turnRad = (broken: Piece, crown: Piece): number =>
  Math.abs(Math.atan2(cross2(broken.dir, crown.dir), dot2(broken.dir, crown.dir)))

/** How far past the node, mm, a side rafter's lower face leaves a line `asideMm` beside the centre line. */
const reachMm = (broken: Piece, side: Piece, asideMm: number): number => {
  const down = scale2(side.dir, -1)
  const aside = Math.abs(dot2(down, broken.left))
  return (side.halfMm - asideMm * dot2(down, broken.dir)) / aside
}

/** How far aside the crown end's head reaches, mm. */
const crownAsideMm = (broken: Piece, crown: Piece | null): number => {
  if (crown === null) return broken.halfMm
  const turn = turnRad(broken, crown)
  const aside = (crown.halfMm + 1.5 * crown.halfMm * Math.sin(turn)) / Math.cos(turn)
  return Math.max(broken.halfMm, aside)
}

/**
 * How far a broken hip runs past its node, mm, where its side rafters bear on its own sides: half a
 * rafter, and further where they come in out of square, until they bear fully on it and leave the
 * crown end one clear face.
 */
const pastSquareSides = (broken: Piece, crown: Piece | null, sides: Piece[]): number => {
  const reaches = sides.flatMap((side) =>
    [broken.halfMm, crownAsideMm(broken, crown)].map((mm) => reachMm(broken, side, mm)),
  )
  const half = Math.max(...sides.map((side) => side.halfMm))
  const inSquare = sides.every((side) => Math.abs(dot2(side.dir, broken.dir)) < 1e-6)
  return inSquare ? half : Math.max(half, ...reaches) + 2 * half * clearShare
}

/**
 * How far it runs past its node, mm, where the side rafters bear on the crown end: half a rafter, or
 * less where the crown end turns off so far that its sides would no longer cover the broken hip's.
 */
const pastOblique = (broken: Piece, crown: Piece | null, half: number): number => {
  if (crown === null) return half
  const turn = turnRad(broken, crown)
  if (turn < 1e-6) return half
  const covered =
    (crown.halfMm - 2 * crown.halfMm * clearShare - broken.halfMm / Math.cos(turn)) / Math.tan(turn)
  return Math.min(half, Math.max(0, covered))
}

/** A foot whose face clears the lower faces of the side rafters, its slant (mm past per mm to the left) given or fitted to them. */
const clearingFoot = (
  broken: Piece,
  crown: Piece | null,
  sides: Piece[],
  slant: number | null,
  clearMm: number,
): PlanCut => {
  const wide = clearMm > 0 ? crownAsideMm(broken, crown) : broken.halfMm
  const corners = sides.flatMap((side) => {
    const sign = dot2(side.dir, broken.left) < 0 ? 1 : -1
    return [broken.halfMm, wide].map((mm) => ({ left: sign * mm, past: reachMm(broken, side, mm) }))
  })
  const furthest = (sign: 1 | -1) =>
    corners
      .filter((corner) => corner.left * sign > 0)
      .reduce((a, b) => (b.past > a.past ? b : a), { left: sign * broken.halfMm, past: 0 })
  const [left, right] = [furthest(1), furthest(-1)]
  const lean = slant ?? (left.past - right.past) / (left.left - right.left)
  const past = Math.max(...corners.map((corner) => corner.past - lean * corner.left)) + clearMm
  const out = add2(scale2(broken.dir, -1), scale2(broken.left, -lean))
  return {
    point: piecePoint(broken, -past, 0),
    normal: scale2(out, 1 / length2(out)),
    mitreWith: null,
  }
}

/** Slant, mm past per mm to the left, of the plane that halves the turn from broken hip to crown end. */
const partingSlant = (broken: Piece, crown: Piece | null): number =>
  crown === null
    ? 0
    : Math.tan(Math.atan2(dot2(crown.dir, broken.left), dot2(crown.dir, broken.dir)) / 2)

/**
 * The foot cut of a broken hip without a lower ridge: half a rafter past its node, on the plane that
 * halves the turn from broken hip to crown end, so that the crown end butts it with one cut. Square
 * where the two are in line, where no crown end comes, and where the side rafters bear on its sides.
 */
export const brokenFootCut = (
  broken: Piece,
  crown: Piece | null,
  sides: Piece[],
  way: FootWay,
): PlanCut => {
  const square = standSquare(broken, sides, way)
  const half = crown?.halfMm ?? sides[0]?.halfMm ?? broken.halfMm
  if (square && (way === 'fitted' || way === 'flush' || way === 'parted')) {
    const slant = way === 'parted' ? partingSlant(broken, crown) : null
    return clearingFoot(broken, crown, sides, slant, way === 'flush' ? 0 : 2 * half * clearShare)
  }
  const past = square ? pastSquareSides(broken, crown, sides) : pastOblique(broken, crown, half)
  const out = scale2(broken.dir, -1)
  const middle = square || crown === null ? out : add2(out, scale2(crown.dir, -1))
  return {
    point: piecePoint(broken, -past, 0),
    normal: scale2(middle, 1 / length2(middle)),
    mitreWith: null,
  }
}
