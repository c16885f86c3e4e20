import { refreshBilling } from '../../../shared/contracts/billing.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'
import { billingKey } from './get-billing.ts'

/** Has the server ask the payment service anew, as after coming back from its page. */
export function useRefreshBilling() {
  return useAct(refreshBilling, { refreshes: [billingKey, seatsKey] })
}
