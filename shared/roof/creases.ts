import type { Point2, Point3 } from './roof-types.ts'
import { at, slopeHeightMm } from './slopes.ts'
import type { PlateLines } from './slopes.ts'
import { distance2, point3 } from './vector.ts'

/** A node of the roof; `corner` is the plate corner it stands on, null above the plate. */
export type RoofNode = { point: Point3; corner: number | null }

/** What lies on one side of a crease. */
export type CreaseSide = { slope: number } | { gable: number }

/** A crease between two nodes; left and right as seen from `from`. */
export type Crease = { from: number; to: number; left: CreaseSide; right: CreaseSide }

export type CreaseNet = { nodes: RoofNode[]; creases: Crease[] }

/** Events of the roof nearer together than this are one node: no saw or tape tells them apart. */
const sameNodeMm = 0.5

const isSameSide = (a: CreaseSide, b: CreaseSide): boolean =>
  'slope' in a ? 'slope' in b && a.slope === b.slope : 'gable' in b && a.gable === b.gable

/** The creases as the wave left them; nodes 0 to n − 1 are the plate corners, in their exact places. */
const rawNet = (plates: PlateLines): CreaseNet => {
  const { wave, edges, slopeOf } = plates
  const nodes = edges.map((edge): RoofNode => ({
    point: point3(edge.from, 0),
    corner: edge.index,
  }))
  const nodeOf = wave.nodes.map((point, k) => {
    const front = wave.fronts[k]
    return front === undefined ? nodes.push({ point, corner: null }) - 1 : at(front.edges, 0)
  })
  const sideOf = wave.fronts.map((front): CreaseSide => {
    const slope = at(slopeOf, front.index)
    return slope === null ? { gable: at(front.edges, 0) } : { slope }
  })
  const creases = wave.arcs.map(({ from, to, left, right }) => ({
    from: at(nodeOf, from),
    to: at(nodeOf, to),
    left: at(sideOf, left),
    right: at(sideOf, right),
  }))
  // where two gables meet is a corner of the walls, not a line of the roof
  return { nodes, creases: creases.filter((c) => 'slope' in c.left || 'slope' in c.right) }
}

const middleOf = (nodes: readonly RoofNode[], members: number[]): Point3 => {
  const corner = members.find((n) => at(nodes, n).corner !== null)
  if (corner !== undefined) return at(nodes, corner).point
  const sum = { x: 0, y: 0, z: 0 }
  for (const n of members) {
    const { point } = at(nodes, n)
    sum.x += point.x / members.length
    sum.y += point.y / members.length
    sum.z += point.z / members.length
  }
  return sum
}

/** Draws the ends of creases too short to tell apart into one node, until none is left. */
const joinNear = ({ nodes, creases }: CreaseNet): CreaseNet => {
  let owner = nodes.map((_, k) => k)
  const places: Point2[] = nodes.map(({ point }) => point)
  const joined = nodes.map((node) => node)
  for (;;) {
    const short = creases.find(({ from, to }) => {
      const [a, b] = [at(owner, from), at(owner, to)]
      if (a === b || (at(nodes, a).corner !== null && at(nodes, b).corner !== null)) return false
      return distance2(at(places, a), at(places, b)) <= sameNodeMm
    })
    if (short === undefined) break
    const [a, b] = [at(owner, short.from), at(owner, short.to)]
    const [kept, gone] = a < b ? [a, b] : [b, a]
    owner = owner.map((root) => (root === gone ? kept : root))
    const members = owner.flatMap((root, k) => (root === kept ? [k] : []))
    const point = middleOf(nodes, members)
    places[kept] = point
    joined[kept] = { point, corner: at(nodes, kept).corner }
  }
  const moved = creases.map((c) => ({ ...c, from: at(owner, c.from), to: at(owner, c.to) }))
  return { nodes: joined, creases: moved.filter((c) => c.from !== c.to) }
}

/** `crease` seen from its end `node`. */
const seenFrom = (crease: Crease, node: number): Crease =>
  crease.from === node
    ? crease
    : { from: crease.to, to: crease.from, left: crease.right, right: crease.left }

/** How many creases end in each node. */
const degrees = (count: number, creases: readonly Crease[]): number[] => {
  const ends = Array.from({ length: count }, () => 0)
  for (const { from, to } of creases) {
    ends[from] = at(ends, from) + 1
    ends[to] = at(ends, to) + 1
  }
  return ends
}

/** Two creases that run on through a node where nothing else happens are one. */
const joinStraight = ({ nodes, creases }: CreaseNet): CreaseNet => {
  let left = creases
  degrees(nodes.length, creases).forEach((degree, n) => {
    if (degree !== 2 || at(nodes, n).corner !== null) return
    const [one, other] = left.filter((c) => c.from === n || c.to === n)
    if (one === undefined || other === undefined) return
    const [a, b] = [seenFrom(one, n), seenFrom(other, n)]
    if (!isSameSide(a.left, b.right) || !isSameSide(a.right, b.left)) return
    const through = { from: a.to, to: b.to, left: a.right, right: a.left }
    left = left.flatMap((c) => (c === one ? [through] : c === other ? [] : [c]))
  })
  return { nodes, creases: left }
}

/** Two creases between the same two nodes lie on each other: what is between them is no part of a slope. */
const dropDoubles = ({ nodes, creases }: CreaseNet): CreaseNet => {
  const keys = creases.map(({ from, to }) => Math.min(from, to) * nodes.length + Math.max(from, to))
  if (new Set(keys).size === keys.length) return { nodes, creases }
  const left = [...creases]
  for (let a = 0; a < left.length; a++) {
    for (let b = a + 1; b < left.length; b++) {
      const one = at(left, a)
      const other = seenFrom(at(left, b), one.from)
      if (other.from !== one.from || other.to !== one.to) continue
      const [inRight, inLeft] = [
        isSameSide(one.right, other.left),
        isSameSide(one.left, other.right),
      ]
      left.splice(b, 1)
      if (inRight && inLeft) left.splice(a, 1)
      else if (inRight) left[a] = { ...one, right: other.right }
      else if (inLeft) left[a] = { ...one, left: other.left }
      b = a
    }
  }
  return { nodes, creases: left }
}

/** Leaves out nodes that no crease ends in; plate corners stay. */
const usedNodes = ({ nodes, creases }: CreaseNet): CreaseNet => {
  const used = new Set(creases.flatMap((c) => [c.from, c.to]))
  const kept = nodes.flatMap((node, n) => (node.corner !== null || used.has(n) ? [n] : []))
  const place = new Map(kept.map((n, k) => [n, k]))
  const of = (n: number) => place.get(n) ?? n
  return {
    nodes: kept.map((n) => at(nodes, n)),
    creases: creases.map((c) => ({ ...c, from: of(c.from), to: of(c.to) })),
  }
}

/** Nodes drawn together lie a little off some slopes: their height is the mean of those that meet there. */
const settleHeights = (plates: PlateLines, { nodes, creases }: CreaseNet): CreaseNet => {
  const meeting = nodes.map(() => new Set<number>())
  for (const { from, to, left, right } of creases) {
    for (const side of [left, right]) {
      if ('slope' in side) {
        at(meeting, from).add(side.slope)
        at(meeting, to).add(side.slope)
      }
    }
  }
  const settled = nodes.map((node, n): RoofNode => {
    const slopes = at(meeting, n)
    if (node.corner !== null || slopes.size === 0) return node
    let sum = 0
    for (const slope of slopes) sum += slopeHeightMm(at(plates.slopes, slope), node.point)
    return { ...node, point: point3(node.point, sum / slopes.size) }
  })
  return { nodes: settled, creases }
}

/** Nodes and creases of the roof: no crease shorter than half a millimetre, none broken without a reason. */
export const roofCreases = (plates: PlateLines): CreaseNet => {
  let net = rawNet(plates)
  for (let count = Infinity; net.creases.length < count;) {
    count = net.creases.length
    net = joinStraight(dropDoubles(joinNear(net)))
  }
  return settleHeights(plates, usedNodes(net))
}
