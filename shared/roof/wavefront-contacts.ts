import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { cornerAt, touchMm } from './wavefront-events.ts'
import type { WaveEvent } from './wavefront-events.ts'
import type { Front, WaveLoop } from './wavefront-types.ts'
import { distance2, dot2, sub2 } from './vector.ts'

/** A straight part of a front between two points of contact. */
export type WavePiece = { front: number; from: number; to: number }

/** A loop at the height of an event: its corners gathered into points, its fronts parted where they are touched. */
export type Contacts = {
  points: { place: Point2; corners: number[]; touched: boolean }[]
  /** Point of each corner of the loop. */
  pointOf: number[]
  pieces: WavePiece[]
}

const root = (owner: number[], k: number): number => {
  let found = k
  while (at(owner, found) !== found) found = at(owner, found)
  return found
}

const gather = (places: Point2[], event: WaveEvent): number[] => {
  const owner = places.map((_, k) => k)
  const unite = (a: number, b: number) => {
    const [low, high] = [root(owner, a), root(owner, b)].sort((x, y) => x - y)
    if (low !== undefined && high !== undefined) owner[high] = low
  }
  if ('join' in event) unite(event.join, (event.join + 1) % places.length)
  for (let a = 0; a < places.length; a++) {
    for (let b = a + 1; b < places.length; b++) {
      const [p, q] = [at(places, a), at(places, b)]
      if (Math.abs(p.x - q.x) <= touchMm && distance2(p, q) <= touchMm) unite(a, b)
    }
  }
  return owner.map((_, k) => root(owner, k))
}

const middle = (places: Point2[], corners: number[]): Point2 => {
  const sum = corners.reduce(
    (total, k) => ({ x: total.x + at(places, k).x, y: total.y + at(places, k).y }),
    { x: 0, y: 0 },
  )
  return { x: sum.x / corners.length, y: sum.y / corners.length }
}

/** Corners that lie on front j between its ends, by how far along it. */
const cornersOn = (
  fronts: readonly Front[],
  loop: WaveLoop,
  places: Point2[],
  j: number,
): { corner: number; along: number }[] => {
  const { along, inward } = at(fronts, at(loop.fronts, j))
  const start = at(places, j)
  const lengthMm = dot2(along, sub2(at(places, j + 1), start))
  return places.flatMap((place, corner) => {
    const off = sub2(place, start)
    if (Math.abs(dot2(inward, off)) > touchMm) return []
    const past = dot2(along, off)
    return past > 0 && past < lengthMm ? [{ corner, along: past }] : []
  })
}

/** What touches what in a loop at the height of `event`. */
export const contactsAt = (
  fronts: readonly Front[],
  loop: WaveLoop,
  event: WaveEvent,
): Contacts => {
  const places = loop.corners.map((corner) => cornerAt(corner, event.zMm))
  const roots = gather(places, event)
  const order = [...new Set(roots)]
  const pointOf = roots.map((k) => order.indexOf(k))
  const points = order.map((k) => {
    const corners = roots.flatMap((own, n) => (own === k ? [n] : []))
    return { place: middle(places, corners), corners, touched: corners.length > 1 }
  })
  const pieces = loop.fronts.flatMap((front, j): WavePiece[] => {
    const ends = [at(pointOf, j), at(pointOf, j + 1)]
    const between = cornersOn(fronts, loop, places, j)
    if ('onto' in event && event.onto === j) {
      const off = sub2(at(places, event.corner), at(places, j))
      between.push({ corner: event.corner, along: dot2(at(fronts, front).along, off) })
    }
    const stops = between
      .filter(({ corner }) => !ends.includes(at(pointOf, corner)))
      .sort((a, b) => a.along - b.along)
      .map(({ corner }) => at(pointOf, corner))
    const way = [at(ends, 0), ...new Set(stops), at(ends, 1)]
    stops.forEach((point) => (at(points, point).touched = true))
    return way
      .slice(1)
      .flatMap((to, n) => (to === at(way, n) ? [] : [{ front, from: at(way, n), to }]))
  })
  return { points, pointOf, pieces }
}
