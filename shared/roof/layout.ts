import type { Roof } from './roof-types.ts'
import type { Joints } from './clusters.ts'
import type { Face, RoofLines } from './roof-lines.ts'
import { squareLineSpan } from './roof-lines.ts'
import { at } from './slopes.ts'
import type { PlateLines, Slope } from './slopes.ts'
import { dot2, sub2 } from './vector.ts'

/** Where a rafter stands on a slope's plate line, mm from the slope's first corner. */
export type Station = { alongMm: number; joint: number | null }

/** Bays that differ by less than this from a whole number are whole. */
const bayTolerance = 1e-6

const isGable = (plates: PlateLines, edge: number) => at(plates.edges, edge).finish === 'gable'

/** The stations a slope must have: at joints whose square line it carries, and flush inside gables. */
const fixedStations = (
  roof: Roof,
  plates: PlateLines,
  lines: RoofLines,
  joints: Joints,
  slope: Slope,
  face: Face,
): Station[] => {
  const half = roof.sections.rafter.thicknessMm / 2
  const stations: (Station & { rank: number })[] = []
  if (isGable(plates, at(plates.edges, at(slope.edges, 0) - 1).index)) {
    stations.push({ alongMm: half, joint: null, rank: 0 })
  }
  if (isGable(plates, at(plates.edges, at(slope.edges, slope.edges.length - 1) + 1).index)) {
    stations.push({ alongMm: slope.lengthMm - half, joint: null, rank: 0 })
  }
  joints.joints.forEach((joint, index) => {
    const own = joint.nodes.filter((n) => face.nodes.includes(n))
    if (own.length === 0 || touchesGable(lines, own)) return
    const ridge = joint.ridge === null ? null : at(lines.lines, joint.ridge)
    const onRidge = own.filter((n) => ridge !== null && (ridge.from === n || ridge.to === n))
    const alongMm = dot2(slope.along, sub2(joint.point, slope.origin))
    const height = Math.max(...own.map((n) => at(lines.nodes, n).point.z))
    stations.push({ alongMm, joint: index, rank: onRidge.length > 0 ? 1 : 2 + 1 / (1 + height) })
  })
  return keepApart(stations, roof.sections.rafter.thicknessMm)
}

const touchesGable = (lines: RoofLines, nodes: number[]): boolean =>
  lines.lines.some(
    (line) => line.kind === 'verge' && (nodes.includes(line.from) || nodes.includes(line.to)),
  )

/** Two rafters cannot stand in one place: the station of better rank stays. */
const keepApart = (stations: (Station & { rank: number })[], thicknessMm: number): Station[] => {
  const kept: Station[] = []
  const byRank = [...stations].sort((a, b) => a.rank - b.rank || a.alongMm - b.alongMm)
  for (const { alongMm, joint } of byRank) {
    const clear = kept.every((other) => Math.abs(other.alongMm - alongMm) >= thicknessMm - 1e-6)
    if (clear) kept.push({ alongMm, joint })
  }
  return kept.sort((a, b) => a.alongMm - b.alongMm)
}

/** Rafters between two stations: even bays not over the spacing, or full bays and an odd one last. */
const between = (roof: Roof, from: number, to: number, backwards: boolean): number[] => {
  const run = to - from
  const bays = Math.max(1, Math.ceil(run / roof.maxSpacingMm - bayTolerance))
  const step = roof.spacing === 'even' ? run / bays : roof.maxSpacingMm
  return Array.from({ length: bays - 1 }, (_, k) =>
    backwards ? to - step * (k + 1) : from + step * (k + 1),
  )
}

/** Both slopes of a ridge count full bays from the same end: the one its lower-numbered slope starts at. */
const countsBackwards = (lines: RoofLines, slope: Slope, face: Face, middle: number): boolean => {
  const border = squareLineSpan(lines, slope, face, middle)?.highBorder
  return border?.kind === 'slope' && border.slope < slope.index
}

/** Steps from the last station towards a corner, at the spacing exactly, until `isClear` fails. */
const towards = (roof: Roof, from: number, sign: 1 | -1, isClear: (s: number) => boolean) => {
  const out: number[] = []
  for (let s = from + sign * roof.maxSpacingMm; isClear(s); s += sign * roof.maxSpacingMm) {
    out.push(s)
  }
  return out
}

/** All stations of a slope, in order along its plate line. */
export const slopeStations = (
  roof: Roof,
  plates: PlateLines,
  lines: RoofLines,
  joints: Joints,
  slope: Slope,
  face: Face,
  isClear: (alongMm: number) => boolean,
): Station[] => {
  const fixed = fixedStations(roof, plates, lines, joints, slope, face).filter(
    (s) => s.alongMm >= 0 && s.alongMm <= slope.lengthMm && isClear(s.alongMm),
  )
  if (fixed.length === 0 && isClear(slope.lengthMm / 2)) {
    fixed.push({ alongMm: slope.lengthMm / 2, joint: null })
  }
  if (fixed.length === 0) return []
  const free = (alongMm: number): Station => ({ alongMm, joint: null })
  const first = at(fixed, 0).alongMm
  const last = at(fixed, fixed.length - 1).alongMm
  const out = towards(roof, first, -1, isClear).map(free).reverse()
  fixed.forEach((station, k) => {
    out.push(station)
    const next = fixed[k + 1]
    if (next === undefined) return
    const middle = (station.alongMm + next.alongMm) / 2
    const backwards = countsBackwards(lines, slope, face, middle)
    const inner = between(roof, station.alongMm, next.alongMm, backwards).map(free)
    out.push(...inner.sort((a, b) => a.alongMm - b.alongMm))
  })
  return [...out, ...towards(roof, last, 1, isClear).map(free)]
}
