import { and, asc, eq, gte, inArray, isNull, ne, type SQL, sql } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import { groupBy } from '../../shared/collections/group-by.ts'
import type { BookingToMove } from '../../shared/planning/rain-off.ts'
import { readWorkedDayIds } from '../bookings/calendar-store.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings, tasks, ticks } from '../db/tables/booking-tables.ts'
import { jobs } from '../db/tables/job-tables.ts'
import { milestones } from '../db/tables/milestone-tables.ts'
import { crews } from '../db/tables/people-tables.ts'

type Row = ReturnType<typeof readRows>[number]

/** A crew's standing bookings with a day from one on, as far as a rain-off looks at them. */
export type CrewToMove = { bookings: BookingToMove[]; rowOf(bookingId: string): Row | undefined }

const standingOf = (crewId: string, fromDay: Day): SQL | undefined =>
  and(
    isNull(bookings.cancelledAt),
    // From the days ahead, not from the crew: of all bookings it ever had few have one.
    sql`+${bookings.crewId} = ${crewId}`,
    sql`${bookings.id} in (select later.booking_id from booking_days later where later.day >= ${fromDay})`,
  )

function readRows(db: DbOrTx, scope: SQL | undefined) {
  return db
    .select({
      dayId: bookingDays.id,
      day: bookingDays.day,
      bookingId: bookings.id,
      version: bookings.version,
      state: bookings.state,
      clashReason: bookings.clashReason,
      job: { id: jobs.id, number: jobs.number, title: jobs.title },
      customerName: jobs.customerName,
      wantedBy: jobs.wantedBy,
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .where(scope)
    .orderBy(asc(bookingDays.day), asc(bookings.createdAt), asc(bookings.id))
    .all()
}

/** Days that hold a task with pieces not ticked. */
function readUnfinishedDayIds(db: DbOrTx, dayIds: readonly string[]): Set<string> {
  if (dayIds.length === 0) return new Set()
  const rows = db
    .select({ id: tasks.bookingDayId })
    .from(tasks)
    .leftJoin(ticks, eq(ticks.taskId, tasks.id))
    .where(inArray(tasks.bookingDayId, [...dayIds]))
    .groupBy(tasks.id)
    .having(sql`coalesce(sum(${ticks.delta}), 0) < ${tasks.quantity}`)
    .all()
  return new Set(rows.map((row) => row.id))
}

export function readCrewToMove(db: DbOrTx, crewId: string, fromDay: Day): CrewToMove {
  const scope = standingOf(crewId, fromDay)
  const rows = readRows(db, scope)
  const worked = scope ? readWorkedDayIds(db, scope) : new Set<string>()
  const unfinished = readUnfinishedDayIds(db, [...worked])
  const byBooking = groupBy(rows, (row) => row.bookingId)
  return {
    rowOf: (bookingId) => byBooking.get(bookingId)?.[0],
    bookings: [...byBooking].map(([id, own]) => ({
      id,
      days: own.map(({ day, dayId }) => ({
        day,
        worked: worked.has(dayId),
        unfinished: worked.has(dayId) && unfinished.has(dayId),
      })),
    })),
  }
}

/** Deliveries and other trades of some jobs that have a day and are not done, by job. */
export function readTouchedMilestones(db: DbOrTx, jobIds: readonly string[]) {
  const rows = db
    .select({
      jobId: milestones.jobId,
      kind: milestones.kind,
      state: milestones.state,
      day: milestones.day,
      broughtBy: milestones.broughtBy,
    })
    .from(milestones)
    .where(and(inArray(milestones.jobId, [...jobIds]), ne(milestones.state, 'done')))
    .orderBy(asc(milestones.day))
    .all()
  const dated = rows.flatMap(({ day, ...row }) => (day === null ? [] : [{ ...row, day }]))
  return groupBy(dated, (row) => row.jobId)
}

/** Days of other crews on some jobs from one day on, by job. */
export function readOtherCrews(
  db: DbOrTx,
  input: { jobIds: readonly string[]; crewId: string; fromDay: Day },
) {
  const rows = db
    .select({ jobId: bookings.jobId, crew: crews.name, day: bookingDays.day })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(crews, eq(crews.id, bookings.crewId))
    .where(
      and(
        inArray(bookings.jobId, [...input.jobIds]),
        ne(bookings.crewId, input.crewId),
        isNull(bookings.cancelledAt),
        gte(bookingDays.day, input.fromDay),
      ),
    )
    .orderBy(asc(crews.name), asc(bookingDays.day))
    .all()
  return groupBy(rows, (row) => row.jobId)
}
