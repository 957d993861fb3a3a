import { timberAxes, timberTop } from '../drawing/timber-shape.ts'
import type { Cut, Member } from '../roof/roof-types.ts'
import { angleText, type MarkingOptions } from './marking-figures.ts'

export const pastSawSafety = "Clamped, guard working, within the saw's manual."

/** Blade tilt from square with the saw base on the top edge, before any backing, degrees. */
export function topTiltDeg(member: Member, cut: Cut): number {
  const { down } = timberAxes(member)
  const { normal } = cut.plane
  const reach = Math.hypot(normal.x, normal.y, normal.z)
  const up = Math.abs(normal.x * down.x + normal.y * down.y + normal.z * down.z) / (reach || 1)
  return (Math.asin(Math.min(1, up)) * 180) / Math.PI
}

/** How to saw what the blade cannot tilt to; empty when it can. */
export function pastSawWords(member: Member, cut: Cut, options: MarkingOptions): string[] {
  if (!cut.pastSaw) return []
  const tilt = angleText(cut.bladeTiltDeg, options)
  const limit = options.sawMaxTiltDeg
  const past =
    limit === undefined
      ? `Past the saw: needs ${tilt} of tilt.`
      : `Past the saw: needs ${tilt} of tilt, the saw has ${angleText(limit, options)}.`
  const top = timberTop(member)
  const squareTop = top === 'backed' ? cut.edgeOtherTop : cut.edge
  const finish = 'then finish down the marked side lines with a handsaw.'
  if (!squareTop || topTiltDeg(member, cut) > (limit ?? 45))
    return [past, `Way round: mark it on all faces and cut it with a handsaw.`, pastSawSafety]
  const before = { backed: 'before backing, run', dished: 'before dishing, run', square: 'run' }[
    top
  ]
  const line = angleText(squareTop.fromEdgeDeg, options)
  const topTilt = angleText(topTiltDeg(member, cut), options)
  return [
    past,
    `Way round: ${before} the saw on the top edge along a line ${line} from the edge, blade tilted ${topTilt}, as deep as it goes, ${finish}`,
    pastSawSafety,
  ]
}
