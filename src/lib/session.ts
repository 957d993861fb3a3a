import { queryOptions, useSuspenseQuery } from '@tanstack/react-query'
import { type Session, sessionSchema } from '../../shared/auth/auth-schemas.ts'
import { type Permission, roleMay } from '../../shared/auth/permissions.ts'
import { api } from './api-client.ts'

export const sessionQuery = queryOptions({
  queryKey: ['session'] as const,
  queryFn: ({ signal }) => api.get('/api/session', sessionSchema, { signal }),
  staleTime: 60_000,
})

export function useSession(): Session {
  return useSuspenseQuery(sessionQuery).data
}

export type SessionUser = NonNullable<Session['user']>

/** Who is signed in; only for screens inside the shell. */
export function useUser(): SessionUser {
  const { user } = useSession()
  if (!user) throw new Error('This screen is only for somebody signed in.')
  return user
}

/** Whether a control is worth showing; the server decides all the same. */
export function useMay(permission: Permission): boolean {
  const { user } = useSession()
  return user !== null && roleMay(user.role, permission)
}
