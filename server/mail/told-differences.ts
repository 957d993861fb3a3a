import { and, eq, gte, inArray, max } from 'drizzle-orm'
import type { Day } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookingDays } from '../db/tables/booking-tables.ts'
import { toldDays } from '../db/tables/mail-tables.ts'
import type { Firm } from '../firm/firm-store.ts'
import { reminderInstant } from './reminders.ts'
import {
  readToldDays,
  startsOf,
  type ToldDay,
  type ToldDays,
  toldDaySchema,
  toldHash,
  withoutLines,
} from './told-day.ts'

export type ToldRow = typeof toldDays.$inferSelect

/** A day of a person that is not as the person was last told; net, so there and back is nothing. */
export type DayDifference = {
  personId: string
  day: Day
  /** Null: never told of it. */
  row: ToldRow | null
  before: ToldDay
  after: ToldDay
  /** Of what the difference is made: it differs again when the day changes once more. */
  hash: string
  /** Word of it is of no use after this: the later of the start told and the start now. */
  until: Date
}

const nothing: ToldDay = { bookings: [] }

function latestStart(firm: Firm, day: Day, told: readonly ToldDay[]): Date | null {
  const lasts = told.flatMap((one) => startsOf(one, day, firm.timeZone)?.last ?? [])
  return lasts.length === 0 ? null : new Date(Math.max(...lasts.map((last) => last.getTime())))
}

/** Until the reminder only the day itself has been told: its lines may still move. */
function inWhatWasTold(row: ToldRow | null, told: ToldDay): ToldDay {
  return row?.reminded === false ? withoutLines(told) : told
}

function differenceOf(
  firm: Firm,
  from: { personId: string; day: Day; row: ToldRow | null; after: ToldDay; now: Date },
): DayDifference | null {
  const { personId, day, row, after, now } = from
  const before = row ? toldDaySchema.parse(row.content) : nothing
  const hash = toldHash(inWhatWasTold(row, after))
  if (hash === toldHash(inWhatWasTold(row, before))) return null
  const until = latestStart(firm, day, [before, after])
  if (until === null || until <= now) return null
  return { personId, day, row, before, after, hash, until }
}

function lastBookedDay(db: DbOrTx, today: Day): Day {
  const last = db
    .select({ day: max(bookingDays.day) })
    .from(bookingDays)
    .get()?.day
  return last && last > today ? last : today
}

/** A day whose reminder hour has come and which nobody has been told of is the reminder's. */
function isForReminder(firm: Firm, day: Day, now: Date): boolean {
  const at = reminderInstant(firm, day)
  return at === null || at <= now
}

function neverTold(firm: Firm, current: ToldDays, told: ReadonlySet<string>, now: Date) {
  return current
    .peopleOn()
    .filter(({ personId, day }) => !told.has(`${personId} ${day}`))
    .filter(({ day }) => !isForReminder(firm, day, now))
}

/** What of days told does not hold any more, from today on; by person and day. */
export function readToldDifferences(db: DbOrTx, firm: Firm, now: Date): DayDifference[] {
  return readDifferences(db, firm, now, { withNew: false })
}

/** The same, and firm days ahead that a person has not been told of at all. */
export function readNotYetTold(db: DbOrTx, firm: Firm, now: Date): DayDifference[] {
  return readDifferences(db, firm, now, { withNew: true })
}

function readDifferences(
  db: DbOrTx,
  firm: Firm,
  now: Date,
  { withNew }: { withNew: boolean },
): DayDifference[] {
  const today = localDayOf(now, firm.timeZone)
  const rows = db.select().from(toldDays).where(gte(toldDays.day, today)).all()
  if (rows.length === 0 && !withNew) return []
  const lastTold = rows.reduce((last, row) => (row.day > last ? row.day : last), today)
  const lastDay = withNew ? lastBookedDay(db, lastTold) : lastTold
  const current = readToldDays(db, firm, { from: today, to: lastDay })
  const told = new Set(rows.map((row) => `${row.personId} ${row.day}`))
  const fresh = withNew ? neverTold(firm, current, told, now) : []
  const all = [
    ...rows.map((row) => ({ personId: row.personId, day: row.day, row })),
    ...fresh.map((one) => ({ ...one, row: null })),
  ]
  return all
    .flatMap((one) => {
      const after = current.of(one.personId, one.day)
      return differenceOf(firm, { ...one, after, now }) ?? []
    })
    .sort((a, b) => (a.day < b.day ? -1 : 1))
}

/** Some days of one person, for the text of a notice when it is written. */
export function readDifferencesOf(
  db: DbOrTx,
  firm: Firm,
  from: { personId: string; days: readonly Day[]; now: Date },
): DayDifference[] {
  const rows = db
    .select()
    .from(toldDays)
    .where(and(eq(toldDays.personId, from.personId), inArray(toldDays.day, [...from.days])))
    .all()
  return [...from.days].sort().flatMap((day) => {
    const row = rows.find((one) => one.day === day) ?? null
    const after = readToldDays(db, firm, { from: day, to: day }).of(from.personId, day)
    return differenceOf(firm, { personId: from.personId, day, row, after, now: from.now }) ?? []
  })
}
