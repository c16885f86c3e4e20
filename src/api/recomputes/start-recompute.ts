import { startRecompute } from '../../../shared/contracts/recomputes.ts'
import { useAct } from '../use-act.ts'
import { recomputeKeys } from './recompute-keys.ts'

export function useStartRecompute() {
  return useAct(startRecompute, { refreshes: [recomputeKeys.all] })
}
