import { queryOptions, useQuery } from '@tanstack/react-query'
import { listSquads } from '../../../shared/contracts/squads.ts'
import { call } from '../client.ts'
import { squadKeys } from './squad-keys.ts'

export function squadsQuery() {
  return queryOptions({
    queryKey: squadKeys.list(),
    queryFn: async ({ signal }) => (await call(listSquads, {}, { signal })).squads,
  })
}

/** Every squad of the club, archived ones too. */
export function useSquads() {
  return useQuery(squadsQuery())
}
