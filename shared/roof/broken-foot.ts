import { piecePoint } from './piece.ts'
import type { Piece, PlanCut } from './piece.ts'
import { add2, cross2, dot2, length2, scale2 } from './vector.ts'

/** Side rafters nearer than this (cosine) to square with their broken hip stand to it as commons to a ridge. */
const squareSideCos = 0.35
/** Where timbers part at a slant beside a joint they stand this share of a thickness apart, so that one clear face bears. */
const clearShare = 1 / 30

/** The rafters of a broken hip's own two slopes that meet it at its foot. */
export const sidesAt = (broken: Piece, pieces: Piece[]): Piece[] =>
  pieces.filter(
    (p) =>
      p.role === 'creeper' &&
      p.headJoint !== null &&
      p.headJoint === broken.footJoint &&
      p.slopes.some((slope) => broken.slopes.includes(slope)),
  )

/** Whether the side rafters come in about square to the broken hip, and so bear on its sides. */
export const standSquare = (broken: Piece, sides: Piece[]): boolean =>
  sides.length > 0 && sides.every((p) => Math.abs(dot2(p.dir, broken.dir)) < squareSideCos)

/** Turn in plan between a broken hip and the crown end that carries its line on, radians, 0 when in line. */
const turnRad = (broken: Piece, crown: Piece): number =>
  Math.abs(Math.atan2(cross2(broken.dir, crown.dir), dot2(broken.dir, crown.dir)))

/**
 * How far a broken hip runs past its node, mm, where its side rafters bear on its own sides: half a
 * rafter, and further where they come in out of square, until they bear fully on it and leave the
 * crown end one clear face.
 */
const pastSquareSides = (broken: Piece, crown: Piece | null, sides: Piece[]): number => {
  const turn = crown === null ? 0 : turnRad(broken, crown)
  const crownAside =
    crown === null ? 0 : (crown.halfMm + 1.5 * crown.halfMm * Math.sin(turn)) / Math.cos(turn)
  const reaches = sides.flatMap((side) => {
    const down = scale2(side.dir, -1)
    const towardsFoot = -dot2(down, broken.dir)
    const aside = Math.abs(dot2(down, broken.left))
    return [broken.halfMm, Math.max(broken.halfMm, crownAside)].map(
      (mm) => (side.halfMm + mm * towardsFoot) / aside,
    )
  })
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

/**
 * The foot cut of a broken hip without a lower ridge: half a rafter past its node, on the plane that
 * halves the turn from broken hip to crown end, so that the crown end butts it with one cut. Square
 * where the two are in line, where no crown end comes, and where the side rafters bear on its sides.
 */
export const brokenFootCut = (broken: Piece, crown: Piece | null, sides: Piece[]): PlanCut => {
  const square = standSquare(broken, sides)
  const half = crown?.halfMm ?? sides[0]?.halfMm ?? broken.halfMm
  const past = square ? pastSquareSides(broken, crown, sides) : pastOblique(broken, crown, half)
  const out = scale2(broken.dir, -1)
  const middle = square || crown === null ? out : add2(out, scale2(crown.dir, -1))
  return {
    point: piecePoint(broken, -past, 0),
    normal: scale2(middle, 1 / length2(middle)),
    mitreWith: null,
  }
}
