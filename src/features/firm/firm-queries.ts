import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import { type editFirmSchema, firmSchema } from '../../../shared/firm/firm-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const firmQuery = queryOptions({
  queryKey: ['firm'] as const,
  queryFn: ({ signal }) => api.get('/api/firm', firmSchema, { signal }),
})

export function useSaveFirm() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (input: z.input<typeof editFirmSchema>) => api.put('/api/firm', firmSchema, input),
    onSuccess: async (saved) => {
      client.setQueryData(firmQuery.queryKey, saved)
      await client.invalidateQueries({ queryKey: ['session'] })
    },
  })
}
