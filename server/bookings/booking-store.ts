import { and, asc, eq, inArray } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { isWorkedDay } from '../day-logs/worked-days.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { crews } from '../db/tables/people-tables.ts'
import { newId } from '../lib/ids.ts'

export type BookingRow = typeof bookings.$inferSelect

export function readBookingRow(db: DbOrTx, id: string): BookingRow | null {
  return db.select().from(bookings).where(eq(bookings.id, id)).get() ?? null
}

export type BookedDay = { id: string; day: Day; worked: boolean }

export function readBookedDays(db: DbOrTx, bookingId: string): BookedDay[] {
  return db
    .select({ id: bookingDays.id, day: bookingDays.day, worked: isWorkedDay.mapWith(Boolean) })
    .from(bookingDays)
    .where(eq(bookingDays.bookingId, bookingId))
    .orderBy(asc(bookingDays.day))
    .all()
}

export function readJobToBook(db: DbOrTx, jobId: string) {
  return db
    .select({ id: jobs.id, number: jobs.number, completedOn: jobs.completedOn })
    .from(jobs)
    .where(eq(jobs.id, jobId))
    .get()
}

export function readCrew(db: DbOrTx, crewId: string) {
  return db.select().from(crews).where(eq(crews.id, crewId)).get() ?? null
}

export function insertBooking(
  tx: DbOrTx,
  row: typeof bookings.$inferInsert,
  days: readonly Day[],
  revisionId: string | null,
): void {
  tx.insert(bookings).values(row).run()
  tx.insert(bookingDays)
    .values(days.map((day) => ({ id: newId(), bookingId: row.id, day, revisionId })))
    .run()
}

/**
 * Makes a booking have exactly `days`. A day that gives way to another keeps its row, and with it who was
 * given its tasks.
 */
export function writeDays(
  tx: DbOrTx,
  bookingId: string,
  before: readonly BookedDay[],
  days: readonly Day[],
  revisionId: string | null,
): void {
  const gone = before.filter((d) => !days.includes(d.day))
  const fresh = days.filter((day) => !before.some((d) => d.day === day))
  for (const [i, day] of fresh.entries()) {
    const reused = gone[i]
    if (reused) tx.update(bookingDays).set({ day }).where(eq(bookingDays.id, reused.id)).run()
    else tx.insert(bookingDays).values({ id: newId(), bookingId, day, revisionId }).run()
  }
  const dropped = gone.slice(fresh.length).map((d) => d.id)
  if (dropped.length > 0)
    tx.delete(bookingDays)
      .where(and(eq(bookingDays.bookingId, bookingId), inArray(bookingDays.id, dropped)))
      .run()
}
