import type { FrameSpec, Member, Point3 } from '../roof/roof-types.ts'
import { figureOf, type MarkingFigure, type MarkingOptions } from './marking-figures.ts'

/** Where a timber of a row is fixed: an underpurlin up its rafters, a collar tie over the plate. */
export function placeFigures(
  spec: FrameSpec,
  member: Member,
  options: MarkingOptions,
): MarkingFigure[] {
  if (member.role === 'collar-tie') {
    const undersideMm = member.axis.from.z - member.section.depthMm
    return [figureOf('Height of the underside', undersideMm, options, 'plumb, over the plate')]
  }
  if (member.role !== 'underpurlin') return []
  const upMm = upTheRafterMm(spec, member)
  const note = 'up the rafter from its heel line to the middle of the underpurlin'
  return upMm === null ? [] : [figureOf('Row', upMm, options, note)]
}

/** Square from the middle of an underpurlin's top to the rafters' top edges, from their heel lines. */
function upTheRafterMm(spec: FrameSpec, { planes, axis }: Member): number | null {
  const [p = -1] = planes
  const plane = spec.planes[p]
  const eave = spec.lines.find((line) => line.kind === 'eave' && line.planes.includes(p))
  if (!plane || !eave) return null
  const pitch = (plane.pitchDeg * Math.PI) / 180
  const inMm = distanceFromLine(axis.from, eave.from, eave.to)
  return inMm * Math.cos(pitch) + (axis.from.z - spec.standMm) * Math.sin(pitch)
}

function distanceFromLine(point: Point3, from: Point3, to: Point3): number {
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1
  const along = { x: (to.x - from.x) / length, y: (to.y - from.y) / length }
  return Math.abs((point.x - from.x) * along.y - (point.y - from.y) * along.x)
}
