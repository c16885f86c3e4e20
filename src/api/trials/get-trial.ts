import { queryOptions, useQuery } from '@tanstack/react-query'
import { getTrial, type Trial } from '../../../shared/contracts/trials.ts'
import { eventOrder } from '../../../shared/mechanics/events/event-order.ts'
import { call } from '../client.ts'
import { trialKeys } from './trial-keys.ts'

/** True while the analysis that the trial stands for is still being made. */
export function isBeingAnalysed({ analysis, eventMoves }: Trial): boolean {
  if (!analysis) return true
  const asked = eventMoves[0]?.events
  return asked !== undefined && eventOrder.some((name) => asked[name] !== analysis.movedEvents[name])
}

/** How often a trial that is being analysed is asked for again, ms. */
const waitingMs = 2_000

export function trialQuery(trialId: string) {
  return queryOptions({
    queryKey: trialKeys.one(trialId),
    queryFn: ({ signal }) => call(getTrial, { params: { trialId } }, { signal }),
    refetchInterval: ({ state }) => (state.data && isBeingAnalysed(state.data) ? waitingMs : false),
  })
}

export function useTrial(trialId: string) {
  return useQuery(trialQuery(trialId))
}
