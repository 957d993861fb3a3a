import type { Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { PopPanel } from '../../ui/pop-panel.tsx'
import { BookingActions } from './booking-actions.tsx'

/** What was pressed: a stretch of a booking's days, and the place it stands at. */
export type Opened = { bookingId: string; stretch: readonly string[]; anchor: Element }

type Props = { calendar: Calendar; opened: Opened | null; mayEdit: boolean; onClose: () => void }

/** The actions of the booking that was pressed; gone when the booking is no longer shown. */
export function OpenedBooking({ calendar, opened, mayEdit, onClose }: Props) {
  const booking = calendar.bookings.find((one) => one.id === opened?.bookingId)
  return (
    <PopPanel
      anchor={booking && opened ? opened.anchor : null}
      title={booking ? `${booking.job.number} ${booking.job.title}` : ''}
      onClose={onClose}
    >
      {booking && opened ? (
        <BookingActions
          calendar={calendar}
          booking={booking}
          stretch={opened.stretch}
          mayEdit={mayEdit}
          onDone={onClose}
        />
      ) : null}
    </PopPanel>
  )
}
