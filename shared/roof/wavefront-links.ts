import { at } from './slopes.ts'
import type { Contacts, WavePiece } from './wavefront-contacts.ts'
import type { Front } from './wavefront-types.ts'

/** Two pieces that have come to lie on each other: a ridge between their slopes. */
export type ClosedPair = { one: WavePiece; other: WavePiece }

/** Takes out all pieces that lie on each other. */
export const closePairs = (pieces: WavePiece[]): { open: WavePiece[]; closed: ClosedPair[] } => {
  const left = new Set(pieces)
  const closed: ClosedPair[] = []
  for (const one of pieces) {
    if (!left.has(one)) continue
    const other = pieces.find((p) => left.has(p) && p.from === one.to && p.to === one.from)
    if (other === undefined) continue
    left.delete(one)
    left.delete(other)
    closed.push({ one, other })
  }
  return { open: pieces.filter((piece) => left.has(piece)), closed }
}

type Ray = { angle: number; piece: number; leaves: boolean }

const raysAt = (fronts: readonly Front[], pieces: WavePiece[], point: number): Ray[] =>
  pieces
    .flatMap((piece, index): Ray[] => {
      const { along } = at(fronts, piece.front)
      const leaves = piece.from === point
      if (!leaves && piece.to !== point) return []
      const angle = leaves ? Math.atan2(along.y, along.x) : Math.atan2(-along.y, -along.x)
      return [{ angle, piece: index, leaves }]
    })
    .sort((a, b) => a.angle - b.angle || Number(b.leaves) - Number(a.leaves))

/**
 * The piece that follows each piece, going round what is left of the inside: at every point each sector
 * of inside, counter-clockwise from a piece that leaves to the next one, which arrives, is one corner.
 */
export const linkPieces = (
  fronts: readonly Front[],
  contacts: Contacts,
  pieces: WavePiece[],
): number[] => {
  const next = pieces.map(() => -1)
  contacts.points.forEach((_, point) => {
    const rays = raysAt(fronts, pieces, point)
    const open: number[] = []
    // twice round, so that a sector may start before the first ray
    for (const ray of [...rays, ...rays]) {
      if (ray.leaves) {
        if (!open.includes(ray.piece) && !next.includes(ray.piece)) open.push(ray.piece)
      } else if (at(next, ray.piece) < 0) {
        const leaving = open.pop()
        if (leaving !== undefined) next[ray.piece] = leaving
      }
    }
  })
  return next
}
