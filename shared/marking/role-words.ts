import { pieceHand } from '../drawing/timber-hand.ts'
import type { Member, MemberRole, Section } from '../roof/roof-types.ts'

/** What a carpenter calls each piece. */
export const roleWords: Record<MemberRole, string> = {
  ridge: 'Ridge',
  common: 'Common rafter',
  'crown-end': 'Crown end rafter',
  hip: 'Hip',
  'broken-hip': 'Broken hip',
  valley: 'Valley',
  creeper: 'Creeper',
  'valley-creeper': 'Valley creeper',
  'cripple-creeper': 'Cripple creeper',
  underpurlin: 'Underpurlin',
  'collar-tie': 'Collar tie',
  fascia: 'Fascia',
  barge: 'Barge',
}

/** Timbers that trim or stiffen the frame: they run between points of their own and carry no head. */
export function isBesideFrame({ role }: Pick<Member, 'role'>): boolean {
  return role === 'underpurlin' || role === 'collar-tie' || role === 'fascia' || role === 'barge'
}

/** `140 × 45`: depth by thickness, as merchants say it. */
export function sectionWords(section: Section): string {
  return `${section.depthMm} × ${section.thicknessMm}`
}

/** 'the ridge R1', 'the hips H1 and H2': pieces named by what they are and their marks. */
export function piecesWords(pieces: readonly { mark: string; role: MemberRole }[]): string {
  const byRole = new Map<MemberRole, string[]>()
  for (const { mark, role } of pieces) byRole.set(role, [...(byRole.get(role) ?? []), mark])
  const groups = [...byRole].map(([role, marks]) => {
    const name = roleWords[role].toLowerCase()
    return `the ${marks.length > 1 ? `${name}s` : name} ${listWords(marks)}`
  })
  return listWords(groups)
}

/** 'a', 'a and b', 'a, b and c'. */
export function listWords(parts: readonly string[]): string {
  if (parts.length < 2) return parts[0] ?? ''
  return `${parts.slice(0, -1).join(', ')} and ${parts[parts.length - 1]}`
}

/** How many pieces, and which hands they are: 'x3: 2 left, 1 right'. */
export function shareWords(
  members: readonly Pick<Member, 'mark' | 'hand' | 'cuts'>[],
  marks: readonly string[],
): string {
  const { left, right } = handCounts(members.filter((member) => marks.includes(member.mark)))
  return quantityWords(marks.length, left, right)
}

/** How many pieces are of each hand, those told apart by their foot too. */
export function handCounts(pieces: readonly Pick<Member, 'hand' | 'cuts'>[]): {
  left: number
  right: number
} {
  const sides = pieces.map((piece) => pieceHand(piece)?.side)
  const count = (side: 'left' | 'right') => sides.filter((one) => one === side).length
  return { left: count('left'), right: count('right') }
}

/** 'x4: 2 left, 2 right', 'x6'. */
export function quantityWords(quantity: number, left: number, right: number): string {
  const hands = [left > 0 ? `${left} left` : '', right > 0 ? `${right} right` : ''].filter(Boolean)
  return hands.length > 0 ? `x${quantity}: ${hands.join(', ')}` : `x${quantity}`
}
