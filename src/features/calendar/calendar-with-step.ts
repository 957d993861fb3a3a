import type {
  Booking,
  Calendar,
  CalendarBooking,
  CalendarDay,
} from '../../../shared/bookings/calendar-schemas.ts'
import { type Day, dayPlus, daysBetween } from '../../../shared/calendar/days.ts'
import type { BookingSide } from './booking-steps.ts'

/** Every day from one to the other. */
export const daysFromTo = ({ from, to }: { from: Day; to: Day }): Day[] =>
  Array.from({ length: Math.max(0, daysBetween(from, to) + 1) }, (_, i) => dayPlus(from, i))

const byDay = (a: CalendarDay, b: CalendarDay): number => (a.day < b.day ? -1 : 1)

function daysOn(calendar: Calendar, booking: CalendarBooking, side: BookingSide): CalendarDay[] {
  const shown = side.days.filter((day) => day >= calendar.from && day <= calendar.to)
  const kept = booking.days.filter((d) => shown.includes(d.day))
  const gone = booking.days.filter((d) => !shown.includes(d.day))
  const fresh = shown.filter((day) => !kept.some((d) => d.day === day))
  const made = fresh.map((day, i): CalendarDay => {
    const hours = calendar.crewHours.find((h) => h.crewId === side.crewId && h.day === day)
    return {
      id: `${booking.id} ${day}`,
      revisionLetter: null,
      holds: '',
      plannedMinutes: 0,
      worked: false,
      ...gone[i],
      day,
      availableMinutes: hours?.availableMinutes ?? 0,
      peopleThere: hours?.peopleThere ?? 0,
      flags: [],
    }
  })
  return [...kept, ...made].sort(byDay)
}

function bookingOn(calendar: Calendar, booking: CalendarBooking, side: BookingSide) {
  const [firstDay = booking.firstDay, lastDay = firstDay] = [
    side.days[0],
    side.days[side.days.length - 1],
  ]
  return {
    ...booking,
    crew: calendar.crews.find((crew) => crew.id === side.crewId) ?? booking.crew,
    state: side.state,
    clashReason: side.clashReason,
    allDays: [...side.days],
    firstDay,
    lastDay,
    dayCount: side.days.length,
    days: daysOn(calendar, booking, side),
  }
}

/** A span as it will be, so that a booking stays where it was dropped while the server decides. */
export function withSides(calendar: Calendar, sides: ReadonlyMap<string, BookingSide>): Calendar {
  return {
    ...calendar,
    bookings: calendar.bookings.flatMap((booking) => {
      const side = sides.get(booking.id)
      if (!side) return [booking]
      return side.cancelled ? [] : [bookingOn(calendar, booking, side)]
    }),
  }
}

/** A span with bookings as the server has answered them. */
export function withAnswered(calendar: Calendar, answered: readonly Booking[]): Calendar {
  const isNew = (id: string) => !answered.some((booking) => booking.id === id)
  const shown = answered
    .filter((booking) => !booking.cancelled)
    .map((booking) => ({
      ...booking,
      days: booking.days.filter((d) => d.day >= calendar.from && d.day <= calendar.to),
    }))
    .filter((booking) => booking.days.length > 0)
  return {
    ...calendar,
    bookings: [...calendar.bookings.filter((booking) => isNew(booking.id)), ...shown],
  }
}
