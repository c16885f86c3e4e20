import { Link } from 'react-router-dom'
import type { SeatPlan } from '../../../shared/contracts/seats.ts'
import { useChangeSeatRule } from '../../api/seats/change-seat-rule.ts'
import { Facts } from '../../components/facts.tsx'
import { Tick } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Notice } from '../../components/notice.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { counted } from '../../lib/counted.ts'
import { paths } from '../../lib/paths.ts'

interface SeatsSheetProps {
  plan: SeatPlan
  staff: number
}

/** How many seats there are and who waits, and whether they are given by themselves. */
export function SeatsSheet({ plan, staff }: SeatsSheetProps) {
  const rule = useChangeSeatRule()
  const { paid, used, byItself, version, athletes } = plan
  const count = (wanted: SeatPlan['athletes'][number]['state']) =>
    athletes.filter(({ state }) => state === wanted).length
  const waiting = count('waiting')
  const over = count('over')
  return (
    <Sheet className="max-w-xl">
      <p className="flex flex-wrap items-baseline gap-x-3 pt-2 pb-3">
        <span className="text-figure font-semibold">{used}</span>
        <span className="text-panel text-ink-2">of {counted(paid, 'seat')} used</span>
      </p>
      {over > 0 && (
        <Notice tone="caution">
          <p>
            {counted(over, 'more athlete')} than there are seats. Nothing of theirs is lost; their new trials
            wait in the Tray. Release other seats, or <Link to={paths.billing}>add some</Link>.
          </p>
        </Notice>
      )}
      {waiting > 0 && over === 0 && (
        <Notice tone="plain">
          <p>
            {counted(waiting, 'athlete')} {waiting === 1 ? 'waits' : 'wait'} for a seat, the longest first.{' '}
            <Link to={paths.billing}>Add seats</Link> and they have one at once.
          </p>
        </Notice>
      )}
      <Facts
        facts={[
          ['Seats free', Math.max(0, paid - used)],
          ['Released, free again later', count('cooling')],
          ['Waiting for a seat', waiting],
          ['Staff, without a seat', staff],
        ]}
      />
      <div className="pt-3">
        <FormError error={rule.error} />
        <Tick
          label="Give a seat to whoever is entered or invited as an athlete"
          hint="Where none is free they wait for one. Off: you give each seat by hand."
          checked={byItself}
          disabled={rule.isPending}
          onChange={(event) => rule.mutate({ body: { byItself: event.target.checked, version } })}
        />
      </div>
    </Sheet>
  )
}
