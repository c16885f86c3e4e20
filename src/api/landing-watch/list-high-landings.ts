import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query'
import { listHighLandings } from '../../../shared/contracts/landing-watch.ts'
import { call } from '../client.ts'
import { landingWatchKeys } from './landing-watch-keys.ts'

export function highLandingsQuery(days: number) {
  return queryOptions({
    queryKey: [...landingWatchKeys.all, days],
    queryFn: ({ signal }) => call(listHighLandings, { query: { days } }, { signal }),
    placeholderData: keepPreviousData,
  })
}

/** Landings above the club's limits of the last `days` days. */
export function useHighLandings(days: number) {
  return useQuery(highLandingsQuery(days))
}
