import { queryOptions, useQueries } from '@tanstack/react-query'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { samplesQuery } from './get-samples.ts'
import { trialQuery } from './get-trial.ts'
import type { Samples } from './read-samples.ts'
import { trialKeys } from './trial-keys.ts'

/** A trial with its force, to be laid over another's trace. */
export interface OverlaidTrial {
  trial: Trial
  samples: Samples
}

function overlaidQuery(trialId: string) {
  return queryOptions({
    queryKey: trialKeys.overlaid(trialId),
    queryFn: async ({ client }): Promise<OverlaidTrial> => {
      const trial = await client.fetchQuery(trialQuery(trialId))
      return { trial, samples: await client.fetchQuery(samplesQuery(trial)) }
    },
    structuralSharing: false,
  })
}

/** Several trials with their force, in the order asked for. */
export function useOverlaid(trialIds: readonly string[]) {
  return useQueries({ queries: trialIds.map(overlaidQuery) })
}
