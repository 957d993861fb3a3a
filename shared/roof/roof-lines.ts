import { clipConvex, polygonBox, polygonSignedArea } from './convex.ts'
import type { Labelled } from './convex.ts'
import type { LineKind, Point2, Point3 } from './roof-types.ts'
import { at, insideMm, slopeGradient, slopeHeightMm } from './slopes.ts'
import type { PlateLines, Slope } from './slopes.ts'
import { distance2, dot2, scale2, sub2 } from './vector.ts'

/** What a side of a slope borders: its own eave, another slope, or a gable edge. */
export type Border =
  { kind: 'plate'; edge: number } | { kind: 'slope'; slope: number } | { kind: 'open' }

type RoofNode = { point: Point3; corner: number | null }

/** A slope's own part of the plan, corner by corner; `borders[k]` runs from node k to node k + 1. */
export type Face = { slope: number; nodes: number[]; borders: Border[] }

/** A crease or edge of the roof between two nodes, the lower one first. */
export type NodeLine = { kind: LineKind; from: number; to: number; slopes: number[] }

export type RoofLines = { nodes: RoofNode[]; faces: Face[]; lines: NodeLine[] }

/** Events of the roof nearer together than this are one node: no saw or tape tells them apart. */
const sameNodeMm = 0.5
/** A line that climbs less than this over its whole length, and less than this for each mm, is level. */
const levelMm = 0.5
const levelSlope = 0.002
/** How far beyond the outline a slope is drawn before it is clipped: past any overhang. */
const marginMm = 10_000

const everywhere = (plates: PlateLines): Labelled<Border> => {
  const open: Border = { kind: 'open' }
  const box = polygonBox(plates.edges.map((edge) => edge.from))
  const [minX, maxX] = [box.minX - marginMm, box.maxX + marginMm]
  const [minY, maxY] = [box.minY - marginMm, box.maxY + marginMm]
  return {
    points: [
      { x: minX, y: minY },
      { x: maxX, y: minY },
      { x: maxX, y: maxY },
      { x: minX, y: maxY },
    ],
    labels: [open, open, open, open],
  }
}

/** Where `slope` is the lowest of all slopes (lower envelope), without regard to the plates. */
const whereLowest = (slopes: readonly Slope[], slope: Slope, start: Labelled<Border>) => {
  let part = start
  const own = slopeGradient(slope)
  for (const other of slopes) {
    if (other.index === slope.index) continue
    // own height − other height ≤ 0, as a line in plan
    const fall = sub2(own, slopeGradient(other))
    const size = Math.hypot(fall.x, fall.y)
    if (size < 1e-9) continue
    const level = dot2(own, slope.origin) - dot2(slopeGradient(other), other.origin)
    part = clipConvex(part, scale2(fall, 1 / size), level / size, {
      kind: 'slope',
      slope: other.index,
    })
  }
  return part
}

/** The plan of one slope, out to `outMm(edge)` beyond each plate edge. */
const slopePlan = (plates: PlateLines, slope: Slope, outMm: (edge: number) => number) => {
  let part = everywhere(plates)
  for (const edge of plates.edges) {
    const out = scale2(edge.inward, -1)
    part = clipConvex(part, out, dot2(out, edge.from) + outMm(edge.index), {
      kind: 'plate',
      edge: edge.index,
    })
  }
  return whereLowest(plates.slopes, slope, part)
}

/** Plan area of a slope with its overhangs, each plate edge carrying its own, square mm. */
export const planAreaWithEavesMm2 = (plates: PlateLines, slope: Slope): number => {
  let area = 0
  slope.edges.forEach((index, place) => {
    const own = at(plates.edges, index)
    let part = slopePlan(plates, slope, (edge) =>
      slope.edges.includes(edge) ? own.overhangMm : at(plates.edges, edge).overhangMm,
    )
    const open: Border = { kind: 'open' }
    if (place > 0) {
      part = clipConvex(part, scale2(own.along, -1), -dot2(own.along, own.from), open)
    }
    if (place < slope.edges.length - 1) {
      part = clipConvex(part, own.along, dot2(own.along, own.to), open)
    }
    area += polygonSignedArea(part.points)
  })
  return area
}

type Vertex = { point: Point2; slope: number }

/** Gathers the corners of all slopes into nodes; plate corners keep their exact place. */
const gatherNodes = (plates: PlateLines, vertices: Vertex[]) => {
  const groups: { corner: number | null; anchor: Point2; members: Vertex[] }[] = plates.edges.map(
    (edge) => ({ corner: edge.index, anchor: edge.from, members: [] }),
  )
  const owner = vertices.map((vertex) => {
    const found = groups.findIndex((group) => distance2(group.anchor, vertex.point) <= sameNodeMm)
    if (found >= 0) {
      at(groups, found).members.push(vertex)
      return found
    }
    groups.push({ corner: null, anchor: vertex.point, members: [vertex] })
    return groups.length - 1
  })
  const nodes = groups.map((group): RoofNode => {
    if (group.corner !== null) return { point: { ...group.anchor, z: 0 }, corner: group.corner }
    const count = group.members.length
    const sum = { x: 0, y: 0, z: 0 }
    for (const { point, slope } of group.members) {
      sum.x += point.x / count
      sum.y += point.y / count
      sum.z += slopeHeightMm(at(plates.slopes, slope), point) / count
    }
    return { point: sum, corner: null }
  })
  return { nodes, owner }
}

const facesOf = (plans: Labelled<Border>[], owner: number[]): Face[] => {
  let next = 0
  return plans.map((plan, slope) => {
    const ids = plan.points.map(() => at(owner, next++))
    const nodes: number[] = []
    const borders: Border[] = []
    ids.forEach((id, k) => {
      if (id === at(ids, k + 1)) return
      nodes.push(id)
      borders.push(at(plan.labels, k))
    })
    return { slope, nodes, borders }
  })
}

const creaseKind = (a: RoofNode, b: RoofNode): LineKind => {
  if (a.corner !== null || b.corner !== null) return 'hip'
  const rise = Math.abs(a.point.z - b.point.z)
  const isLevel = rise <= levelMm && rise <= levelSlope * distance2(a.point, b.point)
  return isLevel ? 'ridge' : 'broken-hip'
}

const linesOf = (plates: PlateLines, nodes: RoofNode[], faces: Face[]): NodeLine[] => {
  const lines: NodeLine[] = []
  for (const face of faces) {
    face.borders.forEach((border, k) => {
      const from = at(face.nodes, k)
      const to = at(face.nodes, k + 1)
      if (border.kind === 'slope' && border.slope > face.slope) {
        const kind = creaseKind(at(nodes, from), at(nodes, to))
        // going round a slope counter-clockwise its upper side runs against its plate
        const up = at(nodes, from).point.z <= at(nodes, to).point.z
        const forward = kind === 'ridge' ? false : up
        lines.push({
          kind,
          from: forward ? from : to,
          to: forward ? to : from,
          slopes: [face.slope, border.slope],
        })
      }
      if (border.kind === 'plate' && at(plates.edges, border.edge).finish === 'gable') {
        const up = at(nodes, from).point.z <= at(nodes, to).point.z
        lines.push({
          kind: 'verge',
          from: up ? from : to,
          to: up ? to : from,
          slopes: [face.slope],
        })
      }
    })
  }
  for (const slope of plates.slopes) {
    const from = at(slope.edges, 0)
    const to = (at(slope.edges, slope.edges.length - 1) + 1) % plates.edges.length
    lines.push({ kind: 'eave', from, to, slopes: [slope.index] })
  }
  const order: LineKind[] = ['ridge', 'hip', 'broken-hip', 'valley', 'verge', 'eave']
  return lines
    .map((line, place) => ({ line, place }))
    .sort((a, b) => order.indexOf(a.line.kind) - order.indexOf(b.line.kind) || a.place - b.place)
    .map(({ line }) => line)
}

/**
 * Nodes, slopes and lines of the roof over a convex outline without problems: the lower envelope of
 * the set-out planes. Points that coincide within half a millimetre are one node, so four or more
 * slopes meeting in a point give one apex and no sliver. All heights are of set-out planes.
 */
export const roofLines = (plates: PlateLines): RoofLines => {
  const plans = plates.slopes.map((slope) => slopePlan(plates, slope, () => 0))
  const vertices = plans.flatMap((plan, slope) => plan.points.map((point) => ({ point, slope })))
  const { nodes, owner } = gatherNodes(plates, vertices)
  const faces = facesOf(plans, owner)
  return { nodes, faces, lines: linesOf(plates, nodes, faces) }
}

/** A square line's part in a slope: how far inside the plate it starts and ends, and what borders the slope there. */
export type SquareSpan = { low: number; high: number; lowBorder: Border; highBorder: Border }

/** Where a slope's square line `alongMm` from its first corner enters and leaves the slope, mm inside its plate. */
export const squareLineSpan = (
  lines: RoofLines,
  slope: Slope,
  face: Face,
  alongMm: number,
): SquareSpan | null => {
  let low = Infinity
  let high = -Infinity
  let lowBorder: Border = { kind: 'open' }
  let highBorder: Border = { kind: 'open' }
  face.nodes.forEach((id, k) => {
    const p = at(lines.nodes, id).point
    const q = at(lines.nodes, at(face.nodes, k + 1)).point
    const sp = dot2(slope.along, sub2(p, slope.origin)) - alongMm
    const sq = dot2(slope.along, sub2(q, slope.origin)) - alongMm
    if (Math.min(sp, sq) > 0 || Math.max(sp, sq) < 0 || Math.abs(sp - sq) < 1e-9) return
    const t = sp / (sp - sq)
    const depth = insideMm(slope, p) * (1 - t) + insideMm(slope, q) * t
    const border = at(face.borders, k)
    if (depth < low) {
      low = depth
      lowBorder = border
    }
    if (depth > high) {
      high = depth
      highBorder = border
    }
  })
  return high > low ? { low, high, lowBorder, highBorder } : null
}
