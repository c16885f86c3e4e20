import { queryOptions, useQuery } from '@tanstack/react-query'
import { checkReset } from '../../../shared/contracts/account.ts'
import { call } from '../client.ts'

export function resetQuery(token: string) {
  return queryOptions({
    queryKey: ['reset', token],
    queryFn: ({ signal }) => call(checkReset, { params: { token } }, { signal }),
    // Used up by finishing it: asking again would only say that it no longer works.
    staleTime: Infinity,
  })
}

/** Whose password the link sets. */
export function useReset(token: string) {
  return useQuery(resetQuery(token))
}
