import { crossingAt, crossingOf, timberPoint, topFall } from './bevel.ts'
import type { Timber } from './bevel.ts'
import type { DraftCut } from './cuts.ts'
import { faceCorners } from './ends.ts'
import type { DraftMember } from './members.ts'
import type { FrameSpec, Point3, RoofSettings } from './roof-types.ts'
import { sectionCorners } from './secondary/end-faces.ts'
import { along3, cross3, dot3, radians, scale3, unit3 } from './vector.ts'
import type { Plane } from './vector.ts'

const roundTo = (value: number, step: number): number => Math.round(value / step) * step

/** The side a cut's marks start from: its long point, or either arris of a square cut. */
const markedSide = (cut: DraftCut): 1 | -1 => (cut.longSide === 'right' ? -1 : 1)

/**
 * Normal of the top as the bevel lies on it: the half planed to a slope on the cut's side; square for
 * a square top, and for a cut that is marked square across the bar.
 */
const topNormal = (timber: Timber, cut: DraftCut): Point3 => {
  if (cut.longSide === 'none') return timber.up
  const away = -markedSide(cut)
  const { left, right } = timber.arrisFall
  const fall = (away > 0 ? left : right) / timber.halfMm
  return unit3(along3(timber.up, timber.left, away * fall * timber.cos))
}

/**
 * A cut as it comes out when its long point, face and edge bevels are marked to the given steps:
 * the plane through the marked point, along both marked lines.
 */
const rebuiltPlane = (timber: Timber, cut: DraftCut, roundMm: number, roundDeg: number): Plane => {
  const side = markedSide(cut)
  const leftMm = side * timber.halfMm
  const along = roundTo(cut.longPointFromHeelMm, roundMm)
  const point = timberPoint(timber, along, leftMm, topFall(timber, leftMm))
  const face = radians(roundTo(cut.face.fromEdgeDeg, roundDeg))
  const edge = radians(roundTo(cut.edge.fromEdgeDeg, roundDeg))
  const down = along3(scale3(timber.direction, -Math.cos(face)), timber.up, -Math.sin(face))
  const top = topNormal(timber, cut)
  const inward = unit3(cross3(timber.direction, top))
  const across = dot3(inward, timber.left) * side > 0 ? scale3(inward, -1) : inward
  const back = cut.end === 'head' ? -1 : 1
  const line = along3(scale3(timber.direction, back * Math.cos(edge)), across, Math.sin(edge))
  const normal = unit3(cross3(line, down))
  return { point, normal: dot3(normal, cut.plane.normal) < 0 ? scale3(normal, -1) : normal }
}

/** Largest gap between a cut's face and its rebuilt self, over the face's corners, mm square to the cut. */
const gapMm = (
  { timber, cuts, topInSlope }: DraftMember,
  cut: DraftCut,
  rebuilt: Plane,
): number => {
  const facing = Math.abs(dot3(cut.plane.normal, timber.direction))
  const marked = crossingOf(rebuilt, timber)
  const upper = cut.end === 'head'
  const sameEnd = cuts.filter((other) => (other.end === 'head') === upper)
  // the cuts of a timber that lies in a slope meet across its sides too
  const corners = topInSlope === true ? sectionCorners : faceCorners
  const offs = corners(timber, sameEnd, cut, upper).map(({ leftMm, downMm }) =>
    Math.abs(crossingAt(marked, leftMm, downMm) - crossingAt(cut.crossing, leftMm, downMm)),
  )
  return facing * Math.max(0, ...offs)
}

/** The joint that suffers most when every number is marked to the settings' steps, mm. */
export const worstRounding = (
  drafts: DraftMember[],
  settings: RoofSettings,
  markOf: Map<number, string>,
): FrameSpec['rounding'] => {
  let worst: FrameSpec['rounding'] = { worstMm: 0, joint: null }
  for (const draft of drafts) {
    const { piece, timber, cuts } = draft
    for (const cut of cuts) {
      const [against] = cut.bears
      if (against === undefined) continue
      const rebuilt = rebuiltPlane(timber, cut, settings.roundMm, settings.roundDeg)
      const gap = gapMm(draft, cut, rebuilt)
      if (gap > worst.worstMm + 1e-9) {
        const joint: [string, string] = [markOf.get(piece.id) ?? '', markOf.get(against) ?? '']
        worst = { worstMm: gap, joint }
      }
    }
  }
  return worst
}
