import type { Trial } from '../../../shared/contracts/trials.ts'
import { useMoveEvents } from '../../api/trials/move-events.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { ConfirmDialog } from '../../components/confirm-dialog.tsx'
import { movedWords } from './moved-words.ts'

interface Props {
  trial: Trial
  onClose: () => void
}

/** Puts every moved event back to where the engine finds it. */
export function BackToAutomaticDialog({ trial, onClose }: Props) {
  const announce = useAnnounce()
  const act = useMoveEvents(() => {
    announce({ text: 'All events are back to automatic.' })
    onClose()
  })
  const { engineInputs, eventMoves, version } = trial
  if (!engineInputs) return null
  const { engineVersion } = engineInputs
  const putBack = () =>
    act.mutate({ params: { trialId: trial.id }, body: { version, engineVersion, events: {}, reason: null } })
  return (
    <ConfirmDialog
      title="Put all events back to automatic?"
      act="Put them back"
      onConfirm={putBack}
      onClose={onClose}
      busy={act.isPending}
      error={act.error}
    >
      <p>
        Moved now: {movedWords(eventMoves[0]?.events ?? {})}. The engine places them again and the figures
        follow. What was moved, by whom and why stays in the trial’s history.
      </p>
    </ConfirmDialog>
  )
}
