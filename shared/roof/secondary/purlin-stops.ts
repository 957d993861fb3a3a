import { timberPoint } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import type { FrameDraft } from '../members.ts'
import type { Point3 } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { along3, dot3, point3, scale3, sub2, unit2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { timberOnLine } from './beside-ground.ts'
import type { BesideGround } from './beside-ground.ts'
import { planeSection } from './end-faces.ts'
import { sideFace, timberEnds } from './shared-face.ts'

/**
 * A plane that an underpurlin's end meets, normal off the purlin; the centre of what stands there; and
 * that timber, with its face in the plane.
 */
export type Stop = {
  kind: 'square' | 'valley' | 'hip'
  plane: Plane
  centre: Plane
  bearing: { piece: number; face: Point3[] } | null
}

/** Planes that face an end less than this (cosine) run along the timber and end nothing. */
const leastFacing = 0.02

export const facesEnd = (plane: Plane, timber: Timber): boolean =>
  Math.abs(dot3(plane.normal, timber.direction)) > leastFacing

/** A plane's normal turned so that it points off the end. */
const offEnd = (plane: Plane, timber: Timber, upper: boolean): Plane => {
  const ahead = dot3(plane.normal, timber.direction) > 0
  return ahead === upper ? plane : { ...plane, normal: scale3(plane.normal, -1) }
}

/** The side of a standing timber that an end comes to. */
const sideStop = (kind: Stop['kind'], centre: Plane, stands: FrameDraft): Stop => {
  const { timber, piece } = stands
  const point = along3(timber.origin, centre.normal, -timber.halfMm)
  const side = dot3(centre.normal, timber.left) < 0 ? 1 : -1
  const face = sideFace(stands, side)
  return {
    kind,
    plane: { point, normal: centre.normal },
    centre,
    bearing: { piece: piece.id, face },
  }
}

/** What an underpurlin meets on a border of its slope's face. */
export const borderStop = (
  ground: BesideGround,
  slope: Slope,
  timber: Timber,
  border: number,
  upper: boolean,
): Stop => {
  const { lines, plates } = ground
  const face = at(lines.faces, slope.index)
  const side = at(face.borders, border)
  if (side.kind === 'plate') {
    const edge = at(plates.edges, side.edge)
    const normal = { x: -edge.inward.x, y: -edge.inward.y, z: 0 }
    const plane = offEnd({ point: point3(edge.from, 0), normal }, timber, upper)
    return { kind: 'square', plane, centre: plane, bearing: null }
  }
  const start = at(lines.nodes, at(face.nodes, border)).point
  const along = unit2(sub2(at(lines.nodes, at(face.nodes, border + 1)).point, start))
  const normal = { x: -along.y, y: along.x, z: 0 }
  const centre = offEnd({ point: start, normal }, timber, upper)
  const stands = timberOnLine(ground, side.line)
  const kind = at(lines.lines, side.line).kind === 'valley' ? 'valley' : 'hip'
  return stands === null
    ? { kind, plane: centre, centre, bearing: null }
    : sideStop(kind, centre, stands)
}

/** A square end where another length of the same row comes to meet this one. */
export const squareStop = (timber: Timber, point: Point3, upper: boolean): Stop => {
  const plane = offEnd({ point, normal: timber.direction }, timber, upper)
  return { kind: 'square', plane, centre: plane, bearing: null }
}

/** The plumb faces of a ridge or broken hip that an end could stop at: its sides and its ends. */
export const standingStops = (stands: FrameDraft, timber: Timber, upper: boolean): Stop[] => {
  const { left, direction, origin } = stands.timber
  const centre = offEnd({ point: origin, normal: left }, timber, upper)
  const level = unit2(direction)
  const ends = timberEnds(stands).map((alongMm, k): Stop => {
    const out = { x: level.x * (k === 0 ? -1 : 1), y: level.y * (k === 0 ? -1 : 1), z: 0 }
    const plane = {
      point: timberPoint(stands.timber, alongMm, 0, 0),
      normal: scale3(out, -1),
    }
    const face = planeSection(stands.timber, plane)
    return { kind: 'square', plane, centre: plane, bearing: { piece: stands.piece.id, face } }
  })
  const sides = facesEnd(centre, timber) ? [sideStop('square', centre, stands)] : []
  return [...sides, ...ends].filter(
    ({ plane }) => facesEnd(plane, timber) && dot3(plane.normal, timber.direction) > 0 === upper,
  )
}
