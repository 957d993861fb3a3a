import type { Roof } from '../../../shared/roof/roof-types.ts'
import type { Piece } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { SolidKit } from './solid-kit.ts'
import { tanDeg } from './vec.ts'

/** A seat lies flat when timber is within this over the plate along the whole bearing. */
const FLAT_MM = 0.2
const STRIP_MM = 0.2

/** Length of timber on plate along the member's centre line, FLAT_MM over the plate top. */
function bearingMm(kit: SolidKit, piece: Piece, roof: Roof): number {
  const outer = new kit.CrossSection([roof.outline.map((p) => [p.x, p.y] as [number, number])])
  const plate = outer.subtract(outer.offset(-roof.plateWidthMm, 'Miter', 20))
  const { from, to } = piece.member.axis
  const turn = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI
  const strip = kit.CrossSection.square([piece.member.runMm, STRIP_MM])
    .translate([0, -STRIP_MM / 2])
    .rotate(turn)
    .translate([from.x, from.y])
  return piece.solid.slice(FLAT_MM).intersect(plate).intersect(strip).area() / STRIP_MM
}

/** The published bearing is there, flat on the plate, along the centre line of the member. */
export function checkSeat(complain: Complain, kit: SolidKit, piece: Piece, roof: Roof): void {
  const { member } = piece
  const mouth = member.birdsmouth
  if (mouth === null || mouth.bearingMm <= 0) return
  const found = bearingMm(kit, piece, roof)
  const runOut = FLAT_MM / tanDeg(member.pitchDeg)
  const out = found - mouth.bearingMm
  if (out > runOut + 0.3 || out < -0.3) {
    const text = `${mouth.bearingMm.toFixed(2)} of bearing published, ${found.toFixed(2)} lies flat on the plate, mm`
    complain({ check: 'seat', marks: [member.mark], out, text })
  }
}
