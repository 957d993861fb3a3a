import { createHash } from 'node:crypto'
import { and, asc, between, eq, gte, isNull } from 'drizzle-orm'
import { z } from 'zod'
import type { Day } from '../../shared/calendar/days.ts'
import { instantAt } from '../../shared/calendar/local-time.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import { readCrewHours } from '../bookings/crew-hours.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings, tasks } from '../db/tables/booking-tables.ts'
import { jobs, roofRevisions } from '../db/tables/job-tables.ts'
import type { people } from '../db/tables/people-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { crewIdsOf, rosterOf } from '../people/roster.ts'

const toldLineSchema = z.object({
  work: z.enum(['set-out', 'cut', 'stand']),
  /** Cut line mark; null for set-out work. */
  mark: z.string().nullable(),
  /** What set-out work is called; empty for a marked line. */
  title: z.string(),
  quantity: z.number(),
  members: z.array(z.string()),
})

const toldBookingSchema = z.object({
  bookingId: z.string(),
  jobNumber: z.string(),
  jobTitle: z.string(),
  site: z.string(),
  access: z.string(),
  startAt: z.string(),
  gear: z.string(),
  revision: z.string().nullable(),
  lines: z.array(toldLineSchema),
})

/** What a person is told of one day; who is there, ticks and who does what are left out on purpose. */
export const toldDaySchema = z.object({ bookings: z.array(toldBookingSchema) })
export type ToldLine = z.infer<typeof toldLineSchema>
export type ToldBooking = z.infer<typeof toldBookingSchema>
export type ToldDay = z.infer<typeof toldDaySchema>

export type ToldPerson = typeof people.$inferSelect

const standing = and(eq(bookings.state, 'firm'), isNull(bookings.cancelledAt))

/** Days from `from` on that have a firm booking, earliest first. */
export function firmDaysFrom(db: DbOrTx, from: Day): Day[] {
  return db
    .selectDistinct({ day: bookingDays.day })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(standing, gte(bookingDays.day, from)))
    .orderBy(asc(bookingDays.day))
    .all()
    .map((row) => row.day)
}

/** Who is rostered on a day's firm bookings: active, not on leave, with an address. */
export function peopleToTell(db: DbOrTx, day: Day): string[] {
  const crewIds = db
    .selectDistinct({ crewId: bookings.crewId })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(eq(bookingDays.day, day), standing))
    .all()
  const present = crewIds
    .flatMap(({ crewId }) => rosterOf(db, crewId, day))
    .filter((person) => !person.onLeave && person.email !== '')
  return [...new Set(present.map((person) => person.id))]
}

/** A line shared out between people is still one line: shares are joined and the order set aside. */
function joinedLines(rows: (typeof tasks.$inferSelect)[]): ToldLine[] {
  const byKey = new Map<string, ToldLine>()
  for (const row of rows) {
    const title = row.cutLineMark === null ? row.title : ''
    const key = `${row.work}|${row.cutLineMark ?? ''}|${title}`
    const line = byKey.get(key)
    byKey.set(key, {
      work: row.work,
      mark: row.cutLineMark,
      title,
      quantity: (line?.quantity ?? 0) + row.quantity,
      members: [...(line?.members ?? []), ...row.memberMarks].sort(),
    })
  }
  return [...byKey.entries()].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, line]) => line)
}

/** Crews a person turns up with on a day; none while on leave or with the account closed. */
export function crewsWorkedWith(db: DbOrTx, personId: string, day: Day): string[] {
  return crewIdsOf(db, personId, day).filter((crewId) =>
    rosterOf(db, crewId, day).some((person) => person.id === personId && !person.onLeave),
  )
}

type Span = { from: Day; to: Day }

function readTaskRows(db: DbOrTx, span: Span): Map<string, (typeof tasks.$inferSelect)[]> {
  const rows = db
    .select({ task: tasks })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(between(bookingDays.day, span.from, span.to), standing))
    .orderBy(asc(tasks.position))
    .all()
  return groupBy(
    rows.map(({ task }) => task),
    (task) => task.bookingDayId,
  )
}

function readBookedRows(db: DbOrTx, span: Span) {
  return db
    .select({ booking: bookings, day: bookingDays, job: jobs, letter: roofRevisions.letter })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .leftJoin(roofRevisions, eq(roofRevisions.id, bookingDays.revisionId))
    .where(and(between(bookingDays.day, span.from, span.to), standing))
    .all()
}

export type ToldDays = {
  /** What the person is to be told of the day as things stand now. */
  of(personId: string, day: Day): ToldDay
  /** Who has something on, on which days. */
  peopleOn(): { personId: string; day: Day }[]
}

/** What everybody is to be told of the days of a span, in the same few queries for any number. */
export function readToldDays(db: DbOrTx, firm: Firm, span: Span): ToldDays {
  const rows = groupBy(readBookedRows(db, span), (row) => row.day.day)
  const tasksOf = readTaskRows(db, span)
  const hours = readCrewHours(db, span, firm)
  const toldOf = ({ booking, day, job, letter }: ReturnType<typeof readBookedRows>[number]) => ({
    bookingId: booking.id,
    jobNumber: job.number,
    jobTitle: job.title,
    site: job.siteAddress,
    access: job.accessNotes,
    startAt: booking.startAt ?? firm.startAt,
    gear: booking.gear,
    revision: letter,
    lines: joinedLines(tasksOf.get(day.id) ?? []),
  })
  const inOrder = (b: ToldBooking) => `${b.startAt}|${b.jobNumber}|${b.bookingId}`
  return {
    of(personId, day) {
      const own = (rows.get(day) ?? []).filter((row) =>
        hours.on(row.booking.crewId, day).thereIds.includes(personId),
      )
      return { bookings: own.map(toldOf).sort((a, b) => (inOrder(a) < inOrder(b) ? -1 : 1)) }
    },
    peopleOn() {
      return [...rows].flatMap(([day, booked]) => {
        const there = booked.flatMap((row) => hours.on(row.booking.crewId, day).thereIds)
        return [...new Set(there)].map((personId) => ({ personId, day }))
      })
    },
  }
}

/** What a person is to be told of a day as things stand now. */
export function toldDayOf(db: DbOrTx, firm: Firm, personId: string, day: Day): ToldDay {
  return readToldDays(db, firm, { from: day, to: day }).of(personId, day)
}

/** The day itself without its lines: until the reminder they still move from day to day. */
export function withoutLines(told: ToldDay): ToldDay {
  return { bookings: told.bookings.map((booking) => ({ ...booking, lines: [] })) }
}

export function toldHash(told: ToldDay): string {
  return createHash('sha256').update(JSON.stringify(told)).digest('hex')
}

/** First and last start of what is told, as instants; null when nothing is on. */
export function startsOf(
  told: ToldDay,
  day: Day,
  timeZone: string,
): { first: Date; last: Date } | null {
  const starts = told.bookings.map((b) => instantAt(day, b.startAt, timeZone).getTime())
  if (starts.length === 0) return null
  return { first: new Date(Math.min(...starts)), last: new Date(Math.max(...starts)) }
}
