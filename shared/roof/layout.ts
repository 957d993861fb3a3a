import type { Ground } from './build-pieces.ts'
import type { Piece } from './piece.ts'
import { raftersAt, reachesJoint } from './rafter-pieces.ts'
import type { Station } from './rafter-pieces.ts'
import type { RoofLines } from './roof-lines.ts'
import type { Roof } from './roof-types.ts'
import type { SlopeGround } from './slope-ground.ts'
import { at } from './slopes.ts'
import { squareLineSpans } from './square-spans.ts'
import { dot2, sub2 } from './vector.ts'

/** Bays that differ by less than this from a whole number are whole. */
const bayTolerance = 1e-6

type Ranked = Station & { rank: number }

const touchesGable = (lines: RoofLines, nodes: number[]): boolean =>
  lines.lines.some(
    (line) => line.kind === 'verge' && (nodes.includes(line.from) || nodes.includes(line.to)),
  )

/** Flush inside the gables at the ends of a slope's plates. */
const gableStations = (ground: Ground, { slope }: SlopeGround): Ranked[] => {
  const half = ground.roof.sections.rafter.thicknessMm / 2
  const isGable = (edge: number) => at(ground.plates.edges, edge).finish === 'gable'
  return slope.plateRuns.flatMap((run) => [
    ...(isGable(run.edge - 1) ? [{ alongMm: run.fromMm + half, joints: [], rank: 0 }] : []),
    ...(isGable(run.edge + 1) ? [{ alongMm: run.toMm - half, joints: [], rank: 0 }] : []),
  ])
}

/** At joints where one of the slope's square lines ends: a ridge's end first, then the higher one. */
const jointStations = (ground: Ground, own: SlopeGround): Ranked[] => {
  const { lines, joints } = ground
  const { slope, face } = own
  const onFace = new Set(face.nodes.map((n) => joints.ofNode[n] ?? null))
  return joints.joints.flatMap((joint, index): Ranked[] => {
    if (!onFace.has(index)) return []
    const nodes = joint.nodes.filter((n) => face.nodes.includes(n))
    if (touchesGable(lines, nodes)) return []
    const alongMm = dot2(slope.along, sub2(joint.point, slope.origin))
    const station = { alongMm, joints: [index] }
    if (!reachesJoint(ground, own, station)) return []
    const isRidgeEnd = joint.ridges.some((ridge) => {
      const { from, to } = at(lines.lines, ridge)
      return nodes.includes(from) || nodes.includes(to)
    })
    const height = Math.max(...nodes.map((n) => at(lines.nodes, n).point.z))
    return [{ ...station, rank: isRidgeEnd ? 1 : 2 + 1 / (1 + height) }]
  })
}

/** Two rafters cannot stand in one place: the station of better rank stays, and takes in the joints of the other. */
const keepApart = (stations: Ranked[], thicknessMm: number): Station[] => {
  const kept: Station[] = []
  const byRank = [...stations].sort((a, b) => a.rank - b.rank || a.alongMm - b.alongMm)
  for (const { alongMm, joints } of byRank) {
    const near = kept.findIndex((s) => Math.abs(s.alongMm - alongMm) < thicknessMm - 1e-6)
    if (near < 0) kept.push({ alongMm, joints })
    else {
      const found = at(kept, near)
      kept[near] = { ...found, joints: [...found.joints, ...joints] }
    }
  }
  return kept.sort((a, b) => a.alongMm - b.alongMm)
}

/** An odd bay narrower than this many rafters is shared with the one beside it: two rafters need room. */
const oddBayRafters = 2

/** Full bays, and an odd one last; the distances from the first station. */
const fullBays = (roof: Roof, run: number, bays: number): number[] => {
  const steps = Array.from({ length: bays - 1 }, (_, k) => roof.maxSpacingMm * (k + 1))
  const odd = run - at(steps, -1)
  if (odd >= oddBayRafters * roof.sections.rafter.thicknessMm) return steps
  return [...steps.slice(0, -1), run - (odd + roof.maxSpacingMm) / 2]
}

/** Rafters between two stations: even bays not over the spacing, or full bays and an odd one last. */
const between = (roof: Roof, from: number, to: number, backwards: boolean): number[] => {
  const run = to - from
  const bays = Math.max(1, Math.ceil(run / roof.maxSpacingMm - bayTolerance))
  if (bays === 1) return []
  const steps =
    roof.spacing === 'even'
      ? Array.from({ length: bays - 1 }, (_, k) => (run / bays) * (k + 1))
      : fullBays(roof, run, bays)
  return backwards ? steps.map((mm) => to - mm).reverse() : steps.map((mm) => from + mm)
}

/** Both slopes of a ridge count full bays from the same end: the one its lower-numbered slope starts at. */
const countsBackwards = (ground: Ground, { slope, face }: SlopeGround, middle: number): boolean => {
  const spans = squareLineSpans(ground.lines, slope, face, middle)
  const border = spans[spans.length - 1]?.highBorder
  return border?.kind === 'slope' && border.slope < slope.index
}

/** Steps from the last station outwards to the slope's reach, at the spacing exactly. */
const towards = (roof: Roof, from: number, end: number): number[] => {
  const sign = end < from ? -1 : 1
  const count = Math.floor(Math.abs(end - from) / roof.maxSpacingMm)
  return Array.from({ length: count }, (_, k) => from + sign * roof.maxSpacingMm * (k + 1))
}

/** All rafters of a slope, in order along its plate line. */
export const slopeRafters = (ground: Ground, own: SlopeGround): Piece[] => {
  const { roof } = ground
  const { slope } = own
  const found = keepApart(
    [...gableStations(ground, own), ...jointStations(ground, own)],
    roof.sections.rafter.thicknessMm,
  )
  const make = (station: Station) => ({ station, pieces: raftersAt(ground, own, station) })
  const free = (alongMm: number) => make({ alongMm, joints: [] })
  let fixed = found.map(make).filter(({ pieces }) => pieces.length > 0)
  if (fixed.length === 0) {
    const [first] = slope.plateRuns
    const middle = first === undefined ? 0 : (first.fromMm + first.toMm) / 2
    fixed = [slope.lengthMm / 2, middle].map(free).filter(({ pieces }) => pieces.length > 0)
    fixed = fixed.slice(0, 1)
  }
  if (fixed.length === 0) return []
  const made = towards(roof, at(fixed, 0).station.alongMm, own.fromMm).reverse().map(free)
  fixed.forEach((entry, k) => {
    made.push(entry)
    const next = fixed[k + 1]
    if (next === undefined) return
    const [from, to] = [entry.station.alongMm, next.station.alongMm]
    const backwards = countsBackwards(ground, own, (from + to) / 2)
    made.push(...between(roof, from, to, backwards).map(free))
  })
  made.push(...towards(roof, at(fixed, -1).station.alongMm, own.toMm).map(free))
  return made.flatMap(({ pieces }) => pieces)
}
