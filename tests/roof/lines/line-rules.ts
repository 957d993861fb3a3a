import type { RoofLines } from '../../../shared/roof/roof-lines.ts'
import type { LineKind, Point2, Point3, Roof } from '../../../shared/roof/roof-types.ts'
import type { PlateLines, Slope } from '../../../shared/roof/slopes.ts'
import { planAreaMm2 } from './random-outlines.ts'

/** Nodes nearer together than half a millimetre are one node: this far a slope's corner may be off its plane. */
export const oneNodeMm = 0.75

/** Height of the plane that rises from a plate at its pitch, by its first corner and direction alone. */
export const planeHeightMm = (slope: Slope, p: Point2): number => {
  const { origin, along, pitchDeg } = slope
  const inside = (p.y - origin.y) * along.x - (p.x - origin.x) * along.y
  return inside * Math.tan((pitchDeg * Math.PI) / 180)
}

export const facePoints = (lines: RoofLines, face: number): Point3[] =>
  lines.faces[face]!.nodes.map((n) => lines.nodes[n]!.point)

const segmentDistance = (p: Point2, a: Point2, b: Point2): number => {
  const [dx, dy] = [b.x - a.x, b.y - a.y]
  const t = ((p.x - a.x) * dx + (p.y - a.y) * dy) / (dx * dx + dy * dy)
  const s = Math.min(1, Math.max(0, t))
  return Math.hypot(p.x - a.x - s * dx, p.y - a.y - s * dy)
}

/** Whether a point lies in a polygon, and how far from its nearest side. */
export const placeIn = (polygon: Point2[], p: Point2): { inside: boolean; sideMm: number } => {
  let inside = false
  let sideMm = Infinity
  polygon.forEach((a, k) => {
    const b = polygon[(k + 1) % polygon.length]!
    if (a.y > p.y !== b.y > p.y && p.x < a.x + ((b.x - a.x) * (p.y - a.y)) / (b.y - a.y)) {
      inside = !inside
    }
    sideMm = Math.min(sideMm, segmentDistance(p, a, b))
  })
  return { inside, sideMm }
}

const numbersOf = (value: unknown): number[] => {
  if (typeof value === 'number') return [value]
  if (typeof value !== 'object' || value === null) return []
  return Object.values(value).flatMap(numbersOf)
}

/** Corners of the plan within a millimetre of a straight eave are left out of its slope. */
const straightCornersMm2 = (roof: Roof): number =>
  roof.outline.length * Math.sqrt(planAreaMm2(roof.outline))

/**
 * Round a slope counter-clockwise the slope is on the left of each side: where its plane is the lower one
 * there, the crease is a ridge or hip; where it is the higher one, a valley.
 */
const isConcave = (own: Slope, other: Slope, a: Point3, b: Point3): boolean => {
  const mid = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 }
  const left = { x: mid.x - (b.y - a.y), y: mid.y + (b.x - a.x) }
  const rise = (slope: Slope) => planeHeightMm(slope, left) - planeHeightMm(slope, mid)
  return rise(own) > rise(other)
}

const faceFaults = (plates: PlateLines, lines: RoofLines): string[] =>
  lines.faces.flatMap((face) => {
    const points = facePoints(lines, face.slope)
    const slope = plates.slopes[face.slope]!
    const faults: string[] = []
    if (!(planAreaMm2(points) > 1)) faults.push(`slope ${face.slope} has no area`)
    if (new Set(face.nodes).size !== face.nodes.length) {
      faults.push(`slope ${face.slope} comes to one node twice`)
    }
    for (const p of points) {
      const offMm = Math.abs(planeHeightMm(slope, p) - p.z)
      if (!(offMm < oneNodeMm))
        faults.push(`slope ${face.slope}: a corner ${offMm} mm off its plane`)
    }
    face.borders.forEach((border, k) => {
      const line = border.line === null ? undefined : lines.lines[border.line]
      const ends = [face.nodes[k]!, face.nodes[(k + 1) % face.nodes.length]!].sort()
      if (line === undefined || [line.from, line.to].sort().join() !== ends.join()) {
        faults.push(`slope ${face.slope}: border ${k} is not its line`)
      } else if (!line.slopes.includes(face.slope)) {
        faults.push(`slope ${face.slope}: border ${k} is a line of other slopes`)
      } else if (border.kind === 'slope') {
        const other = plates.slopes[border.slope]!
        const concave = isConcave(slope, other, points[k]!, points[(k + 1) % points.length]!)
        if (concave !== (line.kind === 'valley')) {
          faults.push(`${line.kind} of slopes ${line.slopes.join()} bends the other way`)
        }
      }
    })
    return faults
  })

const lineFaults = (plates: PlateLines, lines: RoofLines): string[] => {
  return lines.lines.flatMap((line) => {
    const [a, b] = [lines.nodes[line.from]!.point, lines.nodes[line.to]!.point]
    const name = `${line.kind} of slopes ${line.slopes.join()}`
    const faults: string[] = []
    const planMm = Math.hypot(b.x - a.x, b.y - a.y)
    if (!(planMm >= 0.5)) faults.push(`${name} is ${planMm} mm long`)
    for (const slope of line.slopes) {
      for (const p of [a, b]) {
        const offMm = Math.abs(planeHeightMm(plates.slopes[slope]!, p) - p.z)
        if (line.kind !== 'eave' && !(offMm < oneNodeMm)) {
          faults.push(`${name} is ${offMm} mm off slope ${slope}`)
        }
      }
    }
    if (line.kind !== 'ridge' && a.z > b.z) faults.push(`${name} runs down`)
    if (line.kind === 'hip' && lines.nodes[line.from]!.corner === null) {
      faults.push(`${name} starts at no plate corner`)
    }
    return faults
  })
}

/** All that is wrong with the lines of a roof, each fault in words; empty when they are sound. */
export const faultsOf = (roof: Roof, plates: PlateLines, lines: RoofLines): string[] => {
  const covered = lines.faces.reduce((sum, f) => sum + planAreaMm2(facePoints(lines, f.slope)), 0)
  const planMm2 = planAreaMm2(roof.outline)
  const missMm2 = Math.abs(covered - planMm2)
  const borders = lines.faces.reduce((sum, f) => sum + f.borders.length, 0)
  const sides = lines.lines.reduce((sum, line) => sum + line.slopes.length, 0)
  return [
    ...(numbersOf(lines).every(Number.isFinite) ? [] : ['a number is not a number']),
    ...(missMm2 <= straightCornersMm2(roof) ? [] : [`slopes miss the plan by ${missMm2} mm²`]),
    ...(borders === sides ? [] : [`${borders} borders of slopes for ${sides} sides of lines`]),
    ...faceFaults(plates, lines),
    ...lineFaults(plates, lines),
  ]
}

/** A line whatever its place in the list: its kind and its ends. */
export type Shown = { kind: LineKind; a: Point3; b: Point3 }

export const shownLines = (lines: RoofLines, move: (p: Point3) => Point3 = (p) => p): Shown[] =>
  lines.lines.map((line) => ({
    kind: line.kind,
    a: move(lines.nodes[line.from]!.point),
    b: move(lines.nodes[line.to]!.point),
  }))

const apart = (a: Point3, b: Point3): number => Math.hypot(a.x - b.x, a.y - b.y, a.z - b.z)

/** Lines of one list with no like line in the other; a ridge may be named from either end. */
export const unmatched = (from: Shown[], by: Shown[], withinMm: number): Shown[] =>
  from.filter(
    (one) =>
      !by.some(
        (other) =>
          other.kind === one.kind &&
          Math.min(
            Math.max(apart(one.a, other.a), apart(one.b, other.b)),
            Math.max(apart(one.a, other.b), apart(one.b, other.a)),
          ) <= withinMm,
      ),
  )
