import type { DrawnMember } from './timber-pose.ts'
import { formatLength, type LengthUnits } from '../units/format-length.ts'
import { cutWords, type BevelDialData, type BevelPlace } from './bevel-dials.ts'
import type { DrawingPoint } from './drawing-geometry.ts'
import { textWidthPx } from './text-size.ts'
import type { TimberLayout } from './timber-layout.ts'
import type { BirdsmouthPoints, SidePoint } from './timber-outline.ts'
import { timberEndLines } from './timber-outline.ts'
import { endCuts, timberTop, timberTopEnd, timberTopOutline } from './timber-shape.ts'
import { overPlateText, timberTextPx, type CalloutWish } from './timber-texts.ts'

export type TimberText = { text: string; x: number; baselineY: number }
export type TimberLetter = { letter: string; at: DrawingPoint }

/** The words below the side view: the cut at each end, heel and seat, with their bevels' letters. */
export function calloutWishes(
  member: DrawnMember,
  mouth: BirdsmouthPoints | null,
  dials: readonly BevelDialData[],
  layout: TimberLayout,
  units: LengthUnits,
): CalloutWish[] {
  const letterOf = (place: BevelPlace) =>
    dials.find((dial) => dial.where === 'side' && dial.places.includes(place))?.letter ?? null
  const ends = (['foot', 'head'] as const).flatMap((end): CalloutWish[] => {
    const cut = endCuts(member, end)[0]
    const near = timberEndLines(member, end)[0]
    if (!cut || !near) return []
    const words = cutWords(member, cut)
    const text = words === 'mitre' ? words : `${words}${cheekWords(endCuts(member, end))}`
    return [{ text, letter: letterOf(cut.end), anchor: layout.side(near.to), lean: 'middle' }]
  })
  if (!mouth || !member.birdsmouth) return ends
  const { seatMm, heelMm } = member.birdsmouth
  const midway = (a: SidePoint, b: SidePoint) =>
    layout.side({ alongMm: (a.alongMm + b.alongMm) / 2, downMm: (a.downMm + b.downMm) / 2 })
  return [
    ...ends,
    {
      text: `heel ${formatLength(heelMm, units)}`,
      letter: letterOf('heel'),
      anchor: midway(mouth.corner, mouth.heelFoot),
      lean: 'left',
    },
    {
      text: `seat ${formatLength(seatMm, units)}`,
      letter: letterOf('seat'),
      anchor: midway(mouth.corner, mouth.seatEnd),
      lean: 'right',
    },
  ]
}

function cheekWords(cuts: readonly { longSide: string }[]): string {
  const cheeks = cuts.filter((cut) => cut.longSide !== 'none').length
  if (cheeks === 0) return ''
  return cheeks === 1 ? ', one cheek' : ', two cheeks'
}

/** Letters of the bevels across the top in the margin beside the cut, and of the backing over it. */
export function topLetters(
  member: DrawnMember,
  dials: readonly BevelDialData[],
  layout: TimberLayout,
): TimberLetter[] {
  const middleY = layout.topY + layout.topHeightPx / 2
  const xs = timberTopOutline(member).map((p) => layout.top(p).x)
  const endLetters = (['foot', 'head'] as const).flatMap((end) => {
    const places = endCuts(member, end).map((cut): BevelPlace => cut.end)
    const across = dials.filter(
      (dial) => dial.where === 'top' && dial.places.some((place) => places.includes(place)),
    )
    const x = end === 'head' ? Math.max(...xs) + 15 : Math.min(...xs) - 15
    // The long side's bevel cuts the other side away, and stands beside it.
    return across.map((dial, i) => {
      const awayPx = across.length === 1 ? 0 : dial.longSide === 'left' ? 10 : -10
      // Two cheeks one behind the other on one side stand beside one another.
      const before = across.slice(0, i).filter((one) => one.longSide === dial.longSide).length
      const outPx = 20 * before * (end === 'head' ? 1 : -1)
      return { letter: dial.letter, at: { x: x + outPx, y: middleY + awayPx } }
    })
  })
  const backing = dials.filter((dial) => dial.where === 'end')
  const backingLetters = backing.map((dial, i) => ({
    letter: dial.letter,
    at: { x: backingX(member, layout) + 9 + i * 20, y: layout.topY - 10 },
  }))
  return [...endLetters, ...backingLetters]
}

/** Where the backing is named: at the heel line, or clear of the foot's points. */
function backingX(member: DrawnMember, layout: TimberLayout): number {
  if (member.birdsmouth) return layout.scale.xPx(0) + 7
  const left = timberTopEnd(member, 'foot')[0]?.alongMm ?? 0
  return layout.scale.xPx(left) + 11
}

/** Which arris is which, the backing, and the height over plate at the top of its plumb line. */
export function timberTexts(
  member: DrawnMember,
  mouth: BirdsmouthPoints | null,
  dials: readonly BevelDialData[],
  layout: TimberLayout,
  units: LengthUnits,
): TimberText[] {
  const overY = layout.topY - 5
  const underY = layout.topY + layout.topHeightPx + timberTextPx + 3
  const heelX = layout.scale.xPx(0) + 7
  const overX = backingX(member, layout)
  const backing = dials.filter((dial) => dial.where === 'end').length
  const over =
    backing > 0
      ? [
          {
            text: timberTop(member) === 'dished' ? 'dish' : 'backing',
            x: overX + backing * 20,
            baselineY: overY,
          },
        ]
      : []
  const plate = mouth ? [{ text: overPlateText(member, units), x: heelX, baselineY: underY }] : []
  const taken = [...over, ...plate].map((t) => t.x + textWidthPx(t.text, timberTextPx) + 8)
  const headZone = layout.scale.zones.at(-1)
  const x = Math.max((headZone?.startPx ?? 0) + 4, ...taken)
  return [
    { text: 'left', x, baselineY: overY },
    { text: 'right', x, baselineY: underY },
    ...over,
    ...plate,
  ]
}
