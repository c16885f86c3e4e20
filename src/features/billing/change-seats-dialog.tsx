import { useState } from 'react'
import { SeatCount, type Billing } from '../../../shared/contracts/billing.ts'
import { useChangeSeats } from '../../api/billing/change-seats.ts'
import { useSeatPreview } from '../../api/billing/preview-seats.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { counted } from '../../lib/counted.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { showMoney } from '../../lib/show-money.ts'

interface Props {
  version: number
  subscription: NonNullable<Billing['subscription']>
  timeZone: string
  onClose: () => void
}

/** More seats now, for the amount that the payment service names; fewer from the next period on. */
export function ChangeSeatsDialog({ version, subscription, timeZone, onClose }: Props) {
  const [text, setText] = useState(String(subscription.nextSeats ?? subscription.seats))
  const parsed = SeatCount.safeParse(text.trim() === '' ? Number.NaN : Number(text))
  const seats = parsed.success ? parsed.data : null
  const more = seats !== null && seats > subscription.seats
  const preview = useSeatPreview(seats ?? 0, more)
  const change = useChangeSeats()
  const announce = useAnnounce()
  const { seats: now, nextSeats, periodEnd } = subscription
  const until = formatMoment(periodEnd, timeZone)
  const unchanged = seats === (nextSeats ?? now)
  const shown = more && preview.data?.seats === seats ? preview.data : null

  const save = () => {
    if (seats === null) return
    change.mutate(
      { body: { version, seats, at: shown?.at ?? null } },
      {
        onSuccess: () => {
          announce({
            text:
              seats < now
                ? `${counted(seats, 'seat')} from ${until} on.`
                : `The club has ${counted(seats, 'seat')}.`,
          })
          onClose()
        },
      },
    )
  }

  return (
    <Dialog title="Change the seats" onClose={onClose} dirty={!unchanged && !change.isSuccess}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          save()
        }}
      >
        <TextField
          label="Seats"
          hint={`The club has ${counted(now, 'seat')} now.`}
          inputMode="numeric"
          autoComplete="off"
          className="max-w-60"
          error={parsed.success ? undefined : parsed.error.issues[0]?.message}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
        <p aria-live="polite">{whatFollows()}</p>
        <FormError error={change.error ?? (more ? preview.error : null)} />
        <Button
          type="submit"
          look="main"
          className="self-start"
          busy={change.isPending}
          disabled={seats === null || unchanged || (more && shown === null)}
        >
          {actWords()}
        </Button>
      </form>
    </Dialog>
  )

  function whatFollows(): string {
    if (seats === null || unchanged) return 'Give the number of seats that the club needs.'
    if (seats < now)
      return `${counted(now, 'seat')} until ${until}, ${seats} after that. Nothing is paid back.`
    if (seats === now)
      return `The change to ${nextSeats} is taken back: the club keeps ${counted(now, 'seat')}.`
    if (shown === null) return 'Asking the payment service what is due …'
    return `${showMoney(shown.due)} is due now, for the rest of the period until ${until}. The card on file is charged.`
  }

  function actWords(): string {
    if (shown !== null) return `Pay ${showMoney(shown.due)} and add ${counted((seats ?? now) - now, 'seat')}`
    if (seats !== null && seats < now) return `Have ${counted(seats, 'seat')} from then on`
    return 'Change the seats'
  }
}
