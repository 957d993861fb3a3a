import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import {
  type changePasswordSchema,
  doneSchema,
  type signInSchema,
  type useResetSchema,
} from '../../../shared/auth/auth-schemas.ts'
import { ticketListSchema } from '../../../shared/people/ticket-schemas.ts'
import { api } from '../../lib/api-client.ts'
import { sessionQuery } from '../../lib/session.ts'

/** Under the topic of people, so that it follows what the office changes. */
export const ownTicketsQuery = queryOptions({
  queryKey: ['people', 'own-tickets'] as const,
  queryFn: ({ signal }) => api.get('/api/account/tickets', ticketListSchema, { signal }),
})

/** After any change of who is signed in, nothing of the earlier person may stay on screen. */
function useFreshSession() {
  const client = useQueryClient()
  return async () => {
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' })
    await client.refetchQueries({ queryKey: sessionQuery.queryKey })
  }
}

export function useSignIn() {
  const onSuccess = useFreshSession()
  return useMutation({
    mutationFn: (input: z.input<typeof signInSchema>) =>
      api.post('/api/session', doneSchema, input),
    onSuccess,
  })
}

export function useSignOut() {
  const onSuccess = useFreshSession()
  return useMutation({ mutationFn: () => api.delete('/api/session', doneSchema), onSuccess })
}

export function useAskReset() {
  return useMutation({
    mutationFn: (email: string) => api.post('/api/password-resets', doneSchema, { email }),
  })
}

export function useSetPassword() {
  const onSuccess = useFreshSession()
  return useMutation({
    mutationFn: (input: z.input<typeof useResetSchema>) =>
      api.put('/api/password-resets', doneSchema, input),
    onSuccess,
  })
}

export function useChangePassword() {
  const onSuccess = useFreshSession()
  return useMutation({
    mutationFn: (input: z.input<typeof changePasswordSchema>) =>
      api.put('/api/session/password', doneSchema, input),
    onSuccess,
  })
}
