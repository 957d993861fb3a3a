import { and, asc, between, desc, eq, inArray, isNull, type SQL, sql } from 'drizzle-orm'
import { z } from 'zod'
import type { Day } from '../../shared/calendar/days.ts'
import type { ClashMilestone, ClashRevision } from '../../shared/clashes/clash-facts.ts'
import { neededFirst, type NeededFirst } from '../../shared/clashes/clash-words.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import { isMilestoneKept } from '../../shared/milestones/milestone-rules.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs, roofRevisions } from '../db/tables/job-tables.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import { milestones } from '../db/tables/milestone-tables.ts'
import { crews } from '../db/tables/people-tables.ts'

export type Span = { from: Day; to: Day }

/**
 * Bookings that stand and have a day within a span, with all their days: the condition for queries over
 * `booking_days` joined with `bookings`. Not `exists`: for each booking ever made that would look for a day.
 */
export function bookedWithin(span: Span): SQL {
  return sql`(${bookings.cancelledAt} is null and ${bookings.id} in (
    select d.booking_id from booking_days d where d.day between ${span.from} and ${span.to}))`
}

const jobsBookedWithin = (span: Span): SQL => sql`(
  select b.job_id from booking_days d join bookings b on b.id = d.booking_id
  where d.day between ${span.from} and ${span.to} and b.cancelled_at is null)`

export type BookedDayRow = ReturnType<typeof readBookedDays>[number]

/** Each booking's days together and in order, the bookings as they were made. */
export function readBookedDays(db: DbOrTx, span: Span) {
  return db
    .select({
      id: bookingDays.id,
      day: bookingDays.day,
      revision: { letter: roofRevisions.letter, sequence: roofRevisions.sequence },
      booking: {
        id: bookings.id,
        state: bookings.state,
        clashReason: bookings.clashReason,
        shortMinutes: bookings.shortMinutes,
      },
      job: {
        id: jobs.id,
        number: jobs.number,
        title: jobs.title,
        completedOn: jobs.completedOn,
      },
      crew: { id: crews.id, name: crews.name },
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .leftJoin(roofRevisions, eq(roofRevisions.id, bookingDays.revisionId))
    .where(bookedWithin(span))
    .orderBy(asc(bookings.createdAt), asc(bookings.id), asc(bookingDays.day))
    .all()
}

/** The newest revision of each job booked within the span; the roof itself stays in the table. */
export function readNewestRevisions(db: DbOrTx, span: Span): Map<string, ClashRevision> {
  const rows = db
    .select({
      jobId: roofRevisions.jobId,
      sequence: roofRevisions.sequence,
      letter: roofRevisions.letter,
    })
    .from(roofRevisions)
    .where(sql`${roofRevisions.jobId} in ${jobsBookedWithin(span)}`)
    .orderBy(asc(roofRevisions.sequence))
    .all()
  return new Map(rows.map(({ jobId, ...revision }) => [jobId, revision]))
}

/** What jobs wait for before their first day, where something has been said of it. */
export function readNeededMilestones(
  db: DbOrTx,
  which: Span | { jobId: string },
): Map<string, ClashMilestone[]> {
  const ofJobs =
    'jobId' in which
      ? eq(milestones.jobId, which.jobId)
      : sql`${milestones.jobId} in ${jobsBookedWithin(which)}`
  const rows = db
    .select()
    .from(milestones)
    .where(and(ofJobs, inArray(milestones.kind, Object.keys(neededFirst) as NeededFirst[])))
    .all()
  return groupBy(rows.filter(isMilestoneKept), (row) => row.jobId)
}

const toldSchema = z.object({
  bookings: z.array(z.object({ bookingId: z.string(), revision: z.string().nullable() })),
})

/** Which roof of a booking (undefined: not of it) a person was told for a day of the span. */
export function readToldRoofs(
  db: DbOrTx,
  span: Span,
): (personId: string, day: Day, bookingId: string) => string | null | undefined {
  const rows = db
    .select({ personId: toldDays.personId, day: toldDays.day, content: toldDays.content })
    .from(toldDays)
    .where(between(toldDays.day, span.from, span.to))
    .all()
  const told = new Map(
    rows.flatMap(({ personId, day, content }) =>
      toldSchema
        .parse(content)
        .bookings.map(
          ({ bookingId, revision }) => [`${personId} ${day} ${bookingId}`, revision] as const,
        ),
    ),
  )
  return (personId, day, bookingId) => told.get(`${personId} ${day} ${bookingId}`)
}

/** The last day of any booking that stands; null when there is none. */
export function readLastBookedDay(db: DbOrTx): Day | null {
  const row = db
    .select({ day: bookingDays.day })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(isNull(bookings.cancelledAt))
    .orderBy(desc(bookingDays.day))
    .limit(1)
    .get()
  return row?.day ?? null
}

/** Bookings of a span that `visible` lets through, and their days ('booking day') as keys. */
export function readSeenBookings(db: DbOrTx, span: Span, visible: SQL) {
  const rows = db
    .select({
      day: bookingDays.day,
      booking: { id: bookings.id, state: bookings.state },
      job: { id: jobs.id, number: jobs.number, title: jobs.title },
      crew: { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour },
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(and(isNull(bookings.cancelledAt), between(bookingDays.day, span.from, span.to), visible))
    .all()
  const seen = new Map(
    rows.map(({ booking, job, crew }) => [booking.id, { ...booking, job, crew }]),
  )
  const days = new Set(rows.map(({ booking, day }) => `${booking.id} ${day}`))
  return { bookings: [...seen.values()], days }
}

export function readActiveCrewNames(db: DbOrTx): { id: string; name: string }[] {
  return db
    .select({ id: crews.id, name: crews.name })
    .from(crews)
    .where(eq(crews.active, true))
    .orderBy(asc(crews.letter), asc(crews.name))
    .all()
}

export function readJobOf(db: DbOrTx, jobId: string) {
  return db
    .select({
      id: jobs.id,
      number: jobs.number,
      title: jobs.title,
      completedOn: jobs.completedOn,
    })
    .from(jobs)
    .where(eq(jobs.id, jobId))
    .get()
}

/** All days of one booking; empty when it is not there or cancelled. */
export function readDaysOfBooking(db: DbOrTx, bookingId: string): Day[] {
  return db
    .select({ day: bookingDays.day })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(eq(bookings.id, bookingId), isNull(bookings.cancelledAt)))
    .orderBy(asc(bookingDays.day))
    .all()
    .map((row) => row.day)
}
