import { queryOptions, useQuery } from '@tanstack/react-query'
import { getSeats } from '../../../shared/contracts/clubs.ts'
import { call } from '../client.ts'

export const seatsKey = ['seats'] as const

export function seatsQuery() {
  return queryOptions({ queryKey: seatsKey, queryFn: ({ signal }) => call(getSeats, {}, { signal }) })
}

export function useSeats() {
  return useQuery(seatsQuery())
}
