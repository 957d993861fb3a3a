import { and, eq, gte, inArray, isNull, ne } from 'drizzle-orm'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { readCrewHours } from './crew-hours.ts'
import { assignmentsOf, writeDayTasks } from './day-tasks.ts'
import { type JobPlan, planJob, startedDayIds } from './job-plan.ts'
import {
  type JobDay,
  readJobDays,
  readJobTasks,
  readNewestRevisionId,
  readSpecs,
} from './job-plan-store.ts'

/** What a new revision made of work already done. */
export type RevisionTaken = {
  daysTaken: number
  /** Marks, in the older revisions they were cut to, that the new roof has no place for. */
  cutButUnused: JobPlan['cutButUnused']
}

/** Plans what is left of a job over its days not started, in the caller's transaction. */
export function replanJob(tx: DbOrTx, jobId: string, now: Date): JobPlan | null {
  const firm = readFirm(tx)
  const days = readJobDays(tx, jobId)
  const [first, last] = [days[0], days[days.length - 1]]
  if (!first || !last) return null
  const jobTasks = readJobTasks(tx, jobId)
  const today = localDayOf(now, firm.timeZone)
  const revisionId = readNewestRevisionId(tx, jobId)
  takeNewest(tx, { days, started: startedDayIds(days, jobTasks), revisionId, today })
  const hours = readCrewHours(tx, { from: first.day, to: last.day }, firm)
  const plan = planJob({
    days,
    tasks: jobTasks,
    revisionId,
    specs: readSpecs(tx, revisionsWorked(days, revisionId)),
    rates: firm.labourRates,
    hours,
    today,
  })
  const assignments = assignmentsOf(jobTasks)
  for (const [i, { row, started }] of plan.days.entries()) {
    if (started) continue
    const { thereIds } = hours.on(row.crewId, row.day)
    writeDayTasks(tx, {
      bookingDayId: row.id,
      existing: jobTasks.filter((task) => task.bookingDayId === row.id),
      planned: plan.plan.days[i]?.tasks ?? [],
      sameRevision: row.revisionId === revisionId,
      assigneeOf: (task) => {
        const was = assignments.was(row.id, task)
        return was !== null && thereIds.includes(was) ? was : null
      },
    })
  }
  writeShortMinutes(tx, jobId, days, plan)
  return plan
}

/** The same for the job that a booking is of. */
export function replanBooking(tx: DbOrTx, bookingId: string, now: Date): void {
  const row = tx
    .select({ jobId: bookings.jobId })
    .from(bookings)
    .where(eq(bookings.id, bookingId))
    .get()
  if (row) replanJob(tx, row.jobId, now)
}

/**
 * A revision has been issued: days ahead that have not been worked take it and are planned again. Days
 * worked keep what they were cut to.
 */
export function takeRevision(
  tx: DbOrTx,
  jobId: string,
  revisionId: string,
  now: Date,
): RevisionTaken {
  const plan = replanJob(tx, jobId, now)
  const taken = readJobDays(tx, jobId).filter((d) => !d.cancelled && d.revisionId === revisionId)
  return { daysTaken: taken.length, cutButUnused: plan?.cutButUnused ?? [] }
}

/** After a change of people, leave, hours or rates: every job with days from today on. */
export function replanUpcoming(tx: DbOrTx, now: Date): void {
  const firm = readFirm(tx)
  for (const jobId of jobsAhead(tx, firm, now)) replanJob(tx, jobId, now)
}

function jobsAhead(tx: DbOrTx, firm: Firm, now: Date): string[] {
  return tx
    .selectDistinct({ jobId: bookings.jobId })
    .from(bookings)
    .innerJoin(bookingDays, eq(bookingDays.bookingId, bookings.id))
    .where(and(isNull(bookings.cancelledAt), gte(bookingDays.day, localDayOf(now, firm.timeZone))))
    .orderBy(bookings.jobId)
    .all()
    .map((row) => row.jobId)
}

function takeNewest(
  tx: DbOrTx,
  input: {
    days: readonly JobDay[]
    started: ReadonlySet<string>
    revisionId: string | null
    today: string
  },
): void {
  const { days, started, revisionId, today } = input
  const taking = days.filter(
    (d) => !d.cancelled && d.day >= today && !started.has(d.id) && d.revisionId !== revisionId,
  )
  if (taking.length === 0) return
  const ids = taking.map((d) => d.id)
  tx.update(bookingDays).set({ revisionId }).where(inArray(bookingDays.id, ids)).run()
}

function revisionsWorked(days: readonly JobDay[], revisionId: string | null): string[] {
  const ids = [revisionId, ...days.map((d) => d.revisionId)]
  return [...new Set(ids.filter((id) => id !== null))]
}

/** The job's last booking carries what is short; its other ones nothing. */
function writeShortMinutes(
  tx: DbOrTx,
  jobId: string,
  days: readonly JobDay[],
  { plan }: JobPlan,
): void {
  const standing = days.filter((d) => !d.cancelled)
  const lastId = standing[standing.length - 1]?.bookingId
  const others = and(eq(bookings.jobId, jobId), ne(bookings.shortMinutes, 0))
  tx.update(bookings).set({ shortMinutes: 0 }).where(others).run()
  if (lastId && plan.shortMinutes > 0) {
    tx.update(bookings)
      .set({ shortMinutes: Math.ceil(plan.shortMinutes) })
      .where(eq(bookings.id, lastId))
      .run()
  }
}
