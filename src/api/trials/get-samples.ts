import { queryOptions, useQuery } from '@tanstack/react-query'
import { getSamples, type Trial } from '../../../shared/contracts/trials.ts'
import { callForResponse } from '../client.ts'
import { readSamples } from './read-samples.ts'
import { trialKeys } from './trial-keys.ts'

export function samplesQuery(trial: Pick<Trial, 'id' | 'recording'>) {
  const { channels, sampleCount } = trial.recording
  return queryOptions({
    queryKey: trialKeys.samples(trial.id),
    queryFn: async ({ signal }) => {
      const response = await callForResponse(getSamples, { params: { trialId: trial.id } }, { signal })
      return readSamples(await response.arrayBuffer(), channels, sampleCount)
    },
    staleTime: Infinity,
    structuralSharing: false,
  })
}

/** The force of every plate, newtons. */
export function useSamples(trial: Pick<Trial, 'id' | 'recording'>) {
  return useQuery(samplesQuery(trial))
}
