import { acceptInvitation } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'

/** The answer says who is signed in now. */
export function useAcceptInvitation() {
  return useAct(acceptInvitation, { refreshes: [] })
}
