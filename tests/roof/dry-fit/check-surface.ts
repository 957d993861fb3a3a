import type { FrameSpec, RoofLine } from '../../../shared/roof/roof-types.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { heightOn, slopeNormal, slopeOfEdge } from './slopes.ts'
import type { Plan } from './surface.ts'
import { angleDeg, cosDeg, length, sub, toDeg, toVec } from './vec.ts'

const TOL_MM = 0.01
const TOL_DEG = 0.001
const TOL_M2 = 0.0001
const MM2_PER_M2 = 1e6

type Near = (name: string, published: number, found: number, tolerance: number) => void

function planArea(polygon: readonly Plan[]): number {
  const twice = polygon.reduce((sum, [ax, ay], i) => {
    const [bx, by] = polygon[(i + 1) % polygon.length]!
    return sum + ax * by - bx * ay
  }, 0)
  return twice / 2
}

/** The slopes lie at the pitches typed in, and together cover the plan once. */
function judgePlanes(near: Near, site: Site): void {
  const { roof, spec, surface } = site
  spec.planes.forEach((plane, index) => {
    const { slope, plan } = surface.faces[index]!
    for (const edge of plane.edges) {
      const typed = roof.edges[edge]!
      const pitchDeg = typed.finish === 'eave' ? typed.pitchDeg : NaN
      near(`pitch of slope ${index}`, plane.pitchDeg, pitchDeg, TOL_DEG)
      const other = slopeOfEdge(roof, edge)
      const off = Math.abs(heightOn(slope, other.cornerX, other.cornerY))
      near(`edge ${edge} on the plate line of slope ${index}`, off, 0, TOL_MM)
    }
    for (const p of plane.polygon) {
      near(`corner of slope ${index}`, p.z, heightOn(slope, p.x, p.y), TOL_MM)
    }
    const sloped = planArea(plan) / cosDeg(plane.pitchDeg) / MM2_PER_M2
    near(`area of slope ${index}`, plane.areaM2, sloped, TOL_M2)
  })
  const covered = surface.faces.reduce((sum, face) => sum + planArea(face.plan), 0)
  const outline = planArea(roof.outline.map((p): Plan => [p.x, p.y]))
  near('plan under the slopes', covered / MM2_PER_M2, outline / MM2_PER_M2, TOL_M2)
}

function judgeLine(near: Near, site: Site, line: RoofLine, index: number): void {
  const name = `line ${index} (${line.kind})`
  const [from, to] = [toVec(line.from), toVec(line.to)]
  const run = Math.hypot(to[0] - from[0], to[1] - from[1])
  near(`${name} in plan`, line.planLengthMm, run, TOL_MM)
  near(`${name} in length`, line.trueLengthMm, length(sub(to, from)), TOL_MM)
  near(`${name} in pitch`, line.pitchDeg, toDeg(Math.atan2(to[2] - from[2], run)), TOL_DEG)
  const slopes = line.planes.map((plane) => site.surface.slopes[plane]!)
  for (const slope of slopes) {
    for (const p of [from, to])
      near(`${name} in its slopes`, p[2], heightOn(slope, p[0], p[1]), TOL_MM)
  }
  if (line.dihedralDeg === undefined) return
  const [a, b] = slopes
  if (a === undefined || b === undefined) return
  const turn = angleDeg(slopeNormal(a), slopeNormal(b))
  near(`${name} in dihedral`, line.dihedralDeg, 180 - turn, TOL_DEG)
}

/** Slopes and lines against what was typed; the other checks stand on them. */
export function checkSurface(complain: Complain, site: Site): void {
  const { spec }: { spec: FrameSpec } = site
  const near: Near = (name, published, found, tolerance) => {
    const out = published - found
    if (Math.abs(out) <= tolerance) return
    const text = `${name} is given as ${published.toFixed(4)}, found ${found.toFixed(4)}`
    complain({ check: 'surface', marks: ['lines'], out, text })
  }
  judgePlanes(near, site)
  spec.lines.forEach((line, index) => judgeLine(near, site, line, index))
}
