import { and, asc, between, eq, inArray, isNull, type SQL, sql, sum } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings, tasks } from '../db/tables/booking-tables.ts'
import { isWorkedDay } from '../day-logs/worked-days.ts'
import { jobs, roofRevisions } from '../db/tables/job-tables.ts'
import { crews } from '../db/tables/people-tables.ts'

/**
 * Every query here runs over `booking_days` joined with `bookings`, so that one `scope` condition (which
 * days, and the right to see them) serves them all.
 */
export type DayRow = ReturnType<typeof readDayRows>[number]

export const daysBetweenScope = (from: Day, to: Day): SQL => between(bookingDays.day, from, to)
export const standingScope = (): SQL => isNull(bookings.cancelledAt)

export function readDayRows(db: DbOrTx, scope: SQL) {
  return db
    .select({
      id: bookingDays.id,
      day: bookingDays.day,
      revisionLetter: roofRevisions.letter,
      glyph: roofRevisions.glyph,
      booking: {
        id: bookings.id,
        version: bookings.version,
        state: bookings.state,
        startAt: bookings.startAt,
        gear: bookings.gear,
        clashReason: bookings.clashReason,
        shortMinutes: bookings.shortMinutes,
        cancelledAt: bookings.cancelledAt,
      },
      job: {
        id: jobs.id,
        number: jobs.number,
        title: jobs.title,
        siteAddress: jobs.siteAddress,
        completedOn: jobs.completedOn,
      },
      crew: { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour },
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .leftJoin(roofRevisions, eq(roofRevisions.id, bookingDays.revisionId))
    .where(scope)
    .orderBy(asc(bookingDays.day), asc(crews.letter), asc(bookings.createdAt), asc(bookings.id))
    .all()
}

export type DayWork = { packageKeys: string[]; plannedMinutes: number }

/** What each day holds, by booking day id. */
export function readDayWork(db: DbOrTx, scope: SQL): Map<string, DayWork> {
  const rows = db
    .select({
      dayId: tasks.bookingDayId,
      packageKey: tasks.packageKey,
      minutes: sum(tasks.plannedMinutes).mapWith(Number),
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(scope)
    .groupBy(tasks.bookingDayId, tasks.packageKey)
    .all()
  const work = new Map<string, DayWork>()
  for (const { dayId, packageKey, minutes } of rows) {
    const of = work.get(dayId) ?? { packageKeys: [], plannedMinutes: 0 }
    of.packageKeys.push(packageKey)
    of.plannedMinutes += minutes
    work.set(dayId, of)
  }
  return work
}

/** Ids of the days that have a tick or a log. */
export function readWorkedDayIds(db: DbOrTx, scope: SQL): Set<string> {
  const rows = db
    .select({ id: bookingDays.id })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(scope, isWorkedDay))
    .all()
  return new Set(rows.map((row) => row.id))
}

export type Extent = {
  firstDay: Day
  lastDay: Day
  dayCount: number
  allDays: Day[]
  emptyDays: number
}

/** All days of each booking, and how many from `today` on hold nothing. */
export function readExtents(
  db: DbOrTx,
  bookingIds: readonly string[],
  visible: SQL,
  today: Day,
): Map<string, Extent> {
  const isEmpty = sql`${bookingDays.day} >= ${today} and ${bookingDays.revisionId} is not null
    and not exists (select 1 from ${tasks} where ${tasks.bookingDayId} = ${bookingDays.id})`
  const rows = db
    .select({
      id: bookingDays.bookingId,
      days: sql<string>`group_concat(${bookingDays.day})`,
      emptyDays: sql<number>`sum(case when ${isEmpty} then 1 else 0 end)`.mapWith(Number),
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(inArray(bookingDays.bookingId, [...bookingIds]), visible))
    .groupBy(bookingDays.bookingId)
    .all()
  return new Map(
    rows.map(({ id, days, emptyDays }) => {
      const allDays = days.split(',').sort()
      const [firstDay = '', lastDay = ''] = [allDays[0], allDays[allDays.length - 1]]
      return [id, { firstDay, lastDay, dayCount: allDays.length, allDays, emptyDays }]
    }),
  )
}

export function readDayTaskLines(db: DbOrTx, scope: SQL) {
  return db
    .select({
      dayId: tasks.bookingDayId,
      title: tasks.title,
      quantity: tasks.quantity,
      plannedMinutes: tasks.plannedMinutes,
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(scope)
    .orderBy(asc(bookingDays.day), asc(tasks.position), asc(tasks.id))
    .all()
}

/** Standing bookings of some crews within a span: which crew is where. */
export function readCrewDays(db: DbOrTx, crewIds: readonly string[], span: { from: Day; to: Day }) {
  return db
    .select({
      day: bookingDays.day,
      bookingId: bookings.id,
      crewId: bookings.crewId,
      clashReason: bookings.clashReason,
      jobNumber: jobs.number,
      jobTitle: jobs.title,
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .where(
      and(
        inArray(bookings.crewId, [...crewIds]),
        isNull(bookings.cancelledAt),
        between(bookingDays.day, span.from, span.to),
      ),
    )
    .orderBy(asc(bookingDays.day), asc(jobs.number), asc(bookings.id))
    .all()
}

export type CrewDayRow = ReturnType<typeof readCrewDays>[number]
