import type { UseQueryResult } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { ErrorState } from './error-state.tsx'
import { Loading } from './loading.tsx'

interface QueryStateProps<T> {
  query: UseQueryResult<T>
  /** Completes "Loading …". */
  what: string
  children: (data: T) => ReactNode
}

/** Loading, failed with a retry, or the data; data that is there stays while it is read again. */
export function QueryState<T>({ query, what, children }: QueryStateProps<T>) {
  if (query.data !== undefined) return children(query.data)
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} retrying={query.isFetching} />
  }
  return <Loading what={what} />
}
