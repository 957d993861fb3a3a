import { afterAll, beforeAll, describe, expect, test } from 'vitest'

import { plateLines } from '../../../shared/roof/plate-lines.ts'
import { roofLines } from '../../../shared/roof/roof-lines.ts'
import { makeRoof } from '../support/roofs.ts'
import { sampleOf } from '../support/sample.ts'
import { planKinds, randomPlan } from '../lines/random-outlines.ts'

/**
 * Source: the npm package straight-skeleton 3.0.0, CGAL's straight skeleton in WebAssembly; it knows one
 * pitch only, and gives single-precision numbers (0.001 mm at these sizes). At one pitch of 45° the
 * height of a node is its time of arrival there.
 *
 * Compared: every node of ours is one of theirs, every node of theirs lies on one of ours or, where one
 * of our lines runs straight on and theirs are two, on that line; every line of ours is covered by theirs
 * between the same two slopes, and theirs by ours. Their line between two eaves in one line of one pitch
 * is left out: those are one slope here.
 */
const MM = 0.1

type Skeleton = { vertices: [number, number, number][]; polygons: number[][] }
type Spot = { x: number; y: number; z: number }
type Line = { a: Spot; b: Spot; edges: [number, number] }

let skeletonOf: (plan: [number, number][]) => Skeleton

// the package looks for a browser's global names; other files' packages must not find them
const names = globalThis as Record<string, unknown>
afterAll(() => {
  delete names['self']
  delete names['window']
})

beforeAll(async () => {
  names['self'] = globalThis
  names['window'] = globalThis
  const { SkeletonBuilder } = await import('straight-skeleton')
  await SkeletonBuilder.init()
  skeletonOf = (plan) => {
    const found = SkeletonBuilder.buildFromPolygon([[...plan, plan[0]!]])
    if (found === null) throw new Error('the reference package gave no skeleton')
    return found
  }
})

const apart = (a: Spot, b: Spot): number => Math.hypot(a.x - b.x, a.y - b.y, a.z - b.z)

const offSegment = (p: Spot, { a, b }: Line): number => {
  const d = { x: b.x - a.x, y: b.y - a.y, z: b.z - a.z }
  const size = d.x * d.x + d.y * d.y + d.z * d.z
  const t = ((p.x - a.x) * d.x + (p.y - a.y) * d.y + (p.z - a.z) * d.z) / size
  const s = Math.min(1, Math.max(0, size === 0 ? 0 : t))
  return apart(p, { x: a.x + d.x * s, y: a.y + d.y * s, z: a.z + d.z * s })
}

/** Their polygons name no edges: the one that has both ends of a plate edge is that edge's. */
function theirLines(plan: [number, number][]): Line[] {
  const { vertices, polygons } = skeletonOf(plan)
  const spots = vertices.map(([x, y, z]): Spot => ({ x, y, z }))
  const cornerOf = spots.map((s) =>
    s.z > 1e-6 ? -1 : plan.findIndex(([x, y]) => Math.hypot(x - s.x, y - s.y) < 0.01),
  )
  const owners = new Map<string, number[]>()
  for (const polygon of polygons) {
    const steps = polygon.map((v, k) => [v, polygon[(k + 1) % polygon.length]!] as const)
    const edge = steps
      .map(([v, w]) => [cornerOf[v]!, cornerOf[w]!] as const)
      .flatMap(([c, d]) => {
        if (c < 0 || d < 0) return []
        return (c + 1) % plan.length === d ? [c] : (d + 1) % plan.length === c ? [d] : []
      })[0]
    for (const [v, w] of steps) {
      if (v === w || (cornerOf[v]! >= 0 && cornerOf[w]! >= 0)) continue
      const key = v < w ? `${v} ${w}` : `${w} ${v}`
      owners.set(key, [...(owners.get(key) ?? []), edge ?? -1])
    }
  }
  return [...owners].map(([key, edges]) => {
    const [v, w] = key.split(' ').map(Number)
    return { a: spots[v!]!, b: spots[w!]!, edges: [edges[0]!, edges[1] ?? -1] }
  })
}

const samplesOf = ({ a, b }: Line): Spot[] =>
  [0, 0.25, 0.5, 0.75, 1].map((t) => ({
    x: a.x + (b.x - a.x) * t,
    y: a.y + (b.y - a.y) * t,
    z: a.z + (b.z - a.z) * t,
  }))

function differences(plan: [number, number][]): string[] {
  const plates = plateLines(
    makeRoof(
      plan,
      plan.map(() => 45),
    ),
  )
  const lines = roofLines(plates)
  const slopeOfEdge = plan.map((_, e) => plates.slopes.findIndex((s) => s.edges.includes(e)))
  const ours = lines.lines
    .filter((line) => line.kind !== 'eave')
    .map((line) => ({
      a: lines.nodes[line.from]!.point,
      b: lines.nodes[line.to]!.point,
      slopes: [...line.slopes].sort((a, b) => a - b).join(),
    }))
  const theirs = theirLines(plan)
    .map(({ a, b, edges }) => {
      const slopes = edges.map((e) => slopeOfEdge[e]!)
      return { a, b, slopes: slopes.sort((x, y) => x - y).join(), inOne: slopes[0] === slopes[1] }
    })
    // a reference line shorter than our own limit of one node has no line of its own here
    .filter((line) => !line.inOne)
  type Named = { a: Spot; b: Spot; slopes: string }
  const uncovered = (from: Named[], by: Named[], name: string) =>
    from
      .filter((line) => apart(line.a, line.b) > 0.5)
      .filter((line) =>
        samplesOf({ ...line, edges: [0, 0] }).some(
          (p) =>
            !by.some(
              (o) => o.slopes === line.slopes && offSegment(p, { ...o, edges: [0, 0] }) < MM,
            ),
        ),
      )
      .map((line) => `${name} between slopes ${line.slopes}: ${JSON.stringify([line.a, line.b])}`)
  const theirEnds = theirs.flatMap(({ a, b }) => [a, b])
  const strayNodes = lines.nodes
    .filter(({ corner }) => corner === null)
    .filter(({ point }) => !theirEnds.some((end) => apart(end, point) < MM))
    .map(({ point }) => `node of ours: ${JSON.stringify(point)}`)
  return [
    ...uncovered(ours, theirs, 'line of ours'),
    ...uncovered(theirs, ours, 'line of theirs'),
    ...strayNodes,
  ]
}

describe('at one pitch the lines are those of the straight skeleton', () => {
  // `PROOF=1` compares 400 plans, otherwise a sample of every kind
  const count = sampleOf(60, 400)
  const cases = Array.from({ length: count }, (_, n) => {
    const kind = planKinds[n % planKinds.length]!
    return { n, kind, corners: 4 + ((n * 7) % 29) }
  })
  test.each(cases)('plan $n, $kind, up to $corners corners', ({ n, kind, corners }) => {
    expect(differences(randomPlan(kind, 1000 + n, corners, true))).toEqual([])
  })
})
