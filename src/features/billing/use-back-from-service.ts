import { useEffect, useRef } from 'react'
import { useSearchParams } from 'react-router-dom'
import { useRefreshBilling } from '../../api/billing/refresh-billing.ts'

/** Who comes back from the payment service's page sees what happened there, also where its event is late. */
export function useBackFromService(): boolean {
  const [params, setParams] = useSearchParams()
  const { mutate, isPending } = useRefreshBilling()
  const back = params.has('checkout') || params.has('portal')
  const asked = useRef(false)
  useEffect(() => {
    if (!back || asked.current) return
    asked.current = true
    mutate({}, { onSettled: () => setParams({}, { replace: true }) })
  }, [back, mutate, setParams])
  return back || isPending
}
