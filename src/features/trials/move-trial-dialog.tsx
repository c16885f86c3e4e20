import { useState } from 'react'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { SelectField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { useMoveTrial, type ActedTrial } from './use-trial-acts.ts'

export interface AthleteChoice {
  athleteId: string
  name: string
}

interface Props {
  trial: ActedTrial
  /** Of the session. */
  athletes: readonly AthleteChoice[]
  onClose: () => void
}

/** Puts a trial on another athlete of the session, or into the Tray. */
export function MoveTrialDialog({ trial, athletes, onClose }: Props) {
  const [chosen, setChosen] = useState(trial.athleteId ?? '')
  const { move, busy, error } = useMoveTrial(trial, onClose)
  const unchanged = chosen === (trial.athleteId ?? '')
  return (
    <Dialog title={`Move ${trial.words}`} onClose={onClose}>
      <form
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          if (unchanged) onClose()
          else move(chosen === '' ? null : chosen)
        }}
      >
        <SelectField
          label="Athlete"
          hint="Whoever was on the plates. Only athletes of this session can be chosen."
          value={chosen}
          onChange={(event) => setChosen(event.target.value)}
        >
          <option value="">Nobody yet: the Tray</option>
          {athletes.map((athlete) => (
            <option key={athlete.athleteId} value={athlete.athleteId}>
              {athlete.name}
            </option>
          ))}
        </SelectField>
        <FormError error={error} />
        <div className="flex flex-wrap gap-3">
          <Button look="main" type="submit" busy={busy}>
            Move
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  )
}
