import type { Ground } from './build-pieces.ts'
import { cautionOf } from './caution-words.ts'
import type { Caution, Member } from './roof-types.ts'
import { at } from './slopes.ts'
import type { PlateEdge, Slope } from './slopes.ts'
import { cross2, degrees, dot2, radians } from './vector.ts'

const bevelSlackDeg = 0.5

/** Edge bevel across a backed top, whichever top the hip has. */
const backedEdgeDeg = (hip: Member, cut: Member['cuts'][number]): number =>
  (hip.backing === null ? (cut.edgeOtherTop ?? cut.edge) : cut.edge).fromEdgeDeg

/** What an octagonal end, or a splay at 45°, has at its corners; the short cut is known for no other. */
const splayCornerDeg = 135
const cornerSlackDeg = 0.5

const interiorDeg = (before: PlateEdge, after: PlateEdge): number =>
  180 - degrees(Math.atan2(cross2(before.along, after.along), dot2(before.along, after.along)))

/**
 * Whether a slope is a side of an octagonal or splayed end: both its corners at 135°, and the slopes
 * round them of its own pitch.
 */
const isSplaySide = (ground: Ground, slope: Slope): boolean => {
  const { edges } = ground.plates
  const [first, last] = [at(slope.edges, 0), at(slope.edges, slope.edges.length - 1)]
  const [before, after] = [at(edges, first - 1), at(edges, last + 1)]
  if (before.finish === 'gable' || after.finish === 'gable') return false
  if (before.pitchDeg !== slope.pitchDeg || after.pitchDeg !== slope.pitchDeg) return false
  const corners = [interiorDeg(before, at(edges, first)), interiorDeg(at(edges, last), after)]
  return corners.every((deg) => Math.abs(deg - splayCornerDeg) < cornerSlackDeg)
}

type Miss = { crown: Member; exact: number; short: number; gapMm: number }

/** Where the short cut misses a diagonal crown end by over half a degree; null where it does not. */
const shortcutMiss = (crown: Member, members: Member[]): Miss | null => {
  const heads = crown.cuts.filter((cut) => cut.end === 'head' && cut.longSide !== 'none')
  const [first, second] = heads
  if (crown.role !== 'crown-end' || first === undefined || second === undefined) return null
  const exact = first.edge.fromEdgeDeg
  if (Math.abs(exact - second.edge.fromEdgeDeg) > bevelSlackDeg) return null
  const [backed] = members
    .filter((m) => m.role === 'hip' && m.planes.some((p) => crown.planes.includes(p)))
    .flatMap((hip) =>
      hip.cuts.filter((c) => c.against === crown.mark).map((c) => backedEdgeDeg(hip, c)),
    )
  if (backed === undefined || Math.abs(exact - 2 * backed) <= bevelSlackDeg) return null
  const short = 2 * backed
  const acrossMm = crown.section.thicknessMm / 2 / Math.sin(radians(exact))
  const gapMm = acrossMm * Math.tan(radians(Math.abs(exact - short)))
  return { crown, exact, short, gapMm }
}

/**
 * Common practice (no source) takes a diagonal crown end's edge bevel at an octagonal or splayed end as
 * twice the backed hip's beside it; where that is over half a degree out, says what it would cost at
 * the joint.
 */
export const crownShortcut = (ground: Ground, members: Member[]): Caution[] => {
  const misses = members.flatMap((crown) => {
    const [plane] = crown.planes
    if (plane === undefined || !isSplaySide(ground, at(ground.plates.slopes, plane))) return []
    return shortcutMiss(crown, members) ?? []
  })
  const [first] = misses
  if (first === undefined) return []
  const text =
    `Twice the backed hip's edge bevel would give ${first.crown.mark} ${first.short.toFixed(2)}° from the edge; ` +
    `the joint wants ${first.exact.toFixed(2)}°. The short cut leaves ${first.gapMm.toFixed(1)} mm open at the joint.`
  const remedy = 'Mark the edge bevel given here (the short cut is common practice, no source).'
  const crowns = misses.map((m) => m.crown)
  return [cautionOf('crown-bevel-shortcut', crowns, text, remedy)]
}
