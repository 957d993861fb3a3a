import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { StandingBooking } from '../../shared/planning/find-days.ts'
import { readWorkedDayIds } from '../bookings/calendar-store.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'

export function readJobToPlace(db: DbOrTx, jobId: string) {
  return db
    .select({
      id: jobs.id,
      number: jobs.number,
      title: jobs.title,
      wantedBy: jobs.wantedBy,
      completedOn: jobs.completedOn,
    })
    .from(jobs)
    .where(eq(jobs.id, jobId))
    .get()
}

/** Standing bookings with a day from one on, whole. */
export function readStanding(db: DbOrTx, from: Day, jobId: string) {
  const scope = and(
    isNull(bookings.cancelledAt),
    sql`${bookings.id} in (select later.booking_id from booking_days later where later.day >= ${from})`,
  )
  const rows = db
    .select({
      dayId: bookingDays.id,
      day: bookingDays.day,
      bookingId: bookings.id,
      version: bookings.version,
      crewId: bookings.crewId,
      state: bookings.state,
      job: { id: jobs.id, number: jobs.number, title: jobs.title },
      wantedBy: jobs.wantedBy,
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .where(scope)
    .orderBy(asc(bookingDays.day), asc(bookings.id))
    .all()
  const worked = scope ? readWorkedDayIds(db, scope) : new Set<string>()
  const byBooking = groupBy(rows, (row) => row.bookingId)
  const standing = [...byBooking].flatMap(([id, own]): StandingBooking[] => {
    const [first] = own
    if (!first) return []
    return [
      {
        id,
        crewId: first.crewId,
        isPencilled: first.state === 'pencilled',
        isOwnJob: first.job.id === jobId,
        wantedBy: first.wantedBy,
        days: own.map(({ day, dayId }) => ({ day, worked: worked.has(dayId) })),
      },
    ]
  })
  return { standing, rowOf: (bookingId: string) => byBooking.get(bookingId)?.[0] }
}
