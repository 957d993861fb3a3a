import type { DrawingPoint, Segment, TurnedBox } from './drawing-geometry.ts'
import { pointAlong, segmentLength, uprightAngleDeg } from './drawing-geometry.ts'
import type { PlanMember } from './plan-members.ts'
import { textWidthPx } from './text-size.ts'

/** A place for a mark, and the fine line from it to its timber where it stands beside it. */
export type LabelPlace = TurnedBox & { leader: Segment | null }

const paddingPx = 3
const stepPx = 5
const besideStepPx = 9
const gapPx = 4
/** How far from its timber, square to it, a mark may stand, in rows: some bays away at most. */
const besideRows = [1, 2, 3.2, 4.6, 6.2]
const farRows = [...besideRows, 8, 10, 12]

/** What a mark takes up, turned along its timber. */
export function markBox(member: PlanMember, text: string, sizePx: number): TurnedBox {
  return {
    centre: pointAlong(member.centre, 0.5),
    widthPx: textWidthPx(text, sizePx) + 2 * paddingPx,
    heightPx: sizePx + 2,
    angleDeg: uprightAngleDeg(member.centre),
  }
}

/** Rafters from the plate up, so that marks stand in rows; other timbers from the middle out. */
export function* placesAlong(member: PlanMember, box: TurnedBox): Generator<LabelPlace> {
  const lengthPx = segmentLength(member.centre)
  if (lengthPx < box.widthPx) return
  const start = box.widthPx / 2
  const end = lengthPx - box.widthPx / 2
  const at = (alongPx: number): LabelPlace => ({
    ...box,
    centre: pointAlong(member.centre, alongPx / lengthPx),
    leader: null,
  })
  if (standsInRow(member)) {
    const tail: Segment = { from: member.centre.from, to: member.heel }
    const fromPlate = Math.min(Math.max(segmentLength(tail) + start, start), end)
    for (let alongPx = fromPlate; alongPx <= end; alongPx += stepPx) yield at(alongPx)
    for (let alongPx = fromPlate - stepPx; alongPx >= start; alongPx -= stepPx) yield at(alongPx)
    return
  }
  const middle = lengthPx / 2
  for (let offPx = 0; middle - offPx >= start; offPx += stepPx) {
    yield at(middle + offPx)
    yield at(middle - offPx)
  }
}

/**
 * Beside a timber with no room of its own: beyond its ends in its own line, in the bays along it, and
 * level beside its ends, always with a fine line to it.
 */
export function placesBeside(member: PlanMember, box: TurnedBox): Generator<LabelPlace> {
  return placesBesideIn(member, box, besideRows)
}

/** The same, further off where all that is nearer is taken. */
export function placesFurtherOff(member: PlanMember, box: TurnedBox): Generator<LabelPlace> {
  return placesBesideIn(member, box, farRows)
}

function* placesBesideIn(
  member: PlanMember,
  box: TurnedBox,
  rows: readonly number[],
): Generator<LabelPlace> {
  const { centre } = member
  const lengthPx = segmentLength(centre) || 1
  const way = {
    x: (centre.to.x - centre.from.x) / lengthPx,
    y: (centre.to.y - centre.from.y) / lengthPx,
  }
  const point = (alongPx: number, sidePx: number): DrawingPoint => ({
    x: centre.from.x + way.x * alongPx - way.y * sidePx,
    y: centre.from.y + way.y * alongPx + way.x * sidePx,
  })
  const half = box.widthPx / 2
  for (const outPx of [gapPx, gapPx + 14, gapPx + 30]) {
    const foot = -outPx - half
    const head = lengthPx + outPx + half
    yield { ...box, centre: point(foot, 0), leader: leaderTo(point(-outPx, 0), centre.from) }
    yield {
      ...box,
      centre: point(head, 0),
      leader: leaderTo(point(lengthPx + outPx, 0), centre.to),
    }
  }
  const rowPx = box.heightPx / 2 + gapPx
  for (const row of rows)
    for (let alongPx = 0; alongPx <= lengthPx; alongPx += besideStepPx)
      for (const side of [1, -1]) {
        const offPx = side * row * rowPx
        const nearPx = offPx - (side * box.heightPx) / 2
        const leader = leaderTo(point(alongPx, nearPx), point(alongPx, 0))
        yield { ...box, centre: point(alongPx, offPx), leader }
      }
}

function leaderTo(from: DrawingPoint, to: DrawingPoint): Segment {
  return { from, to }
}

/** Rafters of every kind stand side by side, their marks in rows. */
export function standsInRow({ role }: Pick<PlanMember, 'role'>): boolean {
  return rowRoles.has(role)
}

const rowRoles: ReadonlySet<PlanMember['role']> = new Set([
  'common',
  'crown-end',
  'creeper',
  'valley-creeper',
  'cripple-creeper',
])

/** Timbers that the rafters run on to or over: their marks may stand on those where they must. */
export function mayStandOverRafters(member: Pick<PlanMember, 'role'>): boolean {
  return !standsInRow(member) && member.role !== 'collar-tie' && member.role !== 'barge'
}
