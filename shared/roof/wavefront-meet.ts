import type { Point3 } from './roof-types.ts'
import { at } from './slopes.ts'
import { cornerAt } from './wavefront-events.ts'
import { fitOf, runOneWay } from './wavefront-lines.ts'
import type { Front, WaveArc, WaveLoop, WaveRefusal } from './wavefront-types.ts'
import { distance2 } from './vector.ts'

/** A front this short between two plates in one line is there because the plates are a little off it. */
const jogMm = 2.5

/** The wave while it runs. */
export type Run = {
  fronts: readonly Front[]
  nodes: Point3[]
  arcs: WaveArc[]
  owner: number[]
  /** Two fronts found to be nearly in one line where they grow together. */
  align: [number, number] | null
  refusal: WaveRefusal | null
}

export const ownerOf = (owner: readonly number[], front: number): number => {
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
export const meet = (run: Run, before: number, after: number): boolean => {
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
export const noteJogs = (run: Run, loop: WaveLoop) => {
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
export const noteGableClosed = (run: Run, a: Front, b: Front) => {
  if (a.gable === b.gable) return
  if (run.fronts.filter((front) => !front.gable).length === 1) return
  const [gable, slope] = a.gable ? [a, b] : [b, a]
  run.refusal ??= { reason: 'gable-reached', gable: at(gable.edges, 0), edges: slope.edges }
}
