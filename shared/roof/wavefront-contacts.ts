import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { cornerAt, nearMm, touchMm } from './wavefront-events.ts'
import type { WaveEvent } from './wavefront-events.ts'
import type { Front, WaveLoop } from './wavefront-types.ts'
import { cross2, distance2, dot2, sub2 } from './vector.ts'

/** A straight part of a front between two points of contact. */
export type WavePiece = { front: number; from: number; to: number }

/** A loop at the height of an event: its corners gathered into points, its fronts parted where they are touched. */
export type Contacts = {
  points: { place: Point2; corners: number[]; touched: boolean }[]
  pieces: WavePiece[]
}

/** The corners of a loop at one height, with what has been found to touch. */
type Ring = {
  fronts: readonly Front[]
  loop: WaveLoop
  places: Point2[]
  /** Corner that stands for the point of each corner. */
  owner: number[]
  /** Points where something happens. */
  live: Set<number>
  /** Corners that lie on each front between its ends. */
  onFront: Set<number>[]
}

const root = (ring: Ring, k: number): number => {
  let found = k
  while (at(ring.owner, found) !== found) found = at(ring.owner, found)
  return found
}

const isLive = (ring: Ring, k: number): boolean => ring.live.has(root(ring, k))

const unite = (ring: Ring, a: number, b: number) => {
  const [p, q] = [root(ring, a), root(ring, b)]
  const [low, high] = p < q ? [p, q] : [q, p]
  ring.owner[high] = low
  ring.live.add(low)
}

/** Joins corners that stand in one point; true when it found some. */
const joinCorners = (ring: Ring): boolean => {
  const { places } = ring
  let found = false
  for (let a = 0; a < places.length; a++) {
    for (let b = a + 1; b < places.length; b++) {
      const [p, q] = [at(places, a), at(places, b)]
      if (Math.abs(p.x - q.x) > nearMm || root(ring, a) === root(ring, b)) continue
      const limitMm = isLive(ring, a) || isLive(ring, b) ? nearMm : touchMm
      if (distance2(p, q) > limitMm) continue
      unite(ring, a, b)
      found = true
    }
  }
  return found
}

/** Fronts this near to antiparallel (cosine) close along their length. */
const closingCosine = -0.9999
/** A wedge that widens by less than this for each mm of its length does not widen. */
const leastOpening = 1e-6

/**
 * Whether `corner` and front j lie either side of a wedge that runs from a point where something happens
 * and gets no wider: what is left of it closes along its whole length.
 */
const isAcrossWedge = (ring: Ring, j: number, corner: number): boolean => {
  const frontAt = (k: number) => at(ring.fronts, at(ring.loop.fronts, k)).along
  const isEnd = (far: number, end: number) =>
    isLive(ring, far) && root(ring, far) === root(ring, end)
  const count = ring.places.length
  const closes = (leaving: Point2, arriving: Point2) =>
    dot2(leaving, arriving) < closingCosine && cross2(leaving, arriving) > -leastOpening
  const [next, before] = [(corner + 1) % count, (corner + count - 1) % count]
  if (isEnd(next, j) && closes(frontAt(j), frontAt(corner))) return true
  return isEnd(before, (j + 1) % count) && closes(frontAt(before), frontAt(j))
}

/** Notes the corners that lie on front j between its ends; true when it found one. */
const partFront = (ring: Ring, j: number): boolean => {
  const { along, inward } = at(ring.fronts, at(ring.loop.fronts, j))
  const start = at(ring.places, j)
  const lengthMm = dot2(along, sub2(at(ring.places, j + 1), start))
  const ends = [root(ring, j), root(ring, (j + 1) % ring.places.length)]
  const on = at(ring.onFront, j)
  let found = false
  ring.places.forEach((place, corner) => {
    if (on.has(corner) || ends.includes(root(ring, corner))) return
    const off = sub2(place, start)
    const gapMm = Math.abs(dot2(inward, off))
    if (gapMm > nearMm) return
    if (gapMm > touchMm && !isLive(ring, corner) && !isAcrossWedge(ring, j, corner)) return
    const past = dot2(along, off)
    if (past <= 0 || past >= lengthMm) return
    on.add(corner)
    ring.live.add(root(ring, corner))
    found = true
  })
  return found
}

/** The pieces of front j between the points on it. */
const piecesOf = (ring: Ring, pointOf: number[], j: number): WavePiece[] => {
  const front = at(ring.loop.fronts, j)
  const { along } = at(ring.fronts, front)
  const ends = [at(pointOf, j), at(pointOf, j + 1)]
  const stops = [...at(ring.onFront, j)]
    .filter((corner) => !ends.includes(at(pointOf, corner)))
    .map((corner) => ({ point: at(pointOf, corner), past: dot2(along, at(ring.places, corner)) }))
    .sort((a, b) => a.past - b.past)
    .map(({ point }) => point)
  const way = [...new Set([at(ends, 0), ...stops]), at(ends, 1)]
  return way.slice(1).flatMap((to, n): WavePiece[] => {
    const from = at(way, n)
    return from === to ? [] : [{ front, from, to }]
  })
}

const middle = (places: Point2[], corners: number[]): Point2 => {
  const sum = { x: 0, y: 0 }
  for (const k of corners) {
    sum.x += at(places, k).x / corners.length
    sum.y += at(places, k).y / corners.length
  }
  return sum
}

/**
 * What touches what in a loop at the height of `event`. What lies within half a millimetre of a point
 * where something happens takes part in it: such events are one, and no sliver is left between them.
 */
export const contactsAt = (
  fronts: readonly Front[],
  loop: WaveLoop,
  event: WaveEvent,
): Contacts => {
  const ring: Ring = {
    fronts,
    loop,
    places: loop.corners.map((corner) => cornerAt(corner, event.zMm)),
    owner: loop.corners.map((_, k) => k),
    live: new Set(),
    onFront: loop.fronts.map(() => new Set<number>()),
  }
  if ('join' in event) unite(ring, event.join, (event.join + 1) % loop.corners.length)
  else {
    at(ring.onFront, event.onto).add(event.corner)
    ring.live.add(event.corner)
  }
  for (let found = true; found;) {
    found = joinCorners(ring)
    for (let j = 0; j < loop.fronts.length; j++) found = partFront(ring, j) || found
  }
  const roots = loop.corners.map((_, k) => root(ring, k))
  const order = [...new Set(roots)]
  const pointOf = roots.map((k) => order.indexOf(k))
  const points = order.map((k) => {
    const corners = roots.flatMap((own, n) => (own === k ? [n] : []))
    const touched = corners.some((n) => ring.live.has(n))
    return { place: middle(ring.places, corners), corners, touched }
  })
  return { points, pieces: loop.fronts.flatMap((_, j) => piecesOf(ring, pointOf, j)) }
}
