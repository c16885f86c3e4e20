import { queryOptions, useQuery } from '@tanstack/react-query'
import { listAnalyses } from '../../../shared/contracts/analyses.ts'
import { call } from '../client.ts'
import { trialKeys } from '../trials/trial-keys.ts'

export function analysesQuery(trialId: string) {
  return queryOptions({
    queryKey: [...trialKeys.one(trialId), 'analyses'],
    queryFn: ({ signal }) => call(listAnalyses, { params: { trialId } }, { signal }),
  })
}

export function useAnalyses(trialId: string) {
  return useQuery(analysesQuery(trialId))
}
