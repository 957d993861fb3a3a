import { crossingAt, crossingOf } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import type { FrameDraft } from '../members.ts'
import { at } from '../slopes.ts'
import type { Slope } from '../slopes.ts'
import { along3, dot3, scale3, sub2, unit2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { cutFace, facesEnd, governing } from './beside-member.ts'
import type { EndCut } from './beside-member.ts'
import { lineOfBorder, timberOnLine } from './beside-ground.ts'
import type { BesideGround } from './beside-ground.ts'
import { leastBearingMm2, sharedFaceMm2, sideFace } from './shared-face.ts'

/** What an underpurlin ends on, and its cuts there. */
export type PurlinEnd = {
  kind: 'gable' | 'valley' | 'hip'
  cuts: Omit<EndCut, 'end'>[]
  /** Along the purlin: to the centre of what it meets, and to the nearest corner of its own end. */
  centreMm: number
  nearestMm: number
}

/** A plane that an end meets: where it is cut, and the centre of what stands there. */
type Stop = { kind: PurlinEnd['kind']; plane: Plane; centre: Plane; timber: FrameDraft | null }

/** A plane's normal turned so that it points off the end. */
const offEnd = (plane: Plane, timber: Timber, upper: boolean): Plane => {
  const ahead = dot3(plane.normal, timber.direction) > 0
  return ahead === upper ? plane : { ...plane, normal: scale3(plane.normal, -1) }
}

const stopAt = (
  ground: BesideGround,
  slope: Slope,
  timber: Timber,
  border: number,
  upper: boolean,
): Stop | null => {
  const { lines, plates } = ground
  const face = at(lines.faces, slope.index)
  const side = at(face.borders, border)
  if (side.kind === 'plate') {
    const edge = at(plates.edges, side.edge)
    const normal = { x: -edge.inward.x, y: -edge.inward.y, z: 0 }
    const plane = offEnd({ point: { ...edge.from, z: 0 }, normal }, timber, upper)
    return { kind: 'gable', plane, centre: plane, timber: null }
  }
  const [from, to] = [at(face.nodes, border), at(face.nodes, border + 1)]
  const start = at(lines.nodes, from).point
  const along = unit2(sub2(at(lines.nodes, to).point, start))
  const normal = { x: -along.y, y: along.x, z: 0 }
  const centre = offEnd({ point: start, normal }, timber, upper)
  const line = lineOfBorder(ground, face, border)
  const stands = line === null ? null : timberOnLine(ground, line)
  const kind = line !== null && at(lines.lines, line).kind === 'valley' ? 'valley' : 'hip'
  if (stands === null) return { kind, plane: centre, centre, timber: null }
  const point = along3(stands.timber.origin, centre.normal, -stands.timber.halfMm)
  return { kind, plane: { point, normal: centre.normal }, centre, timber: stands }
}

/** Whether the end's face lies on the side of what stands there, and does not only pass under it. */
const bearsOn = (timber: Timber, { plane, timber: other }: Stop): boolean => {
  if (other === null) return false
  const side = dot3(plane.normal, other.timber.left) < 0 ? 1 : -1
  const ends = cutFace(timber, plane)
  return sharedFaceMm2(ends, sideFace(other, side), plane.normal) > leastBearingMm2
}

const alongMm = (timber: Timber, plane: Plane): number => crossingOf(plane, timber).baseMm

/** An underpurlin's end on the given borders of its slope's face; null where none of them faces it. */
export const purlinEnd = (
  ground: BesideGround,
  slope: Slope,
  timber: Timber,
  borders: number[],
  upper: boolean,
): PurlinEnd | null => {
  const stops = borders
    .flatMap((border) => stopAt(ground, slope, timber, border, upper) ?? [])
    .filter(({ plane }) => facesEnd(plane, timber))
  const cuts = governing(timber, stops, upper)
  const [first] = cuts
  if (first === undefined) return null
  const bottom = timber.depthMm
  const reaches = cuts.flatMap(({ plane }) =>
    [timber.halfMm, -timber.halfMm].flatMap((left) =>
      [0, bottom].map((down) => crossingAt(crossingOf(plane, timber), left, down)),
    ),
  )
  return {
    kind: first.kind,
    cuts: cuts.map((stop) => ({
      plane: stop.plane,
      bears: stop.timber !== null && bearsOn(timber, stop) ? [stop.timber.piece.id] : [],
    })),
    centreMm: alongMm(timber, first.centre),
    nearestMm: upper ? Math.min(...reaches) : Math.max(...reaches),
  }
}
