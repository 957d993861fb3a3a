import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { cornerAt, nearMm } from './wavefront-events.ts'
import type { WaveEvent } from './wavefront-events.ts'
import type { Front, WaveLoop } from './wavefront-types.ts'
import { cross2, distance2, dot2, sub2 } from './vector.ts'

/** Fronts this near to antiparallel (cosine) close along their length. */
const closingCosine = -0.9999
/** A wedge that widens by less than this for each mm of its length does not widen. */
const leastOpening = 1e-6

/** A loop at the height of an event, with what has been found to touch; everything by corner of the loop. */
export type Ring = {
  count: number
  fronts: readonly Front[]
  loop: WaveLoop
  places: Point2[]
  /** Corner that stands for the point of each corner: the first of those drawn together. */
  owner: number[]
  /** Corners that stand for points where something happens. */
  live: Set<number>
  /** Corners that lie on front j between its ends. */
  onFront: Map<number, Set<number>>
}

/** The corner that stands for the point of corner `k`. */
export const pointOf = (ring: Ring, k: number): number => {
  let found = k % ring.count
  while (at(ring.owner, found) !== found) found = at(ring.owner, found)
  return found
}

const frontAt = (ring: Ring, j: number): Front => at(ring.fronts, at(ring.loop.fronts, j))

const unite = (ring: Ring, a: number, b: number) => {
  const [p, q] = [pointOf(ring, a), pointOf(ring, b)]
  const [low, high] = p < q ? [p, q] : [q, p]
  ring.owner[high] = low
  ring.live.delete(high)
  ring.live.add(low)
}

const putOn = (ring: Ring, j: number, corner: number) => {
  const known = ring.onFront.get(j)
  if (known === undefined) ring.onFront.set(j, new Set([corner]))
  else known.add(corner)
  ring.live.add(pointOf(ring, corner))
}

/** Whether the point of a corner is an end of front j, or already known to lie on it. */
const isKnownOn = (ring: Ring, j: number, corner: number): boolean => {
  const point = pointOf(ring, corner)
  if (point === pointOf(ring, j) || point === pointOf(ring, j + 1)) return true
  for (const other of ring.onFront.get(j) ?? []) if (pointOf(ring, other) === point) return true
  return false
}

/** Whether a corner lies within `nearMm` of front j and between its ends. */
const liesOn = (ring: Ring, j: number, corner: number): boolean => {
  const { along, inward } = frontAt(ring, j)
  const off = sub2(at(ring.places, corner), at(ring.places, j))
  if (Math.abs(dot2(inward, off)) > nearMm) return false
  const past = dot2(along, off)
  return past > 0 && past < dot2(along, sub2(at(ring.places, j + 1), at(ring.places, j)))
}

/** Draws into a live corner's point the corners and fronts near it; true when it found any. */
const drawNear = (ring: Ring, corner: number): boolean => {
  const place = at(ring.places, corner)
  let found = false
  for (let k = 0; k < ring.count; k++) {
    if (distance2(place, at(ring.places, k)) > nearMm) continue
    if (pointOf(ring, corner) === pointOf(ring, k)) continue
    unite(ring, corner, k)
    found = true
  }
  for (let j = 0; j < ring.count; j++) {
    if (!liesOn(ring, j, corner) || isKnownOn(ring, j, corner)) continue
    // on the last millimetre of a front: at its end, or a small triangle could close in two ways
    const end = [j, j + 1].find((k) => distance2(place, at(ring.places, k)) <= 2 * nearMm)
    if (end === undefined) putOn(ring, j, corner)
    else unite(ring, corner, end)
    found = true
  }
  return found
}

/**
 * Front `leaving` leaves a live point and front `arriving` comes to it along the same line: when the
 * wedge between them gets no wider it closes along its whole length, up to the nearer far end.
 */
const closeWedge = (ring: Ring, leaving: number, arriving: number): boolean => {
  const [far, start] = [(leaving + 1) % ring.count, arriving]
  if (pointOf(ring, far) === pointOf(ring, start)) {
    const isKnown = ring.live.has(pointOf(ring, far))
    ring.live.add(pointOf(ring, far))
    return !isKnown
  }
  const [out, back] = [frontAt(ring, leaving).along, frontAt(ring, arriving).along]
  if (dot2(out, back) > closingCosine || cross2(out, back) <= -leastOpening) return false
  if (distance2(at(ring.places, far), at(ring.places, start)) <= nearMm) {
    unite(ring, far, start)
    return true
  }
  for (const [j, corner] of [
    [arriving, far],
    [leaving, start],
  ] as const) {
    if (!liesOn(ring, j, corner)) continue
    if (isKnownOn(ring, j, corner)) return false
    putOn(ring, j, corner)
    return true
  }
  return false
}

const closeWedges = (ring: Ring, corners: readonly number[]): boolean => {
  const point = pointOf(ring, at(corners, 0))
  const through = [...ring.onFront].flatMap(([j, on]) =>
    [...on].some((corner) => pointOf(ring, corner) === point) ? [j] : [],
  )
  const leaving = [...corners, ...through]
  const arriving = [...corners.map((k) => (k + ring.count - 1) % ring.count), ...through]
  let found = false
  for (const j of leaving) {
    for (const k of arriving) if (j !== k) found = closeWedge(ring, j, k) || found
  }
  return found
}

/** A front whose ends have come together takes what lies on it into their point. */
const drawIn = (ring: Ring): boolean => {
  let found = false
  for (const [j, on] of ring.onFront) {
    if (pointOf(ring, j) !== pointOf(ring, j + 1)) continue
    for (const corner of on) {
      if (pointOf(ring, corner) === pointOf(ring, j)) continue
      unite(ring, j, corner)
      found = true
    }
  }
  return found
}

/**
 * What touches what in a loop where `event` happens, and all that hangs together with it. What lies within
 * half a millimetre of a point where something happens takes part in it: such events are one, and no
 * sliver is left between them.
 */
export const contactsAt = (fronts: readonly Front[], loop: WaveLoop, event: WaveEvent): Ring => {
  const count = loop.corners.length
  const ring: Ring = {
    count,
    fronts,
    loop,
    places: loop.corners.map((corner) => cornerAt(corner, event.zMm)),
    owner: loop.corners.map((_, k) => k),
    live: new Set(),
    onFront: new Map(),
  }
  if ('join' in event) unite(ring, event.join, event.join + 1)
  else putOn(ring, event.onto, event.corner)
  const [first] = ring.places
  if (first !== undefined && ring.places.every((place) => distance2(place, first) <= 2 * nearMm)) {
    // what is left is smaller than anything a saw can cut
    for (let k = 1; k < count; k++) unite(ring, 0, k)
  }
  for (let found = true; found;) {
    found = drawIn(ring)
    for (const point of [...ring.live]) {
      const corners = ring.owner.flatMap((_, k) => (pointOf(ring, k) === point ? [k] : []))
      for (const corner of corners) found = drawNear(ring, corner) || found
      if (!found && corners.length > 0) found = closeWedges(ring, corners)
    }
  }
  return ring
}
