import {
  infiniteQueryOptions,
  keepPreviousData,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query'
import type { Day } from '../../../shared/calendar/days.ts'
import type { JobFactName, JobFieldsInput } from '../../../shared/jobs/job-schemas.ts'
import type { JobStage } from '../../../shared/jobs/job-stage.ts'
import { boardSchema, jobSchema, type JobView } from '../../../shared/jobs/job-views.ts'
import { api } from '../../lib/api-client.ts'

export type BoardFilter = { q: string; stage: JobStage | null; crew: string | null }

function boardAddress(filter: BoardFilter, offset: number): string {
  const params = new URLSearchParams()
  if (filter.q) params.set('q', filter.q)
  if (filter.stage) params.set('stage', filter.stage)
  if (filter.crew) params.set('crew', filter.crew)
  if (offset > 0) params.set('offset', String(offset))
  return `/api/jobs?${params.toString()}`
}

export const jobQueries = {
  all: () => ['jobs'] as const,
  board: (filter: BoardFilter) =>
    infiniteQueryOptions({
      queryKey: [...jobQueries.all(), 'board', filter] as const,
      queryFn: ({ signal, pageParam }) =>
        api.get(boardAddress(filter, pageParam), boardSchema, { signal }),
      initialPageParam: 0,
      getNextPageParam: (last) => last.nextOffset,
      placeholderData: keepPreviousData,
    }),
  detail: (jobId: string) =>
    queryOptions({
      queryKey: [...jobQueries.all(), 'one', jobId] as const,
      queryFn: ({ signal }) => api.get(`/api/jobs/${jobId}`, jobSchema, { signal }),
    }),
}

/** Keeps what the server answered, and has every list asked again. */
function useKeepJob() {
  const client = useQueryClient()
  return (job: JobView) => {
    client.setQueryData(jobQueries.detail(job.id).queryKey, job)
    void client.invalidateQueries({ queryKey: [...jobQueries.all(), 'board'] })
  }
}

export function useCreateJob() {
  return useMutation({
    mutationFn: (input: JobFieldsInput & { id: string }) => api.post('/api/jobs', jobSchema, input),
    onSuccess: useKeepJob(),
  })
}

export function useChangeJob() {
  return useMutation({
    mutationFn: ({
      jobId,
      ...input
    }: Partial<JobFieldsInput> & { jobId: string; version: number }) =>
      api.patch(`/api/jobs/${jobId}`, jobSchema, input),
    onSuccess: useKeepJob(),
  })
}

type FactChange = { fact: JobFactName; on: Day | null; version: number }

/** Sets a fact of any job, as the board does. */
export function useSetFactOf() {
  return useMutation({
    mutationFn: ({ jobId, fact, ...input }: FactChange & { jobId: string }) =>
      api.put(`/api/jobs/${jobId}/facts/${fact}`, jobSchema, input),
    onSuccess: useKeepJob(),
  })
}

export function useSetFact(jobId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ fact, ...input }: FactChange) =>
      api.put(`/api/jobs/${jobId}/facts/${fact}`, jobSchema, input),
    onSuccess: useKeepJob(),
    onError: () => client.invalidateQueries({ queryKey: jobQueries.detail(jobId).queryKey }),
  })
}
