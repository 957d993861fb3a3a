import { and, asc, desc, eq, inArray, isNull, type SQL, sql } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import { formatDay } from '../../shared/calendar/days.ts'
import { ordinaryMinutes } from '../../shared/calendar/ordinary-hours.ts'
import { cautionsOf, leftOverOf, planMarks } from '../../shared/day-sheets/day-pieces.ts'
import { comparePlates, differingCount } from '../../shared/day-sheets/plate-check.ts'
import type { DayTask } from '../../shared/day-sheets/task-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays, bookings } from '../db/tables/booking-tables.ts'
import { jobs, plateChecks, roofRevisions } from '../db/tables/job-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { readLogSummaries } from '../day-logs/day-log-store.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { rosterOf, type RosteredPerson } from '../people/roster.ts'
import {
  type IssuedRoof,
  type ReadIssuedRoofs,
  readIssuedRoofs,
} from '../revisions/issued-roofs.ts'
import { tasksOfBookings } from './task-store.ts'

/** Everything a crew's day holds for one booking, unfiltered: who may see what is for the caller. */
export type CrewDaySheet = ReturnType<typeof readDaySheets>[number]

type DayRow = { bookingId: string; id: string; day: Day; letter: string | null }

/** A crew's sheets of one day, by start. `visible` narrows them to what somebody may see. */
export function readDaySheets(
  db: DbOrTx,
  { crewId, day }: { crewId: string; day: Day },
  readRoofs: ReadIssuedRoofs = readIssuedRoofs,
  visible?: SQL,
) {
  const firm = readFirm(db)
  const rows = db
    .select({ booking: bookings, job: jobs, bookingDay: bookingDays })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .innerJoin(jobs, eq(jobs.id, bookings.jobId))
    .where(
      and(
        eq(bookingDays.day, day),
        eq(bookings.crewId, crewId),
        isNull(bookings.cancelledAt),
        visible,
      ),
    )
    .orderBy(asc(sql`coalesce(${bookings.startAt}, ${firm.startAt})`), asc(jobs.number))
    .all()
  const bookingIds = rows.map(({ booking }) => booking.id)
  const allTasks = tasksOfBookings(db, bookingIds)
  const allDays = daysOfBookings(db, bookingIds)
  const revisions = readRoofs(
    db,
    rows.map((row) => row.bookingDay.revisionId).filter((id) => id !== null),
  )
  const logs = readLogSummaries(
    db,
    rows.map(({ bookingDay }) => bookingDay.id),
  )
  const roster = rows.length > 0 ? rosterOf(db, crewId, day) : []
  return rows.map(({ booking, job, bookingDay }) => {
    const revision = revisions.get(bookingDay.revisionId ?? '') ?? null
    const days = allDays.filter((one) => one.bookingId === booking.id)
    const work = dayWork(
      allTasks.filter((one) => one.bookingId === booking.id),
      day,
    )
    const before = days.filter((one) => one.day < day).at(-1)
    return {
      bookingDayId: bookingDay.id,
      day,
      booking,
      job,
      revision,
      roster,
      startAt: booking.startAt ?? firm.startAt,
      dayNumber: days.findIndex((one) => one.day === day) + 1,
      dayCount: days.length,
      plates: revision ? latestPlateCheck(db, revision) : null,
      minutesPlanned: work.tasks.reduce((sum, task) => sum + task.plannedMinutes, 0),
      minutesThere: minutesThere(firm, roster, day),
      log: logs.get(bookingDay.id) ?? null,
      ...work,
      cautions: cautionsOf(revision?.spec.cautions ?? [], [...work.tasks, ...work.leftOver]),
      changes: before
        ? changesSince(before, revision, rosterOf(db, crewId, before.day), roster)
        : [],
    }
  })
}

function dayWork(bookingTasks: DayTask[], day: Day) {
  const tasks = bookingTasks.filter((task) => task.day === day)
  const earlier = bookingTasks.filter((task) => task.day < day)
  const leftOver = leftOverOf(
    earlier,
    bookingTasks.filter((task) => task.day >= day),
  )
  return { tasks, leftOver, marks: planMarks([...tasks, ...leftOver], bookingTasks) }
}

function daysOfBookings(db: DbOrTx, bookingIds: string[]): DayRow[] {
  if (bookingIds.length === 0) return []
  return db
    .select({
      bookingId: bookingDays.bookingId,
      id: bookingDays.id,
      day: bookingDays.day,
      letter: roofRevisions.letter,
    })
    .from(bookingDays)
    .leftJoin(roofRevisions, eq(roofRevisions.id, bookingDays.revisionId))
    .where(inArray(bookingDays.bookingId, bookingIds))
    .orderBy(asc(bookingDays.day))
    .all()
}

export type LatestPlateCheck = {
  takenAt: Date
  takenBy: string
  note: string
  /** Lengths more than the tolerance off plan. */
  differing: number
}

/** The latest check of sides and diagonals taken for a revision. */
export function latestPlateCheck(
  db: DbOrTx,
  revision: Pick<IssuedRoof, 'id' | 'roof'>,
): LatestPlateCheck | null {
  const row = db
    .select({ check: plateChecks, takenBy: people.name })
    .from(plateChecks)
    .innerJoin(people, eq(people.id, plateChecks.takenById))
    .where(eq(plateChecks.revisionId, revision.id))
    .orderBy(desc(plateChecks.takenAt))
    .limit(1)
    .get()
  if (!row) return null
  const { takenAt, note } = row.check
  const differing = differingCount(comparePlates(revision.roof.outline, row.check))
  return { takenAt, takenBy: row.takenBy, note, differing }
}

function minutesThere(firm: Firm, roster: RosteredPerson[], day: Day): number {
  return roster
    .filter((person) => !person.onLeave)
    .reduce((total, person) => total + ordinaryMinutes(firm, person, day), 0)
}

/** What is not as it was on the booking's day before. */
function changesSince(
  before: DayRow,
  revision: IssuedRoof | null,
  rosterBefore: RosteredPerson[],
  roster: RosteredPerson[],
): string[] {
  const was = formatDay(before.day)
  const there = (people: RosteredPerson[]) => people.filter((person) => !person.onLeave)
  const missing = (from: RosteredPerson[], to: RosteredPerson[]) =>
    there(from).filter((person) => !there(to).some((other) => other.id === person.id))
  return [
    ...(revision && revision.letter !== before.letter
      ? [`Roof is now revision ${revision.letter}; ${was} had ${before.letter ?? 'none'}.`]
      : []),
    ...missing(roster, rosterBefore).map((p) => `${p.name} is with the crew; not on ${was}.`),
    ...missing(rosterBefore, roster).map((p) => `${p.name} is not with the crew; was on ${was}.`),
  ]
}

/** The crew's nearest booked days before and after. */
export function neighbouringDays(
  db: DbOrTx,
  { crewId, day }: { crewId: string; day: Day },
  visible?: SQL,
): { previousDay: Day | null; nextDay: Day | null } {
  const found = db
    .select({
      previousDay: sql<
        string | null
      >`max(case when ${bookingDays.day} < ${day} then ${bookingDays.day} end)`,
      nextDay: sql<
        string | null
      >`min(case when ${bookingDays.day} > ${day} then ${bookingDays.day} end)`,
    })
    .from(bookingDays)
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(eq(bookings.crewId, crewId), isNull(bookings.cancelledAt), visible))
    .get()
  return found ?? { previousDay: null, nextDay: null }
}
