import type { CutLine } from '../roof/roof-types.ts'
import type { Segment, TurnedBox } from './drawing-geometry.ts'
import {
  boxesOverlap,
  pointAlong,
  segmentCrossesBox,
  segmentLength,
  uprightAngleDeg,
} from './drawing-geometry.ts'
import type { PlanMember } from './plan-members.ts'
import { textWidthPx } from './text-size.ts'

export type PlanLabel = TurnedBox & { mark: string; text: string; sizePx: number }

export type PlanLabelOptions = {
  sizePx: number
  /** Marks placed first and never left out while there is any room at all. */
  firstMarks: ReadonlySet<string>
  /** Where nothing may be written: problem markers, dimensions. */
  taken: readonly TurnedBox[]
}

export type PlanLabels = { labels: PlanLabel[]; hiddenMarks: string[] }

const paddingPx = 3
const stepPx = 5
const lineClearancePx = 1

/**
 * Marks written along their timbers: upright, in rows beside the plates, never over one another.
 * Where a drawing is too dense for the full mark its cut line's mark stands in, then nothing: picking
 * the timber or drawing larger shows it. Each cut line keeps at least one mark where there is room.
 */
export function placePlanLabels(
  members: readonly PlanMember[],
  cutLines: readonly Pick<CutLine, 'mark' | 'members'>[],
  options: PlanLabelOptions,
): PlanLabels {
  const lineMarkOf = new Map(cutLines.flatMap((l) => l.members.map((mark) => [mark, l.mark])))
  const placed: PlanLabel[] = []
  const written = new Set<string>()
  const write = (member: PlanMember, text: string, mayCross: boolean) => {
    const label = roomFor(member, text, members, placed, options, mayCross)
    if (!label) return
    placed.push(label)
    written.add(member.mark)
  }
  const ordered = inWritingOrder(members, options.firstMarks)
  const isFirst = (member: PlanMember) => options.firstMarks.has(member.mark)
  for (const member of ordered) write(member, member.mark, isFirst(member))
  for (const member of ordered) {
    const lineMark = lineMarkOf.get(member.mark)
    if (lineMark && lineMark !== member.mark && !written.has(member.mark))
      write(member, lineMark, false)
  }
  for (const line of cutLines) {
    if (line.members.some((mark) => written.has(mark))) continue
    const longest = ordered.find((member) => line.members.includes(member.mark))
    if (longest) write(longest, line.mark, true)
  }
  return {
    labels: placed,
    hiddenMarks: members.map((m) => m.mark).filter((mark) => !written.has(mark)),
  }
}

/** Picked marks, then the long timbers that carry the roof, then the rest from long to short. */
function inWritingOrder(
  members: readonly PlanMember[],
  firstMarks: ReadonlySet<string>,
): PlanMember[] {
  const rank = (member: PlanMember) =>
    firstMarks.has(member.mark) ? 0 : isRafterRow(member) ? 2 : 1
  return [...members].sort(
    (a, b) => rank(a) - rank(b) || segmentLength(b.centre) - segmentLength(a.centre),
  )
}

function isRafterRow(member: PlanMember): boolean {
  return ['common', 'crown-end', 'creeper'].includes(member.role)
}

function roomFor(
  member: PlanMember,
  text: string,
  members: readonly PlanMember[],
  placed: readonly PlanLabel[],
  options: PlanLabelOptions,
  mayCross: boolean,
): PlanLabel | null {
  const widthPx = textWidthPx(text, options.sizePx) + 2 * paddingPx
  const label = (centre: { x: number; y: number }): PlanLabel => ({
    mark: member.mark,
    text,
    sizePx: options.sizePx,
    centre,
    widthPx,
    heightPx: options.sizePx + 2,
    angleDeg: uprightAngleDeg(member.centre),
  })
  const along = placesAlong(member, widthPx)
  const places = along.length > 0 || !mayCross ? along : [pointAlong(member.centre, 0.5)]
  const isTaken = (box: TurnedBox) =>
    placed.some((other) => boxesOverlap(box, other)) ||
    options.taken.some((other) => boxesOverlap(box, other))
  let firstFree: PlanLabel | null = null
  for (const place of places) {
    const box = label(place)
    if (isTaken(box)) continue
    if (!crossesAnother(box, member, members)) return box
    firstFree ??= box
  }
  return mayCross ? firstFree : null
}

function crossesAnother(box: TurnedBox, own: PlanMember, members: readonly PlanMember[]): boolean {
  const inner = {
    ...box,
    widthPx: box.widthPx - 2 * lineClearancePx,
    heightPx: box.heightPx - 2 * lineClearancePx,
  }
  return members.some((other) => other.mark !== own.mark && segmentCrossesBox(other.centre, inner))
}

/** Rafters from the plate up, so that marks stand in rows; other timbers from the middle out. */
function placesAlong(member: PlanMember, widthPx: number): { x: number; y: number }[] {
  const lengthPx = segmentLength(member.centre)
  if (lengthPx < widthPx) return []
  const start = widthPx / 2
  const end = lengthPx - widthPx / 2
  const places: number[] = []
  if (isRafterRow(member)) {
    const tail: Segment = { from: member.centre.from, to: member.heel }
    const fromPlate = Math.min(Math.max(segmentLength(tail) + start, start), end)
    for (let at = fromPlate; at <= end; at += stepPx) places.push(at)
    for (let at = fromPlate - stepPx; at >= start; at -= stepPx) places.push(at)
  } else {
    const middle = lengthPx / 2
    for (let off = 0; middle - off >= start; off += stepPx) places.push(middle + off, middle - off)
  }
  return places.map((at) => pointAlong(member.centre, at / lengthPx))
}
