import { useState } from 'react'
import { changeTrial } from '../../../shared/contracts/trials.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { useSetAside, type ActedTrial } from './use-trial-acts.ts'

/** What coaches most often see wrong with a trial; each may be changed before it is used. */
const readyReasons = [
  'Moved while being weighed',
  'Stepped off on landing',
  'Arms left the hips',
  'Practice trial',
  'Two people on the plates',
  'Plate was bumped or not zeroed',
]

export function SetAsideDialog({ trial, onClose }: { trial: ActedTrial; onClose: () => void }) {
  const [reason, setReason] = useState('')
  const [refused, setRefused] = useState<string | undefined>()
  const { setAside, busy, error } = useSetAside(trial, onClose)
  const submit = (form: HTMLFormElement) => {
    const parsed = changeTrial.body.shape.setAsideReason.safeParse(reason)
    if (!parsed.success) {
      form.querySelector('input')?.focus()
      return setRefused(parsed.error.issues[0]?.message)
    }
    setAside(parsed.data ?? '')
  }
  return (
    <Dialog title={`Set aside ${trial.words}`} onClose={onClose} dirty={reason !== ''}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          submit(event.currentTarget)
        }}
      >
        <p>
          It stays here with its reason, and out of means, trends and what athletes see. It can be taken back.
        </p>
        <div role="group" aria-label="Ready reasons" className="flex flex-wrap gap-2">
          {readyReasons.map((ready) => (
            <Button key={ready} aria-pressed={reason === ready} onClick={() => setReason(ready)}>
              {ready}
            </Button>
          ))}
        </div>
        <TextField
          label="Reason"
          value={reason}
          maxLength={limits.reasonCharacters}
          error={refused}
          onChange={(event) => setReason(event.target.value)}
        />
        <FormError error={error} />
        <div className="flex flex-wrap gap-3">
          <Button look="main" type="submit" busy={busy}>
            Set aside
          </Button>
          <Button onClick={onClose}>Leave it in</Button>
        </div>
      </form>
    </Dialog>
  )
}
