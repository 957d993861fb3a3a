import type { Member } from '../roof/roof-types.ts'
import type { LengthUnits } from '../units/format-length.ts'
import type { DrawingPoint } from './drawing-geometry.ts'
import { textWidthPx } from './text-size.ts'
import type { BirdsmouthPoints, SidePoint } from './timber-outline.ts'
import { timberEndLines, timberSideOutline } from './timber-outline.ts'
import type { TimberPoint } from './timber-shape.ts'
import { overPlateText, timberTextPx } from './timber-texts.ts'
import type { TimberScale, TimberZoneWish } from './timber-zones.ts'

/** Where the two views stand in the drawing, and how timber points come to px. */
export type TimberLayout = {
  scale: TimberScale
  top: (point: TimberPoint) => DrawingPoint
  side: (point: SidePoint) => DrawingPoint
  topY: number
  topHeightPx: number
  sideY: number
  sideHeightPx: number
}

const betweenPx = 24

/** Tail, birdsmouth and head, each with a little plain timber beside it. */
export function zoneWishes(
  member: Member,
  mouth: BirdsmouthPoints | null,
  units: LengthUnits,
): TimberZoneWish[] {
  const outline = timberSideOutline(member)
  const depthMm = member.section.depthMm
  const alongs = (end: 'head' | 'foot') =>
    timberEndLines(member, end).flatMap((line) => [line.from.alongMm, line.to.alongMm])
  const head = alongs('head')
  const foot = alongs('foot')
  const overPlatePx = textWidthPx(overPlateText(member, units), timberTextPx) + 12
  const heel = mouth ? [0, mouth.heelFoot.alongMm, mouth.seatEnd.alongMm] : [0]
  const zone = (of: number[], beforePx: number, afterPx: number): TimberZoneWish => ({
    fromMm: Math.min(...of),
    toMm: Math.max(...of),
    beforePx,
    afterPx,
  })
  const isUsable = outline.every((p) => Number.isFinite(p.alongMm)) && depthMm > 0
  if (!isUsable) return [zone([0, member.setOutLengthMm], 0, 0)]
  return [zone(foot, 0, 26), zone(heel, 22, mouth ? overPlatePx : 0), zone(head, 40, 0)]
}

export function layoutFor(member: Member, scale: TimberScale, topY: number): TimberLayout {
  const { thicknessMm, depthMm } = member.section
  const topHeightPx = thicknessMm * scale.pxPerMm
  const sideY = topY + topHeightPx + betweenPx
  return {
    scale,
    topY,
    topHeightPx,
    sideY,
    sideHeightPx: depthMm * scale.pxPerMm,
    top: (p) => ({
      x: scale.xPx(p.alongMm),
      y: topY + (thicknessMm / 2 - p.acrossMm) * scale.pxPerMm,
    }),
    side: (p) => ({ x: scale.xPx(p.alongMm), y: sideY + p.downMm * scale.pxPerMm }),
  }
}
