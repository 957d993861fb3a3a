import { and, asc, between, eq, inArray, isNull, lt, sql, sum } from 'drizzle-orm'
import { type Day, dayPlus, isoWeekday } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { JobHours, WeekHours } from '../../shared/day-logs/hours-schemas.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { labourMinutes } from '../../shared/labour/work-step.ts'
import {
  type JobTask,
  readJobTasks,
  readNewestRevisionId,
  readSpecs,
} from '../bookings/job-plan-store.ts'
import type { Viewer } from '../day-sheets/task-store.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { dayLogPeople, dayLogs } from '../db/tables/day-log-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { crews, people } from '../db/tables/people-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { notFound } from '../http/app-error.ts'
import { jobVisible } from '../lib/visibility.ts'
import { readDayLog } from './day-log-store.ts'
import { isLoggedDay, isWorkedDay } from './worked-days.ts'

const crewColumns = { id: crews.id, name: crews.name, letter: crews.letter, colour: crews.colour }
const jobColumns = { id: jobs.id, number: jobs.number, title: jobs.title }

/** Days of a job that stand, and those of bookings called off that were worked. */
function readJobBookedDays(db: DbOrTx, jobId: string) {
  return db
    .select({ bookingDayId: bookingDays.id, day: bookingDays.day, crew: crewColumns })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(and(eq(bookings.jobId, jobId), sql`(${bookings.cancelledAt} is null or ${isWorkedDay})`))
    .orderBy(asc(bookingDays.day), asc(crews.letter), asc(bookings.createdAt))
    .all()
}

function roofMinutesOf(db: DbOrTx, jobId: string, firm: Firm): number | null {
  const revisionId = readNewestRevisionId(db, jobId)
  const spec = revisionId === null ? undefined : readSpecs(db, [revisionId]).get(revisionId)
  return spec ? Math.round(labourMinutes(workPackagesOf(spec, firm.labourRates))) : null
}

function doneShare({ tickSum, quantity }: JobTask): number {
  return Math.min(1, Math.max(0, tickSum / Math.max(1, quantity)))
}

/** Planned and logged, day by day, of one job. @throws AppError 404. */
export function jobHours(db: DbOrTx, viewer: Viewer, jobId: string): JobHours {
  const { user, firm, now } = viewer
  const job = db
    .select({ ...jobColumns, siteAddress: jobs.siteAddress, customerName: jobs.customerName })
    .from(jobs)
    .where(and(eq(jobs.id, jobId), jobVisible(user, 'hours:read', firm, now)))
    .get()
  if (!job) throw notFound('That job')
  const tasks = readJobTasks(db, jobId)
  return {
    firm: { name: firm.name, phone: firm.phone },
    job,
    today: localDayOf(now, firm.timeZone),
    roofMinutes: roofMinutesOf(db, jobId, firm),
    days: readJobBookedDays(db, jobId).map((row) => {
      const own = tasks.filter((task) => task.bookingDayId === row.bookingDayId)
      const done = own.reduce((total, task) => total + task.plannedMinutes * doneShare(task), 0)
      return {
        ...row,
        plannedMinutes: own.reduce((total, task) => total + task.plannedMinutes, 0),
        doneMinutes: Math.round(done),
        log: readDayLog(db, row.bookingDayId),
      }
    }),
  }
}

/** Monday to Sunday of the week that a day lies in. */
export function weekOf(day: Day): Day[] {
  const monday = dayPlus(day, 1 - isoWeekday(day))
  return Array.from({ length: 7 }, (_, i) => dayPlus(monday, i))
}

type Span = { from: Day; to: Day }

function readPersonDays(db: DbOrTx, { from, to }: Span) {
  return db
    .select({
      personId: people.id,
      name: people.name,
      day: bookingDays.day,
      minutes: sum(dayLogPeople.minutes).mapWith(Number),
    })
    .from(dayLogPeople)
    .innerJoin(dayLogs, eq(dayLogs.id, dayLogPeople.dayLogId))
    .innerJoin(bookingDays, eq(bookingDays.id, dayLogs.bookingDayId))
    .innerJoin(people, eq(people.id, dayLogPeople.personId))
    .where(between(bookingDays.day, from, to))
    .groupBy(people.id, bookingDays.day)
    .orderBy(asc(people.name), asc(people.id))
    .all()
}

/** Booked days before today that nobody has closed. */
function readOpenDays(db: DbOrTx, { from, to }: Span, today: Day) {
  return db
    .select({
      bookingDayId: bookingDays.id,
      day: bookingDays.day,
      job: jobColumns,
      crew: crewColumns,
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(
      and(
        between(bookingDays.day, from, to),
        lt(bookingDays.day, today),
        isNull(bookings.cancelledAt),
        sql`not ${isLoggedDay}`,
      ),
    )
    .orderBy(asc(bookingDays.day), asc(crews.letter))
    .all()
}

/** Hours of everybody who works on site, a day a column. */
export function weekHours(db: DbOrTx, viewer: Viewer, week: Day | undefined): WeekHours {
  const today = localDayOf(viewer.now, viewer.firm.timeZone)
  const days = weekOf(week ?? today)
  const span = { from: days[0] ?? today, to: days[6] ?? today }
  const onSite = db
    .select({ personId: people.id, name: people.name })
    .from(people)
    .where(and(eq(people.active, true), inArray(people.role, ['leading-hand', 'apprentice'])))
    .all()
  const rows = readPersonDays(db, span)
  const everybody = new Map([...onSite, ...rows].map((one) => [one.personId, one.name]))
  return {
    days,
    today,
    people: [...everybody]
      .map(([personId, name]) => ({
        personId,
        name,
        minutes: days.map(
          (day) => rows.find((row) => row.personId === personId && row.day === day)?.minutes ?? 0,
        ),
      }))
      .sort((a, b) => a.name.localeCompare(b.name)),
    open: readOpenDays(db, span, today),
  }
}
