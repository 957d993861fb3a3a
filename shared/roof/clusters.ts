import type { Roof } from './roof-types.ts'
import { gather } from './lists.ts'
import { pinchedLines } from './pinched.ts'
import { ridgeChains } from './ridge-chains.ts'
import type { RidgeChain } from './ridge-chains.ts'
import type { NodeLine, RoofLines } from './roof-lines.ts'
import { at } from './slopes.ts'
import { add2, distance2, scale2 } from './vector.ts'
import type { Point2 } from './roof-types.ts'

/**
 * A joint of the roof: one node, or several so near together that no timber fits between them.
 * `ridges` are lines (indexes) that end here and get a member, those of the timber that runs through
 * (or furthest) first; `rising` is a broken hip or valley that starts here and climbs on. A joint with
 * neither is an apex. Its rafters' centre lines all run through `point`.
 */
export type Joint = {
  nodes: number[]
  point: Point2
  /** How far its nodes lie from `point`. */
  radiusMm: number
  ridges: number[]
  rising: number | null
}

export type Joints = {
  joints: Joint[]
  /** Joint of each node; null for plate corners and nodes on gable edges' feet. */
  ofNode: (number | null)[]
  /** Lines too short for a member. */
  swallowed: ReadonlySet<number>
  /** Lines too close beside another one for a member. */
  pinched: ReadonlySet<number>
  /** Ridges as timbers, in the order of who runs through. */
  chains: RidgeChain[]
}

/** A broken hip shorter than this many thicknesses in plan is all joint and no timber. */
const brokenHipThicknesses = 2

const isTooShort = (roof: Roof, lines: RoofLines, line: NodeLine): boolean => {
  const [from, to] = [at(lines.nodes, line.from), at(lines.nodes, line.to)]
  const planMm = distance2(from.point, to.point)
  if (line.kind === 'ridge') return planMm <= roof.sections.rafter.thicknessMm
  const isBetween = line.kind === 'broken-hip' || line.kind === 'valley' || line.kind === 'hip'
  if (!isBetween || from.corner !== null || to.corner !== null) return false
  const own = line.kind === 'valley' ? roof.sections.valley : roof.sections.hip
  const thickest = Math.max(roof.sections.rafter.thicknessMm, own.thicknessMm)
  return planMm <= brokenHipThicknesses * thickest
}

const unite = (owner: number[], a: number, b: number) => {
  const from = at(owner, b)
  const to = at(owner, a)
  owner.forEach((id, k) => {
    if (id === from) owner[k] = to
  })
}

const middle = (a: Point2, b: Point2): Point2 => scale2(add2(a, b), 0.5)

/** Its ridge's end, the middle of a ridge too short to be one, the foot of what climbs on, or its highest node. */
const centreOf = (
  lines: RoofLines,
  nodes: number[],
  ridge: NodeLine | undefined,
  rising: NodeLine | undefined,
  shortRidge: NodeLine | undefined,
): Point2 => {
  const point = (n: number) => at(lines.nodes, n).point
  if (ridge !== undefined) return point(nodes.includes(ridge.from) ? ridge.from : ridge.to)
  if (rising !== undefined) return point(rising.from)
  if (shortRidge !== undefined) return middle(point(shortRidge.from), point(shortRidge.to))
  return nodes.map(point).reduce((a, b) => (b.z > a.z ? b : a))
}

const jointOf = (
  lines: RoofLines,
  swallowed: ReadonlySet<number>,
  chains: readonly RidgeChain[],
  nodes: number[],
  index: number,
): Joint => {
  const ends = (line: NodeLine) => nodes.includes(line.from) || nodes.includes(line.to)
  const find = (want: (line: NodeLine, isSwallowed: boolean) => boolean) => {
    const found = lines.lines.findIndex((line, i) => want(line, swallowed.has(i)))
    return found < 0 ? null : found
  }
  const passes = (chain: RidgeChain) => chain.through.includes(index)
  const inOrder = [...chains.filter(passes), ...chains.filter((chain) => !passes(chain))]
  const ridges = gather(inOrder, (chain) => chain.lines.filter((n) => ends(at(lines.lines, n))))
  const climbs = (l: NodeLine) =>
    (l.kind === 'broken-hip' || l.kind === 'valley') && nodes.includes(l.from)
  const rising = find((l, gone) => !gone && climbs(l))
  const shortRidge = find((l, gone) => gone && l.kind === 'ridge' && ends(l))
  const line = (index: number | null | undefined) =>
    index === null || index === undefined ? undefined : at(lines.lines, index)
  const centre = centreOf(lines, nodes, line(ridges[0]), line(rising), line(shortRidge))
  const radiusMm = Math.max(...nodes.map((n) => distance2(at(lines.nodes, n).point, centre)))
  return { nodes, point: { x: centre.x, y: centre.y }, radiusMm, ridges, rising }
}

/** Gathers the nodes of a roof into joints. */
export const roofJoints = (roof: Roof, lines: RoofLines): Joints => {
  const owner = lines.nodes.map((_, k) => k)
  const swallowed = new Set<number>()
  lines.lines.forEach((line, index) => {
    if (!isTooShort(roof, lines, line)) return
    swallowed.add(index)
    unite(owner, line.from, line.to)
  })
  const groups: number[][] = []
  const ofNode = lines.nodes.map((): number | null => null)
  owner.forEach((root, k) => {
    if (root !== k || at(lines.nodes, k).corner !== null) return
    const nodes = owner.flatMap((other, n) => (other === root ? [n] : []))
    nodes.forEach((n) => (ofNode[n] = groups.length))
    groups.push(nodes)
  })
  const chains = ridgeChains(lines, ofNode, swallowed)
  const pinched = pinchedLines(roof, lines, ofNode, swallowed)
  const gone = new Set([...swallowed, ...pinched])
  const joints = groups.map((nodes, index) => jointOf(lines, gone, chains, nodes, index))
  return { joints, ofNode, swallowed, pinched, chains }
}
