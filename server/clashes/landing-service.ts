import { and, eq, isNull, sql, sum } from 'drizzle-orm'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { movedDays } from '../../shared/bookings/move-days.ts'
import type { ClashBooking } from '../../shared/clashes/clash-facts.ts'
import type { Landings } from '../../shared/clashes/clash-schemas.ts'
import { bookingLandings, jobLandings, lastLandingDay } from '../../shared/clashes/find-landings.ts'
import { workPackagesOf } from '../../shared/labour/work-packages.ts'
import { labourMinutes } from '../../shared/labour/work-step.ts'
import { readNewestRevisionId, readSpecs } from '../bookings/job-plan-store.ts'
import type { Db } from '../db/client.ts'
import { bookingDays, bookings, tasks } from '../db/tables/booking-tables.ts'
import { roofRevisions } from '../db/tables/job-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { invalidField, notFound } from '../http/app-error.ts'
import type { Clock } from '../lib/clock.ts'
import {
  readActiveCrewNames,
  readDaysOfBooking,
  readJobOf,
  readNeededMilestones,
  type Span,
} from './clash-store.ts'
import { type ClashView, readClashFacts } from './read-clashes.ts'

/** Minutes planned on a booking's days, by day. */
function readPlannedMinutes(db: Db, bookingId: string): Map<Day, number> {
  const rows = db
    .select({ day: bookingDays.day, minutes: sum(tasks.plannedMinutes).mapWith(Number) })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .where(eq(bookingDays.bookingId, bookingId))
    .groupBy(bookingDays.day)
    .all()
  return new Map(rows.map(({ day, minutes }) => [day, minutes]))
}

/** What of a job's work no booked day has room for; all of it while no booking stands. */
function readWorkLeft(db: Db, firm: Firm, jobId: string): number {
  const booked = db
    .select({ short: sum(bookings.shortMinutes).mapWith(Number), count: sql<number>`count(*)` })
    .from(bookings)
    .where(and(eq(bookings.jobId, jobId), isNull(bookings.cancelledAt)))
    .get()
  if (booked && booked.count > 0) return booked.short
  const revisionId = readNewestRevisionId(db, jobId)
  const spec = revisionId === null ? undefined : readSpecs(db, [revisionId]).get(revisionId)
  return spec ? labourMinutes(workPackagesOf(spec, firm.labourRates)) : 0
}

function readNewestRevision(db: Db, jobId: string) {
  const id = readNewestRevisionId(db, jobId)
  if (id === null) return null
  const { letter, sequence } = roofRevisions
  return (
    db.select({ letter, sequence }).from(roofRevisions).where(eq(roofRevisions.id, id)).get() ??
    null
  )
}

export function createLandingService({ db, clock }: { db: Db; clock: Clock }) {
  const viewOf = (): ClashView => {
    const firm = readFirm(db)
    return { firm, today: localDayOf(clock.now(), firm.timeZone), reader: 'office' }
  }

  return {
    /** Before the query is looked at: a GET of what is not there is 404. @throws AppError 404. */
    requireBooking(bookingId: string): void {
      if (readDaysOfBooking(db, bookingId).length === 0) throw notFound('That booking')
    },

    requireJob(jobId: string): void {
      if (!readJobOf(db, jobId)) throw notFound('That job')
    },

    /**
     * A booking taken hold of at one of its days.
     *
     * @throws AppError 404; 400 when the booking has no such day or it has been worked.
     */
    ofBooking(bookingId: string, asked: Span & { day: Day }): Landings {
      const view = viewOf()
      const days = readDaysOfBooking(db, bookingId)
      const [first] = days
      const last = days[days.length - 1]
      if (!first || !last) throw notFound('That booking')
      if (!days.includes(asked.day))
        throw invalidField('day', 'The booking has no such day any more.')
      const reach = movedDays(view.firm, days, new Set(), { from: asked.day, to: asked.to })
      const span = spanOver([asked.from, asked.to, first, last, ...reach])
      const facts = readClashFacts(db, span, view)
      const booking = facts.bookings.find((one) => one.id === bookingId)
      if (!booking) throw notFound('That booking')
      if (booking.days.some((one) => one.day === asked.day && one.worked))
        throw invalidField('day', `${formatDay(asked.day)} has been worked and stays.`)
      const workMinutes = workAhead(booking, readPlannedMinutes(db, bookingId), view.today)
      const crews = readActiveCrewNames(db)
      const move = { day: asked.day, workMinutes }
      return { landings: bookingLandings(facts, booking, move, { ...asked, crews }) }
    },

    /** A job, or what is left of it. @throws AppError 404. */
    ofJob(jobId: string, asked: Span): Landings {
      const view = viewOf()
      const row = readJobOf(db, jobId)
      if (!row) throw notFound('That job')
      const { completedOn, ...named } = row
      const job: ClashBooking['job'] = {
        ...named,
        isComplete: completedOn !== null,
        newestRevision: readNewestRevision(db, jobId),
        milestones: readNeededMilestones(db, { jobId }).get(jobId) ?? [],
      }
      const span = { from: asked.from, to: lastLandingDay(view.firm, asked.to) }
      const facts = readClashFacts(db, span, view)
      const crews = readActiveCrewNames(db)
      const workMinutes = readWorkLeft(db, view.firm, jobId)
      return { landings: jobLandings(facts, job, workMinutes, { ...asked, crews }) }
    },
  }
}

function spanOver(days: readonly Day[]): Span {
  const sorted = [...days].sort()
  return { from: sorted[0] ?? '', to: sorted[sorted.length - 1] ?? '' }
}

/** What is planned on days from today on that have not been worked, with what found no room. */
function workAhead(
  { days, shortMinutes }: ClashBooking,
  planned: ReadonlyMap<Day, number>,
  today: Day,
): number {
  const ahead = days.filter((one) => one.day >= today && !one.worked)
  return ahead.reduce((minutes, { day }) => minutes + (planned.get(day) ?? 0), shortMinutes)
}
