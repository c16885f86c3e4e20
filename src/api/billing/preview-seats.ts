import { queryOptions, useQuery } from '@tanstack/react-query'
import { previewSeats } from '../../../shared/contracts/billing.ts'
import { call } from '../client.ts'
import { billingKey } from './get-billing.ts'

/** What more seats cost now; asked anew each time, since it falls from second to second. */
export function seatPreviewQuery(seats: number, enabled: boolean) {
  return queryOptions({
    queryKey: [...billingKey, 'preview', seats],
    queryFn: ({ signal }) => call(previewSeats, { query: { seats } }, { signal }),
    enabled,
    staleTime: 10 * 60 * 1000,
    gcTime: 0,
  })
}

export function useSeatPreview(seats: number, enabled: boolean) {
  return useQuery(seatPreviewQuery(seats, enabled))
}
