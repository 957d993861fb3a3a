import type { FrameSpec, Roof } from '../../../shared/roof/roof-types.ts'
import { checkJoints } from './check-joints.ts'
import { checkLayout } from './check-layout.ts'
import { checkLists, checkWeight } from './check-lists.ts'
import { checkNumbers } from './check-numbers.ts'
import { checkPlace, checkPlaning, checkTop } from './check-place.ts'
import { checkRounding } from './check-rounding.ts'
import { checkSeat } from './check-seats.ts'
import { rebuildMember, type Piece } from './rebuild-member.ts'
import { collector, type Complain, type Complaint } from './report.ts'
import { backingFromSlopes, ownSlopes, slopesOf } from './slopes.ts'
import { boxesMeet, type Solid, type SolidKit } from './solid-kit.ts'

/** Two pieces may share no more than this: a sliver from double-precision corners. */
const OVERLAP_MM3 = 5
export const PLATE_DEPTH_MM = 90

type Settings = { sawMaxTiltDeg: number; densityKgM3: number; minCreeperMm: number }
/** As agreed for a roof without settings of its own, written out again here. */
const defaultSettings: Settings = { sawMaxTiltDeg: 50, densityKgM3: 550, minCreeperMm: 300 }

/** The wall plates: the outline's ring, plate width inward, its top at z = 0. */
export function plateSolid(kit: SolidKit, roof: Roof): Solid {
  const outer = new kit.CrossSection([roof.outline.map((p) => [p.x, p.y] as [number, number])])
  const inner = outer.offset(-roof.plateWidthMm, 'Miter', 20)
  return outer.subtract(inner).extrude(PLATE_DEPTH_MM).translate([0, 0, -PLATE_DEPTH_MM])
}

function checkOverlaps(complain: Complain, pieces: Piece[], plates: Solid): void {
  const say = (marks: string[], solid: Solid): void => {
    const shared = solid.volume()
    if (shared <= OVERLAP_MM3) return
    const points = solid.boundingBox()
    const at = points.min.map((low, i) => Math.round((low + points.max[i]!) / 2)).join(', ')
    complain({ check: 'overlap', marks, out: shared, text: `share timber about ${at}, mm³` })
  }
  pieces.forEach((piece, index) => {
    for (const other of pieces.slice(index + 1)) {
      if (!boxesMeet(piece.box, other.box)) continue
      say([piece.member.mark, other.member.mark], piece.solid.intersect(other.solid))
    }
    if (piece.box.min[2] < 0) say([piece.member.mark, 'plates'], piece.solid.intersect(plates))
  })
}

function checkMarks(complain: Complain, spec: FrameSpec): void {
  const marks = spec.members.map((m) => m.mark)
  if (new Set(marks).size === marks.length) return
  const twice = marks.filter((mark, i) => marks.indexOf(mark) !== i)
  complain({ check: 'numbers', marks: twice, out: 0, text: 'mark used twice' })
}

/** Saws every member from its published numbers, stands the frame up and judges it. */
export function dryFit(
  kit: SolidKit,
  roof: Roof,
  spec: FrameSpec,
  settings: Settings = defaultSettings,
): Complaint[] {
  const { complain, complaints } = collector()
  checkMarks(complain, spec)
  checkLists(complain, spec)
  const pieces = spec.members.map((member) => rebuildMember(kit, member))
  const plates = plateSolid(kit, roof)
  const slopes = slopesOf(roof, spec)
  for (const piece of pieces) {
    const hipLike = ['hip', 'broken-hip'].includes(piece.member.role)
    const backed = hipLike ? backingFromSlopes(piece.pose, ownSlopes(piece, slopes)) : null
    checkNumbers(complain, piece, roof, backed, settings.sawMaxTiltDeg)
    checkWeight(complain, piece, settings.densityKgM3)
    checkPlace(complain, piece, spec, slopes)
    checkTop(complain, piece, spec, slopes)
    checkPlaning(complain, piece, spec, slopes)
    checkSeat(complain, kit, piece, roof)
    checkJoints(complain, piece, pieces)
  }
  checkLayout(complain, roof, spec, slopes, settings.minCreeperMm)
  checkRounding(complain, pieces, spec)
  checkOverlaps(complain, pieces, plates)
  for (const piece of pieces) piece.solid.delete()
  return complaints
}
