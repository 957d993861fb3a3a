import type { OneOfChanges } from '../../shared/bookings/booking-changes.ts'
import type { ChangeBooking } from '../../shared/bookings/booking-schemas.ts'
import type { CurrentUser } from '../auth/current-user.ts'
import type { Firm } from '../firm/firm-store.ts'
import type { Before, CrewAndDays, OnPurpose } from './booking-rules.ts'
import type { BookingDeps } from './booking-write.ts'

/** A change of one booking; `cancelled` takes it off the calendar or puts it back. */
export type BookingChange = ChangeBooking & Pick<OneOfChanges, 'cancelled'>

export type StageGiven = { deps: BookingDeps; user: CurrentUser; firm: Firm; now: Date }

/** A booking put where it is to be, its version not yet raised. */
export type Staged = {
  bookingId: string
  jobId: string
  /** null when it books nothing that could clash. */
  check: { booking: CrewAndDays; before: Before; said: OnPurpose } | null
  /** Writes the rest; false when nothing has changed. */
  settle(crewTwice: boolean): boolean
}
