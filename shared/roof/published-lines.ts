import { polygonSignedArea } from './convex.ts'
import { planAreaWithEavesMm2 } from './eaves.ts'
import type { RoofLines } from './roof-lines.ts'
import type { Point3, RoofLine, RoofPlane } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateLines, Slope } from './slopes.ts'
import { angleBetweenDeg, degrees, distance2, distance3, radians } from './vector.ts'

const squareMetre = 1_000_000

/** The slopes as published: polygons to the plate line, areas on the slope. */
export const publishedPlanes = (plates: PlateLines, lines: RoofLines): RoofPlane[] =>
  plates.slopes.map((slope) => {
    const polygon = at(lines.faces, slope.index).nodes.map((n) => ({ ...at(lines.nodes, n).point }))
    const lean = Math.cos(radians(slope.pitchDeg)) * squareMetre
    return {
      edges: [...slope.edges],
      pitchDeg: slope.pitchDeg,
      areaM2: polygonSignedArea(polygon) / lean,
      areaWithEavesM2: planAreaWithEavesMm2(plates, lines, slope) / lean,
      polygon,
    }
  })

const slopeNormal = (slope: Slope): Point3 => {
  const cos = Math.cos(radians(slope.pitchDeg))
  const sin = Math.sin(radians(slope.pitchDeg))
  return { x: -slope.inward.x * sin, y: -slope.inward.y * sin, z: cos }
}

/** The roof's lines as published, with the angle between the two slopes of a crease. */
export const publishedLines = (plates: PlateLines, lines: RoofLines): RoofLine[] =>
  lines.lines.map((line) => {
    const from = at(lines.nodes, line.from).point
    const to = at(lines.nodes, line.to).point
    const planLengthMm = distance2(from, to)
    const [a, b] = line.slopes.map((s) => slopeNormal(at(plates.slopes, s)))
    const crease = a !== undefined && b !== undefined
    return {
      kind: line.kind,
      from: { ...from },
      to: { ...to },
      planLengthMm,
      trueLengthMm: distance3(from, to),
      pitchDeg: degrees(Math.atan2(to.z - from.z, planLengthMm)),
      planes: [...line.slopes],
      ...(crease ? { dihedralDeg: 180 - angleBetweenDeg(a, b) } : {}),
    }
  })
