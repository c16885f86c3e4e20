import { resendInvitation } from '../../../shared/contracts/people.ts'
import { useAct } from '../use-act.ts'
import { peopleKey } from './list-people.ts'

export function useResendInvitation() {
  return useAct(resendInvitation, { refreshes: [peopleKey] })
}
