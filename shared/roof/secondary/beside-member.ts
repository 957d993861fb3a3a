import { bevelOf, bothWays, timberPoint } from '../bevel.ts'
import type { Timber } from '../bevel.ts'
import type { DraftCut } from '../cuts.ts'
import type { DraftMember } from '../members.ts'
import type { Cut, Member, Point3, RoofSettings } from '../roof-types.ts'
import { degrees, dot3, scale3 } from '../vector.ts'
import type { Plane } from '../vector.ts'
import { endFaces, facesReachMm } from './end-faces.ts'
import type { EndFace } from './end-faces.ts'

/** A saw cut of a timber beside the frame: its plane, normal off the timber, and the pieces it bears on. */
export type EndCut = { end: Cut['end']; plane: Plane; bears: number[] }

/** A timber beside the frame before its numbers; `timber.origin` is where its axis starts. */
export type BesideTimber = {
  id: number
  role: Member['role']
  timber: Timber
  thicknessMm: number
  /** Along the top centre line from the axis' start to its end. */
  lengthMm: number
  cuts: EndCut[]
  dropMm: number
  planes: number[]
  topInSlope?: boolean
}

/** A top that is not planed. */
const noFalls = { left: 0, right: 0 }
/** A long point nearer the middle than this is central. */
const centralMm = 0.05
const samePointMm = 1e-6

/** A timber that lies with its top in a slope or level: depths go square to its top. */
export const lyingTimber = (
  at: Pick<Timber, 'origin' | 'direction' | 'left' | 'up'>,
  section: { thicknessMm: number; depthMm: number },
): Timber => ({
  ...at,
  down: scale3(at.up, -1),
  halfMm: section.thicknessMm / 2,
  depthMm: section.depthMm,
  sin: 0,
  cos: 1,
  arrisFall: { left: 0, right: 0 },
})

/** The same timber taken from its other end. */
export const turnedTimber = (timber: Timber): Timber => ({
  ...timber,
  direction: scale3(timber.direction, -1),
  left: scale3(timber.left, -1),
})

const draftCut = (
  settings: RoofSettings,
  timber: Timber,
  { end, plane, bears }: EndCut,
): DraftCut => {
  const bevel = bevelOf(plane, timber, noFalls)
  const leftIsLong = bevel.longSide !== 'right'
  return {
    end,
    plane: { point: timberPoint(timber, bevel.alongMm, 0, 0), normal: { ...plane.normal } },
    bears,
    listed: null,
    crossing: bevel.crossing,
    alongMm: bevel.alongMm,
    longSide: bevel.longSide,
    longPointFromHeelMm: leftIsLong ? bevel.leftMm : bevel.rightMm,
    shortPointFromHeelMm: leftIsLong ? bevel.rightMm : bevel.leftMm,
    face: bothWays(bevel.faceFromEdgeDeg),
    edge: bothWays(bevel.squareEdgeDeg),
    edgeOtherTop: null,
    bladeTiltDeg: bevel.tiltDeg,
    pastSaw: bevel.tiltDeg > settings.sawMaxTiltDeg + 1e-9,
  }
}

/** The side of the head's long point, looking from foot to head; null when central or square. */
const handOf = (timber: Timber, heads: EndFace<unknown>[]): Member['hand'] => {
  const corners = heads.flatMap(({ corners, alongMm }) =>
    corners.map((p, k) => ({ along: alongMm[k] ?? 0, left: asideMm(timber, p) })),
  )
  const furthest = Math.max(...corners.map(({ along }) => along))
  const tips = corners.filter(({ along }) => along > furthest - samePointMm)
  const lefts = tips.map(({ left }) => left)
  const middle = (Math.min(...lefts) + Math.max(...lefts)) / 2
  if (Math.abs(middle) < centralMm) return null
  return middle > 0 ? 'left' : 'right'
}

const asideMm = (timber: Timber, p: Point3): number =>
  dot3(timber.left, {
    x: p.x - timber.origin.x,
    y: p.y - timber.origin.y,
    z: p.z - timber.origin.z,
  })

const nearest = (distances: number[]): number => (distances.length > 0 ? Math.min(...distances) : 0)

/** The numbers of a timber beside the frame, with the fields and the meaning that rafters have. */
export const besideMember = (settings: RoofSettings, beside: BesideTimber): DraftMember => {
  const { timber, lengthMm, thicknessMm } = beside
  const cuts = beside.cuts.map((cut) => draftCut(settings, timber, cut))
  const heads = cuts.filter((cut) => cut.end === 'head')
  const feet = cuts.filter((cut) => cut.end !== 'head')
  const along = (end: Cut['end']) => cuts.filter((c) => c.end === end).map((c) => c.alongMm)
  const headFaces = endFaces(timber, heads, true)
  const footFaces = endFaces(timber, feet, false)
  const cutLengthMm = facesReachMm(timber, headFaces, true) - facesReachMm(timber, footFaces, false)
  const volumeM3 = (cutLengthMm * thicknessMm * timber.depthMm) / 1_000_000_000
  const { direction } = timber
  const level = Math.hypot(direction.x, direction.y)
  return {
    piece: { id: beside.id },
    timber,
    role: beside.role,
    ...(beside.topInSlope === true ? { topInSlope: true } : {}),
    hand: handOf(timber, headFaces),
    section: { thicknessMm, depthMm: timber.depthMm },
    axis: { from: { ...timber.origin }, to: timberPoint(timber, lengthMm, 0, 0) },
    riseMm: lengthMm * direction.z,
    runMm: lengthMm * level,
    pitchDeg: degrees(Math.atan2(direction.z, level)),
    setOutLengthMm: lengthMm,
    headDeductionMm: nearest(along('head').map((mm) => lengthMm - mm)),
    footDeductionMm: nearest(along('foot')),
    tailLengthMm: nearest(along('tail').map((mm) => -mm)),
    cutLengthMm,
    cuts,
    birdsmouth: null,
    backing: null,
    dropMm: beside.dropMm,
    planes: beside.planes,
    weightKg: volumeM3 * settings.densityKgM3,
  }
}
