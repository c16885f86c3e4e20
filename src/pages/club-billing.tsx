import { useMe } from '../api/account/get-me.ts'
import { useBilling } from '../api/billing/get-billing.ts'
import { useSeats } from '../api/clubs/get-seats.ts'
import { Notice } from '../components/notice.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { BillingView } from '../features/billing/billing-view.tsx'
import { useBackFromService } from '../features/billing/use-back-from-service.ts'

export function ClubBillingPage() {
  const me = useMe()
  const billing = useBilling()
  const seats = useSeats()
  const asking = useBackFromService()
  return (
    <>
      <PageHead title="Billing" />
      {asking && (
        <div className="max-w-2xl pb-6">
          <Notice tone="plain" role="status">
            <p>Asking the payment service how things stand …</p>
          </Notice>
        </div>
      )}
      <QueryState query={billing} what="the billing">
        {(state) => (
          <BillingView
            billing={state}
            active={seats.data?.used ?? 0}
            timeZone={me.data?.club.timeZone ?? 'UTC'}
          />
        )}
      </QueryState>
    </>
  )
}
