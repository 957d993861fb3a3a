import { and, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import { readCrewHours } from '../bookings/crew-hours.ts'
import type { DbOrTx } from '../db/client.ts'
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

/** Hands tasks that nobody has back to who had them, where that person is there on the day. */
export function handBackTasks(tx: DbOrTx, held: readonly HeldTask[], firm: Firm): void {
  const dayIds = [...new Set(held.map((task) => task.bookingDayId))]
  if (dayIds.length === 0) return
  const rows = tx
    .select({
      id: tasks.id,
      bookingDayId: tasks.bookingDayId,
      packageKey: tasks.packageKey,
      work: tasks.work,
      cutLineMark: tasks.cutLineMark,
      crewId: bookings.crewId,
      day: bookingDays.day,
    })
    .from(tasks)
    .innerJoin(bookingDays, eq(bookingDays.id, tasks.bookingDayId))
    .innerJoin(bookings, eq(bookings.id, bookingDays.bookingId))
    .where(and(inArray(tasks.bookingDayId, dayIds), isNull(tasks.assignedToId)))
    .all()
  const days = rows.map((row) => row.day).sort()
  const [from, to] = [days[0], days[days.length - 1]]
  if (from === undefined || to === undefined) return
  const hours = readCrewHours(tx, { from, to }, firm)
  const had = new Map(held.map((task) => [`${task.bookingDayId} ${lineOf(task)}`, task.personId]))
  for (const row of rows) {
    const personId = had.get(`${row.bookingDayId} ${lineOf(row)}`)
    if (personId === undefined) continue
    if (hours.on(row.crewId, row.day).thereIds.includes(personId))
      tx.update(tasks).set({ assignedToId: personId }).where(eq(tasks.id, row.id)).run()
  }
}
