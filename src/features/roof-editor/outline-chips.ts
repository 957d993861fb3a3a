import {
  boxesOverlap,
  pointAlong,
  segmentLength,
  type TurnedBox,
} from '../../../shared/drawing/drawing-geometry.ts'
import { edgeOutward } from '../../../shared/drawing/overhang-outline.ts'
import type { PlanView } from '../../../shared/drawing/plan-view.ts'
import { textWidthPx } from '../../../shared/drawing/text-size.ts'
import type { Roof, RoofEdge } from '../../../shared/roof/roof-types.ts'

/** A word about an edge, written inside its plate. */
export type PlanChip = TurnedBox & { edge: number; text: string; sizePx: number; isStrong: boolean }

const sizePx = 12
const heightPx = 18
const offPx = 15
const handlePx = 16

export function edgeLine({ outline }: Pick<Roof, 'outline'>, view: PlanView, edge: number) {
  const from = outline[edge] ?? { x: 0, y: 0 }
  const to = outline[(edge + 1) % outline.length] ?? from
  return { from: view.place(from), to: view.place(to) }
}

/** Gables and pitches that differ first, then the common pitch; each only where it stands clear of the others. */
export function edgeChips(roof: Roof, view: PlanView): PlanChip[] {
  const common = commonPitch(roof)
  const taken: TurnedBox[] = roof.outline.map((corner) => ({
    centre: view.place(corner),
    widthPx: handlePx,
    heightPx: handlePx,
    angleDeg: 0,
  }))
  const wanted = roof.edges.flatMap((edge, i) => chipOf(roof, view, i, edge, common))
  const strongFirst = [...wanted].sort((a, b) => Number(b.isStrong) - Number(a.isStrong))
  return strongFirst.filter((chip) => {
    if (taken.some((box) => boxesOverlap(box, chip))) return false
    taken.push(chip)
    return true
  })
}

function chipOf(
  roof: Roof,
  view: PlanView,
  edge: number,
  own: RoofEdge,
  common: number | null,
): PlanChip[] {
  const pitch = own.finish === 'eave' && Number.isFinite(own.pitchDeg) ? `${own.pitchDeg}°` : ''
  const text = own.finish === 'gable' ? 'Gable' : pitch
  const line = edgeLine(roof, view, edge)
  const widthPx = textWidthPx(text, sizePx) + 8
  if (text === '' || segmentLength(line) < widthPx) return []
  const outward = edgeOutward(roof.outline, edge)
  const middle = pointAlong(line, 0.5)
  const reachPx = offPx + (Math.abs(outward.x) * widthPx) / 2
  const centre = { x: middle.x - outward.x * reachPx, y: middle.y + outward.y * reachPx }
  const isStrong = own.finish === 'gable' || own.pitchDeg !== common
  return [{ edge, text, sizePx, isStrong, centre, widthPx, heightPx, angleDeg: 0 }]
}

/** The pitch that most edges have. */
function commonPitch({ edges }: Roof): number | null {
  const counts = new Map<number, number>()
  for (const edge of edges) {
    if (edge.finish === 'eave') counts.set(edge.pitchDeg, (counts.get(edge.pitchDeg) ?? 0) + 1)
  }
  const [most] = [...counts].sort((a, b) => b[1] - a[1])
  return most?.[0] ?? null
}
