import { useState } from 'react'
import type { Billing } from '../../../shared/contracts/billing.ts'
import { useEndSubscription } from '../../api/billing/end-subscription.ts'
import { useOpenPortal } from '../../api/billing/open-portal.ts'
import { Button } from '../../components/button.tsx'
import { Facts } from '../../components/facts.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { counted } from '../../lib/counted.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { showMoney } from '../../lib/show-money.ts'
import { intervalWords } from './billing-words.ts'
import { ChangeSeatsDialog } from './change-seats-dialog.tsx'
import { EndDialog } from './end-dialog.tsx'

type Subscription = NonNullable<Billing['subscription']>

/** What the club has, what comes next, and what can be done about it. */
export function SubscriptionSheet({
  billing,
  subscription,
  timeZone,
}: {
  billing: Billing
  subscription: Subscription
  timeZone: string
}) {
  const [open, setOpen] = useState<'seats' | 'end' | null>(null)
  const portal = useOpenPortal()
  const resume = useEndSubscription()
  const { version, nextInvoice, state } = billing
  const { seats, nextSeats, interval, periodEnd, endsWithPeriod } = subscription
  const close = () => setOpen(null)
  return (
    <Sheet title="Subscription" titleAside={intervalWords[interval].toLowerCase()} className="max-w-2xl">
      <Facts
        facts={[
          ['Seats', seats],
          ...(nextSeats === null
            ? []
            : [[`Seats from ${formatMoment(periodEnd, timeZone)}`, nextSeats] as [string, number]]),
          ['Period ends', formatMoment(periodEnd, timeZone)],
          [
            'Next invoice',
            nextInvoice
              ? `${showMoney(nextInvoice.total)} on ${formatMoment(nextInvoice.at, timeZone)}`
              : 'none',
          ],
        ]}
      />
      <FormError error={portal.error ?? resume.error} />
      <div className="flex flex-wrap gap-3 pt-4">
        {state === 'active' && !endsWithPeriod && (
          <Button look="main" onClick={() => setOpen('seats')}>
            Change the seats
          </Button>
        )}
        <Button
          look={state === 'active' ? 'plain' : 'main'}
          busy={portal.isPending}
          onClick={() => portal.mutate({})}
        >
          Card and invoices
        </Button>
        {endsWithPeriod ? (
          <Button busy={resume.isPending} onClick={() => resume.mutate({ body: { version, ends: false } })}>
            Go on after all
          </Button>
        ) : (
          <Button onClick={() => setOpen('end')}>End the subscription</Button>
        )}
      </div>
      <p className="pt-3 text-small text-ink-2">
        Cards are kept by the payment service, not here. {counted(seats, 'seat')}: one for each active
        athlete; staff need none.
      </p>
      {open === 'seats' && (
        <ChangeSeatsDialog
          version={version}
          subscription={subscription}
          timeZone={timeZone}
          onClose={close}
        />
      )}
      {open === 'end' && (
        <EndDialog version={version} until={formatMoment(periodEnd, timeZone)} onClose={close} />
      )}
    </Sheet>
  )
}
