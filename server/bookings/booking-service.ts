import type { BookingChanges } from '../../shared/bookings/booking-changes.ts'
import type {
  ChangeBooking,
  CreateBooking,
  RestoreBooking,
} from '../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { BookingDeps } from './booking-write.ts'
import { changeBooking, changeBookings } from './change-booking.ts'
import { createBooking } from './create-booking.ts'

export type BookingService = ReturnType<typeof createBookingService>

export function createBookingService(deps: BookingDeps) {
  return {
    create: (user: CurrentUser, input: CreateBooking): Booking => createBooking(deps, user, input),
    change: (user: CurrentUser, id: string, input: ChangeBooking): Booking =>
      changeBooking(deps, user, id, input),
    changeAll: (user: CurrentUser, input: BookingChanges): Booking[] =>
      changeBookings(deps, user, input),
    cancel: (user: CurrentUser, id: string, input: { version: number }): Booking =>
      changeBooking(deps, user, id, { ...input, cancelled: true }),
    /** Takes a cancellation back, when its days are still free or both are booked on purpose. */
    restore: (user: CurrentUser, id: string, input: RestoreBooking): Booking =>
      changeBooking(deps, user, id, { ...input, cancelled: false }),
  }
}
