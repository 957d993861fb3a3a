import { eq } from 'drizzle-orm'
import type { ChangeBooking } from '../../shared/bookings/booking-schemas.ts'
import { movedDays } from '../../shared/bookings/move-days.ts'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import type { WorkingCalendar } from '../../shared/calendar/working-days.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import { AppError, invalidField } from '../http/app-error.ts'
import { sortedDays } from './booking-rules.ts'
import { type BookedDay, type BookingRow, readCrew } from './booking-store.ts'

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

export function daysAfter(
  input: Pick<ChangeBooking, 'days' | 'move'>,
  before: readonly BookedDay[],
  calendar: WorkingCalendar,
): Day[] {
  const now = before.map((d) => d.day)
  if (input.days) return sortedDays(input.days)
  if (!input.move) return now
  if (!now.includes(input.move.from))
    throw invalidField('move.from', 'The booking has no such day any more.')
  const worked = new Set(before.filter((d) => d.worked).map((d) => d.day))
  if (worked.has(input.move.from)) keepWorked(before, [])
  return movedDays(calendar, now, worked, input.move)
}

export function crewAfter(
  tx: DbOrTx,
  crewId: string | undefined,
  row: BookingRow,
  before: readonly BookedDay[],
) {
  const crew = readCrew(tx, crewId ?? row.crewId)
  // A crew is stood down once nothing stands for it: what was cancelled does not come back to it.
  const isItsOwn = crew?.id === row.crewId && row.cancelledAt === null
  if (!crew || (!crew.active && !isItsOwn)) throw invalidField('crewId', 'There is no such crew.')
  if (crew.id !== row.crewId && before.some((d) => d.worked))
    throw new AppError(
      'conflict',
      'Days of this booking have been worked by its crew. Take the days ahead off it and book the other crew for them.',
    )
  return crew
}

/** @throws AppError 409 when a worked day would go. */
export function keepWorked(before: readonly BookedDay[], days: readonly Day[]): void {
  const lost = before.filter((d) => d.worked && !days.includes(d.day)).map((d) => formatDay(d.day))
  if (lost.length === 0) return
  const verb = lost.length === 1 ? 'has been worked and stays' : 'have been worked and stay'
  throw new AppError(
    'conflict',
    `${lost.join(', ')} ${verb}. Move or take off the days ahead only.`,
  )
}

export type RowChange = Partial<BookingRow>

export function changesOf(
  row: BookingRow,
  next: RowChange,
  before: readonly BookedDay[],
  days: readonly Day[],
): string[] {
  const keys = (Object.keys(next) as (keyof RowChange)[]).filter((k) => !isSame(row[k], next[k]))
  const sameDays = isSame(
    before.map((d) => d.day),
    days,
  )
  return sameDays ? keys : [...keys, 'days']
}

export function saveRow(
  tx: DbOrTx,
  row: BookingRow,
  next: RowChange,
  { isRealChange, now }: { isRealChange: boolean; now: Date },
): void {
  const sequence = row.sequence + (isRealChange ? 1 : 0)
  tx.update(bookings)
    .set({ ...next, sequence, version: row.version + 1, updatedAt: now })
    .where(eq(bookings.id, row.id))
    .run()
}

/** Where a booking stands, before its version is raised: what the clash checks read. */
export function placeRow(tx: DbOrTx, id: string, place: RowChange): void {
  tx.update(bookings).set(place).where(eq(bookings.id, id)).run()
}
