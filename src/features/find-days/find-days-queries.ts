import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import {
  type BookingChangesToSend,
  changedBookingsSchema,
} from '../../../shared/bookings/booking-changes.ts'
import { unbookedJobsSchema } from '../../../shared/bookings/calendar-schemas.ts'
import { openingsSchema } from '../../../shared/find-days/find-days-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const findDaysQueries = {
  // Under 'calendar', whose news makes them stale.
  all: () => ['calendar', 'find-days'] as const,
  jobs: (jobId: string) =>
    queryOptions({
      queryKey: [...findDaysQueries.all(), 'jobs', jobId] as const,
      queryFn: ({ signal }) => {
        const query = jobId ? `?job=${encodeURIComponent(jobId)}` : ''
        return api.get(`/api/calendar/unbooked${query}`, unbookedJobsSchema, { signal })
      },
    }),
  openings: (jobId: string, from: string, days: string) =>
    queryOptions({
      queryKey: [...findDaysQueries.all(), 'openings', jobId, from, days] as const,
      queryFn: ({ signal }) => {
        const query = new URLSearchParams({ ...(from ? { from } : {}), ...(days ? { days } : {}) })
        const at = `/api/jobs/${encodeURIComponent(jobId)}/openings?${query}`
        return api.get(at, openingsSchema, { signal })
      },
      placeholderData: keepPreviousData,
    }),
}

/** All of it or nothing: what gives way moves with what is booked. */
export function useChangeBookings() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (input: BookingChangesToSend) =>
      api.post('/api/bookings/changes', changedBookingsSchema, input),
    onSettled: () => client.invalidateQueries({ queryKey: ['calendar'] }),
  })
}
