import { hangsByCorner, tailTouches } from './contacts.ts'
import type { SegmentIndex } from './contacts.ts'
import { gather } from './lists.ts'
import type { Piece } from './piece.ts'
import type { Roof } from './roof-types.ts'

/** Ends that do not go together as cut; `End` is a piece's number, or its mark. */
export type OpenEnds<End> = {
  /** Heads that do not close on what they meet. */
  heads: readonly End[]
  /** Feet cut against timber that is not there. */
  feet: readonly End[]
  /** Tails that end hard against the side of another piece, and that piece. */
  touches: readonly (readonly [tail: End, other: End])[]
}

const hasTail = ({ edge, corner }: Piece): boolean => edge !== null || corner !== null

/** All open ends of a frame, once every joint is cut; `openPieces` those that no way of a joint closed. */
export const openEnds = (
  roof: Roof,
  pieces: readonly Piece[],
  segments: SegmentIndex,
  openPieces: ReadonlySet<number>,
): OpenEnds<number> => {
  const heads: number[] = []
  const feet: number[] = []
  for (const piece of pieces) {
    if (piece.role === 'ridge') continue
    if (openPieces.has(piece.id) || hangsByCorner(pieces, segments, piece, 'head')) {
      heads.push(piece.id)
    }
    if (piece.footLine !== null && hangsByCorner(pieces, segments, piece, 'foot')) {
      feet.push(piece.id)
    }
  }
  // a tail cut square is not plumb, and no side of a timber lies against it
  const tails = roof.tail === 'plumb' ? pieces.filter(hasTail) : []
  const touches = gather(tails, (piece) =>
    tailTouches(pieces, segments, piece).map((other) => [piece.id, other] as const),
  )
  return { heads, feet, touches }
}

/** The same ends by their marks. */
export const markedEnds = (
  { heads, feet, touches }: OpenEnds<number>,
  markOf: ReadonlyMap<number, string>,
): OpenEnds<string> => {
  const mark = (piece: number): string => markOf.get(piece) ?? ''
  return {
    heads: heads.map(mark),
    feet: feet.map(mark),
    touches: touches.map(([tail, other]) => [mark(tail), mark(other)] as const),
  }
}
