import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query'
import { isApiError } from '../api/api-error.ts'

/** A refusal is an answer and is not asked for again; a lost connection is, twice. */
function retryQuery(failures: number, error: Error): boolean {
  return isApiError(error, 'no-answer') && failures < 2
}

/**
 * The cache of everything read from the server. Mutations are never retried by themselves: the person is told and
 * decides, and the Idempotency-Key keeps their second try from doing it twice.
 */
export function createQueryClient(onSessionEnded: () => void): QueryClient {
  const watch = (error: Error) => {
    if (isApiError(error, 'not-signed-in')) onSessionEnded()
  }
  return new QueryClient({
    queryCache: new QueryCache({ onError: watch }),
    mutationCache: new MutationCache({ onError: watch }),
    defaultOptions: {
      queries: { retry: retryQuery, retryDelay: (attempt) => 500 * 2 ** attempt, staleTime: 15_000 },
      mutations: { retry: false },
    },
  })
}
