import type { DrawnMember } from './timber-pose.ts'
import { arrisFallMm, timberEndMm, timberTopEnd } from './timber-shape.ts'

/** Along the timber and down square to its edge. */
export type SidePoint = { alongMm: number; downMm: number }

/** A line of the side view; hidden where it lies behind the timber. */
export type SideLine = { from: SidePoint; to: SidePoint; isHidden: boolean }

const sameMm = 0.05

export type BirdsmouthPoints = {
  /** Where the heel plumb line meets the top edge; a valley's stands out from the corner. */
  heelTop: SidePoint
  /** Where heel and seat meet: the plate's outer top edge. */
  corner: SidePoint
  heelFoot: SidePoint
  seatEnd: SidePoint
}

/**
 * The silhouette from the right-hand side, foot to the left, with the birdsmouth taken out. Where the
 * foot is cut away inside the heel line, as against a valley, only what is left of the birdsmouth shows.
 */
export function timberSideOutline(member: DrawnMember): SidePoint[] {
  const depthMm = member.section.depthMm
  const reach = (end: 'head' | 'foot', downMm: number): SidePoint => {
    const ends = timberTopEnd(member, end).map((p) => timberEndMm(member, end, p.acrossMm, downMm))
    return { alongMm: end === 'head' ? Math.max(...ends) : Math.min(...ends), downMm }
  }
  const head = [reach('head', 0), reach('head', depthMm)]
  const foot = { top: reach('foot', 0), under: reach('foot', depthMm) }
  const mouth = birdsmouthPoints(member)
  if (!mouth) return [foot.top, ...head, foot.under]
  const beyondMm = Math.min(foot.top.alongMm, foot.under.alongMm, mouth.heelFoot.alongMm) - depthMm
  const uncut: SidePoint[] = [
    { alongMm: beyondMm, downMm: 0 },
    ...head,
    mouth.seatEnd,
    mouth.corner,
    mouth.heelFoot,
    { alongMm: beyondMm, downMm: depthMm },
  ]
  return cutAtFoot(uncut, foot, depthMm)
}

/** Keeps what lies on the head's side of the foot's line. */
function cutAtFoot(
  shape: readonly SidePoint[],
  foot: { top: SidePoint; under: SidePoint },
  depthMm: number,
): SidePoint[] {
  const lineAt = (downMm: number) =>
    foot.top.alongMm + ((foot.under.alongMm - foot.top.alongMm) * downMm) / depthMm
  const inside = (p: SidePoint) => p.alongMm - lineAt(p.downMm)
  return shape.flatMap((from, i) => {
    const to = shape[(i + 1) % shape.length] ?? from
    const [here, there] = [inside(from), inside(to)]
    const kept = here >= 0 ? [from] : []
    if (here >= 0 === there >= 0) return kept
    const share = here / (here - there)
    const at = (of: 'alongMm' | 'downMm') => from[of] + (to[of] - from[of]) * share
    return [...kept, { alongMm: at('alongMm'), downMm: at('downMm') }]
  })
}

/** Heel and seat, from the numbers of the birdsmouth alone. */
export function birdsmouthPoints(member: DrawnMember): BirdsmouthPoints | null {
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
  const movedOut = moved({ alongMm: 0, downMm: 0 }, level, -mouth.heelOffsetMm)
  const corner = moved(movedOut, plumb, mouth.standMm)
  return {
    heelTop: { alongMm: -heelOutAlongMm(member), downMm: 0 },
    corner,
    heelFoot: moved(corner, plumb, mouth.heelMm),
    seatEnd: moved(corner, level, mouth.seatMm),
  }
}

/** How far down the top edge a valley's heel line stands from the plumb line through the plate corner. */
export function heelOutAlongMm({ birdsmouth, pitchDeg }: DrawnMember): number {
  if (!birdsmouth || birdsmouth.heelOffsetMm === 0) return 0
  return birdsmouth.heelOffsetMm / Math.cos((pitchDeg * Math.PI) / 180)
}

/** From the top edge plumb down the heel line to the seat. */
export function heelLineStandMm({ birdsmouth, pitchDeg }: DrawnMember): number {
  if (!birdsmouth) return 0
  return birdsmouth.standMm - birdsmouth.heelOffsetMm * Math.tan((pitchDeg * Math.PI) / 180)
}

/** The cut lines down the side: on the near (right) face, between cheeks, and dashed behind. */
export function timberEndLines(member: DrawnMember, end: 'head' | 'foot'): SideLine[] {
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
