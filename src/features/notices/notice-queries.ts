import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import {
  notYetToldSchema,
  type TellThem,
  toldThemSchema,
} from '../../../shared/notices/notice-schemas.ts'
import { api } from '../../lib/api-client.ts'

export const noticeQueries = {
  all: () => ['notices'] as const,
  list: () =>
    queryOptions({
      queryKey: [...noticeQueries.all(), 'list'] as const,
      queryFn: ({ signal }) => api.get('/api/notices', notYetToldSchema, { signal }),
    }),
}

export function useTellThem() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (input: TellThem) => api.post('/api/notices', toldThemSchema, input),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: noticeQueries.all() }),
        client.invalidateQueries({ queryKey: ['messages'] }),
      ]),
  })
}
