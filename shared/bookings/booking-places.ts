import { type Day, dayPlus } from '../calendar/days.ts'
import { isWorked, type WorkingCalendar } from '../calendar/working-days.ts'
import { movedDays } from './move-days.ts'

/** Where a booking stands; `worked` are the days that stay. */
export type Place = { crewId: string; days: readonly Day[]; worked: ReadonlySet<Day> }

const furthestDays = 400

function daysAfterUntil(first: Day, last: Day): Day[] {
  const days: Day[] = []
  for (let day = dayPlus(first, 1); day < last && days.length < furthestDays; day = dayPlus(day, 1))
    days.push(day)
  return days
}

/** A booking's days in order, cut where a day that the firm works lies between two of them. */
export function stretchesOf(calendar: WorkingCalendar, days: readonly Day[]): Day[][] {
  const stretches: Day[][] = []
  let last: Day | undefined
  for (const day of [...days].sort()) {
    const open = stretches[stretches.length - 1]
    const isNext =
      last !== undefined && !daysAfterUntil(last, day).some((d) => isWorked(calendar, d))
    if (open && isNext) open.push(day)
    else stretches.push([day])
    last = day
  }
  return stretches
}

/** The day `count` working days before `day`; `day` itself for 0. */
function workedBack(calendar: WorkingCalendar, day: Day, count: number): Day {
  let at = day
  for (let left = count, tried = 0; left > 0 && tried < furthestDays; tried++) {
    at = dayPlus(at, -1)
    if (isWorked(calendar, at)) left--
  }
  return at
}

/**
 * The move that puts the day `held` of a stretch on `to`: the stretch's first day not worked and all the
 * booking's days after it go along. null when every day of the stretch has been worked.
 */
export function heldMove(
  calendar: WorkingCalendar,
  place: Place,
  held: { stretch: readonly Day[]; day: Day; to: Day },
): { from: Day; to: Day } | null {
  const moving = held.stretch.filter((day) => !place.worked.has(day))
  const [from] = moving
  if (from === undefined) return null
  const ahead = Math.max(0, moving.indexOf(held.day))
  return { from, to: workedBack(calendar, held.to, ahead) }
}

/** One end of a stretch pulled to `to`; days worked stay, and at least one day does. */
export function pulledDays(
  calendar: WorkingCalendar,
  place: Place,
  pull: { stretch: readonly Day[]; end: 'first' | 'last'; to: Day },
): Day[] {
  const { stretch, end, to } = pull
  const [first, last] = [stretch[0], stretch[stretch.length - 1]]
  if (first === undefined || last === undefined) return [...place.days]
  const isInside = (day: Day): boolean => (end === 'last' ? day <= to : day >= to)
  const kept = stretch.filter((day) => isInside(day) || place.worked.has(day))
  const anchor = end === 'last' ? first : last
  const between = end === 'last' ? daysAfterUntil(last, to) : daysAfterUntil(to, first)
  const added = [
    ...between.filter((day) => isWorked(calendar, day)),
    ...((end === 'last' ? to > last : to < first) ? [to] : []),
  ]
  const others = place.days.filter((day) => !stretch.includes(day))
  return [...new Set([...others, ...(kept.length > 0 ? kept : [anchor]), ...added])].sort()
}

/** Days before `day`, and from it on; null when either would be empty or a worked day would change hands. */
export function splitDays(place: Place, day: Day): [Day[], Day[]] | null {
  const first = place.days.filter((d) => d < day)
  const second = place.days.filter((d) => d >= day)
  if (first.length === 0 || second.length === 0) return null
  return second.some((d) => place.worked.has(d)) ? null : [first, second]
}

type Placed = { crewId: string; days: Day[] }

/**
 * Two bookings change places. On one crew they change their order within the days the two have together;
 * on two crews each takes the other's crew and first day. Days worked stay. null when either has no day
 * ahead.
 */
export function swappedPlaces(
  calendar: WorkingCalendar,
  a: Place,
  b: Place,
): [Placed, Placed] | null {
  const aheadOf = (place: Place) => place.days.filter((d) => !place.worked.has(d)).sort()
  const [aheadA, aheadB] = [aheadOf(a), aheadOf(b)]
  const [firstA, firstB] = [aheadA[0], aheadB[0]]
  if (firstA === undefined || firstB === undefined) return null
  const together = [...aheadA, ...aheadB].sort()
  const isShared = new Set(together).size < together.length
  if (a.crewId === b.crewId && !isShared) {
    const isAFirst = firstA < firstB
    const countOfNewFirst = isAFirst ? aheadB.length : aheadA.length
    const early = together.slice(0, countOfNewFirst)
    const late = together.slice(countOfNewFirst)
    const put = (place: Place, days: Day[]): Placed => ({
      crewId: place.crewId,
      days: [...place.worked, ...days].sort(),
    })
    return isAFirst ? [put(a, late), put(b, early)] : [put(a, early), put(b, late)]
  }
  const go = (place: Place, from: Day, to: Day, crewId: string): Placed => ({
    crewId,
    days: movedDays(calendar, place.days, place.worked, { from, to }),
  })
  return [go(a, firstA, firstB, b.crewId), go(b, firstB, firstA, a.crewId)]
}
