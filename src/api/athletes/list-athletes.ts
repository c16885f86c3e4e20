import { queryOptions, useQuery } from '@tanstack/react-query'
import { listAthletes } from '../../../shared/contracts/athletes.ts'
import { call } from '../client.ts'
import { athleteKeys } from './athlete-keys.ts'

export function athletesQuery() {
  return queryOptions({
    queryKey: athleteKeys.list(),
    queryFn: async ({ signal }) => (await call(listAthletes, {}, { signal })).athletes,
  })
}

/** Every athlete of the club, archived ones too. */
export function useAthletes() {
  return useQuery(athletesQuery())
}
