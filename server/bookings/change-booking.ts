import type { BookingChanges } from '../../shared/bookings/booking-changes.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { notFound } from '../http/app-error.ts'
import { applyBookingChange, applyBookingChanges } from './apply-changes.ts'
import { type BookingDeps, writeBooking } from './booking-write.ts'
import type { BookingChange } from './staged.ts'

export function changeBooking(
  deps: BookingDeps,
  user: CurrentUser,
  id: string,
  input: BookingChange,
): Booking {
  return writeBooking(deps, user, (tx) => {
    applyBookingChange(tx, deps, user, id, input)
    return id
  })
}

/** All of it in one transaction; the news goes out once. */
export function changeBookings(
  deps: BookingDeps,
  user: CurrentUser,
  input: BookingChanges,
): Booking[] {
  const ids = deps.db.transaction((tx) => applyBookingChanges(tx, deps, user, input))
  deps.events.publish({ topic: 'calendar' })
  const changed = new Map(deps.calendar.readBookings(user, ids).map((one) => [one.id, one]))
  return ids.map((id) => {
    const booking = changed.get(id)
    if (!booking) throw notFound('That booking')
    return booking
  })
}
