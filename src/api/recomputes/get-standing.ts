import { queryOptions, useQuery } from '@tanstack/react-query'
import type { ResponseOf } from '../../../shared/contracts/endpoint.ts'
import { getStanding, type Scope } from '../../../shared/contracts/recomputes.ts'
import { call } from '../client.ts'
import { recomputeKeys } from './recompute-keys.ts'
import { scopeQuery } from './scope-query.ts'

export type Standing = ResponseOf<typeof getStanding>

/** While a recompute is open its progress is looked at this often, whether or not the stream of events is heard. */
const pollMs = 1500

export function standingQuery(scope: Scope) {
  return queryOptions({
    queryKey: [...recomputeKeys.standings, scope],
    queryFn: ({ signal }) => call(getStanding, { query: scopeQuery(scope) }, { signal }),
    refetchInterval: ({ state }) => (state.data?.open ? pollMs : false),
  })
}

export function useStanding(scope: Scope) {
  return useQuery(standingQuery(scope))
}
