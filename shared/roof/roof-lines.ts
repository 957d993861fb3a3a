import { roofCreases } from './creases.ts'
import type { Crease, RoofNode } from './creases.ts'
import { eaveRuns, readFaces } from './faces.ts'
import type { RawFace } from './faces.ts'
import type { LineKind } from './roof-types.ts'
import { at, slopeGradient } from './slopes.ts'
import type { PlateLines } from './slopes.ts'
import { cross2, distance2, sub2 } from './vector.ts'

/**
 * What a side of a slope borders: its own eave or a gable edge (by the first of its plate edges), or
 * another slope. `line` is an index into `RoofLines.lines`.
 */
export type Border =
  | { kind: 'plate'; edge: number; line: number | null }
  | { kind: 'slope'; slope: number; line: number }

/** A slope's own part of the plan, corner by corner, counter-clockwise; `borders[k]` runs from node k to node k + 1. */
export type Face = { slope: number; nodes: number[]; borders: Border[] }

/** A crease or edge of the roof between two nodes, the lower one first. */
export type NodeLine = { kind: LineKind; from: number; to: number; slopes: number[] }

export type RoofLines = { nodes: RoofNode[]; faces: Face[]; lines: NodeLine[] }

/** A line that climbs less than this over its whole length, and less than this for each mm, is level. */
const levelMm = 0.5
const levelSlope = 0.002

const isLevel = (a: RoofNode, b: RoofNode): boolean => {
  const rise = Math.abs(a.point.z - b.point.z)
  return rise <= levelMm && rise <= levelSlope * distance2(a.point, b.point)
}

/** The kind of the crease from a to b between the slope on its left and the one on its right. */
const creaseKind = (
  plates: PlateLines,
  a: RoofNode,
  b: RoofNode,
  left: number,
  right: number,
): LineKind => {
  const [one, other] = [at(plates.slopes, left), at(plates.slopes, right)]
  // along the left normal the left slope falls away more than the right one climbs: convex
  const across = cross2(sub2(b.point, a.point), sub2(slopeGradient(one), slopeGradient(other)))
  if (across > 0) return 'valley'
  if (isLevel(a, b)) return 'ridge'
  return a.corner !== null || b.corner !== null ? 'hip' : 'broken-hip'
}

/** A line and where it comes from: a crease (by index), or an eave (by its first edge). */
type Traced = { line: NodeLine; crease: number | null; eave: number | null }

const creaseLine = (
  plates: PlateLines,
  nodes: RoofNode[],
  creases: Crease[],
  face: RawFace,
  own: number,
  k: number,
): Traced[] => {
  const border = at(face.borders, k)
  if (!('crease' in border)) return []
  const { crease, other } = border
  const ends = { from: at(face.nodes, k), to: at(face.nodes, k + 1) }
  const turned = { from: ends.to, to: ends.from }
  const [a, b] = [at(nodes, ends.from), at(nodes, ends.to)]
  const isUp = a.point.z <= b.point.z
  if ('gable' in other) {
    // the top of a lean-to against its high wall is level; it runs against the plate, as ridges do
    const kind = isLevel(a, b) ? 'ridge' : 'verge'
    const line = { kind, ...(isUp && kind === 'verge' ? ends : turned), slopes: [own] } as const
    return [{ line: { ...line, slopes: [own] }, crease, eave: null }]
  }
  if (other.slope < own) return []
  const { left, right } = at(creases, crease)
  if (!('slope' in left) || !('slope' in right)) return []
  const kind = creaseKind(plates, a, b, own, other.slope)
  // going round a slope counter-clockwise its upper side runs against its plate
  const forward = kind === 'ridge' ? false : isUp
  const line = { kind, ...(forward ? ends : turned), slopes: [own, other.slope] }
  return [{ line, crease, eave: null }]
}

const eaveLines = (plates: PlateLines): Traced[] =>
  plates.slopes.flatMap((slope) =>
    eaveRuns(plates, slope).map((run): Traced => {
      const from = at(run, 0)
      const to = (at(run, -1) + 1) % plates.edges.length
      return { line: { kind: 'eave', from, to, slopes: [slope.index] }, crease: null, eave: from }
    }),
  )

const order: LineKind[] = ['ridge', 'hip', 'broken-hip', 'valley', 'verge', 'eave']

/** Gives each side of a face the line that was traced from its crease or eave. */
const borderReader = (traced: Traced[]) => {
  const ofCrease = new Map<number, number>()
  const ofEave = new Map<number, number>()
  traced.forEach(({ crease, eave }, line) => {
    if (crease !== null) ofCrease.set(crease, line)
    if (eave !== null) ofEave.set(eave, line)
  })
  return (border: RawFace['borders'][number]): Border => {
    if (!('crease' in border)) {
      return { kind: 'plate', edge: border.eave, line: ofEave.get(border.eave) ?? null }
    }
    const line = ofCrease.get(border.crease)
    if ('gable' in border.other) {
      return { kind: 'plate', edge: border.other.gable, line: line ?? null }
    }
    return { kind: 'slope', slope: border.other.slope, line: line ?? -1 }
  }
}

/**
 * Nodes, slopes and lines of the roof over an outline without problems: any simple outline, each eave
 * with its own pitch. Events that coincide within half a millimetre are one node, so four or more slopes
 * meeting in a point give one apex and no sliver. All heights are of set-out planes. Nodes 0 to n − 1
 * are the plate corners.
 */
export const roofLines = (plates: PlateLines): RoofLines => {
  const net = roofCreases(plates)
  const faces = readFaces(plates, net)
  const traced = faces
    .flatMap((face, own) =>
      face.borders.flatMap((_, k) => creaseLine(plates, net.nodes, net.creases, face, own, k)),
    )
    .concat(eaveLines(plates))
  traced.sort((a, b) => order.indexOf(a.line.kind) - order.indexOf(b.line.kind))
  const borderOf = borderReader(traced)
  return {
    nodes: net.nodes,
    faces: faces.map(({ nodes, borders }, slope) => ({
      slope,
      nodes,
      borders: borders.map(borderOf),
    })),
    lines: traced.map(({ line }) => line),
  }
}
