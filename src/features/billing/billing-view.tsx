import type { Billing } from '../../../shared/contracts/billing.ts'
import { Notice } from '../../components/notice.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table } from '../../components/table.tsx'
import { stateWords } from './billing-words.ts'
import { BuySheet } from './buy-sheet.tsx'
import { invoiceColumns } from './invoice-columns.tsx'
import { SubscriptionSheet } from './subscription-sheet.tsx'

interface Props {
  billing: Billing
  /** Active athletes. */
  active: number
  timeZone: string
}

/** How the club stands, its subscription or the way to one, and its invoices. */
export function BillingView({ billing, active, timeZone }: Props) {
  const words = stateWords(billing, timeZone)
  const { subscription, invoices, sells, state } = billing
  return (
    <div className="flex flex-col gap-8">
      {words && (
        <div className="max-w-2xl">
          <Notice tone={words.tone} title={words.title}>
            <p>{words.sentence}</p>
          </Notice>
        </div>
      )}
      {state === 'granted' && (
        <p className="max-w-prose text-ink-2">
          The club’s seats were given by whoever runs this installation: there is no subscription and nothing
          to pay.
        </p>
      )}
      {subscription && (
        <SubscriptionSheet billing={billing} subscription={subscription} timeZone={timeZone} />
      )}
      {!subscription && sells && <BuySheet active={active} />}
      {invoices.length > 0 && (
        <Sheet title="Invoices" flush>
          <Table
            caption="Invoices, newest first"
            columns={invoiceColumns(timeZone)}
            rows={invoices}
            rowKey={({ id }) => id}
          />
        </Sheet>
      )}
    </div>
  )
}
