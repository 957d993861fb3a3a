import type { FrameSpec } from '../../../shared/roof/roof-types.ts'
import { toBuilding, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import {
  backingFromSlopes,
  distanceIn,
  heightOn,
  isAlongLine,
  lowest,
  ownSlopes,
  type Slope,
} from './slopes.ts'
import { tanDeg, type Vec } from './vec.ts'

const PLACE_TOL_MM = 0.01
const TOP_TOL_MM = 0.2
const PLANING_TOL_MM = 0.2
const BACKING_TOL_DEG = 0.001

/** `axis` stands over the set-out lines by the stand less the drop, and starts on the plate face. */
export function checkPlace(complain: Complain, piece: Piece, spec: FrameSpec, all: Slope[]): void {
  const { member } = piece
  const slopes = ownSlopes(piece, all)
  const marks = [member.mark]
  for (const [name, p] of Object.entries(member.axis)) {
    for (const slope of slopes) {
      const out = p.z - (heightOn(slope, p.x, p.y) + spec.standMm - member.dropMm)
      if (Math.abs(out) <= PLACE_TOL_MM) continue
      const text = `axis.${name} is not stand less drop over its slope, mm`
      complain({ check: 'place', marks, out, text })
    }
  }
  if (member.birdsmouth !== null) {
    const heel = member.axis.from
    const off = slopes.map((slope) => distanceIn(slope, heel.x, heel.y))
    const out = Math.max(...off.map(Math.abs))
    if (out > PLACE_TOL_MM) {
      complain({ check: 'place', marks, out, text: 'its heel is not on the outer plate face, mm' })
    }
    const stand = member.birdsmouth.standMm - (spec.standMm - member.dropMm)
    if (Math.abs(stand) > PLACE_TOL_MM) {
      complain({ check: 'place', marks, out: stand, text: 'its stand is not the roof’s, mm' })
    }
  }
  if (member.backing !== null) {
    const { leftDeg, rightDeg } = backingFromSlopes(piece.pose, slopes)
    const left = member.backing.leftDeg - leftDeg
    const right = member.backing.rightDeg - rightDeg
    const out = Math.abs(left) > Math.abs(right) ? left : right
    if (Math.abs(out) > BACKING_TOL_DEG) {
      complain({ check: 'place', marks, out, text: 'its backing is not its slopes’, degrees' })
    }
  }
}

/** Points along the top of the bar, at both arrises. */
function topArrises(piece: Piece): Vec[] {
  const { member } = piece
  const half = member.section.thicknessMm / 2
  const points: Vec[] = []
  for (const sign of [-1, 1]) {
    const backed = sign > 0 ? member.backing?.leftDeg : member.backing?.rightDeg
    const fall = half * tanDeg(backed ?? 0)
    for (const along of [0, member.setOutLengthMm]) points.push([along, sign * half, -fall])
  }
  return points
}

/** No top arris over its own slopes, and none sunk under both of them. */
export function checkTop(complain: Complain, piece: Piece, spec: FrameSpec, all: Slope[]): void {
  const { member } = piece
  const slopes = ownSlopes(piece, all)
  const marks = [member.mark]
  const proud = Math.max(
    ...piece.corners.map((p) => p[2] - lowest(slopes, p[0], p[1]) - spec.standMm),
  )
  if (proud > TOP_TOL_MM) {
    complain({ check: 'top edge', marks, out: proud, text: 'stands over its own slopes, mm' })
  }
  const lies = topArrises(piece).map((own) => {
    const p = toBuilding(piece.pose, own)
    return p[2] - lowest(slopes, p[0], p[1]) - spec.standMm
  })
  const mayHang = isAlongLine(member) && member.backing === null
  const sunk = mayHang ? Math.max(...lies) : Math.min(...lies)
  if (sunk < -TOP_TOL_MM) {
    complain({ check: 'top edge', marks, out: sunk, text: 'lies under its own slopes, mm' })
  }
}

type End = 'head' | 'foot'
type Side = 'left' | 'right'

function proudAt(piece: Piece, spec: FrameSpec, all: Slope[], end: End, side: Side): number {
  const middle = piece.member.setOutLengthMm / 2
  const heights = piece.own.map((own, index) => {
    const atEnd = end === 'head' ? own[0] > middle : own[0] <= middle
    const onSide = side === 'left' ? own[1] > -0.01 : own[1] < 0.01
    if (!atEnd || !onSide) return -Infinity
    const p = piece.corners[index]!
    return p[2] - lowest(all, p[0], p[1]) - spec.standMm
  })
  return Math.max(...heights)
}

/** A corner over a neighbouring slope must be in the published planing, by what it stands over. */
export function checkPlaning(
  complain: Complain,
  piece: Piece,
  spec: FrameSpec,
  all: Slope[],
): void {
  const { mark } = piece.member
  for (const end of ['head', 'foot'] as const) {
    for (const side of ['left', 'right'] as const) {
      const listed = spec.planing.filter((p) => p.mark === mark && p.end === end && p.side === side)
      const off = Math.max(0, ...listed.map((p) => p.offMm))
      const proud = Math.max(0, proudAt(piece, spec, all, end, side))
      const out = proud - off
      if (Math.abs(out) <= PLANING_TOL_MM) continue
      const text = `${end} ${side} corner stands ${proud.toFixed(2)} over the roof, planing takes ${off.toFixed(2)}, mm`
      complain({ check: 'planing', marks: [mark], out, text })
    }
  }
}
