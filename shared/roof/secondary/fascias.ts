import { crossingOf } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import { tailPlane } from '../cuts.ts'
import type { DraftMember } from '../members.ts'
import type { Point3, Section } from '../roof-types.ts'
import { at } from '../slopes.ts'
import type { PlateEdge } from '../slopes.ts'
import { along3, cross3, dot3, point3, radians, scale3, unit3 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import type { BargeDraft } from './barges.ts'
import type { BesideGround } from './beside-ground.ts'
import { besideMember, lyingTimber, turnedTimber } from './beside-member.ts'
import type { EndCut } from './beside-member.ts'
import { eaveRuns } from './eave-runs.ts'
import { planeSection } from './end-faces.ts'
import type { EaveRun, RunEnd } from './eave-runs.ts'
import { leastBearingMm2, sharedFaceMm2, sideFace } from './shared-face.ts'

/** A fascia laid along its eave, its ends not yet known. */
type Laid = { run: EaveRun; edge: PlateEdge; timber: Timber; dropMm: number }

/**
 * The board along an eave: its back on the tail plane. Plumb tails: the board plumb, the front arris of
 * its level top in line with the rafters' tops. Square tails: the board canted, its top in line with them.
 */
const layFascia = (ground: BesideGround, run: EaveRun, section: Section): Laid => {
  const edge = at(ground.plates.edges, at(run.edges, 0))
  const pitch = radians(edge.pitchDeg)
  const back = tailPlane(ground, edge, ground.standMm)
  const halfMm = section.thicknessMm / 2
  const along: Point3 = { x: edge.along.x, y: edge.along.y, z: 0 }
  const left = scale3(back.normal, -1)
  const up = cross3(along, left)
  const plumb = ground.roof.tail === 'plumb'
  const dropMm = plumb ? halfMm * Math.tan(pitch) : 0
  const centre = along3(back.point, back.normal, halfMm)
  const fallMm = plumb ? 2 * dropMm : 0
  const origin = point3(centre, centre.z - fallMm)
  return { run, edge, timber: lyingTimber({ origin, direction: along, left, up }, section), dropMm }
}

/** A point on two planes that cross. */
const sharedPoint = (a: Plane, b: Plane): Point3 => {
  const line = cross3(a.normal, b.normal)
  const square = dot3(line, line)
  const [da, db] = [dot3(a.normal, a.point), dot3(b.normal, b.point)]
  const onA = scale3(cross3(b.normal, line), da / square)
  return along3(onA, cross3(line, a.normal), db / square)
}

/** The plane of a fascia's end. A mitre runs through the lines in which backs and fronts of both boards cross. */
const endPlane = (ground: BesideGround, laid: Laid, end: RunEnd, upper: boolean): Plane => {
  const { edge } = laid
  const corner = at(ground.plates.edges, end.corner).from
  const beyond = at(ground.plates.edges, end.edge)
  const ahead = scale3({ x: edge.along.x, y: edge.along.y, z: 0 }, upper ? 1 : -1)
  if (end.kind === 'square') return { point: point3(corner, 0), normal: ahead }
  if (end.kind === 'verge') {
    const out = scale3(point3(beyond.inward, 0), -1)
    return { point: along3(point3(beyond.from, 0), out, beyond.overhangMm), normal: out }
  }
  const own = tailPlane(ground, edge, ground.standMm)
  const other = tailPlane(ground, beyond, ground.standMm)
  const normal = unit3(along3(own.normal, other.normal, -1))
  const point = sharedPoint(own, other)
  return { point, normal: dot3(normal, ahead) < 0 ? scale3(normal, -1) : normal }
}

/** Pieces that an end lies on: the fascia round the corner, or the barge that covers it. */
const bearsOn = (
  all: Laid[],
  barges: BargeDraft[],
  laid: Laid,
  end: RunEnd,
  plane: Plane,
  firstId: number,
): number[] => {
  const face = planeSection(laid.timber, plane)
  const meets = (other: Point3[]) => sharedFaceMm2(face, other, plane.normal) > leastBearingMm2
  if (end.kind === 'verge') {
    const cover = barges.find((barge) => barge.corner === end.corner)
    if (cover === undefined) return []
    const side = dot3(cover.draft.timber.left, plane.normal) < 0 ? 1 : -1
    return meets(sideFace(cover.draft, side)) ? [cover.draft.piece.id] : []
  }
  const place = all.findIndex((other) => other.run.edges.includes(end.edge))
  const mate = all[place]
  return mate !== undefined && meets(planeSection(mate.timber, plane)) ? [firstId + place] : []
}

/** Heads are where the rarer cut is: square ends first, then inside corners, then outside ones. */
const endRank = (end: RunEnd): number => (end.kind !== 'mitre' ? 0 : end.inward ? 1 : 2)

/**
 * Fascia boards, one a run of eaves in one line, mitred at the corners of the plan and square at verges,
 * where the barge covers their ends. The back lies on the tail plane; with plumb tails the front arris
 * of the top is in line with the rafters' tops, with square tails the whole top. A mitre's plane halves the
 * angle between two boards of one thickness: plumb for plumb boards, leaning between canted ones of
 * unequal pitch. True lengths: joins go on rafters. mm, degrees, kg.
 */
export const fascias = (
  ground: BesideGround,
  barges: BargeDraft[],
  firstId: number,
): DraftMember[] => {
  const section = ground.roof.sections.fascia
  if (section === undefined) return []
  const all = eaveRuns(ground.plates, section.thicknessMm).map((run) =>
    layFascia(ground, run, section),
  )
  return all.map((laid, place) => {
    const { run, timber } = laid
    const ends = [run.from, run.to].map((end, k) => {
      const plane = endPlane(ground, laid, end, k === 1)
      const bears = bearsOn(all, barges, laid, end, plane, firstId)
      return { end, plane, bears, alongMm: crossingOf(plane, timber).baseMm }
    })
    const turned = endRank(run.from) > endRank(run.to)
    const [foot, head] = turned ? [at(ends, 1), at(ends, 0)] : [at(ends, 0), at(ends, 1)]
    const cut = (end: EndCut['end'], of: (typeof ends)[number]): EndCut => ({
      end,
      plane: of.plane,
      bears: of.bears,
    })
    const origin = along3(timber.origin, timber.direction, foot.alongMm)
    return besideMember(ground.settings, {
      id: firstId + place,
      role: 'fascia',
      timber: { ...(turned ? turnedTimber(timber) : timber), origin },
      thicknessMm: section.thicknessMm,
      lengthMm: Math.abs(head.alongMm - foot.alongMm),
      cuts: [cut('head', head), cut('foot', foot)],
      dropMm: laid.dropMm,
      planes: [at(ground.plates.slopes, slopeOfEdge(ground, laid.edge.index)).index],
      ...(ground.roof.tail === 'square' ? { topInSlope: true } : {}),
    })
  })
}

const slopeOfEdge = (ground: BesideGround, edge: number): number =>
  ground.plates.slopes.findIndex((slope) => slope.edges.includes(edge))
