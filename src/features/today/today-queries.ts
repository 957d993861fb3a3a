import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import { dayRoofSchema, daySheetsSchema } from '../../../shared/day-sheets/day-sheet-schemas.ts'
import {
  latestPlateCheckSchema,
  type NewPlateCheck,
  plateCheckSchema,
} from '../../../shared/day-sheets/plate-check.ts'
import { type ChangeTask, taskAnswerSchema } from '../../../shared/day-sheets/task-schemas.ts'
import { api } from '../../lib/api-client.ts'

type Which = { day: string | null; crewId: string | null }

function addressOf({ day, crewId }: Which): string {
  const query = new URLSearchParams()
  if (day) query.set('day', day)
  if (crewId) query.set('crewId', crewId)
  const text = query.toString()
  return text ? `/api/day-sheets?${text}` : '/api/day-sheets'
}

export const todayQueries = {
  all: () => ['day-sheet'] as const,
  sheets: (which: Which) =>
    queryOptions({
      queryKey: [...todayQueries.all(), 'sheets', which] as const,
      queryFn: ({ signal }) => api.get(addressOf(which), daySheetsSchema, { signal }),
      placeholderData: keepPreviousData,
    }),
  /** A revision never changes: fetched once, and not again with every tick. */
  roof: (bookingDayId: string, revisionId: string) =>
    queryOptions({
      queryKey: ['day-roof', revisionId, bookingDayId] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/day-sheets/${bookingDayId}/spec`, dayRoofSchema, { signal }),
      staleTime: Infinity,
      gcTime: Infinity,
    }),
  plateCheck: (jobId: string, letter: string) =>
    queryOptions({
      queryKey: [...todayQueries.all(), 'plates', jobId, letter] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/jobs/${jobId}/plate-checks/${letter}`, latestPlateCheckSchema, { signal }),
    }),
}

export function changeTask(taskId: string, change: ChangeTask) {
  return api.patch(`/api/tasks/${taskId}`, taskAnswerSchema, change)
}

export function raiseHand(taskId: string, raised: boolean) {
  return api.post(`/api/tasks/${taskId}/hand`, taskAnswerSchema, { raised })
}

export function recordPlateCheck(jobId: string, check: NewPlateCheck) {
  return api.post(`/api/jobs/${jobId}/plate-checks`, plateCheckSchema, check)
}
