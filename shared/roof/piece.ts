import type { MemberRole, Point2, Point3, Section } from './roof-types.ts'
import { add2, left2, length2, scale2, sub2 } from './vector.ts'

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
  /** A valley whose top is planed down to its slopes, once its cuts are sawn on the square blank. */
  dished: boolean
  dropMm: number
  /** Plate edge that a rafter stands on, or corner that a hip stands on. */
  edge: number | null
  corner: number | null
  /** The line (index) that a ridge, hip or valley is; of ridges in one line the first. */
  line: number | null
  headJoint: number | null
  footJoint: number | null
  /** Whether a rafter's head lies against the side of a ridge. */
  onRidge: boolean
  /** Joints that a ridge runs through. */
  through: number[]
  /** The valley that a rafter starts from, or the hip it hangs from beyond the end of its plate. */
  footLine: number | null
  /** How far the piece reaches past its foot in plan before any tail cut. */
  tailPlanMm: number
  /** Where the tail planes of a hip's or valley's two eaves meet its top, in plan: normals off the piece. */
  tailLines: { normal: Point2; offset: number }[]
  /** Where a rafter's centre line is over a plate, plan mm from its foot. */
  overPlate: { fromMm: number; toMm: number }
  headCuts: PlanCut[]
  footCuts: PlanCut[]
  /** Where a rafter's tail runs into a valley: its cut against the valley's side. */
  tailCuts: PlanCut[]
}

type Start = Pick<Piece, 'role' | 'section' | 'foot' | 'head' | 'slopes'>

/** A timber from its set-out line, on nothing and cut nowhere yet. */
export const rawPiece = (start: Start): Piece => {
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
    dished: false,
    dropMm: 0,
    edge: null,
    corner: null,
    line: null,
    headJoint: null,
    footJoint: null,
    onRidge: false,
    through: [],
    footLine: null,
    tailPlanMm: 0,
    tailLines: [],
    overPlate: { fromMm: 0, toMm: 0 },
    headCuts: [],
    footCuts: [],
    tailCuts: [],
  }
}

/** A point of the plan, `alongMm` from the foot and `leftMm` off the centre line. */
export const piecePoint = (piece: Piece, alongMm: number, leftMm: number): Point2 =>
  add2(piece.foot, add2(scale2(piece.dir, alongMm), scale2(piece.left, leftMm)))

export const isHipLike = (role: MemberRole): boolean => role === 'hip' || role === 'broken-hip'

/** Hips and valleys: their tops can be square or follow their two slopes. */
export const isAlongCrease = (role: MemberRole): boolean => isHipLike(role) || role === 'valley'

export const setOutLengthMm = (piece: Piece): number => piece.planMm / piece.cos
