import {
  infiniteQueryOptions,
  keepPreviousData,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query'
import { messageDetailSchema, messageListSchema } from '../../../shared/messages/message-schemas.ts'
import type { MessageKind, MessageState } from '../../../shared/messages/message-words.ts'
import { api } from '../../lib/api-client.ts'

export type MessageFilter = { q: string; state: MessageState | null; kind: MessageKind | null }

function listAddress(filter: MessageFilter, cursor: string | null): string {
  const params = new URLSearchParams()
  if (filter.q.trim()) params.set('q', filter.q.trim())
  if (filter.state) params.set('state', filter.state)
  if (filter.kind) params.set('kind', filter.kind)
  if (cursor) params.set('cursor', cursor)
  return `/api/messages?${params.toString()}`
}

export const messageQueries = {
  all: () => ['messages'] as const,
  list: (filter: MessageFilter) =>
    infiniteQueryOptions({
      queryKey: [...messageQueries.all(), 'list', filter] as const,
      queryFn: ({ signal, pageParam }) =>
        api.get(listAddress(filter, pageParam), messageListSchema, { signal }),
      initialPageParam: null as string | null,
      getNextPageParam: (last) => last.nextCursor,
      placeholderData: keepPreviousData,
    }),
  detail: (id: string) =>
    queryOptions({
      queryKey: [...messageQueries.all(), 'one', id] as const,
      queryFn: ({ signal }) => api.get(`/api/messages/${id}`, messageDetailSchema, { signal }),
    }),
}

export function useTryAgain() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (id: string) => api.post(`/api/messages/${id}/retry`, messageDetailSchema),
    onSettled: () => client.invalidateQueries({ queryKey: messageQueries.all() }),
  })
}
