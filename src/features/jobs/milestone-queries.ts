import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import type { MilestoneKind } from '../../../shared/milestones/milestone-kinds.ts'
import {
  jobMilestonesSchema,
  milestoneConflictSchema,
  type MilestoneConflict,
  type setMilestoneSchema,
} from '../../../shared/milestones/milestone-schemas.ts'
import { api, ApiFailure } from '../../lib/api-client.ts'
import { jobQueries } from './job-queries.ts'

export const milestoneQueries = {
  ofJob: (jobId: string) =>
    queryOptions({
      queryKey: [...jobQueries.all(), 'milestones', jobId] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/jobs/${jobId}/milestones`, jobMilestonesSchema, { signal }),
    }),
}

export type MilestoneChange = { kind: MilestoneKind } & z.input<typeof setMilestoneSchema>

export function useSetMilestone(jobId: string) {
  const client = useQueryClient()
  const { queryKey } = milestoneQueries.ofJob(jobId)
  return useMutation({
    mutationFn: ({ kind, ...input }: MilestoneChange) =>
      api.put(`/api/jobs/${jobId}/milestones/${kind}`, jobMilestonesSchema, input),
    onSuccess: (answer) => client.setQueryData(queryKey, answer),
    onError: () => client.invalidateQueries({ queryKey }),
  })
}

/** What somebody else has made of it meanwhile; null for any other failure. */
export function milestoneConflictOf(error: unknown): MilestoneConflict | null {
  if (!(error instanceof ApiFailure)) return null
  const parsed = milestoneConflictSchema.safeParse(error.error.detail)
  return parsed.success ? parsed.data : null
}
