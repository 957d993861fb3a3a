import { toBuilding, type Piece } from './rebuild-member.ts'
import { backingFromSlopes, heightOn, isHipLike, type Backing, type Slope } from './slopes.ts'
import { faceAt, type Surface } from './surface.ts'
import type { Vec } from './vec.ts'

/** Far enough off a line to be in the slope beside it and in no other. */
const ASIDE_MM = 1
const ON_CENTRE_MM = 0.01

/**
 * The member's own slopes to its left and right at a place along it: one and the same under a
 * rafter, two beside a hip, valley or ridge. A ridge in one timber over several slopes has others at
 * other places.
 */
export function ownSidesAt(
  piece: Piece,
  surface: Surface,
  alongMm: number,
): { left: Slope; right: Slope } {
  const own = piece.member.planes.map((index) => surface.faces[index]!)
  const length = piece.member.setOutLengthMm
  const margin = Math.min(10, length / 4)
  const along = Math.min(length - margin, Math.max(margin, alongMm))
  const side = (left: number): Slope => {
    const [x, y] = toBuilding(piece.pose, [along, left, 0])
    return faceAt(own, x, y).slope
  }
  return { left: side(ASIDE_MM), right: side(-ASIDE_MM) }
}

/** Height of a member's own slopes, run on past their lines, at a point given in its own coordinates. */
export function ownHeight(piece: Piece, surface: Surface, own: Vec): number {
  const [x, y] = toBuilding(piece.pose, own)
  const { left, right } = ownSidesAt(piece, surface, own[0])
  const heights = [heightOn(left, x, y), heightOn(right, x, y)]
  if (piece.member.role === 'valley') return Math.max(...heights)
  if (piece.member.role !== 'ridge' || Math.abs(own[1]) < ON_CENTRE_MM) return Math.min(...heights)
  return own[1] > 0 ? heights[0]! : heights[1]!
}

/** The backing that a hip or valley needs to lie in both its slopes; null for any other member. */
export function backingOfSlopes(piece: Piece, surface: Surface): Backing | null {
  if (!isHipLike(piece.member)) return null
  const sides = ownSidesAt(piece, surface, piece.member.setOutLengthMm / 2)
  return backingFromSlopes(piece.pose.left, piece.pose.up, sides)
}
