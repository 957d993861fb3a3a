import type { Day } from '../calendar/days.ts'
import { groupBy } from '../collections/group-by.ts'
import type { FindDaysFacts, StandingBooking } from './find-days.ts'
import { slotsOf, spreadDays } from './push-days.ts'
import type { DayMove } from './rain-off.ts'

/** Blocked: the crew cannot work. Fixed: something stands there that stays. Movable: one pencilled booking. */
export type DayState = 'free' | 'blocked' | 'fixed' | 'movable'

export type CrewDays = {
  crewId: string
  stateOf(day: Day): DayState
  /** Whether a booking that may give way begins that day. */
  isFirstOfMovable(day: Day): boolean
  /** What may give way, and the days of what stays. */
  movable: readonly StandingBooking[]
  fixedDays: ReadonlySet<Day>
}

/** Pencilled, not begun, of another job, none of its days shared. */
function mayGiveWay(booking: StandingBooking, onDay: ReadonlyMap<Day, unknown[]>): boolean {
  const isAlone = booking.days.every(({ day }) => (onDay.get(day)?.length ?? 0) < 2)
  return booking.isPencilled && !booking.isOwnJob && isAlone && booking.days.every((d) => !d.worked)
}

export function crewDaysOf(facts: FindDaysFacts, crewId: string): CrewDays {
  const own = facts.bookings.filter((booking) => booking.crewId === crewId)
  const placed = own.flatMap((booking) => booking.days.map(({ day }) => ({ day, booking })))
  const onDay = groupBy(placed, (one) => one.day)
  const movable = own.filter((booking) => mayGiveWay(booking, onDay))
  const daysOf = (bookings: readonly StandingBooking[]): Set<Day> =>
    new Set(bookings.flatMap((booking) => booking.days.map(({ day }) => day)))
  const fixedDays = daysOf(own.filter((booking) => !movable.includes(booking)))
  const movableDays = daysOf(movable)
  const firsts = new Set(movable.map((booking) => sorted(booking)[0]))
  return {
    crewId,
    movable,
    fixedDays,
    isFirstOfMovable: (day) => firsts.has(day),
    stateOf(day) {
      if (fixedDays.has(day)) return 'fixed'
      if (facts.isBlocked(crewId, day)) return 'blocked'
      return movableDays.has(day) ? 'movable' : 'free'
    },
  }
}

const sorted = (booking: StandingBooking): Day[] => booking.days.map(({ day }) => day).sort()

export type RoomMade = {
  bookingId: string
  daysBefore: Day[]
  daysAfter: Day[]
  moved: DayMove[]
}

/** Fixed days of the crew that stand between the first and the last of some days. */
function brokenBy(days: readonly Day[], fixed: ReadonlySet<Day>): number {
  const [first, last] = [days[0] ?? '', days[days.length - 1] ?? '']
  return [...fixed].filter((day) => day > first && day < last).length
}

/**
 * Moves the crew's pencilled bookings out of the days a job is to take: each day goes to the next one free,
 * in its order. Null when that cannot be done without harm: one would be cut in two, by the job or by what
 * stays, or would end after it is wanted though it does not now, or there is no room.
 */
export function makeRoom(
  facts: FindDaysFacts,
  crew: CrewDays,
  taken: readonly Day[],
): RoomMade[] | null {
  const start = taken[0]
  if (start === undefined) return null
  const takenDays = new Set(taken)
  const rows = crew.movable.flatMap((booking) => sorted(booking)).filter((day) => day >= start)
  const slots = slotsOf(facts.calendar, {
    earliest: start,
    isKept: (day) =>
      takenDays.has(day) || crew.fixedDays.has(day) || facts.isBlocked(crew.crewId, day),
  })
  const places = spreadDays([...new Set(rows)].sort(), slots, (day) =>
    takenDays.has(day) ? slots.from(day) : day,
  )
  if (!places) return null
  const made = crew.movable.flatMap((booking): RoomMade[] => {
    const daysBefore = sorted(booking)
    const daysAfter = daysBefore.map((day) => places.get(day) ?? day).sort()
    const moved = daysBefore
      .map((from) => ({ from, to: places.get(from) ?? from }))
      .filter((move) => move.from !== move.to)
    return moved.length > 0 ? [{ bookingId: booking.id, daysBefore, daysAfter, moved }] : []
  })
  return made.some((one) => isHarmed(crew, one, start)) ? null : made
}

function isHarmed(crew: CrewDays, made: RoomMade, start: Day): boolean {
  const { daysBefore, daysAfter } = made
  const wantedBy = crew.movable.find((booking) => booking.id === made.bookingId)?.wantedBy ?? null
  const [endBefore, endAfter] = [daysBefore, daysAfter].map((days) => days[days.length - 1] ?? '')
  const isLate = wantedBy !== null && (endAfter ?? '') > wantedBy && (endBefore ?? '') <= wantedBy
  const isCut = daysAfter.some((day) => day < start)
  return (
    isLate || isCut || brokenBy(daysAfter, crew.fixedDays) > brokenBy(daysBefore, crew.fixedDays)
  )
}
