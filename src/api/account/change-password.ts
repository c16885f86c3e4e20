import { changePassword } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'

export function useChangePassword() {
  return useAct(changePassword, { refreshes: [] })
}
