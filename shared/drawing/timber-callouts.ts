import type { Member } from '../roof/roof-types.ts'
import { formatLength } from '../units/format-length.ts'
import type { LengthUnits } from '../units/format-length.ts'
import { cutWords, type BevelDialData } from './bevel-dials.ts'
import type { DrawingPoint } from './drawing-geometry.ts'
import type { TimberLayout } from './timber-layout.ts'
import type { BirdsmouthPoints, SidePoint } from './timber-outline.ts'
import { timberEndLines } from './timber-outline.ts'
import { endCuts, timberTopOutline } from './timber-shape.ts'
import { overPlateText, timberTextPx, type CalloutWish } from './timber-texts.ts'

export type TimberText = {
  text: string
  x: number
  baselineY: number
  anchor: 'start' | 'middle' | 'end'
}
export type TimberLetter = { letter: string; at: DrawingPoint }

export function calloutWishes(
  member: Member,
  mouth: BirdsmouthPoints | null,
  dials: readonly BevelDialData[],
  layout: TimberLayout,
  units: LengthUnits,
): CalloutWish[] {
  const letterOf = (at: BevelDialData['at']) =>
    dials.find((dial) => dial.at === at && dial.where === 'side')?.letter ?? null
  const ends = (['foot', 'head'] as const).flatMap((end): CalloutWish[] => {
    const cut = endCuts(member, end)[0]
    const near = timberEndLines(member, end)[0]
    if (!cut || !near) return []
    const text = `${cutWords(member, cut)}${cheekWords(endCuts(member, end))}`
    return [{ text, letter: letterOf(cut.end), anchor: layout.side(near.to) }]
  })
  if (!mouth || !member.birdsmouth) return ends
  const { seatMm, heelMm } = member.birdsmouth
  const midway = (a: SidePoint, b: SidePoint) =>
    layout.side({ alongMm: (a.alongMm + b.alongMm) / 2, downMm: (a.downMm + b.downMm) / 2 })
  const length = (mm: number) => formatLength(mm, units)
  return [
    ...ends,
    {
      text: `heel ${length(heelMm)}`,
      letter: letterOf('heel'),
      anchor: midway(mouth.corner, mouth.heelFoot),
    },
    {
      text: `seat ${length(seatMm)}`,
      letter: letterOf('seat'),
      anchor: midway(mouth.corner, mouth.seatEnd),
    },
  ]
}

function cheekWords(cuts: readonly { longSide: string }[]): string {
  const cheeks = cuts.filter((cut) => cut.longSide !== 'none').length
  if (cheeks === 0) return ''
  return cheeks === 1 ? ', one cheek' : ', two cheeks'
}

/** Letters of the bevels across the top, in the margin beside the cut. */
export function endLetters(
  member: Member,
  dials: readonly BevelDialData[],
  layout: TimberLayout,
): TimberLetter[] {
  const y = layout.topY + layout.topHeightPx / 2
  const outline = timberTopOutline(member).map(layout.top)
  const leftX = Math.min(...outline.map((p) => p.x)) - 14
  const rightX = Math.max(...outline.map((p) => p.x)) + 14
  return (['foot', 'head'] as const).flatMap((end) => {
    const across = dials.filter(
      (dial) => dial.where === 'top' && (dial.at === 'head') === (end === 'head'),
    )
    return across.map((dial, i) => ({
      letter: dial.letter,
      at: {
        x: end === 'head' ? rightX : leftX,
        y: across.length === 1 ? y : y + (dial.longSide === 'right' ? -10 : 10) * (i < 2 ? 1 : 2),
      },
    }))
  })
}

/** Which arris is which, and the height over plate beside its plumb line. */
export function edgeTexts(
  member: Member,
  mouth: BirdsmouthPoints | null,
  layout: TimberLayout,
  units: LengthUnits,
): TimberText[] {
  const first = layout.scale.zones[0]
  const x = (first?.startPx ?? 0) + 4
  const underY = layout.topY + layout.topHeightPx + timberTextPx + 2
  const texts: TimberText[] = [
    { text: 'left', x, baselineY: layout.topY - 5, anchor: 'start' },
    { text: 'right', x, baselineY: underY, anchor: 'start' },
  ]
  if (mouth) {
    const at = layout.side({
      alongMm: (mouth.heelTop.alongMm + mouth.corner.alongMm) / 2,
      downMm: mouth.corner.downMm / 2,
    })
    texts.push({
      text: overPlateText(member, units),
      x: at.x + 6,
      baselineY: at.y + timberTextPx / 3,
      anchor: 'start',
    })
  }
  return texts
}
