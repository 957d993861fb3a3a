import { asc, eq } from 'drizzle-orm'
import { bookingDays, bookings, tasks } from '../../server/db/tables/booking-tables.ts'
import type { bookingFirm } from './booking-kit.ts'

/** All that a rain-off and its undo may touch; versions, times and the ids of planned tasks left out. */
export function calendarOf({ app }: Pick<Awaited<ReturnType<typeof bookingFirm>>, 'app'>) {
  const rows = app.db
    .select()
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .orderBy(asc(bookingDays.id))
    .all()
  const held = app.db.select().from(tasks).orderBy(asc(tasks.bookingDayId), asc(tasks.position))
  return {
    days: rows.map(({ booking_days: day, bookings: booking }) => {
      const { id, jobId, crewId, state, startAt, gear } = booking
      const { clashReason, cancelledAt, shortMinutes } = booking
      return {
        day,
        id,
        jobId,
        crewId,
        state,
        startAt,
        gear,
        clashReason,
        cancelledAt,
        shortMinutes,
      }
    }),
    tasks: held.all().map((task) => ({ ...task, id: '', version: 0 })),
  }
}
