import { createAthlete } from '../../../shared/contracts/athletes.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { squadKeys } from '../squads/squad-keys.ts'
import { useAct } from '../use-act.ts'
import { athleteKeys } from './athlete-keys.ts'

/** A new athlete takes a seat and may stand in squads. */
export function useCreateAthlete() {
  return useAct(createAthlete, { refreshes: [athleteKeys.all, squadKeys.all, seatsKey] })
}
