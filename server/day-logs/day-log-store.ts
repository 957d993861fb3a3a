import { and, asc, eq, inArray, ne, sum } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import type { DayLog, DayLogSummary, WriteDayLog } from '../../shared/day-logs/day-log-schemas.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays } from '../db/tables/booking-tables.ts'
import { dayLogDelays, dayLogPeople, dayLogs } from '../db/tables/day-log-tables.ts'
import { people } from '../db/tables/people-tables.ts'
import { newId } from '../lib/ids.ts'

export type DayLogRow = typeof dayLogs.$inferSelect

export function readLogRow(db: DbOrTx, bookingDayId: string): DayLogRow | null {
  return db.select().from(dayLogs).where(eq(dayLogs.bookingDayId, bookingDayId)).get() ?? null
}

export function readDayLog(db: DbOrTx, bookingDayId: string): DayLog | null {
  const row = db
    .select({ log: dayLogs, loggedBy: people.name })
    .from(dayLogs)
    .innerJoin(people, eq(people.id, dayLogs.loggedById))
    .where(eq(dayLogs.bookingDayId, bookingDayId))
    .get()
  if (!row) return null
  const { id, version, done, remarks, loggedAt } = row.log
  return {
    version,
    done,
    remarks,
    loggedBy: row.loggedBy,
    loggedAt: loggedAt.toISOString(),
    people: db
      .select({
        personId: people.id,
        name: people.name,
        turnedUp: dayLogPeople.turnedUp,
        minutes: dayLogPeople.minutes,
      })
      .from(dayLogPeople)
      .innerJoin(people, eq(people.id, dayLogPeople.personId))
      .where(eq(dayLogPeople.dayLogId, id))
      .orderBy(asc(people.name), asc(people.id))
      .all(),
    delays: db
      .select({
        reason: dayLogDelays.reason,
        note: dayLogDelays.note,
        lostMinutes: dayLogDelays.lostMinutes,
      })
      .from(dayLogDelays)
      .where(eq(dayLogDelays.dayLogId, id))
      // In the order they were put down.
      .orderBy(asc(dayLogDelays.id))
      .all(),
  }
}

/** Hours of some days' logs, by booking day id. */
export function readLogSummaries(
  db: DbOrTx,
  bookingDayIds: readonly string[],
): Map<string, DayLogSummary> {
  if (bookingDayIds.length === 0) return new Map()
  const ids = [...bookingDayIds]
  const logs = db
    .select({
      id: dayLogs.id,
      dayId: dayLogs.bookingDayId,
      loggedBy: people.name,
      loggedAt: dayLogs.loggedAt,
    })
    .from(dayLogs)
    .innerJoin(people, eq(people.id, dayLogs.loggedById))
    .where(inArray(dayLogs.bookingDayId, ids))
    .all()
  const logIds = logs.map((log) => log.id)
  const worked = sumsOf(
    db
      .select({ id: dayLogPeople.dayLogId, minutes: sum(dayLogPeople.minutes).mapWith(Number) })
      .from(dayLogPeople)
      .where(inArray(dayLogPeople.dayLogId, logIds))
      .groupBy(dayLogPeople.dayLogId)
      .all(),
  )
  const lost = sumsOf(
    db
      .select({ id: dayLogDelays.dayLogId, minutes: sum(dayLogDelays.lostMinutes).mapWith(Number) })
      .from(dayLogDelays)
      .where(inArray(dayLogDelays.dayLogId, logIds))
      .groupBy(dayLogDelays.dayLogId)
      .all(),
  )
  return new Map(
    logs.map(({ id, dayId, loggedBy, loggedAt }) => [
      dayId,
      {
        loggedBy,
        loggedAt: loggedAt.toISOString(),
        minutes: worked.get(id) ?? 0,
        lostMinutes: lost.get(id) ?? 0,
      },
    ]),
  )
}

const sumsOf = (rows: { id: string; minutes: number }[]) =>
  new Map(rows.map((row) => [row.id, row.minutes]))

/** Minutes that people have in other logs of the same day, by person. */
export function readMinutesElsewhere(
  db: DbOrTx,
  input: { day: Day; bookingDayId: string; personIds: readonly string[] },
): Map<string, number> {
  const rows = db
    .select({ id: dayLogPeople.personId, minutes: sum(dayLogPeople.minutes).mapWith(Number) })
    .from(dayLogPeople)
    .innerJoin(dayLogs, eq(dayLogs.id, dayLogPeople.dayLogId))
    .innerJoin(bookingDays, eq(bookingDays.id, dayLogs.bookingDayId))
    .where(
      and(
        eq(bookingDays.day, input.day),
        ne(bookingDays.id, input.bookingDayId),
        inArray(dayLogPeople.personId, [...input.personIds]),
      ),
    )
    .groupBy(dayLogPeople.personId)
    .all()
  return sumsOf(rows)
}

/** Writes a log whole: what it held before gives way. */
export function saveLog(
  tx: DbOrTx,
  row: Omit<DayLogRow, 'done' | 'remarks'>,
  input: WriteDayLog,
): void {
  const { done, remarks } = input
  tx.insert(dayLogs)
    .values({ ...row, done, remarks })
    .onConflictDoUpdate({
      target: dayLogs.id,
      set: {
        done,
        remarks,
        loggedById: row.loggedById,
        loggedAt: row.loggedAt,
        version: row.version,
      },
    })
    .run()
  tx.delete(dayLogPeople).where(eq(dayLogPeople.dayLogId, row.id)).run()
  tx.delete(dayLogDelays).where(eq(dayLogDelays.dayLogId, row.id)).run()
  for (const person of input.people)
    tx.insert(dayLogPeople)
      .values({ id: newId(), dayLogId: row.id, ...person })
      .run()
  for (const [i, delay] of input.delays.entries())
    tx.insert(dayLogDelays)
      .values({ id: `${row.id} ${String(i).padStart(2, '0')}`, dayLogId: row.id, ...delay })
      .run()
}
