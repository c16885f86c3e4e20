import { queryOptions, useQuery } from '@tanstack/react-query'
import { listRecomputes, type Scope } from '../../../shared/contracts/recomputes.ts'
import { call } from '../client.ts'
import { recomputeKeys } from './recompute-keys.ts'
import { scopeQuery } from './scope-query.ts'

export function recomputesQuery(scope: Scope) {
  return queryOptions({
    queryKey: [...recomputeKeys.lists, scope],
    queryFn: ({ signal }) => call(listRecomputes, { query: scopeQuery(scope) }, { signal }),
  })
}

export function useRecomputes(scope: Scope) {
  return useQuery(recomputesQuery(scope))
}
