import type { Calendar, CalendarBooking } from '../../../shared/bookings/calendar-schemas.ts'
import type { Day } from '../../../shared/calendar/days.ts'
import { useBookingMoves } from './booking-moves-context.ts'
import { moveStep } from './crew-weeks-steps.ts'

/** A dragged day: it and the booking's days after it move, to be taken back like any other step. */
export function useMoveDay(calendar: Calendar) {
  const moves = useBookingMoves()
  return (booking: CalendarBooking, move: { from: Day; to: Day }) =>
    moves.make(moveStep(calendar, booking, move))
}
