import { queryOptions, useQuery } from '@tanstack/react-query'
import { getSeatPlan } from '../../../shared/contracts/seats.ts'
import { call } from '../client.ts'
import { seatsKey } from '../clubs/get-seats.ts'

/** Under `seatsKey`: whatever changes who is active changes who has a seat. */
export function seatPlanQuery() {
  return queryOptions({
    queryKey: [...seatsKey, 'plan'],
    queryFn: ({ signal }) => call(getSeatPlan, {}, { signal }),
  })
}

export function useSeatPlan() {
  return useQuery(seatPlanQuery())
}
