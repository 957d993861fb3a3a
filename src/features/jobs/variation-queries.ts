import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import {
  type changeVariationSchema,
  type createVariationSchema,
  type JobVariations,
  jobVariationsSchema,
} from '../../../shared/variations/variation-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const variationQueries = {
  ofJob: (jobId: string) =>
    queryOptions({
      queryKey: ['jobs', 'variations', jobId] as const,
      queryFn: ({ signal }) =>
        api.get(`/api/jobs/${jobId}/variations`, jobVariationsSchema, { signal }),
    }),
}

function useKeep(jobId: string) {
  const client = useQueryClient()
  const key = variationQueries.ofJob(jobId).queryKey
  return {
    onSuccess: (answer: JobVariations) => {
      client.setQueryData(key, answer)
    },
    onError: () => client.invalidateQueries({ queryKey: key }),
  }
}

export function useAddVariation(jobId: string) {
  return useMutation({
    mutationFn: (input: z.input<typeof createVariationSchema>) =>
      api.post(`/api/jobs/${jobId}/variations`, jobVariationsSchema, input),
    ...useKeep(jobId),
  })
}

export type VariationChange = { id: string } & z.input<typeof changeVariationSchema>

export function useChangeVariation(jobId: string) {
  return useMutation({
    mutationFn: ({ id, ...input }: VariationChange) =>
      api.patch(`/api/jobs/${jobId}/variations/${id}`, jobVariationsSchema, input),
    ...useKeep(jobId),
  })
}
