import { toBuilding, type Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { isHipLike } from './slopes.ts'
import { distanceInside } from './surface.ts'
import { cosDeg, tanDeg } from './vec.ts'

/** A seat lies flat when timber is within this over the plate along the whole bearing. */
const FLAT_MM = 0.2
const STRIP_MM = 0.2
const HEEL_TOL_MM = 0.01

/** Length of timber on plate along the member's centre line, FLAT_MM over the plate top. */
function bearingMm(site: Site, piece: Piece): number {
  const { from, to } = piece.member.axis
  const turn = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI
  const strip = site.kit.CrossSection.square([piece.member.runMm, STRIP_MM])
    .translate([0, -STRIP_MM / 2])
    .rotate(turn)
    .translate([from.x, from.y])
  const level = piece.solid.slice(FLAT_MM)
  const onPlate = level.intersect(site.ring)
  const onLine = onPlate.intersect(strip)
  const found = onLine.area() / STRIP_MM
  for (const flat of [strip, level, onPlate, onLine]) flat.delete()
  return found
}

/** The published bearing is there, flat on the plate, along the centre line of the member. */
function checkBearing(complain: Complain, site: Site, piece: Piece): void {
  const { member } = piece
  const published = Math.max(0, member.birdsmouth?.bearingMm ?? 0)
  const found = bearingMm(site, piece)
  const runOut = FLAT_MM / tanDeg(member.pitchDeg)
  const out = found - published
  if (out > runOut + 0.3 || out < -0.3) {
    const text = `${published.toFixed(2)} of bearing published, ${found.toFixed(2)} lies flat on the plate, mm`
    complain({ check: 'seat', marks: [member.mark], out, text })
  }
}

/**
 * The heel of a hip or valley is cut square across: through the plate corner, or moved out along the
 * member until it clears both plate faces, and no further.
 */
function checkHeel(complain: Complain, site: Site, piece: Piece): void {
  const { member } = piece
  const mouth = member.birdsmouth
  if (mouth === null || !isHipLike(member)) return
  const half = member.section.thicknessMm / 2
  const along = -mouth.heelOffsetMm / cosDeg(member.pitchDeg)
  const inside = [-half, half].map((left) => {
    const [x, y] = toBuilding(piece.pose, [along, left, 0])
    return distanceInside(site.roof, x, y)
  })
  const out = Math.max(...inside)
  const marks = [member.mark]
  if (out > HEEL_TOL_MM) {
    complain({ check: 'seat', marks, out, text: 'its heel cut does not clear the plate, mm' })
  }
  if (mouth.heelOffsetMm > HEEL_TOL_MM && out < -HEEL_TOL_MM) {
    complain({ check: 'seat', marks, out, text: 'its heel stands further out than it must, mm' })
  }
}

export function checkSeat(complain: Complain, site: Site, piece: Piece): void {
  if (piece.member.birdsmouth === null) return
  checkBearing(complain, site, piece)
  checkHeel(complain, site, piece)
}
