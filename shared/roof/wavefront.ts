import { at } from './slopes.ts'
import { cornerVelocity, nextEvent } from './wavefront-events.ts'
import { alignFronts } from './wavefront-lines.ts'
import { ownerOf } from './wavefront-meet.ts'
import type { Run } from './wavefront-meet.ts'
import { crossingAt, overEvent } from './wavefront-step.ts'
import type { Front, Wave, WaveCorner, WaveLoop } from './wavefront-types.ts'
import { distance2, point3 } from './vector.ts'

const runOnce = (fronts: readonly Front[], owner: number[]): Run => {
  const corners = fronts.map((front, k): WaveCorner => {
    const before = at(fronts, k - 1)
    const isKept = distance2(before.to, front.from) === 0
    const point = isKept ? front.from : crossingAt(before, front, 0, front.from)
    return { point, fromMm: 0, velocity: cornerVelocity(before, front), node: k, next: null }
  })
  const nodes = corners.map(({ point }) => point3(point, 0))
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
