import { queryOptions, useQuery } from '@tanstack/react-query'
import { getRecompute } from '../../../shared/contracts/recomputes.ts'
import { call } from '../client.ts'
import { recomputeKeys } from './recompute-keys.ts'

/** The report of a recompute that was cancelled comes a moment after its end. */
const pollMs = 1500

export function recomputeQuery(recomputeId: string) {
  return queryOptions({
    queryKey: recomputeKeys.one(recomputeId),
    queryFn: ({ signal }) => call(getRecompute, { params: { recomputeId } }, { signal }),
    refetchInterval: ({ state }) => (state.data && state.data.report === null ? pollMs : false),
  })
}

export function useRecompute(recomputeId: string) {
  return useQuery(recomputeQuery(recomputeId))
}
