import { queryOptions, useQuery } from '@tanstack/react-query'
import { getMeasuringSettings } from '../../../shared/contracts/measuring.ts'
import { call } from '../client.ts'

export const measuringSettingsKey = ['measuring-settings'] as const

export function measuringSettingsQuery() {
  return queryOptions({
    queryKey: measuringSettingsKey,
    queryFn: ({ signal }) => call(getMeasuringSettings, {}, { signal }),
  })
}

export function useMeasuringSettings() {
  return useQuery(measuringSettingsQuery())
}
