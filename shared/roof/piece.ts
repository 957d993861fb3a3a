import type { MemberRole, Point2, Point3, Section } from './roof-types.ts'
import { add2, scale2 } from './vector.ts'

/** Which way a saw cut of the joint faces, in plan: all joint cuts are plumb. `normal` points off the piece. */
export type PlanCut = { point: Point2; normal: Point2; mitreWith: number | null }

export type PieceEnd = 'head' | 'foot'

/**
 * A timber before its numbers: a plumb slab along a set-out line. Plan distances run from `foot`
 * along `dir`; `left` is square to it. Set-out heights, nothing deducted.
 */
export type Piece = {
  id: number
  role: MemberRole
  section: Section
  halfMm: number
  foot: Point3
  head: Point3
  dir: Point2
  left: Point2
  planMm: number
  /** Rise per mm of plan, and the cosine of the pitch. */
  tan: number
  cos: number
  slopes: number[]
  /** Plumb fall of the slope on each side, per mm square off the set-out line; 0 under a rafter. */
  fall: { left: number; right: number }
  backed: boolean
  dropMm: number
  /** Plate edge that a rafter stands on, or corner that a hip stands on. */
  edge: number | null
  corner: number | null
  /** The line (index) that a ridge or hip is. */
  line: number | null
  headJoint: number | null
  footJoint: number | null
  /** The hip that a rafter hangs from, beyond the end of its plate where a hip leans back. */
  footLine: number | null
  /** How far the piece reaches past its foot in plan before any tail cut. */
  tailPlanMm: number
  headCuts: PlanCut[]
  footCuts: PlanCut[]
}

/** A point of the plan, `alongMm` from the foot and `leftMm` off the centre line. */
export const piecePoint = (piece: Piece, alongMm: number, leftMm: number): Point2 =>
  add2(piece.foot, add2(scale2(piece.dir, alongMm), scale2(piece.left, leftMm)))

export const isHipLike = (role: MemberRole): boolean => role === 'hip' || role === 'broken-hip'

export const setOutLengthMm = (piece: Piece): number => piece.planMm / piece.cos
