import { publishSession } from '../../../shared/contracts/sessions.ts'
import type { ResponseOf } from '../../../shared/contracts/endpoint.ts'
import { useAct } from '../use-act.ts'
import { sessionKeys } from './session-keys.ts'

export function usePublishSession(onDone: (published: ResponseOf<typeof publishSession>) => void) {
  return useAct(publishSession, { refreshes: [sessionKeys.all], onDone })
}
