import { useMutation, useQueryClient } from '@tanstack/react-query'
import {
  type BookingChangesToSend,
  changedBookingsSchema,
} from '../../../shared/bookings/booking-changes.ts'
import type { Booking, Calendar } from '../../../shared/bookings/calendar-schemas.ts'
import { api } from '../../lib/api-client.ts'
import type { BookingStep } from './booking-steps.ts'
import { calendarQueries } from './calendar-queries.ts'
import { withAnswered, withSides } from './calendar-with-step.ts'
import type { Direction } from './step-bodies.ts'

const spans = { queryKey: calendarQueries.spans() }

/** Puts a step on the screen, sends it, and puts it back when it is refused. */
export function useSendStep() {
  const client = useQueryClient()
  const { mutateAsync, isPending } = useMutation({
    mutationFn: (body: BookingChangesToSend) =>
      api.post('/api/bookings/changes', changedBookingsSchema, body),
  })
  const change = (to: (calendar: Calendar) => Calendar) =>
    client.setQueriesData<Calendar>(spans, (old) => (old ? to(old) : old))

  async function send(
    step: BookingStep,
    direction: Direction,
    body: BookingChangesToSend,
  ): Promise<Booking[]> {
    void client.cancelQueries(spans)
    const before = client.getQueriesData<Calendar>(spans)
    const sides = new Map(
      step.parts.map((part) => [part.id, direction === 'on' ? part.after : part.before]),
    )
    change((calendar) => withSides(calendar, sides))
    try {
      const { bookings } = await mutateAsync(body)
      change((calendar) => withAnswered(calendar, bookings))
      for (const booking of bookings)
        client.setQueryData(calendarQueries.booking(booking.id).queryKey, booking)
      return bookings
    } catch (error) {
      for (const [key, data] of before) client.setQueryData(key, data)
      throw error
    } finally {
      void client.invalidateQueries({ queryKey: calendarQueries.all() })
    }
  }
  return { send, isPending }
}
