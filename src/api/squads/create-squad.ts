import { createSquad } from '../../../shared/contracts/squads.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { useAct } from '../use-act.ts'
import { squadKeys } from './squad-keys.ts'

export function useCreateSquad() {
  return useAct(createSquad, { refreshes: [squadKeys.all, athleteKeys.all] })
}
