import { queryOptions, useQuery } from '@tanstack/react-query'
import { getAthlete } from '../../../shared/contracts/athletes.ts'
import { call } from '../client.ts'
import { athleteKeys } from './athlete-keys.ts'

export function athleteQuery(athleteId: string) {
  return queryOptions({
    queryKey: athleteKeys.detail(athleteId),
    queryFn: ({ signal }) => call(getAthlete, { params: { athleteId } }, { signal }),
  })
}

/** The athlete with one point a session, oldest first. */
export function useAthlete(athleteId: string) {
  return useQuery(athleteQuery(athleteId))
}
