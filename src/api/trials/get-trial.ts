import { queryOptions, useQuery } from '@tanstack/react-query'
import { getTrial } from '../../../shared/contracts/trials.ts'
import { call } from '../client.ts'
import { trialKeys } from './trial-keys.ts'

/** How often a trial that is not analysed yet is asked for again, ms. */
const waitingMs = 2_000

export function trialQuery(trialId: string) {
  return queryOptions({
    queryKey: trialKeys.one(trialId),
    queryFn: ({ signal }) => call(getTrial, { params: { trialId } }, { signal }),
    refetchInterval: ({ state }) => (state.data && state.data.analysis === null ? waitingMs : false),
  })
}

export function useTrial(trialId: string) {
  return useQuery(trialQuery(trialId))
}
