import type { Cut, Member } from '../roof/roof-types.ts'

/** Which way round a piece is made, and which end shows it. */
export type PieceHand = { side: 'left' | 'right'; end: 'head' | 'foot' }

type Handed = Pick<Member, 'hand' | 'cuts'>

const sameMm = 0.05

/**
 * The hand of a piece: the side of its head's long point, looking from foot to head with the top edge
 * up. Where the head is square or its cheeks are equal, as on a valley creeper, the side of its foot's
 * long point; null where neither tells left from right.
 */
export function pieceHand(member: Handed): PieceHand | null {
  if (member.hand) return { side: member.hand, end: 'head' }
  const side = footSide(member)
  return side ? { side, end: 'foot' } : null
}

/** The side on which a foot or tail reaches further, or null where it is alike on both. */
export function footSide({ cuts }: Pick<Member, 'cuts'>): 'left' | 'right' | null {
  const feet = cuts.filter((cut) => cut.end !== 'head')
  const leftMm = footReadingMm(feet, 'left')
  const rightMm = footReadingMm(feet, 'right')
  if (feet.length === 0 || Math.abs(leftMm - rightMm) <= sameMm) return null
  return leftMm < rightMm ? 'left' : 'right'
}

/** What the tape reads on one arris at the foot: the cut that is met first. */
function footReadingMm(cuts: readonly Cut[], side: 'left' | 'right'): number {
  return Math.max(
    ...cuts.map((cut) =>
      cut.longSide === 'none' || cut.longSide === side
        ? cut.longPointFromHeelMm
        : cut.shortPointFromHeelMm,
    ),
  )
}
