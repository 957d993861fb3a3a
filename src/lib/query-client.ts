import { QueryCache, QueryClient } from '@tanstack/react-query'
import { ApiFailure } from './api-client.ts'
import { sessionQuery } from './session.ts'

function shouldRetry(failures: number, error: unknown): boolean {
  return error instanceof ApiFailure && error.status === 0 && failures < 2
}

export function createQueryClient(): QueryClient {
  const client = new QueryClient({
    queryCache: new QueryCache({
      onError(error) {
        // Signed out elsewhere: ask who we are, and the shell shows the sign-in.
        if (error instanceof ApiFailure && error.status === 401) {
          void client.invalidateQueries({ queryKey: sessionQuery.queryKey })
        }
      },
    }),
    defaultOptions: {
      queries: { retry: shouldRetry, staleTime: 10_000 },
      mutations: { retry: false },
    },
  })
  return client
}
