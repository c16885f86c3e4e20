import { cancelRecompute } from '../../../shared/contracts/recomputes.ts'
import { useAct } from '../use-act.ts'
import { recomputeKeys } from './recompute-keys.ts'

export function useCancelRecompute() {
  return useAct(cancelRecompute, { refreshes: [recomputeKeys.all] })
}
