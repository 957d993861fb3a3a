import type { Crease, CreaseNet, CreaseSide } from './creases.ts'
import { at } from './slopes.ts'
import type { PlateLines, Slope } from './slopes.ts'

/** A side of a slope as the faces are read: a crease (by index) or an eave. */
export type RawBorder = { crease: number; other: CreaseSide } | { eave: number; lastEdge: number }

/** Corner by corner round a slope, counter-clockwise; `borders[k]` runs from node k to node k + 1. */
export type RawFace = { nodes: number[]; borders: RawBorder[] }

type Step = { to: number; border: RawBorder }

const isSlope = (side: CreaseSide, slope: number): boolean =>
  'slope' in side && side.slope === slope

/** Parts of a slope's plate line that follow each other without a break, as lists of edges. */
export const eaveRuns = (plates: PlateLines, slope: Slope): number[][] => {
  const runs: number[][] = []
  for (const edge of slope.edges) {
    const last = runs[runs.length - 1]
    const follows = last !== undefined && (at(last, -1) + 1) % plates.edges.length === edge
    if (follows && last !== undefined) last.push(edge)
    else runs.push([edge])
  }
  return runs
}

const stepsOf = (plates: PlateLines, creases: readonly Crease[], slope: Slope) => {
  const steps = new Map<number, Step[]>()
  const add = (from: number, step: Step) => {
    const list = steps.get(from)
    if (list === undefined) steps.set(from, [step])
    else list.push(step)
  }
  for (const run of eaveRuns(plates, slope)) {
    const to = (at(run, -1) + 1) % plates.edges.length
    add(at(run, 0), { to, border: { eave: at(run, 0), lastEdge: at(run, -1) } })
  }
  creases.forEach(({ from, to, left, right }, crease) => {
    if (isSlope(left, slope.index)) add(from, { to, border: { crease, other: right } })
    if (isSlope(right, slope.index)) add(to, { to: from, border: { crease, other: left } })
  })
  return steps
}

/** Reads the polygon of every slope from the creases round it, from its first plate corner on. */
export const readFaces = (plates: PlateLines, { creases }: CreaseNet): RawFace[] =>
  plates.slopes.map((slope) => {
    const steps = stepsOf(plates, creases, slope)
    const start = at(slope.edges, 0)
    const face: RawFace = { nodes: [], borders: [] }
    let node = start
    for (let left = 2 * creases.length + plates.edges.length; left > 0; left--) {
      const step = steps.get(node)?.shift()
      if (step === undefined) break
      face.nodes.push(node)
      face.borders.push(step.border)
      node = step.to
      if (node === start) break
    }
    return face
  })
