import { queryOptions, useQuery } from '@tanstack/react-query'
import { getPlateCalibration } from '../../../shared/contracts/measuring.ts'
import { call } from '../client.ts'
import { plateCalibrationKey } from './club-keys.ts'

export function plateCalibrationQuery() {
  return queryOptions({
    queryKey: plateCalibrationKey,
    queryFn: ({ signal }) => call(getPlateCalibration, {}, { signal }),
  })
}

export function usePlateCalibration() {
  return useQuery(plateCalibrationQuery())
}
