import type {
  ChangeBooking,
  CreateBooking,
  RestoreBooking,
} from '../../shared/bookings/booking-schemas.ts'
import type { Booking } from '../../shared/bookings/calendar-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { BookingDeps } from './booking-write.ts'
import { cancelBooking, changeBooking, restoreBooking } from './change-booking.ts'
import { createBooking } from './create-booking.ts'

export type BookingService = ReturnType<typeof createBookingService>

export function createBookingService(deps: BookingDeps) {
  return {
    create: (user: CurrentUser, input: CreateBooking): Booking => createBooking(deps, user, input),
    change: (user: CurrentUser, id: string, input: ChangeBooking): Booking =>
      changeBooking(deps, user, id, input),
    cancel: (user: CurrentUser, id: string, input: { version: number }): Booking =>
      cancelBooking(deps, user, id, input),
    restore: (user: CurrentUser, id: string, input: RestoreBooking): Booking =>
      restoreBooking(deps, user, id, input),
  }
}
