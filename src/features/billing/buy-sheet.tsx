import { useState } from 'react'
import { SeatCount, type Interval } from '../../../shared/contracts/billing.ts'
import { usePlans } from '../../api/billing/list-plans.ts'
import { useStartCheckout } from '../../api/billing/start-checkout.ts'
import { Button } from '../../components/button.tsx'
import { FieldGroup, TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { counted } from '../../lib/counted.ts'
import { showMoney } from '../../lib/show-money.ts'
import { intervalWords, perInterval } from './billing-words.ts'

/** The first purchase, or a new one: how many seats, by the month or the year, then the payment service's own page. */
export function BuySheet({ active }: { active: number }) {
  const plans = usePlans()
  const checkout = useStartCheckout()
  const [typed, setTyped] = useState<string | null>(null)
  const [interval, setInterval] = useState<Interval>('month')
  const [tried, setTried] = useState(false)
  // As many as the club needs now, until somebody says otherwise; they may be counted after this is shown.
  const text = typed ?? (active > 0 ? String(active) : '')
  const parsed = SeatCount.safeParse(text.trim() === '' ? Number.NaN : Number(text))

  const buy = () => {
    setTried(true)
    if (parsed.success) checkout.mutate({ body: { interval, seats: parsed.data } })
  }

  return (
    <Sheet title="Buy seats" className="max-w-2xl">
      <QueryState query={plans} what="the prices">
        {({ plans: offered }) => (
          <form
            noValidate
            className="flex flex-col gap-4"
            onSubmit={(event) => {
              event.preventDefault()
              buy()
            }}
          >
            <FormError error={checkout.error} />
            <TextField
              label="Seats"
              hint={`One for each active athlete: the club has ${counted(active, 'active athlete')} now.`}
              inputMode="numeric"
              autoComplete="off"
              className="max-w-72"
              error={tried && !parsed.success ? parsed.error.issues[0]?.message : undefined}
              value={text}
              onChange={(event) => setTyped(event.target.value)}
            />
            <FieldGroup label="Paid">
              {offered.map((plan) => (
                <label key={plan.interval} className="flex items-center gap-2">
                  <input
                    type="radio"
                    name="interval"
                    className="tick"
                    checked={interval === plan.interval}
                    onChange={() => setInterval(plan.interval)}
                  />
                  {intervalWords[plan.interval]}: {showMoney(plan.seat)} {perInterval[plan.interval]} for each
                  seat
                </label>
              ))}
            </FieldGroup>
            <p className="max-w-prose text-ink-2">
              The payment service asks for the card, and takes a promotion code and a tax id. Nothing is
              charged before you confirm there.
            </p>
            <Button type="submit" look="main" className="self-start" busy={checkout.isPending}>
              Go on to payment
            </Button>
          </form>
        )}
      </QueryState>
    </Sheet>
  )
}
