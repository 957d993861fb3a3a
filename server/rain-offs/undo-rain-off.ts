import { formatDay } from '../../shared/calendar/days.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import type { MovedOn } from '../../shared/rain-offs/rain-off-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { applyBookingChanges } from '../bookings/apply-changes.ts'
import { readBookedDays, readBookingRow, readJobToBook } from '../bookings/booking-store.ts'
import type { BookingDeps } from '../bookings/booking-write.ts'
import { readCrewDays } from '../bookings/calendar-store.ts'
import type { DbOrTx } from '../db/client.ts'
import type { MovedBooking } from '../db/tables/rain-off-tables.ts'
import { type Firm, readFirm } from '../firm/firm-store.ts'
import { AppError, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import { handBackTasks } from './held-tasks.ts'
import { keepClashReason } from './make-rain-off.ts'
import { readRainOff, type RainOffRecord, updateRainOff } from './rain-off-store.ts'

/** Made on the firm's day it is now. */
export function canUndo(row: RainOffRecord, firm: Firm, now: Date): boolean {
  if (row.state !== 'made' || row.settledAt === null) return false
  return localDayOf(row.settledAt, firm.timeZone) === localDayOf(now, firm.timeZone)
}

/** Puts every booking back as it was, or none when any has moved on since. */
export function undoRainOff(
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: { version: number },
): void {
  deps.db.transaction((tx) => {
    const row = readRainOff(tx, id)
    if (!row) throw notFound('That rain-off')
    if (row.state === 'undone') return
    const now = deps.clock.now()
    const firm = readFirm(tx)
    if (row.version !== input.version || row.state !== 'made')
      throw new AppError('conflict', 'Somebody else has settled this since. Look again.')
    if (!canUndo(row, firm, now))
      throw new AppError(
        'conflict',
        'A rain-off is undone on the day it was made. Move the bookings on the calendar instead.',
      )
    refuseMovedOn(tx, row)
    putBack(tx, deps, user, row)
    handBackTasks(
      tx,
      {
        bookingIds: row.moved.map((one) => one.bookingId),
        held: row.moved.flatMap((one) => one.tasksHeld),
      },
      firm,
    )
    updateRainOff(tx, row, { state: 'undone', settledById: user.id })
    const audit = { at: now, personId: user.id, entity: 'rain-off', entityId: id }
    writeAudit(tx, { ...audit, action: 'rain-off.undone' })
  })
  deps.events.publish({ topic: 'calendar' })
}

function putBack(tx: DbOrTx, deps: BookingDeps, user: CurrentUser, row: RainOffRecord): void {
  applyBookingChanges(tx, deps, user, {
    changes: row.moved.map((one) => ({
      bookingId: one.bookingId,
      version: one.versionAfter,
      days: one.daysBefore,
      // Whom it meets has been looked at; the words are put back as they were.
      clashReason: one.clashReasonBefore ?? 'Moved back together',
      evenIfNotWorked: true,
    })),
    create: [],
  })
  for (const one of row.moved) keepClashReason(tx, one.bookingId, one.clashReasonBefore)
}

type InTheWay = MovedOn['bookings'][number]

/** @throws AppError 409 naming each booking that cannot go back, with a `MovedOn` as its detail. */
function refuseMovedOn(tx: DbOrTx, row: RainOffRecord): void {
  const movedIds = new Set(row.moved.map((one) => one.bookingId))
  const found = row.moved.flatMap((one) => inTheWayOf(tx, one, row, movedIds))
  if (found.length === 0) return
  const detail: MovedOn = { kind: 'moved-on', bookings: found }
  const words = found.map((one) => `${one.job} ${one.why}`).join('; ')
  throw new AppError(
    'conflict',
    `Not undone, and nothing has moved: ${words}. Move the bookings on the calendar instead.`,
    { detail },
  )
}

function inTheWayOf(
  tx: DbOrTx,
  one: MovedBooking,
  { crewId }: RainOffRecord,
  movedIds: ReadonlySet<string>,
): InTheWay[] {
  const booking = readBookingRow(tx, one.bookingId)
  const job = booking ? readJobToBook(tx, booking.jobId) : null
  const say = (why: string): InTheWay[] => [
    { bookingId: one.bookingId, job: job?.number ?? 'A booking', why },
  ]
  if (!booking || booking.cancelledAt) return say('has been cancelled since')
  if (booking.version !== one.versionAfter) return say('has been changed since')
  const begun = readBookedDays(tx, one.bookingId)
    .filter((d) => d.worked && !one.daysBefore.includes(d.day))
    .map((d) => formatDay(d.day))
  if (begun.length > 0) return say(`has been started on ${begun.join(', ')}`)
  const going = one.daysBefore.filter((day) => !one.daysAfter.includes(day))
  const [first, last] = [going[0], going[going.length - 1]]
  if (first === undefined || last === undefined) return []
  const taken = readCrewDays(tx, [crewId], { from: first, to: last }).filter(
    (other) =>
      going.includes(other.day) &&
      !movedIds.has(other.bookingId) &&
      !one.metBefore.includes(other.bookingId),
  )
  const names = taken.map((other) => `${other.jobNumber} on ${formatDay(other.day)}`)
  return names.length > 0 ? say(`would meet ${[...new Set(names)].join(', ')}`) : []
}
