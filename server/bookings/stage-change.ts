import type { DbOrTx } from '../db/client.ts'
import { AppError } from '../http/app-error.ts'
import { requireRoof } from './booking-rules.ts'
import { type BookedDay, type BookingRow, readBookedDays, writeDays } from './booking-store.ts'
import { readForChange, recordBooking } from './booking-write.ts'
import { changesOf, crewAfter, daysAfter, keepWorked, placeRow, saveRow } from './change-rules.ts'
import { readNewestRevisionId } from './job-plan-store.ts'
import type { BookingChange, Staged, StageGiven } from './staged.ts'

/** @throws AppError 404, 409 when stale, cancelled or worked, 400 at the field at fault. */
export function stageChange(
  tx: DbOrTx,
  given: StageGiven,
  id: string,
  input: BookingChange,
): Staged {
  const row = readForChange(given.deps, tx, given.user, id, input)
  const before = readBookedDays(tx, id)
  if (input.cancelled === true) return stageCancel(tx, given, row, before)
  if (row.cancelledAt && input.cancelled !== false)
    throw new AppError('conflict', 'This booking is cancelled. Restore it first.')
  const days = daysAfter(input, before, given.firm)
  const crew = crewAfter(tx, input.crewId, row, before)
  keepWorked(before, days)
  const revisionId = readNewestRevisionId(tx, row.jobId)
  const state = input.state ?? row.state
  if (state === 'firm' && row.state !== 'firm') requireRoof(revisionId)
  const isRestored = row.cancelledAt !== null
  // What was said on purpose when the days were booked still holds when a cancellation is taken back.
  const reason = input.clashReason ?? (isRestored ? (row.clashReason ?? undefined) : undefined)
  writeDays(tx, id, before, days, revisionId)
  placeRow(tx, id, { crewId: crew.id, cancelledAt: null })
  return {
    bookingId: id,
    jobId: row.jobId,
    check: {
      booking: { bookingId: id, crew, days },
      before: isRestored ? null : { crewId: row.crewId, days: before.map((d) => d.day) },
      said: { clashReason: reason, evenIfNotWorked: isRestored || input.evenIfNotWorked },
    },
    settle(crewTwice) {
      const next = {
        crewId: crew.id,
        state,
        startAt: input.startAt === undefined ? row.startAt : input.startAt,
        gear: input.gear ?? row.gear,
        clashReason: crewTwice ? (reason ?? row.clashReason) : null,
        cancelledAt: null,
      }
      const changed = changesOf(row, next, before, days)
      if (changed.length === 0) return false
      // Gear is not in anybody's calendar file.
      saveRow(tx, row, next, { isRealChange: changed.some((c) => c !== 'gear'), now: given.now })
      const action = isRestored ? 'booking.restored' : 'booking.changed'
      recordBooking(given.deps, tx, { user: given.user, action, id, detail: { changed, days } })
      return true
    },
  }
}

function stageCancel(
  tx: DbOrTx,
  given: StageGiven,
  row: BookingRow,
  before: readonly BookedDay[],
): Staged {
  const { id, jobId } = row
  const staged = { bookingId: id, jobId, check: null }
  if (row.cancelledAt) return { ...staged, settle: () => false }
  keepWorked(before, [])
  placeRow(tx, id, { cancelledAt: given.now })
  return {
    ...staged,
    settle() {
      const gone = { cancelledAt: given.now, shortMinutes: 0 }
      saveRow(tx, row, gone, { isRealChange: true, now: given.now })
      recordBooking(given.deps, tx, { user: given.user, action: 'booking.cancelled', id })
      return true
    },
  }
}
