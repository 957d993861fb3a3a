import { drawnIn, facetOf, frameOf, gapAt, type Facet, type Facets, type Frame } from './facets.ts'
import { directionToBuilding, toBuilding, type Piece, type SawnPlane } from './rebuild-member.ts'
import type { Complain } from './report.ts'
import type { Site } from './site.ts'
import { isFrameMember } from './slopes.ts'
import { boxesMeet, boxOf, type Flat, type SolidKit } from './solid-kit.ts'
import { cosDeg, dot, scale, sub, type Vec } from './vec.ts'

/** A butt joint closes when the other piece is there within this over the bearing face. */
export const CLOSE_MM = 0.2
/** How far behind a cut a face is still taken to be the one that the cut was meant to meet. */
const REACH_MM = 6
/** Faces that turn further from each other than this were not meant to meet. */
const FACING = cosDeg(2)
/** Less than this is a corner's tip, not a face. */
const SPECK_MM2 = 25
/** A cut that is listed must take some timber, and a piece that is named must touch. */
const TOUCH_MM2 = 1
/** Two cheeks nearly in one plane touch each other's piece by a sliver that needs no name. */
const ASIDE_SHARE = 0.03

type Bearing = {
  mark: string
  /** Area within CLOSE_MM of the cut, and area that is further off or runs into it. */
  closedMm2: number
  openMm2: number
  /** The widest opening, square to the cut; under 0 where the pieces run into each other. */
  worstMm: number
  /** It was cut to fit this piece, is a board nailed over its end, or a caution says that they touch. */
  needsNoName: boolean
}

/** Part of a flat on which one side of a level line runs: `a · p <= d`. */
function halfOf(kit: SolidKit, flat: Flat, a: readonly [number, number], d: number): Flat {
  const size = Math.hypot(a[0], a[1])
  const big = 20_000
  // faces all but parallel part far outside the drawing: the whole of it is on one side
  const edge = Math.min(d / size, big / 2)
  const half = kit.CrossSection.square([big, 2 * big], true)
    .translate([edge - big / 2, 0])
    .rotate((Math.atan2(a[1], a[0]) * 180) / Math.PI)
  const part = flat.intersect(half)
  half.delete()
  return part
}

/** Area of a face over which another one stands within CLOSE_MM: the gap runs straight across it. */
function closedArea(kit: SolidKit, frame: Frame, facet: Facet, both: Flat): number {
  const at = gapAt(frame, facet, [0, 0])
  const slope = [gapAt(frame, facet, [1, 0]) - at, gapAt(frame, facet, [0, 1]) - at] as const
  if (Math.hypot(...slope) < 1e-7) return Math.abs(at) <= CLOSE_MM ? both.area() : 0
  const under = halfOf(kit, both, slope, CLOSE_MM - at)
  const within = halfOf(kit, under, [-slope[0], -slope[1]], CLOSE_MM + at)
  const area = within.area()
  under.delete()
  within.delete()
  return area
}

function bearingOn(
  site: Site,
  frame: Frame,
  face: Flat,
  facets: Facet[],
): Omit<Bearing, 'mark' | 'needsNoName'> {
  const found = { closedMm2: 0, openMm2: 0, worstMm: 0 }
  for (const facet of facets) {
    const drawn = drawnIn(site.kit, frame, facet)
    const both = face.intersect(drawn)
    drawn.delete()
    const gaps = both
      .toPolygons()
      .flatMap((ring) => ring.map((p) => gapAt(frame, facet, [p[0]!, p[1]!])))
    const meant = gaps.some((gap) => Math.abs(gap) <= REACH_MM)
    if (meant) {
      const area = both.area()
      const closed = closedArea(site.kit, frame, facet, both)
      found.closedMm2 += closed
      found.openMm2 += area - closed
      for (const gap of gaps) if (Math.abs(gap) > Math.abs(found.worstMm)) found.worstMm = gap
    }
    both.delete()
  }
  return found
}

const faceCorners = (piece: Piece, sawn: SawnPlane): Vec[] =>
  piece.own
    .filter((p) => Math.abs(dot(sawn.normal, sub(p, sawn.point))) < 0.05)
    .map((p) => toBuilding(piece.pose, p))

/** What stands on or near a face: every other piece with a face turned to it. */
function bearingsOn(
  site: Site,
  facets: Facets,
  piece: Piece,
  sawn: SawnPlane,
  frame: Frame,
  face: Flat,
): Bearing[] {
  const { mark } = piece.member
  const near = boxOf(faceCorners(piece, sawn), REACH_MM)
  return site.pieces
    .filter((o) => o.member.mark !== mark && boxesMeet(o.box, near))
    .map((o) => {
      const facing = facets.facing(o, scale(frame.normal, -1), FACING)
      const buttsBack = o.member.cuts.some((c) => [c.against, ...c.alsoAgainst].includes(mark))
      const covers = isFrameMember(piece.member) && ['fascia', 'barge'].includes(o.member.role)
      // two pieces not cut for each other touch by chance: that is no joint, but it has to be said
      const isSaid =
        sawn.cut.end === 'tail' &&
        site.spec.cautions.some(
          ({ code, members }) =>
            code === 'tail-touches' && members.includes(mark) && members.includes(o.member.mark),
        )
      const needsNoName = buttsBack || covers || isSaid
      return { mark: o.member.mark, needsNoName, ...bearingOn(site, frame, face, facing) }
    })
    .filter((b) => b.closedMm2 + b.openMm2 > TOUCH_MM2)
    .sort((a, b) => b.closedMm2 - a.closedMm2)
}

/** Ends that may stand free: tails, the ends of ridges, the foot of a broken hip, boards and ties. */
function mayStandFree(piece: Piece, sawn: SawnPlane): boolean {
  const { role } = piece.member
  if (sawn.cut.end === 'tail' || role === 'ridge' || !isFrameMember(piece.member)) return true
  return role === 'broken-hip' && sawn.cut.end === 'foot'
}

/**
 * A head or foot that bears over less than this share of its face hangs by a corner. No source: side
 * rafters at a short broken hip bear on the crown end over a sixth of theirs, in the order agreed on.
 */
const BORNE_SHARE = 1 / 8

type Say = (text: string, out: number, other?: string) => void

function judgeNames(say: Say, sawn: SawnPlane, bearings: Bearing[], faceMm2: number): void {
  const { cut } = sawn
  const aside = Math.max(SPECK_MM2, ASIDE_SHARE * faceMm2)
  const listed = cut.against === null ? [] : [cut.against, ...cut.alsoAgainst]
  for (const name of listed) {
    if (bearings.some((b) => b.mark === name)) continue
    say(`its ${cut.end} cut is said to bear on it and does not`, 0, name)
  }
  for (const b of bearings) {
    if (listed.includes(b.mark) || b.needsNoName || b.closedMm2 < aside) continue
    say(`its ${cut.end} cut bears on it unsaid, mm²`, b.closedMm2, b.mark)
  }
  const named = bearings.filter((b) => listed.includes(b.mark))
  const first = named.find((b) => b.mark === cut.against)
  const most = named.find((b) => first !== undefined && b.closedMm2 - first.closedMm2 > aside)
  if (most !== undefined) {
    const text = `its ${cut.end} cut has more bearing on it than on ${cut.against}, mm²`
    say(text, most.closedMm2, most.mark)
  }
  for (const b of named) {
    if (b.openMm2 > SPECK_MM2) say(`its ${cut.end} joint stands open, mm`, b.worstMm, b.mark)
  }
}

type Borne = { faceMm2: number; closedMm2: number }

/** Judges one cut; gives back how much of its face is borne. */
function checkCut(
  complain: Complain,
  site: Site,
  facets: Facets,
  piece: Piece,
  sawn: SawnPlane,
): Borne {
  const { cut } = sawn
  const { mark } = piece.member
  const frame = frameOf(
    toBuilding(piece.pose, sawn.point),
    directionToBuilding(piece.pose, sawn.normal),
  )
  const say: Say = (text, out, other) =>
    complain({ check: 'joint', marks: other === undefined ? [mark] : [mark, other], out, text })
  const face = drawnIn(site.kit, frame, facetOf(piece, frame))
  const faceMm2 = face.area()
  let closedMm2 = 0
  if (faceMm2 < TOUCH_MM2) say(`its ${cut.end} cut misses the timber, mm²`, faceMm2)
  else {
    if (cut.against === null && !mayStandFree(piece, sawn)) {
      say(`its ${cut.end} cut is said to bear on nothing`, 0)
    }
    const bearings = bearingsOn(site, facets, piece, sawn, frame, face)
    judgeNames(say, sawn, bearings, faceMm2)
    closedMm2 = bearings.reduce((sum, b) => sum + b.closedMm2, 0)
  }
  face.delete()
  return { faceMm2, closedMm2 }
}

/**
 * Every cut that butts: closed within 0.2 mm over its bearing face, and on the pieces it names; and no
 * head or foot that hangs by a corner while the rest of it faces nothing.
 */
export function checkJoints(complain: Complain, site: Site, facets: Facets, piece: Piece): void {
  const borne = piece.sawn.map((sawn) => ({
    sawn,
    ...checkCut(complain, site, facets, piece, sawn),
  }))
  for (const end of ['head', 'foot'] as const) {
    const cuts = borne.filter(({ sawn }) => sawn.cut.end === end && !mayStandFree(piece, sawn))
    const sum = (key: keyof Borne): number => cuts.reduce((all, cut) => all + cut[key], 0)
    if (cuts.length === 0 || sum('closedMm2') >= BORNE_SHARE * sum('faceMm2')) continue
    const share = (100 * sum('closedMm2')) / sum('faceMm2')
    const marks = [piece.member.mark]
    complain({
      check: 'joint',
      marks,
      out: share,
      text: `its ${end} bears on this little of its face, %`,
    })
  }
}
