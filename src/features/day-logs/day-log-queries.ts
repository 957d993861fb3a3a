import { queryOptions } from '@tanstack/react-query'
import { dayToCloseSchema, type WriteDayLog } from '../../../shared/day-logs/day-log-schemas.ts'
import { jobHoursSchema, weekHoursSchema } from '../../../shared/day-logs/hours-schemas.ts'
import { api } from '../../lib/api-client.ts'

const logAddress = (bookingDayId: string) => `/api/day-sheets/${bookingDayId}/log`

export const dayLogQueries = {
  all: () => ['day-sheet', 'logs'] as const,
  day: (bookingDayId: string) =>
    queryOptions({
      queryKey: [...dayLogQueries.all(), bookingDayId] as const,
      queryFn: ({ signal }) => api.get(logAddress(bookingDayId), dayToCloseSchema, { signal }),
    }),
  job: (jobId: string) =>
    queryOptions({
      queryKey: [...dayLogQueries.all(), 'job', jobId] as const,
      queryFn: ({ signal }) => api.get(`/api/jobs/${jobId}/hours`, jobHoursSchema, { signal }),
    }),
  week: (week: string | null) =>
    queryOptions({
      queryKey: [...dayLogQueries.all(), 'week', week] as const,
      queryFn: ({ signal }) =>
        api.get(week ? `/api/hours?week=${week}` : '/api/hours', weekHoursSchema, { signal }),
    }),
}

export function writeDayLog(bookingDayId: string, log: WriteDayLog) {
  return api.put(logAddress(bookingDayId), dayToCloseSchema, log)
}

export function takeBackDayLog(bookingDayId: string, version: number) {
  return api.delete(`${logAddress(bookingDayId)}?version=${version}`, dayToCloseSchema)
}
