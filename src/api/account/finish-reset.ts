import { finishReset } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'

export function useFinishReset() {
  return useAct(finishReset, { refreshes: [] })
}
