import type { CreateBooking } from '../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import { applyBookingChanges } from './apply-changes.ts'
import { type BookingDeps, writeBooking } from './booking-write.ts'

/** Books a crew for a job; the same `clientId` again gives the booking it made. */
export function createBooking(deps: BookingDeps, user: CurrentUser, input: CreateBooking): Booking {
  return writeBooking(deps, user, (tx) => {
    applyBookingChanges(tx, deps, user, { changes: [], create: [input] })
    return input.clientId
  })
}
