import { startCheckout } from '../../../shared/contracts/billing.ts'
import { goTo } from '../../lib/go-to.ts'
import { useAct } from '../use-act.ts'

/** Leads to the payment service's own page. */
export function useStartCheckout() {
  return useAct(startCheckout, { refreshes: [], onDone: ({ url }) => goTo(url) })
}
