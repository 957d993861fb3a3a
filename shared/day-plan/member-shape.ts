import type { Member } from '../roof/roof-types.ts'

/** Alike as a cut line has it: within 0.1 mm and 0.01°. */
const lengthKey = (lengthMm: number): string => lengthMm.toFixed(1)
const angleKey = (angleDeg: number): string => angleDeg.toFixed(2)

/** The same for two pieces that can take each other's place: role, section, lengths, bevels, birdsmouth. */
export function memberShapeKey(member: Member): string {
  const cuts = member.cuts.map((cut) =>
    [cut.end, cut.longSide, angleKey(cut.face.fromEdgeDeg), angleKey(cut.edge.fromEdgeDeg)].join(),
  )
  const { birdsmouth: mouth } = member
  return [
    member.role,
    member.section.thicknessMm,
    member.section.depthMm,
    lengthKey(member.cutLengthMm),
    lengthKey(member.tailLengthMm),
    mouth ? `${lengthKey(mouth.seatMm)},${lengthKey(mouth.heelMm)}` : '',
    member.backing
      ? `${angleKey(member.backing.leftDeg)},${angleKey(member.backing.rightDeg)}`
      : '',
    ...cuts,
  ].join(' ')
}
