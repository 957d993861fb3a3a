import { eq } from 'drizzle-orm'
import type { ChangeBooking, RestoreBooking } from '../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import { movedDays } from '../../shared/bookings/move-days.ts'
import { type Day, formatDay } from '../../shared/calendar/days.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { DbOrTx } from '../db/client.ts'
import { bookings } from '../db/tables/booking-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { AppError, invalidField, notFound } from '../http/app-error.ts'
import { requireRoof, settleClashes, sortedDays } from './booking-rules.ts'
import {
  type BookedDay,
  type BookingRow,
  readBookedDays,
  readCrew,
  writeDays,
} from './booking-store.ts'
import { type BookingDeps, readForChange, recordBooking, writeBooking } from './booking-write.ts'
import { readNewestRevisionId } from './job-plan-store.ts'
import { replanJob } from './replan.ts'

export function changeBooking(
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: ChangeBooking,
): Booking {
  return writeBooking(deps, user, (tx) => {
    const row = readForChange(deps, tx, user, id, input)
    if (row.cancelledAt)
      throw new AppError('conflict', 'This booking is cancelled. Restore it first.')
    const now = deps.clock.now()
    const firm = readFirm(tx)
    const before = readBookedDays(tx, id)
    const days = daysAfter(input, before, firm)
    const crew = crewAfter(tx, input, row, before)
    keepWorked(before, days)
    const revisionId = readNewestRevisionId(tx, row.jobId)
    const state = input.state ?? row.state
    if (state === 'firm' && row.state !== 'firm') requireRoof(revisionId)
    const { crewTwice } = settleClashes(tx, {
      booking: { bookingId: id, crew, days },
      before: { crewId: row.crewId, days: before.map((d) => d.day) },
      calendar: firm,
      said: input,
    })
    const next = {
      crewId: crew.id,
      state,
      startAt: input.startAt === undefined ? row.startAt : input.startAt,
      gear: input.gear ?? row.gear,
      clashReason: crewTwice ? (input.clashReason ?? row.clashReason) : null,
    }
    const changed = changesOf(row, next, before, days)
    if (changed.length === 0) return id
    writeDays(tx, id, before, days, revisionId)
    // Gear is not in anybody's calendar file.
    saveRow(tx, row, next, { isRealChange: changed.some((c) => c !== 'gear'), now })
    replanJob(tx, row.jobId, now)
    const detail = { changed, days }
    recordBooking(deps, tx, { user, action: 'booking.changed', id, detail })
    return id
  })
}

export function cancelBooking(
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: { version: number },
): Booking {
  return writeBooking(deps, user, (tx) => {
    const row = readForChange(deps, tx, user, id, input)
    if (row.cancelledAt) return id
    keepWorked(readBookedDays(tx, id), [])
    const now = deps.clock.now()
    saveRow(tx, row, { cancelledAt: now, shortMinutes: 0 }, { isRealChange: true, now })
    replanJob(tx, row.jobId, now)
    recordBooking(deps, tx, { user, action: 'booking.cancelled', id })
    return id
  })
}

/** Takes a cancellation back, when its days are still free or both are booked on purpose. */
export function restoreBooking(
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: RestoreBooking,
): Booking {
  return writeBooking(deps, user, (tx) => {
    const row = readForChange(deps, tx, user, id, input)
    if (!row.cancelledAt) return id
    const crew = readCrew(tx, row.crewId)
    if (!crew) throw notFound('That crew')
    const days = readBookedDays(tx, id).map((d) => d.day)
    // What was said on purpose when the days were booked still holds.
    const reason = input.clashReason ?? row.clashReason ?? undefined
    const { crewTwice } = settleClashes(tx, {
      booking: { bookingId: id, crew, days },
      before: null,
      calendar: readFirm(tx),
      said: { clashReason: reason, evenIfNotWorked: true },
    })
    const now = deps.clock.now()
    const clashReason = crewTwice ? (reason ?? null) : null
    saveRow(tx, row, { cancelledAt: null, clashReason }, { isRealChange: true, now })
    replanJob(tx, row.jobId, now)
    recordBooking(deps, tx, { user, action: 'booking.restored', id })
    return id
  })
}

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

function daysAfter(input: ChangeBooking, before: readonly BookedDay[], firm: Firm): Day[] {
  const now = before.map((d) => d.day)
  if (input.days) return sortedDays(input.days)
  if (!input.move) return now
  if (!now.includes(input.move.from))
    throw invalidField('move.from', 'The booking has no such day any more.')
  const worked = new Set(before.filter((d) => d.worked).map((d) => d.day))
  if (worked.has(input.move.from)) keepWorked(before, [])
  return movedDays(firm, now, worked, input.move)
}

function crewAfter(
  tx: DbOrTx,
  input: ChangeBooking,
  row: BookingRow,
  before: readonly BookedDay[],
) {
  const crew = readCrew(tx, input.crewId ?? row.crewId)
  if (!crew || (!crew.active && crew.id !== row.crewId))
    throw invalidField('crewId', 'There is no such crew.')
  if (crew.id !== row.crewId && before.some((d) => d.worked))
    throw new AppError(
      'conflict',
      'Days of this booking have been worked by its crew. Take the days ahead off it and book the other crew for them.',
    )
  return crew
}

/** @throws AppError 409 when a worked day would go. */
function keepWorked(before: readonly BookedDay[], days: readonly Day[]): void {
  const lost = before.filter((d) => d.worked && !days.includes(d.day)).map((d) => formatDay(d.day))
  if (lost.length === 0) return
  const verb = lost.length === 1 ? 'has been worked and stays' : 'have been worked and stay'
  throw new AppError(
    'conflict',
    `${lost.join(', ')} ${verb}. Move or take off the days ahead only.`,
  )
}

type RowChange = Partial<BookingRow>

function changesOf(
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

function saveRow(
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
