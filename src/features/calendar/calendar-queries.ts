import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import {
  type changeBookingSchema,
  type createBookingSchema,
  bookingConflictSchema,
  type BookingConflict,
  type restoreBookingSchema,
} from '../../../shared/bookings/booking-schemas.ts'
import {
  type Booking,
  bookingSchema,
  type Calendar,
  type CalendarBooking,
  calendarSchema,
  unbookedJobsSchema,
} from '../../../shared/bookings/calendar-schemas.ts'
import { landingsSchema } from '../../../shared/clashes/clash-schemas.ts'
import { movedDays } from '../../../shared/bookings/move-days.ts'
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

export type ChangeInput = { id: string } & z.input<typeof changeBookingSchema>

/** The span as it will be, so that a dragged day stays where it was dropped while the server decides. */
function withMove(calendar: Calendar, id: string, move: { from: Day; to: Day }): Calendar {
  const moveBooking = (booking: CalendarBooking): CalendarBooking => {
    if (booking.id !== id) return booking
    const worked = new Set(booking.days.filter((d) => d.worked).map((d) => d.day))
    const before = booking.allDays
    const after = movedDays(calendar, before, worked, move)
    const gone = before.filter((day) => !after.includes(day))
    const fresh = after.filter((day) => !before.includes(day))
    const days = booking.days.map((d) => ({ ...d, day: fresh[gone.indexOf(d.day)] ?? d.day }))
    return { ...booking, allDays: after, days: days.sort((a, b) => (a.day < b.day ? -1 : 1)) }
  }
  return { ...calendar, bookings: calendar.bookings.map(moveBooking) }
}

export function useChangeBooking() {
  const client = useQueryClient()
  const refresh = useRefresh()
  return useMutation({
    mutationFn: ({ id, ...input }: ChangeInput) =>
      api.patch(`/api/bookings/${encodeURIComponent(id)}`, bookingSchema, input),
    onMutate: async ({ id, move }) => {
      if (!move) return { before: [] }
      const filter = { queryKey: calendarQueries.spans() }
      await client.cancelQueries(filter)
      const before = client.getQueriesData<Calendar>(filter)
      client.setQueriesData<Calendar>(filter, (old) => (old ? withMove(old, id, move) : old))
      return { before }
    },
    onError: (_error, _input, context) => {
      for (const [key, data] of context?.before ?? []) client.setQueryData(key, data)
    },
    onSuccess: (booking) => refresh(booking),
  })
}

export function useCancelBooking() {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: ({ id, version }: { id: string; version: number }) =>
      api.post(`/api/bookings/${encodeURIComponent(id)}/cancel`, bookingSchema, { version }),
    onSuccess: (booking) => refresh(booking),
  })
}

export function useRestoreBooking() {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: ({ id, ...input }: { id: string } & z.input<typeof restoreBookingSchema>) =>
      api.post(`/api/bookings/${encodeURIComponent(id)}/restore`, bookingSchema, input),
    onSuccess: (booking) => refresh(booking),
  })
}
