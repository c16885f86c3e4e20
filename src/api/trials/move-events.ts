import { moveEvents, type Trial } from '../../../shared/contracts/trials.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { landingWatchKeys } from '../landing-watch/landing-watch-keys.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { useAct } from '../use-act.ts'
import { trialKeys } from './trial-keys.ts'

/** Moves events of a trial, or puts them back; it is then analysed anew. */
export function useMoveEvents(onDone?: (trial: Trial) => void) {
  return useAct(moveEvents, {
    refreshes: [trialKeys.all, sessionKeys.all, athleteKeys.all, landingWatchKeys.all],
    ...(onDone ? { onDone } : {}),
  })
}
