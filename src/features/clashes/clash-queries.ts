import { queryOptions } from '@tanstack/react-query'
import { clashListSchema } from '../../../shared/clashes/clash-list-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const clashQueries = {
  // Whatever changes the calendar changes what clashes on it.
  list: () =>
    queryOptions({
      queryKey: ['calendar', 'clashes'] as const,
      queryFn: ({ signal }) => api.get('/api/clashes', clashListSchema, { signal }),
    }),
}
