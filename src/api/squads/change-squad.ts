import { changeSquad } from '../../../shared/contracts/squads.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { useAct } from '../use-act.ts'
import { squadKeys } from './squad-keys.ts'

/** Membership shows on athletes, the name on sessions. */
export function useChangeSquad() {
  return useAct(changeSquad, { refreshes: [squadKeys.all, athleteKeys.all, sessionKeys.all] })
}
