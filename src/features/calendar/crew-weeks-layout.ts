import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import { stretchesOf } from '../../../shared/bookings/booking-places.ts'
import type { Day } from '../../../shared/calendar/days.ts'
import { isWorked } from '../../../shared/calendar/working-days.ts'

/** One unbroken run of a booking's days, as far as the grid shows it. */
export type Bar = {
  key: string
  booking: CalendarBooking
  /** All days of the run, those outside the grid too. */
  stretch: Day[]
  shown: Day[]
  /** Columns from 0. */
  fromColumn: number
  toColumn: number
  lane: number
  goesOnBefore: boolean
  goesOnAfter: boolean
}

export type CrewRow = { bars: Bar[]; laneCount: number }

type Run = Omit<Bar, 'lane'>

function runsOf(calendar: Calendar, booking: CalendarBooking, days: readonly Day[]): Run[] {
  return stretchesOf(calendar, booking.allDays).flatMap((stretch): Run[] => {
    const shown = stretch.filter((day) => days.includes(day))
    const [first, last] = [shown[0], shown[shown.length - 1]]
    if (first === undefined || last === undefined) return []
    return [
      {
        key: `${booking.id} ${stretch[0]}`,
        booking,
        stretch,
        shown,
        fromColumn: days.indexOf(first),
        toColumn: days.indexOf(last),
        goesOnBefore: first !== stretch[0],
        goesOnAfter: last !== stretch[stretch.length - 1],
      },
    ]
  })
}

/** A crew's bookings in as few lanes as they need; the longer of two that start together lies above. */
export function crewRowOf(calendar: Calendar, crewId: string, days: readonly Day[]): CrewRow {
  const runs = calendar.bookings
    .filter((booking) => booking.crew.id === crewId)
    .flatMap((booking) => runsOf(calendar, booking, days))
    .sort(
      (a, b) =>
        a.fromColumn - b.fromColumn ||
        b.toColumn - a.toColumn ||
        a.booking.job.number.localeCompare(b.booking.job.number),
    )
  const laneEnds: number[] = []
  const bars = runs.map((run): Bar => {
    const free = laneEnds.findIndex((end) => end < run.fromColumn)
    const lane = free === -1 ? laneEnds.length : free
    laneEnds[lane] = run.toColumn
    return { ...run, lane }
  })
  return { bars, laneCount: Math.max(1, laneEnds.length) }
}

/** Columns: a day worked or booked has room to be read, any other is a sliver. */
export function gridColumnsOf(
  calendar: Calendar,
  days: readonly Day[],
  { weeks, isWall }: { weeks: number; isWall: boolean },
): { columns: string; minWidth: string } {
  // Nobody scrolls a screen on the wall: there the days share what width it has.
  const dayRem = isWall ? 0 : weeks <= 2 ? 5.5 : weeks === 3 ? 4.75 : 4
  const sliverRem = 1.75
  const headRem = 8.5
  const booked = new Set(calendar.bookings.flatMap((b) => b.days.map((d) => d.day)))
  const isWide = days.map((day) => isWorked(calendar, day) || booked.has(day))
  const total = isWide.reduce((sum, wide) => sum + (wide ? dayRem : sliverRem), headRem)
  return {
    columns: `${headRem}rem ${isWide.map((wide) => (wide ? `minmax(${dayRem}rem, 1fr)` : `${sliverRem}rem`)).join(' ')}`,
    minWidth: `${total}rem`,
  }
}

export type Load = { plannedMinutes: number; availableMinutes: number; isBooked: boolean }

/** What a crew has to do on each day and the hours it has; no entry where that is not known. */
export function loadOf(calendar: Calendar, crewId: string): ReadonlyMap<Day, Load> {
  const load = new Map<Day, Load>()
  for (const { day, availableMinutes, crewId: id } of calendar.crewHours)
    if (id === crewId) load.set(day, { plannedMinutes: 0, availableMinutes, isBooked: false })
  for (const booking of calendar.bookings) {
    if (booking.crew.id !== crewId) continue
    for (const { day, plannedMinutes, availableMinutes } of booking.days) {
      const before = load.get(day) ?? { plannedMinutes: 0, availableMinutes }
      const planned = before.plannedMinutes + plannedMinutes
      load.set(day, { ...before, plannedMinutes: planned, isBooked: true })
    }
  }
  return load
}
