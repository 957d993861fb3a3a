import type { CutLine } from '../roof/roof-types.ts'
import type { Segment, TurnedBox } from './drawing-geometry.ts'
import { segmentLength } from './drawing-geometry.ts'
import { drawingPaper, type DrawingPaper, type PaperWord } from './drawing-paper.ts'
import {
  type LabelPlace,
  mayStandOverRafters,
  markBox,
  placesAlong,
  placesBeside,
  placesFurtherOff,
  standsInRow,
} from './plan-label-places.ts'
import type { PlanMember } from './plan-members.ts'

/** A mark on the plan; the fine line leads to its timber where it stands beside it. */
export type PlanLabel = TurnedBox & {
  mark: string
  text: string
  sizePx: number
  leader: Segment | null
}

export type PlanLabelOptions = {
  widthPx: number
  heightPx: number
  /** Marks placed first and never left out while there is any room at all. */
  firstMarks: ReadonlySet<string>
  /** Where nothing may be written: problem markers, dimensions. */
  taken: readonly PaperWord[]
}

export type PlanLabels = { labels: PlanLabel[]; hiddenMarks: string[] }

const sizePx = 12
const smallSizePx = 10
/** Rafters nearer than this leave no room for words between them; a larger drawing does. */
const leastBayPx = 8
const openBayPx = 20
const mostOverOthers = 24

type Way = {
  sizePx: number
  places: (member: PlanMember, box: TurnedBox) => Iterable<LabelPlace>
  mayCross: boolean
}

const along: Way = { sizePx, places: placesAlong, mayCross: false }
const alongSmall: Way = { sizePx: smallSizePx, places: placesAlong, mayCross: false }
const acrossOthers: Way = { sizePx, places: placesAlong, mayCross: true }
const beside: Way = { sizePx: smallSizePx, places: placesBeside, mayCross: false }
const besideOverOthers: Way = {
  sizePx: smallSizePx,
  places: placesFurtherOff,
  mayCross: true,
}
const inTheMiddle: Way = {
  sizePx,
  places: (_, box) => [{ ...box, leader: null }],
  mayCross: true,
}

/**
 * Marks written along their timbers: upright, in rows beside the plates, never over one another. Where
 * a drawing is too dense for that they are written smaller, then beside the timber with a fine line to
 * it; then the cut line's mark stands in; then nothing: picking the timber or drawing larger shows it.
 * Each cut line keeps at least one mark where there is room.
 */
export function placePlanLabels(
  members: readonly PlanMember[],
  cutLines: readonly Pick<CutLine, 'mark' | 'members'>[],
  options: PlanLabelOptions,
): PlanLabels {
  const lineMarkOf = new Map(cutLines.flatMap((l) => l.members.map((mark) => [mark, l.mark])))
  const paper = drawingPaper(options)
  for (const word of options.taken) paper.addWord(word)
  for (const member of members) paper.addLine(member.centre, member.mark)
  const labels = new Map<string, PlanLabel>()
  const write = (member: PlanMember, text: string, way: Way) => {
    if (labels.has(member.mark)) return
    const label = roomFor(member, text, paper, way)
    if (!label) return
    paper.addWord(label)
    labels.set(member.mark, label)
  }
  const ordered = inWritingOrder(members, options.firstMarks)
  const isFirst = (member: PlanMember) => options.firstMarks.has(member.mark)
  for (const member of ordered) {
    write(member, member.mark, along)
    if (!standsInRow(member)) write(member, member.mark, alongSmall)
    if (isFirst(member) || mayStandOverRafters(member)) write(member, member.mark, acrossOthers)
    if (isFirst(member)) write(member, member.mark, inTheMiddle)
  }
  for (const member of ordered) write(member, member.mark, alongSmall)
  if (bayPx(members) >= leastBayPx) for (const member of ordered) write(member, member.mark, beside)
  // The last few of an open drawing, as where short creepers crowd at a crossing, stand over others.
  const left = ordered.filter((member) => !labels.has(member.mark))
  if (left.length <= mostOverOthers && bayPx(members) >= openBayPx)
    for (const member of left) write(member, member.mark, besideOverOthers)
  for (const member of ordered) {
    const lineMark = lineMarkOf.get(member.mark)
    if (lineMark && lineMark !== member.mark) write(member, lineMark, alongSmall)
  }
  for (const line of cutLines) {
    if (line.members.some((mark) => labels.has(mark))) continue
    const longest = ordered.find((member) => line.members.includes(member.mark))
    if (longest) write(longest, line.mark, acrossOthers)
    if (longest) write(longest, line.mark, inTheMiddle)
  }
  return {
    labels: [...labels.values()],
    hiddenMarks: members.map((m) => m.mark).filter((mark) => !labels.has(mark)),
  }
}

/** Picked marks, then the long timbers that carry the roof, then the rest from long to short. */
function inWritingOrder(
  members: readonly PlanMember[],
  firstMarks: ReadonlySet<string>,
): PlanMember[] {
  const rank = (member: PlanMember) =>
    firstMarks.has(member.mark) ? 0 : standsInRow(member) ? 2 : 1
  return [...members].sort(
    (a, b) => rank(a) - rank(b) || segmentLength(b.centre) - segmentLength(a.centre),
  )
}

function roomFor(
  member: PlanMember,
  text: string,
  paper: DrawingPaper,
  way: Way,
): PlanLabel | null {
  const box = markBox(member, text, way.sizePx)
  let firstFree: LabelPlace | null = null
  for (const place of way.places(member, box)) {
    if (!paper.hasRoom(place)) continue
    // Beside its timber a mark keeps off that too; along it, it stands on it.
    if (!paper.isCrossed(place, place.leader ? '' : member.mark)) {
      firstFree = place
      break
    }
    if (way.mayCross) firstFree ??= place
  }
  return firstFree ? { ...firstFree, mark: member.mark, text, sizePx: way.sizePx } : null
}

/** The usual distance of two rafters side by side; how dense the drawing is. */
function bayPx(members: readonly PlanMember[]): number {
  const rows = members.filter(standsInRow)
  const gaps = rows.slice(1).flatMap((member, i) => {
    const before = rows[i]
    if (!before || before.role !== member.role) return []
    return [Math.hypot(member.heel.x - before.heel.x, member.heel.y - before.heel.y)]
  })
  return gaps.sort((a, b) => a - b)[Math.floor(gaps.length / 2)] ?? Infinity
}
