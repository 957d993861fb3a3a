import type { Timber } from '../bevel.ts'
import { crossingOf } from '../bevel.ts'
import { tailPlane } from '../cuts.ts'
import type { DraftMember } from '../members.ts'
import type { NodeLine } from '../roof-lines.ts'
import type { Section } from '../roof-types.ts'
import { at, slopeGradient, slopeHeightMm } from '../slopes.ts'
import type { PlateEdge } from '../slopes.ts'
import { add2, along3, dot2, dot3, left2, point3, scale2, scale3, sub2, unit2 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import type { BesideGround } from './beside-ground.ts'
import { besideMember } from './beside-member.ts'

/** A barge with the plate corner at its foot. */
export type BargeDraft = { corner: number; draft: DraftMember }

/** A verge line with its gable, the eave at its foot, and the verge beyond its apex, if any. */
type Verge = {
  line: NodeLine
  gable: PlateEdge
  eave: PlateEdge
  corner: number
  mate: NodeLine | null
}

const gableUnder = (ground: BesideGround, line: NodeLine): PlateEdge | null => {
  const face = at(ground.lines.faces, line.slopes[0] ?? 0)
  const border = face.borders.find(
    (one) => one.line !== null && at(ground.lines.lines, one.line) === line,
  )
  return border?.kind === 'plate' ? at(ground.plates.edges, border.edge) : null
}

/** Every verge that rises from the end of an eave. */
const verges = (ground: BesideGround): Verge[] => {
  const { lines, plates } = ground
  const all = lines.lines.filter((line) => line.kind === 'verge')
  return all.flatMap((line): Verge[] => {
    const gable = gableUnder(ground, line)
    const { corner } = at(lines.nodes, line.from)
    if (gable === null || corner === null) return []
    const eave = at(plates.edges, corner === gable.index ? corner - 1 : corner)
    if (eave.finish === 'gable') return []
    const mate =
      all.find(
        (other) => other !== line && other.to === line.to && gableUnder(ground, other) === gable,
      ) ?? null
    return [{ line, gable, eave, corner, mate }]
  })
}

/** The board along a verge: plumb, its back on the verge plane, its top in line with the rafters' tops. */
const layBarge = (ground: BesideGround, { line, gable }: Verge, section: Section) => {
  const slope = at(ground.plates.slopes, line.slopes[0] ?? 0)
  const start = at(ground.lines.nodes, line.from).point
  const dir = unit2(sub2(at(ground.lines.nodes, line.to).point, start))
  const out = scale2(gable.inward, -1)
  const halfMm = section.thicknessMm / 2
  const heel = add2(start, scale2(out, gable.overhangMm + halfMm))
  const tan = dot2(slopeGradient(slope), dir)
  const cos = 1 / Math.hypot(1, tan)
  const sin = tan * cos
  // a slope whose plate is not square to the gable falls across the board
  const dropMm = Math.abs(dot2(slopeGradient(slope), left2(dir))) * halfMm
  const timber: Timber = {
    origin: point3(heel, slopeHeightMm(slope, heel) + ground.standMm - dropMm),
    direction: { x: dir.x * cos, y: dir.y * cos, z: sin },
    left: point3(left2(dir), 0),
    up: { x: -dir.x * sin, y: -dir.y * sin, z: cos },
    down: { x: 0, y: 0, z: -1 },
    halfMm,
    depthMm: section.depthMm,
    sin,
    cos,
    arrisFall: { left: 0, right: 0 },
  }
  return { timber, dropMm, dir }
}

const facing = (plane: Plane, direction: Timber['direction'], sign: 1 | -1): Plane =>
  dot3(plane.normal, direction) * sign > 0 ? plane : { ...plane, normal: scale3(plane.normal, -1) }

/** At the apex, the plumb plane of the ridge, which under a lean-to is the high wall's; without a ridge there, square in plan to the verge. */
const headPlane = (ground: BesideGround, verge: Verge, dir: { x: number; y: number }): Plane => {
  const { lines } = ground
  const top = at(lines.nodes, verge.line.to)
  const ridge = lines.lines.find(
    (line) => line.kind === 'ridge' && (line.from === verge.line.to || line.to === verge.line.to),
  )
  if (ridge === undefined) return { point: top.point, normal: point3(dir, 0) }
  const [from, to] = [at(lines.nodes, ridge.from).point, at(lines.nodes, ridge.to).point]
  return { point: top.point, normal: { ...left2(unit2(sub2(to, from))), z: 0 } }
}

/**
 * Barge boards up the verges: plumb, back on the verge plane, top in line with the rafters' tops. At the
 * apex each is cut plumb in the ridge's plane against the other; the foot is cut as the tails are, in
 * the plane of the fascia's front, so that the barge covers the fascia's end. mm, degrees, kg.
 */
export const barges = (ground: BesideGround, firstId: number): BargeDraft[] => {
  const section = ground.roof.sections.barge
  if (section === undefined) return []
  const fasciaMm = ground.roof.sections.fascia?.thicknessMm ?? 0
  const all = verges(ground)
  return all.map((verge, place): BargeDraft => {
    const { timber, dropMm, dir } = layBarge(ground, verge, section)
    const head = facing(headPlane(ground, verge, dir), timber.direction, 1)
    const tail = tailPlane(ground, verge.eave, ground.standMm)
    const foot = facing(
      { point: along3(tail.point, tail.normal, fasciaMm), normal: tail.normal },
      timber.direction,
      -1,
    )
    const mate = all.findIndex((other) => other.line === verge.mate)
    const draft = besideMember(ground.settings, {
      id: firstId + place,
      role: 'barge',
      timber,
      thicknessMm: section.thicknessMm,
      lengthMm: crossingOf(head, timber).baseMm,
      cuts: [
        { end: 'head', plane: head, bears: mate < 0 ? [] : [firstId + mate] },
        { end: 'tail', plane: foot, bears: [] },
      ],
      dropMm,
      planes: [...verge.line.slopes],
    })
    return { corner: verge.corner, draft }
  })
}
