import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Db, DbOrTx } from '../db/client.ts'
import type { EventHub } from '../events/event-hub.ts'
import { AppError, notFound } from '../http/app-error.ts'
import { writeAudit } from '../lib/audit.ts'
import type { Clock } from '../lib/clock.ts'
import { type BookingRow, readBookingRow } from './booking-store.ts'
import type { CalendarService } from './calendar-service.ts'

export type BookingDeps = { db: Db; clock: Clock; events: EventHub; calendar: CalendarService }

/** One transaction, its audit entry with it; the news goes out once it is committed. */
export function writeBooking(
  { db, events, calendar }: BookingDeps,
  user: CurrentUser,
  work: (tx: DbOrTx) => string,
): Booking {
  const id = db.transaction((tx) => work(tx))
  events.publish({ topic: 'calendar' })
  const booking = calendar.readBooking(user, id)
  if (!booking) throw notFound('That booking')
  return booking
}

export function recordBooking(
  { clock }: BookingDeps,
  tx: DbOrTx,
  entry: { user: CurrentUser; action: string; id: string; detail?: Record<string, unknown> },
): void {
  const { user, action, id, detail = {} } = entry
  const at = clock.now()
  writeAudit(tx, { at, personId: user.id, action, entity: 'booking', entityId: id, detail })
}

/** @throws AppError 404, or 409 with both versions when `sent` was made from an older one. */
export function readForChange(
  { calendar }: BookingDeps,
  tx: DbOrTx,
  user: CurrentUser,
  id: string,
  sent: { version: number },
): BookingRow {
  const row = readBookingRow(tx, id)
  if (!row) throw notFound('That booking')
  if (row.version === sent.version) return row
  const current = calendar.readBooking(user, id, tx)
  throw new AppError(
    'conflict',
    'Somebody else changed this booking since you opened it. Look at it as it is now, then make your change again.',
    { detail: { kind: 'stale', current, sent } },
  )
}
