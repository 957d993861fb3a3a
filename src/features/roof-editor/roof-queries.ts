import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { comparisonSchema } from '../../../shared/revisions/comparison-schemas.ts'
import {
  issuedSchema,
  jobRoofSchema,
  revisionSchema,
  savedDraftSchema,
} from '../../../shared/revisions/revision-schemas.ts'
import type { RoofForm } from '../../../shared/revisions/roof-form.ts'
import { api } from '../../lib/api-client.ts'

export const roofQueries = {
  all: () => ['roof'] as const,
  ofJob: (jobId: string) =>
    queryOptions({
      queryKey: [...roofQueries.all(), 'job', jobId] as const,
      queryFn: ({ signal }) => api.get(`/api/jobs/${jobId}/roof`, jobRoofSchema, { signal }),
    }),
  revision: (jobId: string, letter: string) =>
    queryOptions({
      queryKey: [...roofQueries.all(), 'revision', jobId, letter] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/jobs/${jobId}/revisions/${letter}`, revisionSchema, { signal }),
    }),
  comparison: (jobId: string, letter: string, other: string) =>
    queryOptions({
      queryKey: [...roofQueries.all(), 'comparison', jobId, letter, other] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/jobs/${jobId}/revisions/${letter}/against/${other}`, comparisonSchema, {
          signal,
        }),
    }),
}

export function saveDraft(jobId: string, form: RoofForm, version: number) {
  return api.put(`/api/jobs/${jobId}/roof`, savedDraftSchema, { form, version })
}

export function useIssueRevision(jobId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (version: number) =>
      api.post(`/api/jobs/${jobId}/revisions`, issuedSchema, { version }),
    onSuccess: () => client.invalidateQueries({ queryKey: roofQueries.all() }),
  })
}
