import type { Trial } from '../../../shared/contracts/trials.ts'
import { useChangeTrial } from '../../api/trials/change-trial.ts'
import { useAnnounce } from '../../components/announcer.tsx'

/** What the acts need to know of a trial, on the sheet, in the Tray and on its own page. */
export interface ActedTrial {
  id: string
  version: number
  /** As a person would call it: "trial 2 of Mara Ostrow", "plate_0931.csv". */
  words: string
  athleteId: string | null
}

/*
 * Announcements are made from the mutation itself and not from the call: by then the row or dialog that began the
 * act has often gone from the screen.
 */

/** Takes a set-aside trial back into means, trends and publications. */
export function useTakeBack(trial: Pick<ActedTrial, 'id' | 'words'>) {
  const announce = useAnnounce()
  const change = useChangeTrial(() => announce({ text: `Taken back: ${trial.words}.` }))
  const takeBack = (version: number) =>
    change.mutate({ params: { trialId: trial.id }, body: { version, setAsideReason: null } })
  return { takeBack, busy: change.isPending, error: change.error }
}

/** Sets a trial aside with a reason; can be undone from where it is announced. */
export function useSetAside(trial: ActedTrial, onDone: () => void) {
  const announce = useAnnounce()
  const { takeBack } = useTakeBack(trial)
  const change = useChangeTrial(({ version }) => {
    announce({ text: `Set aside: ${trial.words}.`, undo: () => takeBack(version) })
    onDone()
  })
  const setAside = (reason: string) =>
    change.mutate({ params: { trialId: trial.id }, body: { version: trial.version, setAsideReason: reason } })
  return { setAside, busy: change.isPending, error: change.error }
}

/** Puts a trial on an athlete of the session, or back into the Tray; can be undone from where it is announced. */
export function useMoveTrial(trial: ActedTrial, onDone: () => void = () => {}) {
  const announce = useAnnounce()
  const back = useChangeTrial()
  const params = { trialId: trial.id }
  const change = useChangeTrial((changed: Trial) => {
    announce({
      text: `Moved to ${changed.athlete?.name ?? 'the Tray'}: ${trial.words}.`,
      undo: () => back.mutate({ params, body: { version: changed.version, athleteId: trial.athleteId } }),
    })
    onDone()
  })
  const move = (athleteId: string | null) =>
    change.mutate({ params, body: { version: trial.version, athleteId } })
  return { move, busy: change.isPending, error: change.error }
}
