import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import { type editFirmSchema, firmSchema } from '../../../shared/firm/firm-schemas.ts'
import { publicHolidaysSchema } from '../../../shared/firm/holiday-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const firmQuery = queryOptions({
  queryKey: ['firm'] as const,
  queryFn: ({ signal }) => api.get('/api/firm', firmSchema, { signal }),
})

type HolidayPlace = { country: string | null; state: string | null; year: number }

/** Holidays of a place and year, and the places there are to choose from. */
export const holidaysQuery = (place: HolidayPlace) =>
  queryOptions({
    queryKey: ['firm', 'holidays', place] as const,
    queryFn: ({ signal }) => {
      const query = new URLSearchParams({ year: String(place.year) })
      if (place.country) query.set('country', place.country)
      if (place.country && place.state) query.set('state', place.state)
      return api.get(`/api/firm/holidays?${query.toString()}`, publicHolidaysSchema, { signal })
    },
    staleTime: Infinity,
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
