import { endSubscription } from '../../../shared/contracts/billing.ts'
import { useAct } from '../use-act.ts'
import { billingKey } from './get-billing.ts'

export function useEndSubscription() {
  return useAct(endSubscription, { refreshes: [billingKey] })
}
