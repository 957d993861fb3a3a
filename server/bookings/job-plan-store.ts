import { asc, count, desc, eq, inArray, sql, sum } from 'drizzle-orm'
import type { FrameSpec } from '../../shared/roof/roof-types.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings, tasks, ticks } from '../db/tables/booking-tables.ts'
import { isLoggedDay } from '../day-logs/worked-days.ts'
import { roofRevisions } from '../db/tables/job-tables.ts'

export type JobDay = {
  id: string
  bookingId: string
  crewId: string
  day: string
  revisionId: string | null
  cancelled: boolean
  /** It has been closed with a log. */
  logged: boolean
}

export type TaskRow = typeof tasks.$inferSelect
export type JobTask = TaskRow & { day: string; tickCount: number; tickSum: number }

/** All days of a job's bookings, cancelled ones too, as its crews come to them. */
export function readJobDays(db: DbOrTx, jobId: string): JobDay[] {
  return db
    .select({
      id: bookingDays.id,
      bookingId: bookingDays.bookingId,
      crewId: bookings.crewId,
      day: bookingDays.day,
      revisionId: bookingDays.revisionId,
      cancelled: sql<number>`${bookings.cancelledAt} is not null`.mapWith(Boolean),
      logged: isLoggedDay.mapWith(Boolean),
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(eq(bookings.jobId, jobId))
    .orderBy(asc(bookingDays.day), asc(bookings.createdAt), asc(bookings.id))
    .all()
}

export function readJobTasks(db: DbOrTx, jobId: string): JobTask[] {
  const rows = db
    .select({
      task: tasks,
      day: bookingDays.day,
      tickCount: count(ticks.id),
      tickSum: sum(ticks.delta),
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .leftJoin(ticks, eq(ticks.taskId, tasks.id))
    .where(eq(bookings.jobId, jobId))
    .groupBy(tasks.id)
    .orderBy(asc(bookingDays.day), asc(tasks.position), asc(tasks.id))
    .all()
  return rows.map(({ task, day, tickCount, tickSum }) => ({
    ...task,
    day,
    tickCount,
    tickSum: Number(tickSum ?? 0),
  }))
}

/** The newest revision a job has; null before the first is issued. */
export function readNewestRevisionId(db: DbOrTx, jobId: string): string | null {
  const row = db
    .select({ id: roofRevisions.id })
    .from(roofRevisions)
    .where(eq(roofRevisions.jobId, jobId))
    .orderBy(desc(roofRevisions.sequence))
    .limit(1)
    .get()
  return row?.id ?? null
}

export function readSpecs(db: DbOrTx, revisionIds: readonly string[]): Map<string, FrameSpec> {
  if (revisionIds.length === 0) return new Map()
  const rows = db
    .select({ id: roofRevisions.id, spec: roofRevisions.spec })
    .from(roofRevisions)
    .where(inArray(roofRevisions.id, [...revisionIds]))
    .all()
  return new Map(rows.map((row) => [row.id, row.spec]))
}
