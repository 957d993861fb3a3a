import type { Point2 } from './roof-types.ts'
import { at } from './slopes.ts'
import { contactsAt, pointOf } from './wavefront-contacts.ts'
import type { Ring } from './wavefront-contacts.ts'
import { cornerVelocity, nearMm } from './wavefront-events.ts'
import type { WaveEvent } from './wavefront-events.ts'
import { linkPieces, openPieces } from './wavefront-links.ts'
import type { WavePiece } from './wavefront-links.ts'
import { meet, noteGableClosed, noteJogs } from './wavefront-meet.ts'
import type { Run } from './wavefront-meet.ts'
import type { Front, WaveCorner, WaveLoop } from './wavefront-types.ts'
import { add2, cross2, distance2, point3, scale2, sub2 } from './vector.ts'

/** Fronts this near to parallel (sine) cross too far off to say where. */
const leastCrossing = 1e-4

/** Where two fronts cross at a height, when that is near to `place`; otherwise `place` itself. */
export const crossingAt = (a: Front, b: Front, zMm: number, place: Point2): Point2 => {
  const sine = cross2(a.along, b.along)
  if (Math.abs(sine) < leastCrossing) return place
  const [p, q] = [a, b].map((front) => add2(front.from, scale2(front.inward, front.speed * zMm)))
  if (p === undefined || q === undefined) return place
  const found = add2(p, scale2(a.along, cross2(sub2(q, p), b.along) / sine))
  return distance2(found, place) <= 4 * nearMm ? found : place
}

/** The loops that go on from an event: follows the linked pieces round. */
const followLoops = (
  pieces: WavePiece[],
  next: number[],
  cornerOf: (before: WavePiece, after: WavePiece) => WaveCorner | null,
  zMm: number,
): WaveLoop[] => {
  const done = pieces.map(() => false)
  const loops: WaveLoop[] = []
  pieces.forEach((_, start) => {
    const fronts: number[] = []
    const corners: WaveCorner[] = []
    for (let k = start; k >= 0 && !at(done, k); k = at(next, k)) {
      done[k] = true
      const following = at(next, k)
      if (following < 0) return
      const corner = cornerOf(at(pieces, k), at(pieces, following))
      if (corner === null) continue
      corners.push(corner)
      fronts.push(at(pieces, following).front)
    }
    if (fronts.length > 2) loops.push({ fronts, corners, zMm })
  })
  return loops
}

const middle = (places: Point2[]): Point2 => {
  const sum = places.reduce(add2, { x: 0, y: 0 })
  return scale2(sum, 1 / places.length)
}

/** Makes a node of every point where something happens, and ends the creases that arrive there. */
const nodesAt = (run: Run, ring: Ring, zMm: number): Map<number, number> => {
  const members = new Map<number, number[]>([...ring.live].map((point) => [point, []]))
  ring.owner.forEach((_, k) => members.get(pointOf(ring, k))?.push(k))
  const nodes = new Map<number, number>()
  for (const [point, corners] of members) {
    const place = middle(corners.map((k) => at(ring.places, k)))
    const node = run.nodes.push(point3(place, zMm)) - 1
    nodes.set(point, node)
    for (const k of corners) {
      const [left, right] = [at(ring.loop.fronts, k - 1), at(ring.loop.fronts, k)]
      run.arcs.push({ from: at(ring.loop.corners, k).node, to: node, left, right })
    }
  }
  return nodes
}

/** Carries a loop over its next event; gives the loops that are left of it. */
export const overEvent = (run: Run, loop: WaveLoop, event: WaveEvent): WaveLoop[] => {
  const ring = contactsAt(run.fronts, loop, event)
  const { open, closed } = openPieces(ring)
  const nodes = nodesAt(run, ring, event.zMm)
  for (const { one, other } of closed) {
    const [from, to] = [nodes.get(one.from), nodes.get(one.to)]
    if (from === undefined || to === undefined) continue
    run.arcs.push({ from, to, left: other.front, right: one.front })
    noteGableClosed(run, at(run.fronts, one.front), at(run.fronts, other.front))
  }
  const cornerOf = (before: WavePiece, after: WavePiece): WaveCorner | null => {
    const node = nodes.get(after.from)
    if (node === undefined) return at(loop.corners, after.from)
    if (meet(run, before.front, after.front)) return null
    const [a, b] = [at(run.fronts, before.front), at(run.fronts, after.front)]
    const point = crossingAt(a, b, event.zMm, at(run.nodes, node))
    return { point, fromMm: event.zMm, velocity: cornerVelocity(a, b), node, next: null }
  }
  const loops = followLoops(open, linkPieces(ring, open), cornerOf, event.zMm)
  for (const left of loops) noteJogs(run, left)
  return loops
}
