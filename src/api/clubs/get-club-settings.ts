import { queryOptions, useQuery } from '@tanstack/react-query'
import { getClubSettings } from '../../../shared/contracts/clubs.ts'
import { call } from '../client.ts'

export const clubSettingsKey = ['club-settings'] as const

export function clubSettingsQuery() {
  return queryOptions({
    queryKey: clubSettingsKey,
    queryFn: ({ signal }) => call(getClubSettings, {}, { signal }),
  })
}

export function useClubSettings() {
  return useQuery(clubSettingsQuery())
}
