import { useState } from 'react'
import { MoveReason } from '../../../../shared/contracts/moved-events.ts'
import { limits } from '../../../../shared/contracts/limits.ts'
import { Trial } from '../../../../shared/contracts/trials.ts'
import { isApiError } from '../../../api/api-error.ts'
import { useMoveEvents } from '../../../api/trials/move-events.ts'
import { useAnnounce } from '../../../components/announcer.tsx'
import { Button } from '../../../components/button.tsx'
import { Dialog } from '../../../components/dialog.tsx'
import { TextField } from '../../../components/field.tsx'
import { FormError } from '../../../components/form-error.tsx'
import { StaleNotice } from '../../../components/stale-notice.tsx'
import { newerRow } from '../../../lib/newer-row.ts'
import { movedWords, moveLines } from '../moved-words.ts'
import type { Draft } from './use-draft.ts'

/** What is most often seen; each may be changed before it is used. */
const readyReasons = [
  'The feet left one after the other',
  'Shifted the weight before the movement',
  'The plate was bumped',
  'Noise was taken for the event',
]

interface Props {
  /** As it stood when the moving began. */
  trial: Trial
  draft: Draft
  onClose: () => void
  onSaved: () => void
}

/** Asks why events were moved, and saves. */
export function SaveMovesDialog({ trial, draft, onClose, onSaved }: Props) {
  const [reason, setReason] = useState('')
  const [refused, setRefused] = useState<string | undefined>()
  const { save, busy, error, newer } = useSaveMoves(trial, draft, onSaved)
  const allBack = Object.keys(draft.draft).length === 0
  const submit = (form: HTMLFormElement) => {
    const parsed = MoveReason.safeParse(reason)
    if (!parsed.success && !(allBack && reason.trim() === '')) {
      form.querySelector('input')?.focus()
      return setRefused(parsed.error.issues[0]?.message)
    }
    save(parsed.data ?? null)
  }
  return (
    <Dialog title="Save the moved events" onClose={onClose} dirty={reason !== ''}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          submit(event.currentTarget)
        }}
      >
        <ul className="list-disc ps-5">
          {changeLines(draft).map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
        <div role="group" aria-label="Ready reasons" className="flex flex-wrap gap-2">
          {readyReasons.map((ready) => (
            <Button key={ready} aria-pressed={reason === ready} onClick={() => setReason(ready)}>
              {ready}
            </Button>
          ))}
        </div>
        <TextField
          label={allBack ? 'Reason, if there is one' : 'Reason'}
          hint="It stands with the trial, with your name and the time."
          value={reason}
          maxLength={limits.reasonCharacters}
          error={refused}
          onChange={(event) => setReason(event.target.value)}
        />
        <StaleNotice
          opened={trial}
          newer={newer}
          fields={[
            { label: 'Moved events', show: ({ eventMoves }) => movedWords(eventMoves[0]?.events ?? {}) },
          ]}
          busy={busy}
          onTakeTheirs={onSaved}
        />
        {newer === null && <FormError error={error} />}
        <div className="flex flex-wrap gap-3">
          <Button look="main" type="submit" busy={busy}>
            Save
          </Button>
          <Button onClick={onClose}>Go on moving</Button>
        </div>
      </form>
    </Dialog>
  )
}

/** Saves over the trial as it was opened, or over the newer one that the person has been shown since. */
function useSaveMoves(trial: Trial, { draft }: Draft, onSaved: () => void) {
  const announce = useAnnounce()
  const act = useMoveEvents(() => {
    announce({ text: 'Saved. The figures are being computed anew.' })
    onSaved()
  })
  const newer = isApiError(act.error, 'stale-version') ? newerRow(act.error, Trial) : null
  const engineVersion = trial.engineInputs?.engineVersion ?? ''
  const save = (reason: string | null) =>
    act.mutate({
      params: { trialId: trial.id },
      body: { version: (newer ?? trial).version, engineVersion, events: draft, reason },
    })
  return { save, busy: act.isPending, error: act.error, newer }
}

/** Each change in words: from where it stands saved to where it stands now. */
export function changeLines({ changed, draft, saved, stood }: Draft): string[] {
  const from = Object.fromEntries(changed.map((name) => [name, saved[name] ?? stood[name] ?? null]))
  return moveLines({ events: draft, stood: from })
}
