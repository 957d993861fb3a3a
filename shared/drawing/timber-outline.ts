import type { Member } from '../roof/roof-types.ts'
import { arrisFallMm, timberEndMm, timberTopEnd } from './timber-shape.ts'

/** Along the timber and down square to its edge. */
export type SidePoint = { alongMm: number; downMm: number }

/** A line of the side view; hidden where it lies behind the timber. */
export type SideLine = { from: SidePoint; to: SidePoint; isHidden: boolean }

const sameMm = 0.05

export type BirdsmouthPoints = {
  /** On the top edge. */
  heelTop: SidePoint
  /** Where heel and seat meet: the plate's outer top edge. */
  corner: SidePoint
  heelFoot: SidePoint
  seatEnd: SidePoint
}

/** The silhouette from the right-hand side, foot to the left, with the birdsmouth taken out. */
export function timberSideOutline(member: Member): SidePoint[] {
  const depthMm = member.section.depthMm
  const reach = (end: 'head' | 'foot', downMm: number): SidePoint => {
    const ends = timberTopEnd(member, end).map((p) => timberEndMm(member, end, p.acrossMm, downMm))
    return { alongMm: end === 'head' ? Math.max(...ends) : Math.min(...ends), downMm }
  }
  const mouth = birdsmouthPoints(member)
  const notch = mouth ? [mouth.seatEnd, mouth.corner, mouth.heelFoot] : []
  return [
    reach('foot', 0),
    reach('head', 0),
    reach('head', depthMm),
    ...notch,
    reach('foot', depthMm),
  ]
}

/** Heel and seat, from the numbers of the birdsmouth alone. */
export function birdsmouthPoints(member: Member): BirdsmouthPoints | null {
  const mouth = member.birdsmouth
  if (!mouth) return null
  const heelRad = (mouth.heelFromEdgeDeg * Math.PI) / 180
  const seatRad = (mouth.seatFromEdgeDeg * Math.PI) / 180
  const plumb = { alongMm: -Math.cos(heelRad), downMm: Math.sin(heelRad) }
  const level = { alongMm: Math.cos(seatRad), downMm: Math.sin(seatRad) }
  const moved = (from: SidePoint, way: SidePoint, mm: number): SidePoint => ({
    alongMm: from.alongMm + way.alongMm * mm,
    downMm: from.downMm + way.downMm * mm,
  })
  const heelTop = moved({ alongMm: 0, downMm: 0 }, level, -mouth.heelOffsetMm)
  const corner = moved(heelTop, plumb, mouth.standMm)
  return {
    heelTop: { alongMm: 0, downMm: 0 },
    corner,
    heelFoot: moved(corner, plumb, mouth.heelMm),
    seatEnd: moved(corner, level, mouth.seatMm),
  }
}

/** The cut lines down the side: on the near (right) face, between cheeks, and dashed behind. */
export function timberEndLines(member: Member, end: 'head' | 'foot'): SideLine[] {
  const outward = end === 'head' ? 1 : -1
  const nearToFar = [...timberTopEnd(member, end)].reverse()
  const lines: SideLine[] = []
  for (const corner of nearToFar) {
    const at = (downMm: number): SidePoint => ({
      alongMm: timberEndMm(member, end, corner.acrossMm, downMm),
      downMm,
    })
    const reaches = lines.map((line) => outward * (line.to.alongMm - at(line.to.downMm).alongMm))
    if (reaches.some((reach) => Math.abs(reach) < sameMm)) continue
    lines.push({
      from: at(arrisFallMm(member, corner.acrossMm)),
      to: at(member.section.depthMm),
      isHidden: reaches.some((reach) => reach > 0),
    })
  }
  return lines
}
