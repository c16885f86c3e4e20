import { queryOptions, useQuery } from '@tanstack/react-query'
import { getBilling } from '../../../shared/contracts/billing.ts'
import { call } from '../client.ts'

export const billingKey = ['billing'] as const

export function billingQuery() {
  return queryOptions({ queryKey: billingKey, queryFn: ({ signal }) => call(getBilling, {}, { signal }) })
}

export function useBilling() {
  return useQuery(billingQuery())
}
