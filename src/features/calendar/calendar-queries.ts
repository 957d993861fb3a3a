import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import {
  type createBookingSchema,
  bookingConflictSchema,
  type BookingConflict,
} from '../../../shared/bookings/booking-schemas.ts'
import {
  type Booking,
  bookingSchema,
  calendarSchema,
  unbookedJobsSchema,
} from '../../../shared/bookings/calendar-schemas.ts'
import { landingsSchema } from '../../../shared/clashes/clash-schemas.ts'
import type { Day } from '../../../shared/calendar/days.ts'
import { api, ApiFailure } from '../../lib/api-client.ts'

export type Span = { from: Day; to: Day }

export const calendarQueries = {
  all: () => ['calendar'] as const,
  spans: () => [...calendarQueries.all(), 'span'] as const,
  span: ({ from, to }: Span) =>
    queryOptions({
      queryKey: [...calendarQueries.spans(), from, to] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/calendar?from=${from}&to=${to}`, calendarSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  unbooked: (jobId = '') =>
    queryOptions({
      queryKey: [...calendarQueries.all(), 'unbooked', jobId] as const,
      queryFn: ({ signal }) =>
        api.get(
          `/api/calendar/unbooked${jobId ? `?job=${encodeURIComponent(jobId)}` : ''}`,
          unbookedJobsSchema,
          { signal },
        ),
    }),
  /** Where a booking, taken hold of at `day`, or a job not booked could go, and what stands in the way. */
  landings: (what: { bookingId: string; day: Day } | { jobId: string }, { from, to }: Span) =>
    queryOptions({
      queryKey: [...calendarQueries.all(), 'landings', what, from, to] as const,
      queryFn: ({ signal }) =>
        api.get(
          'jobId' in what
            ? `/api/jobs/${encodeURIComponent(what.jobId)}/landings?from=${from}&to=${to}`
            : `/api/bookings/${encodeURIComponent(what.bookingId)}/landings?from=${from}&to=${to}&day=${what.day}`,
          landingsSchema,
          { signal },
        ),
    }),
  booking: (id: string) =>
    queryOptions({
      queryKey: [...calendarQueries.all(), 'booking', id] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/bookings/${encodeURIComponent(id)}`, bookingSchema, { signal }),
    }),
}

/** What stands in the way of a booking and may be answered on purpose; null for any other failure. */
export function conflictOf(error: unknown): BookingConflict | null {
  if (!(error instanceof ApiFailure)) return null
  const parsed = bookingConflictSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data : null
}

function useRefresh() {
  const client = useQueryClient()
  return (booking?: Booking) => {
    if (booking) client.setQueryData(calendarQueries.booking(booking.id).queryKey, booking)
    return client.invalidateQueries({ queryKey: calendarQueries.all() })
  }
}

export function useCreateBooking() {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: (input: z.input<typeof createBookingSchema>) =>
      api.post('/api/bookings', bookingSchema, input),
    onSuccess: (booking) => refresh(booking),
  })
}
