import { changeAthlete } from '../../../shared/contracts/athletes.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { squadKeys } from '../squads/squad-keys.ts'
import { useAct } from '../use-act.ts'
import { athleteKeys } from './athlete-keys.ts'

/** A change of name or squads shows on sheets and squads too; archiving frees a seat. */
export function useChangeAthlete() {
  return useAct(changeAthlete, { refreshes: [athleteKeys.all, squadKeys.all, sessionKeys.all, seatsKey] })
}
