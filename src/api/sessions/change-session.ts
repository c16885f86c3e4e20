import { changeSession } from '../../../shared/contracts/sessions.ts'
import { useAct } from '../use-act.ts'
import { sessionKeys } from './session-keys.ts'

/** Date, title, place or note of a session. */
export function useChangeSession(onDone: () => void) {
  return useAct(changeSession, { refreshes: [sessionKeys.all], onDone })
}
