import type { Roof } from './roof-types.ts'
import type { NodeLine, RoofLines } from './roof-lines.ts'
import { at } from './slopes.ts'
import { distance2 } from './vector.ts'
import type { Point2 } from './roof-types.ts'

/**
 * A joint of the roof: one node, or several so near together that no timber fits between them.
 * `ridge` and `rising` are lines (indexes) that end here and get a member: a ridge, and a broken hip
 * that starts here and climbs on. A joint with neither is an apex.
 */
export type Joint = {
  nodes: number[]
  point: Point2
  ridge: number | null
  rising: number | null
}

export type Joints = {
  joints: Joint[]
  /** Joint of each node; null for plate corners and nodes on gable edges' feet. */
  ofNode: (number | null)[]
  /** Lines too short for a member. */
  swallowed: ReadonlySet<number>
}

/** A broken hip shorter than this many thicknesses in plan is all joint and no timber. */
const brokenHipThicknesses = 2

const isTooShort = (roof: Roof, lines: RoofLines, line: NodeLine): boolean => {
  const planMm = distance2(at(lines.nodes, line.from).point, at(lines.nodes, line.to).point)
  if (line.kind === 'ridge') return planMm <= roof.sections.rafter.thicknessMm
  const thickest = Math.max(roof.sections.rafter.thicknessMm, roof.sections.hip.thicknessMm)
  return line.kind === 'broken-hip' && planMm <= brokenHipThicknesses * thickest
}

const unite = (owner: number[], a: number, b: number) => {
  const from = at(owner, b)
  const to = at(owner, a)
  owner.forEach((id, k) => {
    if (id === from) owner[k] = to
  })
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
  const joints: Joint[] = []
  const ofNode = lines.nodes.map((): number | null => null)
  owner.forEach((root, k) => {
    if (root !== k || at(lines.nodes, k).corner !== null) return
    const nodes = owner.flatMap((other, n) => (other === root ? [n] : []))
    const points = nodes.map((n) => at(lines.nodes, n).point)
    const mean = (pick: (p: Point2) => number) =>
      points.reduce((sum, p) => sum + pick(p), 0) / points.length
    const kept = (want: (line: NodeLine) => boolean) => {
      const found = lines.lines.findIndex((line, i) => !swallowed.has(i) && want(line))
      return found < 0 ? null : found
    }
    nodes.forEach((n) => (ofNode[n] = joints.length))
    joints.push({
      nodes,
      point: { x: mean((p) => p.x), y: mean((p) => p.y) },
      ridge: kept((l) => l.kind === 'ridge' && (nodes.includes(l.from) || nodes.includes(l.to))),
      rising: kept((l) => l.kind === 'broken-hip' && nodes.includes(l.from)),
    })
  })
  return { joints, ofNode, swallowed }
}
