import type { Ground } from './build-pieces.ts'
import type { Joint } from './clusters.ts'
import type { Piece } from './piece.ts'
import { besideTailMm, raftersAt, reachesJoint } from './rafter-pieces.ts'
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

const inGable = (alongMm: number): Ranked => ({ alongMm, joints: [], rank: 0, flush: true })

/** Flush inside the gables at the ends of a slope's plates. */
const gableStations = (ground: Ground, { slope }: SlopeGround): Ranked[] => {
  const half = ground.roof.sections.rafter.thicknessMm / 2
  const isGable = (edge: number) => at(ground.plates.edges, edge).finish === 'gable'
  return slope.plateRuns.flatMap((run) => [
    ...(isGable(run.edge - 1) ? [inGable(run.fromMm + half)] : []),
    ...(isGable(run.edge + 1) ? [inGable(run.toMm - half)] : []),
  ])
}

/** The nodes of a joint that lie on a slope, but for those at a gable. */
const ownNodes = (ground: Ground, { face }: SlopeGround, joint: Joint): number[] => {
  const nodes = joint.nodes.filter((n) => face.nodes.includes(n))
  return touchesGable(ground.lines, nodes) ? [] : nodes
}

/**
 * Where a joint's rafter stands: on its centre, or on one of its nodes where only that is reached;
 * null where no square line of the slope ends in it.
 */
const jointAlongMm = (ground: Ground, own: SlopeGround, index: number): number | null => {
  const { joints, lines } = ground
  const joint = at(joints.joints, index)
  const nodes = ownNodes(ground, own, joint).map((n) => at(lines.nodes, n).point)
  const places = nodes.length === 0 ? [] : [joint.point, ...nodes]
  const alongs = places.map((p) => dot2(own.slope.along, sub2(p, own.slope.origin)))
  const reached = alongs.find((alongMm) => reachesJoint(ground, own, { alongMm, joints: [index] }))
  return reached ?? null
}

/** At joints where one of the slope's square lines ends: a ridge's end first, then the higher one. */
const jointStations = (ground: Ground, own: SlopeGround): Ranked[] => {
  const { lines, joints } = ground
  const onFace = new Set(own.face.nodes.map((n) => joints.ofNode[n] ?? null))
  return joints.joints.flatMap((joint, index): Ranked[] => {
    if (!onFace.has(index)) return []
    const alongMm = jointAlongMm(ground, own, index)
    if (alongMm === null) return []
    const nodes = ownNodes(ground, own, joint)
    const isRidgeEnd = joint.ridges.some((ridge) => {
      const { from, to } = at(lines.lines, ridge)
      return nodes.includes(from) || nodes.includes(to)
    })
    const height = Math.max(...nodes.map((n) => at(lines.nodes, n).point.z))
    const rank = isRidgeEnd ? 1 : 2 + 1 / (1 + height)
    return [{ alongMm, joints: [index], rank }]
  })
}

/** Two rafters cannot stand in one place: the station of better rank stays, and takes in the joints of the other. */
const keepApart = (stations: Ranked[], thicknessMm: number): Station[] => {
  const kept: Station[] = []
  const byRank = [...stations].sort((a, b) => a.rank - b.rank || a.alongMm - b.alongMm)
  for (const station of byRank) {
    const near = kept.findIndex((s) => Math.abs(s.alongMm - station.alongMm) < thicknessMm - 1e-6)
    if (near < 0) kept.push(station)
    else {
      const found = at(kept, near)
      kept[near] = { ...found, joints: [...found.joints, ...station.joints] }
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

type Laid = { station: Station; pieces: Piece[] }

/** Where to start on a slope without stations: in its middle, else where its square lines are about longest. */
const startsOf = (ground: Ground, { slope, face }: SlopeGround): number[] => {
  const [first] = slope.plateRuns
  const middle = first === undefined ? 0 : (first.fromMm + first.toMm) / 2
  const alongs = face.nodes
    .map((n) => dot2(slope.along, sub2(at(ground.lines.nodes, n).point, slope.origin)))
    .sort((a, b) => a - b)
  const stretches = alongs.slice(1).map((toMm, k) => ({ fromMm: at(alongs, k), toMm }))
  stretches.sort((a, b) => b.toMm - b.fromMm - (a.toMm - a.fromMm))
  return [slope.lengthMm / 2, middle, ...stretches.map((s) => (s.fromMm + s.toMm) / 2)]
}

/** Rafters at the stations given, between them and outwards from the last ones, in order. */
const layOut = (ground: Ground, own: SlopeGround, stations: readonly Station[]): Laid[] => {
  const { roof } = ground
  const make = (station: Station): Laid => ({ station, pieces: raftersAt(ground, own, station) })
  const free = (alongMm: number) => make({ alongMm, joints: [] })
  const found = stations.map(make)
  // a creeper that a hip's tail leaves no room stands beside that tail, and so does the joint's that fell there
  const creeper = (alongMm: number): Laid => {
    const asideMm = besideTailMm(own, alongMm)
    const isNear = asideMm !== null && Math.abs(asideMm - alongMm) < roof.maxSpacingMm / 2
    if (!isNear) return free(alongMm)
    const inTheWay = ({ station, pieces }: Laid) =>
      pieces.length === 0 && Math.abs(station.alongMm - asideMm) < roof.sections.rafter.thicknessMm
    return make({
      alongMm: asideMm,
      joints: found.filter(inTheWay).flatMap(({ station }) => station.joints),
    })
  }
  let fixed = found.filter(({ pieces }) => pieces.length > 0)
  if (fixed.length === 0) {
    fixed = startsOf(ground, own)
      .map(free)
      .filter(({ pieces }) => pieces.length > 0)
      .slice(0, 1)
  }
  if (fixed.length === 0) return []
  const made = towards(roof, at(fixed, 0).station.alongMm, own.fromMm).reverse().map(creeper)
  fixed.forEach((entry, k) => {
    made.push(entry)
    const next = fixed[k + 1]
    if (next === undefined) return
    const [from, to] = [entry.station.alongMm, next.station.alongMm]
    const backwards = countsBackwards(ground, own, (from + to) / 2)
    made.push(...between(roof, from, to, backwards).map(free))
  })
  made.push(...towards(roof, at(fixed, -1).station.alongMm, own.toMm).map(creeper))
  return [...made, ...found.filter(({ pieces }) => pieces.length === 0)]
}

/** Beside the tails of hips that leave rafters no room where they fall, where one is worth cutting. */
const besideTails = (ground: Ground, own: SlopeGround, laid: readonly Laid[]): Ranked[] =>
  laid.flatMap(({ station, pieces }): Ranked[] => {
    const alongMm = pieces.length > 0 ? null : besideTailMm(own, station.alongMm)
    if (alongMm === null) return []
    const moved = { alongMm, joints: station.joints }
    return raftersAt(ground, own, moved).length > 0 ? [{ ...moved, rank: 3 }] : []
  })

/** All rafters of a slope, in order along its plate line. */
export const slopeRafters = (ground: Ground, own: SlopeGround): Piece[] => {
  const fixed = [...gableStations(ground, own), ...jointStations(ground, own)]
  const { thicknessMm } = ground.roof.sections.rafter
  const laid = layOut(ground, own, keepApart(fixed, thicknessMm))
  const moved = besideTails(ground, own, laid)
  if (moved.length === 0) return laid.flatMap(({ pieces }) => pieces)
  const standing = fixed.filter((station) => raftersAt(ground, own, station).length > 0)
  const stations = keepApart([...standing, ...moved], thicknessMm)
  return layOut(ground, own, stations).flatMap(({ pieces }) => pieces)
}
