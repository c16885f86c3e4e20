import { queryOptions, useQuery } from '@tanstack/react-query'
import { getMeasuringSettings } from '../../../shared/contracts/measuring.ts'
import { call } from '../client.ts'
import { measuringSettingsKey } from './club-keys.ts'

export function measuringSettingsQuery() {
  return queryOptions({
    queryKey: measuringSettingsKey,
    queryFn: ({ signal }) => call(getMeasuringSettings, {}, { signal }),
  })
}

export function useMeasuringSettings() {
  return useQuery(measuringSettingsQuery())
}
