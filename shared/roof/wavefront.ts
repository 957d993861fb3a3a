import type { Point2, Point3 } from './roof-types.ts'
import { at } from './slopes.ts'
import { contactsAt } from './wavefront-contacts.ts'
import type { Contacts, WavePiece } from './wavefront-contacts.ts'
import { cornerAt, cornerVelocity, nearMm, nextEvent } from './wavefront-events.ts'
import type { WaveEvent } from './wavefront-events.ts'
import { alignFronts, fitOf, runOneWay } from './wavefront-lines.ts'
import { closePairs, linkPieces } from './wavefront-links.ts'
import type { Front, Wave, WaveArc, WaveCorner, WaveLoop, WaveRefusal } from './wavefront-types.ts'
import { add2, cross2, distance2, scale2, sub2 } from './vector.ts'

/** A front this short between two plates in one line is there because the plates are a little off it. */
const jogMm = 2.5

/** Fronts this near to parallel (sine) cross too far off to say where. */
const leastCrossing = 1e-4

/** The wave while it runs. */
type Run = {
  fronts: readonly Front[]
  nodes: Point3[]
  arcs: WaveArc[]
  owner: number[]
  /** Two fronts found to be nearly in one line where they grow together. */
  align: [number, number] | null
  refusal: WaveRefusal | null
}

const ownerOf = (owner: readonly number[], front: number): number => {
  let found = front
  while (at(owner, found) !== found) found = at(owner, found)
  return found
}

const unite = (run: Run, a: number, b: number) => {
  const [p, q] = [ownerOf(run.owner, a), ownerOf(run.owner, b)]
  run.owner[Math.max(p, q)] = Math.min(p, q)
}

/** Whether gable `k` and the front beside it have been neighbours from the plate up. */
const fromThePlate = (run: Run, before: number, after: number): boolean =>
  (before + 1) % run.fronts.length === after

/** What the meeting of two fronts asks for; notes refusals. True when the two are one slope. */
const meet = (run: Run, before: number, after: number): boolean => {
  if (ownerOf(run.owner, before) === ownerOf(run.owner, after)) return true
  const [a, b] = [at(run.fronts, before), at(run.fronts, after)]
  if (a.gable || b.gable) {
    if (fromThePlate(run, before, after)) return false
    const [gable, other] = a.gable ? [a, b] : [b, a]
    run.refusal ??= { reason: 'gable-reached', gable: at(gable.edges, 0), edges: other.edges }
    return false
  }
  if (!runOneWay(a, b)) return false
  if (a.speed !== b.speed) {
    run.refusal ??= { reason: 'level-break', edges: [at(a.edges, 0), at(b.edges, 0)] }
    return false
  }
  const fit = fitOf(a, b)
  if (fit === 'near') run.align ??= [before, after]
  if (fit !== 'exact') return false
  unite(run, before, after)
  return true
}

/** Plates a little off one line, with a short piece of another front left between them. */
const noteJogs = (run: Run, loop: WaveLoop) => {
  loop.fronts.forEach((_, k) => {
    const [start, end] = [at(loop.corners, k), at(loop.corners, k + 1)]
    if (start.fromMm !== loop.zMm && end.fromMm !== loop.zMm) return
    if (distance2(cornerAt(start, loop.zMm), cornerAt(end, loop.zMm)) > jogMm) return
    const [before, after] = [at(loop.fronts, k - 1), at(loop.fronts, k + 1)]
    const [a, b] = [at(run.fronts, before), at(run.fronts, after)]
    if (before === after || a.gable || b.gable || a.speed !== b.speed || !runOneWay(a, b)) return
    if (fitOf(a, b) !== 'apart') run.align ??= [before, after]
  })
}

/** A slope that lies against a whole gable has climbed to it: the high wall of a lean-to, and no other roof. */
const noteGableClosed = (run: Run, a: Front, b: Front) => {
  if (a.gable === b.gable) return
  if (run.fronts.filter((front) => !front.gable).length === 1) return
  const [gable, slope] = a.gable ? [a, b] : [b, a]
  run.refusal ??= { reason: 'gable-reached', gable: at(gable.edges, 0), edges: slope.edges }
}

/** Ends the creases that arrive at an event's points. */
const endArcs = (
  run: Run,
  loop: WaveLoop,
  contacts: Contacts,
  nodeAt: (point: number) => number,
) => {
  contacts.points.forEach(({ corners, touched }, point) => {
    if (!touched) return
    for (const k of corners) {
      const [left, right] = [at(loop.fronts, k - 1), at(loop.fronts, k)]
      run.arcs.push({ from: at(loop.corners, k).node, to: nodeAt(point), left, right })
    }
  })
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

/** Carries a loop over its next event; gives the loops that are left of it. */
const overEvent = (run: Run, loop: WaveLoop, event: WaveEvent): WaveLoop[] => {
  const contacts = contactsAt(run.fronts, loop, event)
  const { open, closed } = closePairs(contacts.pieces)
  const nodes = new Map<number, number>()
  const nodeAt = (point: number): number => {
    const found = nodes.get(point)
    if (found !== undefined) return found
    const made = run.nodes.push({ ...at(contacts.points, point).place, z: event.zMm }) - 1
    nodes.set(point, made)
    return made
  }
  for (const { one, other } of closed) {
    at(contacts.points, one.from).touched = true
    at(contacts.points, one.to).touched = true
    const ends = { from: nodeAt(one.from), to: nodeAt(one.to) }
    run.arcs.push({ ...ends, left: other.front, right: one.front })
    noteGableClosed(run, at(run.fronts, one.front), at(run.fronts, other.front))
  }
  endArcs(run, loop, contacts, nodeAt)
  const cornerOf = (before: WavePiece, after: WavePiece): WaveCorner | null => {
    const { place, corners, touched } = at(contacts.points, after.from)
    if (!touched) return at(loop.corners, at(corners, 0))
    if (meet(run, before.front, after.front)) return null
    const [a, b] = [at(run.fronts, before.front), at(run.fronts, after.front)]
    const point = crossingAt(a, b, event.zMm, place)
    return { point, fromMm: event.zMm, velocity: cornerVelocity(a, b), node: nodeAt(after.from) }
  }
  const loops = followLoops(open, linkPieces(run.fronts, contacts, open), cornerOf, event.zMm)
  for (const left of loops) noteJogs(run, left)
  return loops
}

/** Where two fronts cross at a height, when that is near to `place`; otherwise `place` itself. */
const crossingAt = (a: Front, b: Front, zMm: number, place: Point2): Point2 => {
  const sine = cross2(a.along, b.along)
  if (Math.abs(sine) < leastCrossing) return place
  const [p, q] = [a, b].map((front) => add2(front.from, scale2(front.inward, front.speed * zMm)))
  if (p === undefined || q === undefined) return place
  const found = add2(p, scale2(a.along, cross2(sub2(q, p), b.along) / sine))
  return distance2(found, place) <= 4 * nearMm ? found : place
}

const runOnce = (fronts: readonly Front[], owner: number[]): Run => {
  const corners = fronts.map((front, k): WaveCorner => {
    const before = at(fronts, k - 1)
    const isKept = distance2(before.to, front.from) === 0
    const point = isKept ? front.from : crossingAt(before, front, 0, front.from)
    return { point, fromMm: 0, velocity: cornerVelocity(before, front), node: k }
  })
  const nodes = corners.map(({ point }) => ({ ...point, z: 0 }))
  const run: Run = { fronts, nodes, arcs: [], owner, align: null, refusal: null }
  const open: WaveLoop[] = [{ fronts: fronts.map((_, k) => k), corners, zMm: 0 }]
  // every event joins or parts fronts for good; the count only guards against rounding without end
  let left = 20 * fronts.length + 50
  for (let loop = open.pop(); loop !== undefined; loop = open.pop()) {
    const event = nextEvent(fronts, loop)
    left -= 1
    if (event === null || left < 0 || !Number.isFinite(event.zMm)) {
      const edges = loop.fronts.flatMap((k) => at(fronts, k).edges)
      run.refusal ??= { reason: 'unsettled', edges }
      break
    }
    open.push(...overEvent(run, loop, event))
    if (run.refusal !== null || run.align !== null) break
  }
  return run
}

/**
 * The creases of the roof over some fronts in order round the plan, counter-clockwise, found by lifting
 * a level cut from the plate up: it shrinks as its fronts move in, and wherever it changes is a node.
 * All that touches at one height is settled together, so that any number of slopes may meet in a point.
 * Never throws; `refusal` says why the slopes cannot be set out (nodes and arcs are then unfinished).
 */
export const growRoof = (start: readonly Front[]): Wave => {
  let fronts = [...start]
  const groups = fronts.map((_, k) => k)
  for (let tries = fronts.length; ; tries--) {
    const run = runOnce(
      fronts,
      fronts.map((_, k) => k),
    )
    if (run.align === null || tries <= 0) {
      const owner = run.owner.map((_, k) => ownerOf(run.owner, k))
      return { nodes: run.nodes, arcs: run.arcs, owner, fronts, refusal: run.refusal }
    }
    const [a, b] = run.align
    const [into, from] = [at(groups, a), at(groups, b)]
    groups.forEach((group, k) => (groups[k] = group === from ? into : group))
    const members = start.filter((_, k) => at(groups, k) === into)
    const aligned = new Map(alignFronts(members).map((front) => [front.index, front]))
    fronts = fronts.map((front) => aligned.get(front.index) ?? front)
  }
}
