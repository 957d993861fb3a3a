import type { NodeLine, RoofLines } from './roof-lines.ts'
import { at } from './slopes.ts'
import { cross2, distance2, dot2, sub2, unit2 } from './vector.ts'
import type { Point2 } from './roof-types.ts'

/** Ridge lines that are one timber: in one line, end to end. */
export type RidgeChain = {
  /** Lines (indexes), in order. */
  lines: number[]
  from: number
  to: number
  /** Joints it runs through. */
  through: number[]
  lengthMm: number
}

/** Ridges are in one line when they turn by less than this (radians) and pass each other by less. */
const inLineRad = 1e-3
const asideMm = 0.5
/** Lengths that differ by less are equal: float noise, nothing to choose by. */
const sameLengthMm = 0.01

type Link = { joint: number; a: number; b: number }

const lengthMm = (lines: RoofLines, line: NodeLine) =>
  distance2(at(lines.nodes, line.from).point, at(lines.nodes, line.to).point)

const inLine = (lines: RoofLines, a: NodeLine, b: NodeLine): boolean => {
  const [p, q, r, s] = [a.from, a.to, b.from, b.to].map((n): Point2 => at(lines.nodes, n).point)
  if (p === undefined || q === undefined || r === undefined || s === undefined) return false
  const dir = unit2(sub2(q, p))
  const other = unit2(sub2(s, r))
  if (Math.abs(cross2(dir, other)) > inLineRad) return false
  if ([r, s].some((point) => Math.abs(cross2(dir, sub2(point, p))) > asideMm)) return false
  // on opposite sides of where they meet
  const mid = (x: Point2, y: Point2) => ({ x: (x.x + y.x) / 2, y: (x.y + y.y) / 2 })
  const apart = Math.abs(dot2(dir, sub2(mid(r, s), mid(p, q))))
  return apart > (lengthMm(lines, a) + lengthMm(lines, b)) / 2 - sameLengthMm - 1
}

/** Ends of ridges by joint. */
const ridgesAt = (
  lines: RoofLines,
  ofNode: readonly (number | null)[],
  skipped: ReadonlySet<number>,
): Map<number, number[]> => {
  const found = new Map<number, number[]>()
  lines.lines.forEach((line, index) => {
    if (line.kind !== 'ridge' || skipped.has(index)) return
    for (const node of [line.from, line.to]) {
      const joint = ofNode[node] ?? null
      if (joint !== null) found.set(joint, [...(found.get(joint) ?? []), index])
    }
  })
  return found
}

/** Follows links from ridge to ridge. */
const gather = (ridges: number[], links: readonly Link[]): number[][] => {
  const owner = new Map(ridges.map((index) => [index, index]))
  for (const { a, b } of links) {
    const [keep, drop] = [owner.get(a) ?? a, owner.get(b) ?? b]
    for (const [index, root] of owner) if (root === drop) owner.set(index, keep)
  }
  const groups = new Map<number, number[]>()
  for (const index of ridges) {
    const root = owner.get(index) ?? index
    groups.set(root, [...(groups.get(root) ?? []), index])
  }
  return [...groups.values()]
}

const chainOf = (lines: RoofLines, members: number[], links: readonly Link[]): RidgeChain => {
  const own = links.filter((link) => members.includes(link.a))
  const first = at(lines.lines, at(members, 0))
  const origin = at(lines.nodes, first.from).point
  const dir = sub2(at(lines.nodes, first.to).point, origin)
  const place = (node: number) => dot2(dir, sub2(at(lines.nodes, node).point, origin))
  const nodes = members.flatMap((index) => {
    const line = at(lines.lines, index)
    return [line.from, line.to]
  })
  const from = nodes.reduce((a, b) => (place(b) < place(a) ? b : a))
  const to = nodes.reduce((a, b) => (place(b) > place(a) ? b : a))
  const middle = (index: number) => {
    const line = at(lines.lines, index)
    return place(line.from) + place(line.to)
  }
  return {
    lines: [...members].sort((a, b) => middle(a) - middle(b)),
    from,
    to,
    through: own.map((link) => link.joint),
    lengthMm: distance2(at(lines.nodes, from).point, at(lines.nodes, to).point),
  }
}

/** The longer first, then the lower number. */
export const runsBefore = (a: RidgeChain, b: RidgeChain): number =>
  Math.abs(a.lengthMm - b.lengthMm) > sameLengthMm
    ? b.lengthMm - a.lengthMm
    : Math.min(...a.lines) - Math.min(...b.lines)

/**
 * Ridges as timbers: those in one line at a joint are one, and where such timbers cross the longest
 * runs through (then the one of the lowest line). In the order of who runs through.
 */
export const ridgeChains = (
  lines: RoofLines,
  ofNode: readonly (number | null)[],
  skipped: ReadonlySet<number>,
): RidgeChain[] => {
  const ridges = lines.lines.flatMap((line, index) =>
    line.kind === 'ridge' && !skipped.has(index) ? [index] : [],
  )
  const links: Link[] = []
  for (const [joint, ends] of ridgesAt(lines, ofNode, skipped)) {
    ends.forEach((a, k) => {
      const b = ends
        .slice(k + 1)
        .find((other) => inLine(lines, at(lines.lines, a), at(lines.lines, other)))
      if (b !== undefined) links.push({ joint, a, b })
    })
  }
  const whole = gather(ridges, links).map((members) => chainOf(lines, members, links))
  const taken = new Map<number, number>()
  ;[...whole].sort(runsBefore).forEach((chain, rank) => {
    for (const joint of chain.through) if (!taken.has(joint)) taken.set(joint, rank)
  })
  const kept = [...whole]
    .sort(runsBefore)
    .flatMap((chain, rank) =>
      links.filter((link) => chain.lines.includes(link.a) && taken.get(link.joint) === rank),
    )
  return gather(ridges, kept)
    .map((members) => chainOf(lines, members, kept))
    .sort(runsBefore)
}
