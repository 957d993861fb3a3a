import type { Point2, Roof } from './roof-types.ts'
import { at, cornerOffLineMm, straightCornerMm } from './slopes.ts'
import type { PlateEdge, PlateLines, Slope } from './slopes.ts'
import { distance2, dot2, left2, radians, sub2, unit2 } from './vector.ts'
import { growRoof } from './wavefront.ts'
import type { Front } from './wavefront-types.ts'

/** The corners as points like all others: what comes out of JSON slows every sum it takes part in. */
const cornersOf = ({ outline }: Roof): Point2[] => outline.map(({ x, y }) => ({ x, y }))

const plateEdges = (roof: Roof): PlateEdge[] => {
  const corners = cornersOf(roof)
  return roof.edges.map((edge, index) => {
    const from = at(corners, index)
    const to = at(corners, index + 1)
    const along = unit2(sub2(to, from))
    return {
      index,
      from,
      to,
      along,
      inward: left2(along),
      lengthMm: distance2(from, to),
      finish: edge.finish,
      overhangMm: edge.overhangMm,
      pitchDeg: edge.finish === 'eave' ? edge.pitchDeg : 90,
    }
  })
}

/** Whether the corner before edge `index` lies in the middle of one slope, or of one gable. */
const runsOn = (edges: PlateEdge[], index: number): boolean => {
  const before = at(edges, index - 1)
  const edge = at(edges, index)
  return (
    before.finish === edge.finish &&
    before.pitchDeg === edge.pitchDeg &&
    dot2(before.along, edge.along) > 0 &&
    Math.abs(cornerOffLineMm(before.from, edge.from, edge.to)) < straightCornerMm
  )
}

const frontOf = (edges: PlateEdge[], members: number[], index: number): Front => {
  const [first, last] = [at(edges, at(members, 0)), at(edges, at(members, -1))]
  const along = unit2(sub2(last.to, first.from))
  const gable = first.finish === 'gable'
  return {
    index,
    edges: members,
    from: first.from,
    to: last.to,
    along,
    inward: left2(along),
    speed: gable ? 0 : 1 / Math.tan(radians(first.pitchDeg)),
    gable,
  }
}

/** The fronts of the wave in order round the plan: edges that run on in one line are one. */
const frontsOf = (edges: PlateEdge[]): Front[] => {
  const start = edges.findIndex((edge) => !runsOn(edges, edge.index))
  const groups: number[][] = []
  for (let n = 0; n < edges.length; n++) {
    const index = (start + n) % edges.length
    const last = groups[groups.length - 1]
    if (last !== undefined && runsOn(edges, index)) last.push(index)
    else groups.push([index])
  }
  return groups.map((members, index) => frontOf(edges, members, index))
}

const slopeOfFronts = (edges: PlateEdge[], fronts: Front[]): Omit<Slope, 'index'> => {
  const { along, inward, from: base } = at(fronts, 0)
  const place = (p: Point2) => dot2(along, sub2(p, base))
  const members = fronts
    .flatMap((front) => front.edges)
    .sort((a, b) => place(at(edges, a).from) - place(at(edges, b).from))
  const [first, last] = [at(edges, at(members, 0)), at(edges, at(members, -1))]
  const startMm = place(first.from)
  const { pitchDeg } = first
  return {
    edges: members,
    plateRuns: members.map((edge) => ({
      fromMm: place(at(edges, edge).from) - startMm,
      toMm: place(at(edges, edge).to) - startMm,
      edge,
    })),
    origin: { x: base.x + along.x * startMm, y: base.y + along.y * startMm },
    along,
    inward,
    lengthMm: place(last.to) - startMm,
    pitchDeg,
    tan: Math.tan(radians(pitchDeg)),
  }
}

/**
 * The plate edges and slopes of an outline without problems; collinear eaves of one pitch are one slope
 * where they follow each other or their slopes grow together. Slopes are in the order of their lowest edge.
 */
export const plateLines = (roof: Roof): PlateLines => {
  const edges = plateEdges(roof)
  const wave = growRoof(frontsOf(edges))
  const { fronts, owner } = wave
  const groups = fronts
    .filter((front) => !front.gable && at(owner, front.index) === front.index)
    .map((front) => fronts.filter((other) => at(owner, other.index) === front.index))
    .map((members) => ({ members, lowest: Math.min(...members.flatMap((front) => front.edges)) }))
    .sort((a, b) => a.lowest - b.lowest)
    .map(({ members }) => members)
  const slopes = groups.map((members, index) => ({ index, ...slopeOfFronts(edges, members) }))
  const slopeOf = fronts.map((front) => {
    const found = groups.findIndex((members) => members.includes(front))
    return found < 0 ? null : found
  })
  return { edges, slopes, wave, slopeOf }
}
