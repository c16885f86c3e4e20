import { queryOptions, useQuery } from '@tanstack/react-query'
import { listPlans } from '../../../shared/contracts/billing.ts'
import { call } from '../client.ts'

/** Not under `billingKey`: prices do not change with what the club does. */
export function plansQuery() {
  return queryOptions({ queryKey: ['plans'], queryFn: ({ signal }) => call(listPlans, {}, { signal }) })
}

export function usePlans() {
  return useQuery(plansQuery())
}
