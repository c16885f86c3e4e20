import { useState } from 'react'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { useSession } from '../../api/sessions/get-session.ts'
import { trialCsvAddress } from '../../api/downloads/download-addresses.ts'
import { originalAddress } from '../../api/uploads/original-address.ts'
import { Button, ButtonLink } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { pathOf } from '../../lib/paths.ts'
import { MoveTrialDialog } from './move-trial-dialog.tsx'
import { SetAsideDialog } from './set-aside-dialog.tsx'
import { useTakeBack, type ActedTrial } from './use-trial-acts.ts'

/** What may be done to a trial from its page. */
export function TrialActs({ trial, onMove }: { trial: Trial; onMove: (() => void) | null }) {
  const [open, setOpen] = useState<'set-aside' | 'move' | null>(null)
  const acted: ActedTrial = {
    id: trial.id,
    version: trial.version,
    athleteId: trial.athlete?.id ?? null,
    words: trialWords(trial),
  }
  const { takeBack, busy } = useTakeBack(acted)
  const close = () => setOpen(null)
  return (
    <>
      {trial.previousTrialId && <ButtonLink to={pathOf.trial(trial.previousTrialId)}>Previous</ButtonLink>}
      {trial.nextTrialId && <ButtonLink to={pathOf.trial(trial.nextTrialId)}>Next</ButtonLink>}
      <a className="button" href={originalAddress(trial.uploadId)} download>
        Download original
      </a>
      <a className="button" href={trialCsvAddress(trial.id)} download>
        Download samples
      </a>
      {onMove && <Button onClick={onMove}>Move an event</Button>}
      <Button onClick={() => setOpen('move')}>Move to athlete</Button>
      {trial.setAside ? (
        <Button look="main" busy={busy} onClick={() => takeBack(trial.version)}>
          Take back
        </Button>
      ) : (
        <Button onClick={() => setOpen('set-aside')}>Set aside</Button>
      )}
      {open === 'set-aside' && <SetAsideDialog trial={acted} onClose={close} />}
      {open === 'move' && <MoveFromPage trial={acted} sessionId={trial.sessionId} onClose={close} />}
    </>
  )
}

interface MoveFromPageProps {
  trial: ActedTrial
  sessionId: string
  onClose: () => void
}

/** The athletes to choose from are those of the trial's session. */
function MoveFromPage({ trial, sessionId, onClose }: MoveFromPageProps) {
  const session = useSession(sessionId)
  if (session.data)
    return <MoveTrialDialog trial={trial} athletes={session.data.athletes} onClose={onClose} />
  return (
    <Dialog title={`Move ${trial.words}`} onClose={onClose}>
      <QueryState query={session} what="the session’s athletes">
        {() => null}
      </QueryState>
    </Dialog>
  )
}

/** "trial 2 of Mara Ostrow", or the file's name while it is nobody's. */
function trialWords({ athlete, placeInSession, fileName }: Trial): string {
  if (athlete && placeInSession) return `trial ${placeInSession.n} of ${athlete.name}`
  return fileName ?? 'this trial'
}
