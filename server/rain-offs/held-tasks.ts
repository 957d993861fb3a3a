import { and, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import { readCrewHours } from '../bookings/crew-hours.ts'
import type { DbOrTx } from '../db/client.ts'
import { isWorkedDay } from '../day-logs/worked-days.ts'
import { bookingDays, bookings, tasks } from '../db/tables/booking-tables.ts'
import type { HeldTask } from '../db/tables/rain-off-tables.ts'
import type { Firm } from '../firm/firm-store.ts'

/** Who has which task of a job. */
export function readHeldTasks(tx: DbOrTx, jobId: string): HeldTask[] {
  const rows = tx
    .select({
      bookingDayId: tasks.bookingDayId,
      packageKey: tasks.packageKey,
      work: tasks.work,
      cutLineMark: tasks.cutLineMark,
      personId: tasks.assignedToId,
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(
      and(eq(bookings.jobId, jobId), isNull(bookings.cancelledAt), isNotNull(tasks.assignedToId)),
    )
    .all()
  return rows.flatMap(({ personId, ...row }) => (personId === null ? [] : [{ ...row, personId }]))
}

const lineOf = (task: Pick<HeldTask, 'packageKey' | 'work' | 'cutLineMark'>): string =>
  [task.packageKey, task.work, task.cutLineMark ?? ''].join(' ')

function readTasksOf(tx: DbOrTx, bookingIds: readonly string[]) {
  const ofJobs = tx
    .select({ jobId: bookings.jobId })
    .from(bookings)
    .where(inArray(bookings.id, [...bookingIds]))
  return tx
    .select({
      id: tasks.id,
      bookingDayId: tasks.bookingDayId,
      packageKey: tasks.packageKey,
      work: tasks.work,
      cutLineMark: tasks.cutLineMark,
      assignedToId: tasks.assignedToId,
      crewId: bookings.crewId,
      day: bookingDays.day,
      isBegun: isWorkedDay.mapWith(Boolean),
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(inArray(bookings.jobId, ofJobs), isNull(bookings.cancelledAt)))
    .all()
}

/**
 * Gives the tasks of the jobs whose bookings were moved to who had them, where that person is there on the
 * day; who had none has none again. Planning anew hands a line that went to another day to whoever had one
 * like it, so what a task holds by then says nothing. Days begun are left alone.
 */
export function handBackTasks(
  tx: DbOrTx,
  moved: { bookingIds: readonly string[]; held: readonly HeldTask[] },
  firm: Firm,
): void {
  const rows = readTasksOf(tx, moved.bookingIds).filter((row) => !row.isBegun)
  const days = rows.map((row) => row.day).sort()
  const [from, to] = [days[0], days[days.length - 1]]
  if (from === undefined || to === undefined) return
  const hours = readCrewHours(tx, { from, to }, firm)
  const had = new Map(
    moved.held.map((task) => [`${task.bookingDayId} ${lineOf(task)}`, task.personId]),
  )
  for (const row of rows) {
    const personId = had.get(`${row.bookingDayId} ${lineOf(row)}`) ?? null
    if (personId === row.assignedToId) continue
    if (personId !== null && !hours.on(row.crewId, row.day).thereIds.includes(personId)) continue
    tx.update(tasks).set({ assignedToId: personId }).where(eq(tasks.id, row.id)).run()
  }
}
