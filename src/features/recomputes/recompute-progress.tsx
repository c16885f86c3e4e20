import { useId } from 'react'
import type { Recompute } from '../../../shared/contracts/recomputes.ts'
import { useCancelRecompute } from '../../api/recomputes/cancel-recompute.ts'
import { Button } from '../../components/button.tsx'
import { FormError } from '../../components/form-error.tsx'
import { counted } from '../../lib/counted.ts'
import './recompute-progress.css'

interface Props {
  recompute: Recompute
  mayCancel: boolean
}

/** How far it is. It goes on whether or not anybody looks. */
export function RecomputeProgress({ recompute, mayCancel }: Props) {
  const id = useId()
  const cancel = useCancelRecompute()
  const { dryRun, done, total, state, scopeName } = recompute
  const what = dryRun ? 'Dry run' : 'Recompute'
  return (
    <div className="flex max-w-prose flex-col gap-2">
      <p id={id} className="font-semibold">
        {what} of {scopeName ?? 'the whole club'}
      </p>
      <progress className="recompute-progress" aria-labelledby={id} value={done} max={total} />
      <p>
        {state === 'waiting' ? 'Waiting to begin: ' : ''}
        {done} of {counted(total, 'trial')}. You can leave this page; it goes on.
      </p>
      <FormError error={cancel.error} />
      {mayCancel && (
        <Button
          className="self-start"
          busy={cancel.isPending}
          onClick={() => cancel.mutate({ params: { recomputeId: recompute.id } })}
        >
          Cancel {dryRun ? 'the dry run' : 'the recompute'}
        </Button>
      )}
    </div>
  )
}
