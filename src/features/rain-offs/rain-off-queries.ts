import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import {
  type askRainOffSchema,
  type makeRainOffSchema,
  type RainOffList,
  rainOffListSchema,
  rainOffPreviewSchema,
} from '../../../shared/rain-offs/rain-off-schemas.ts'
import { api, ApiFailure } from '../../lib/api-client.ts'

export type PreviewOf = { crewId: string; day: string; days: number; useFreeDays: boolean }

export const rainOffQueries = {
  // Under 'calendar', whose news makes them stale.
  all: () => ['calendar', 'rain-offs'] as const,
  list: () =>
    queryOptions({
      queryKey: [...rainOffQueries.all(), 'list'] as const,
      queryFn: ({ signal }) => api.get('/api/rain-offs', rainOffListSchema, { signal }),
    }),
  preview: ({ crewId, day, days, useFreeDays }: PreviewOf) =>
    queryOptions({
      queryKey: [...rainOffQueries.all(), 'preview', crewId, day, days, useFreeDays] as const,
      queryFn: ({ signal }) => {
        const free = useFreeDays ? 'use' : 'keep'
        const query = new URLSearchParams({ crew: crewId, day, days: String(days), free })
        return api.get(`/api/rain-offs/preview?${query}`, rainOffPreviewSchema, { signal })
      },
      placeholderData: keepPreviousData,
      // What would move is looked at as it is now.
      staleTime: 0,
      retry: (count, error) => !(error instanceof ApiFailure && error.status < 500) && count < 2,
    }),
}

function useListed<Input>(send: (input: Input) => Promise<RainOffList>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: send,
    onSuccess: (list) => client.setQueryData(rainOffQueries.list().queryKey, list),
    // Refused or not, what is shown next is what is there now.
    onSettled: () => client.invalidateQueries({ queryKey: ['calendar'] }),
  })
}

export const useAskRainOff = () =>
  useListed((input: z.input<typeof askRainOffSchema>) =>
    api.post('/api/rain-offs/asked', rainOffListSchema, input),
  )

export const useMakeRainOff = () =>
  useListed((input: z.input<typeof makeRainOffSchema>) =>
    api.post('/api/rain-offs', rainOffListSchema, input),
  )

type Answer = { id: string; version: number; answer: 'withdraw' | 'decline' | 'reopen' | 'undo' }

export const useAnswerRainOff = () =>
  useListed(({ id, version, answer }: Answer) =>
    api.post(`/api/rain-offs/${encodeURIComponent(id)}/${answer}`, rainOffListSchema, { version }),
  )
