import { createSession, type SessionSummary } from '../../../shared/contracts/sessions.ts'
import { useAct } from '../use-act.ts'
import { sessionKeys } from './session-keys.ts'

export function useCreateSession(onDone: (session: SessionSummary) => void) {
  return useAct(createSession, { refreshes: [sessionKeys.lists], onDone })
}
