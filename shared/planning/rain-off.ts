import type { Day } from '../calendar/days.ts'
import { type WorkingCalendar, workedDaysFrom } from '../calendar/working-days.ts'
import { slotAfter, type Slots, slotsOf, spreadDays } from './push-days.ts'

/** A standing booking of the crew, with each of its days. */
export type BookingToMove = {
  id: string
  days: readonly {
    day: Day
    /** Has a tick or a log: it stays where it is. */
    worked: boolean
    /** Holds work that is not done; asked only of a worked day. */
    unfinished: boolean
  }[]
}

export type RainOffFacts = {
  calendar: WorkingCalendar
  /** No day is put before this one. */
  today: Day
  /** All of one crew. */
  bookings: readonly BookingToMove[]
  /** The first day lost, and how many working days from it on. */
  fromDay: Day
  workingDays: number
  /** False: everything after moves on by as many days. True: days the crew has free are used up first. */
  useFreeDays: boolean
}

export type DayMove = { from: Day; to: Day }

export type BookingMove = {
  bookingId: string
  /** All its days, ascending. */
  daysBefore: Day[]
  daysAfter: Day[]
  moved: DayMove[]
  /** Days started and then rained off: they stay, and what they left undone gets a day more. */
  added: DayMove[]
}

export type RainOff = {
  lostDays: Day[]
  /** Bookings that change, by their first day moved. */
  moves: BookingMove[]
  /** Days from `fromDay` on that stay, since work on them has begun. */
  stays: { bookingId: string; day: Day }[]
}

type Row = { bookingId: string; day: Day; worked: boolean; unfinished: boolean }

const byDay = (a: Day, b: Day): number => (a < b ? -1 : a > b ? 1 : 0)
const daysOf = (rows: readonly Row[]): Day[] => [...new Set(rows.map((r) => r.day))].sort(byDay)

/** Working days from the first one lost on; that one counts when the crew is booked there, day off or not. */
function lostDaysOf({ calendar, bookings, fromDay, workingDays }: RainOffFacts): Day[] {
  const isBooked = bookings.some((b) => b.days.some((d) => d.day === fromDay))
  const worked = workedDaysFrom(calendar, fromDay, workingDays)
  return isBooked ? [...new Set([fromDay, ...worked])].slice(0, workingDays) : worked
}

/** The place a day would have if no other stood in its way. */
function wantedPlace(facts: RainOffFacts, slots: Slots, lastLost: Day): (day: Day) => Day | null {
  return (day) => {
    const soonest = slotAfter(slots, lastLost, 1)
    if (facts.useFreeDays) return day <= lastLost ? soonest : day
    const later = slotAfter(slots, day, facts.workingDays)
    return later === null || soonest === null || later > soonest ? later : soonest
  }
}

/**
 * What a crew's bookings become when working days are lost: each day from `fromDay` on moves on by that many
 * working days, in its order, so that bookings which shared a day share the next one and none overtakes.
 * Days worked stay. A day that was started and then lost stays too, and its booking gets one day more.
 *
 * @returns null when the firm has no working days to move to.
 */
export function rainOff(facts: RainOffFacts): RainOff | null {
  const { calendar, bookings, fromDay } = facts
  const lostDays = lostDaysOf(facts)
  const lastLost = lostDays[lostDays.length - 1]
  if (lastLost === undefined || lostDays.length < facts.workingDays) return null
  const rows = bookings.flatMap((booking): Row[] =>
    booking.days.filter((d) => d.day >= fromDay).map((d) => ({ bookingId: booking.id, ...d })),
  )
  const stays = rows.filter((row) => row.worked)
  const moving = rows.filter((row) => !row.worked)
  const adding = stays.filter((row) => row.unfinished && row.day <= lastLost)
  const stuck = new Set(stays.map((row) => row.day))
  const slots = slotsOf(calendar, { earliest: facts.today, isKept: (day) => stuck.has(day) })
  const wanted = wantedPlace(facts, slots, lastLost)
  const places = spreadDays(daysOf([...moving, ...adding]), slots, wanted)
  if (!places) return null
  const placed = (of: readonly Row[], id: string): DayMove[] =>
    of
      .filter((row) => row.bookingId === id)
      .map((row) => ({ from: row.day, to: places.get(row.day) ?? row.day }))
      .filter((move) => move.from !== move.to)
      .sort((a, b) => byDay(a.from, b.from))
  const moves = bookings.map((booking): BookingMove => {
    const moved = placed(moving, booking.id)
    const added = placed(adding, booking.id)
    const daysBefore = booking.days.map((d) => d.day).sort(byDay)
    const left = daysBefore.filter((day) => !moved.some((move) => move.from === day))
    const daysAfter = [...left, ...[...moved, ...added].map((move) => move.to)].sort(byDay)
    return { bookingId: booking.id, daysBefore, daysAfter, moved, added }
  })
  const firstOf = (move: BookingMove): Day =>
    [...move.moved, ...move.added].map((m) => m.from).sort(byDay)[0] ?? ''
  return {
    lostDays,
    moves: moves
      .filter((move) => move.moved.length + move.added.length > 0)
      .sort((a, b) => byDay(firstOf(a), firstOf(b))),
    stays: stays
      .map(({ bookingId, day }) => ({ bookingId, day }))
      .sort((a, b) => byDay(a.day, b.day)),
  }
}
