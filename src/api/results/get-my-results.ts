import { queryOptions, useQuery } from '@tanstack/react-query'
import { getMyResults } from '../../../shared/contracts/results.ts'
import { call } from '../client.ts'

export const resultKeys = { all: ['results'], mine: ['results', 'mine'] } as const

export function myResultsQuery() {
  return queryOptions({
    queryKey: resultKeys.mine,
    queryFn: ({ signal }) => call(getMyResults, {}, { signal }),
  })
}

/** The signed-in athlete's published results, oldest first. */
export function useMyResults() {
  return useQuery(myResultsQuery())
}
