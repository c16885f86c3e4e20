import { signIn } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'

/** The answer says who is signed in; the caller decides what that means for what is cached. */
export function useSignIn() {
  return useAct(signIn, { refreshes: [] })
}
