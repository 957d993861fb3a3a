import { at } from './slopes.ts'
import { pointOf } from './wavefront-contacts.ts'
import type { Ring } from './wavefront-contacts.ts'
import type { Front } from './wavefront-types.ts'
import { dot2 } from './vector.ts'

/** A straight part of a front between two points of a ring (by the corners that stand for them). */
export type WavePiece = { front: number; from: number; to: number }

/** The pieces of front j between the points on it; none when it has shrunk to nothing. */
const piecesOf = (ring: Ring, j: number): WavePiece[] => {
  const front = at(ring.loop.fronts, j)
  const [start, end] = [pointOf(ring, j), pointOf(ring, j + 1)]
  const on = ring.onFront.get(j)
  if (start === end) return []
  if (on === undefined) return [{ front, from: start, to: end }]
  const { along } = at(ring.fronts, front)
  const stops = [...on]
    .map((corner) => ({ point: pointOf(ring, corner), past: dot2(along, at(ring.places, corner)) }))
    .filter(({ point }) => point !== start && point !== end)
    .sort((a, b) => a.past - b.past)
    .map(({ point }) => point)
  const way = [...new Set([start, ...stops]), end]
  return way.slice(1).flatMap((to, n): WavePiece[] => {
    const from = at(way, n)
    return from === to ? [] : [{ front, from, to }]
  })
}

/** Two pieces that have come to lie on each other: a ridge between their slopes. */
type ClosedPair = { one: WavePiece; other: WavePiece }

/** The fronts of a ring in pieces, without those that lie on each other. */
export const openPieces = (ring: Ring): { open: WavePiece[]; closed: ClosedPair[] } => {
  const waiting = new Map<number, WavePiece[]>()
  const closed: ClosedPair[] = []
  const open: WavePiece[] = []
  const gone = new Set<WavePiece>()
  const key = (from: number, to: number) => from * ring.count + to
  for (let j = 0; j < ring.count; j++) {
    for (const one of piecesOf(ring, j)) {
      open.push(one)
      if (!ring.live.has(one.from) || !ring.live.has(one.to)) continue
      const other = waiting.get(key(one.to, one.from))?.pop()
      if (other !== undefined) {
        closed.push({ one: other, other: one })
        gone.add(one).add(other)
        continue
      }
      const list = waiting.get(key(one.from, one.to))
      if (list === undefined) waiting.set(key(one.from, one.to), [one])
      else list.push(one)
    }
  }
  return { open: gone.size === 0 ? open : open.filter((piece) => !gone.has(piece)), closed }
}

type Ray = { angle: number; piece: number; leaves: boolean }

const raysByPoint = (fronts: readonly Front[], pieces: WavePiece[], live: ReadonlySet<number>) => {
  const rays = new Map<number, Ray[]>([...live].map((point) => [point, []]))
  pieces.forEach(({ front, from, to }, piece) => {
    const { along } = at(fronts, front)
    rays.get(from)?.push({ angle: Math.atan2(along.y, along.x), piece, leaves: true })
    rays.get(to)?.push({ angle: Math.atan2(-along.y, -along.x), piece, leaves: false })
  })
  return rays
}

/** Matches each arriving piece with the leaving one that the inside between them runs from. */
const matchRays = (rays: Ray[], next: number[]) => {
  rays.sort((a, b) => a.angle - b.angle || Number(b.leaves) - Number(a.leaves))
  const open: number[] = []
  const taken = new Set<number>()
  // twice round, so that a sector may start before the first ray
  for (const ray of [...rays, ...rays]) {
    if (ray.leaves) {
      if (!taken.has(ray.piece)) open.push(ray.piece)
      taken.add(ray.piece)
    } else if (at(next, ray.piece) < 0) {
      next[ray.piece] = open.pop() ?? -1
    }
  }
}

/**
 * The piece that follows each piece, going round what is left of the inside: at every point each sector
 * of inside, counter-clockwise from a piece that leaves to the next one, which arrives, is one corner.
 */
export const linkPieces = (ring: Ring, pieces: WavePiece[]): number[] => {
  const next = pieces.map(() => -1)
  const leaving = new Map<number, number>()
  pieces.forEach(({ from }, piece) => {
    if (!ring.live.has(from)) leaving.set(from, piece)
  })
  pieces.forEach(({ to }, piece) => {
    if (!ring.live.has(to)) next[piece] = leaving.get(to) ?? -1
  })
  for (const rays of raysByPoint(ring.fronts, pieces, ring.live).values()) matchRays(rays, next)
  return next
}
