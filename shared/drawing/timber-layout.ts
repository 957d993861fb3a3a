import type { DrawnMember } from './timber-pose.ts'
import type { DrawingPoint } from './drawing-geometry.ts'
import type { BirdsmouthPoints, SidePoint } from './timber-outline.ts'
import { timberEndLines } from './timber-outline.ts'
import type { TimberPoint } from './timber-shape.ts'
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

/** Tail, birdsmouth and head (a ridge: its two ends), each with a little plain timber beside it. */
export function zoneWishes(member: DrawnMember, mouth: BirdsmouthPoints | null): TimberZoneWish[] {
  const alongs = (end: 'head' | 'foot') =>
    timberEndLines(member, end).flatMap((line) => [line.from.alongMm, line.to.alongMm])
  const heel = mouth
    ? [0, mouth.heelTop.alongMm, mouth.heelFoot.alongMm, mouth.seatEnd.alongMm]
    : [0]
  const zone = (of: number[], beforePx: number, afterPx: number): TimberZoneWish => ({
    fromMm: Math.min(...of),
    toMm: Math.max(...of),
    beforePx,
    afterPx,
  })
  const foot = zone(alongs('foot'), 0, 16)
  if (member.role === 'ridge') {
    // Where a ridge's set-out ends, so that what runs past it is seen.
    const head = [...alongs('head'), member.setOutLengthMm]
    return [foot, zone(heel, 14, 14), zone(head, 40, 0)]
  }
  const head = zone(alongs('head'), 40, 0)
  return mouth ? [foot, zone(heel, 14, 14), head] : [zone(alongs('foot'), 0, 40), head]
}

export function layoutFor(member: DrawnMember, scale: TimberScale, topY: number): TimberLayout {
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
