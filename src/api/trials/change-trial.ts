import { changeTrial, type Trial } from '../../../shared/contracts/trials.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { landingWatchKeys } from '../landing-watch/landing-watch-keys.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { useAct } from '../use-act.ts'
import { trialKeys } from './trial-keys.ts'

/** Moves a trial to an athlete or the Tray, sets it aside, or takes it back; all that counts trials is read again. */
export function useChangeTrial(onDone?: (trial: Trial) => void) {
  return useAct(changeTrial, {
    refreshes: [trialKeys.all, sessionKeys.all, athleteKeys.all, landingWatchKeys.all],
    ...(onDone ? { onDone } : {}),
  })
}
