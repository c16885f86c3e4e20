import { requestReset } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'

export function useRequestReset() {
  return useAct(requestReset, { refreshes: [] })
}
