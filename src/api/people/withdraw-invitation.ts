import { withdrawInvitation } from '../../../shared/contracts/people.ts'
import { useAct } from '../use-act.ts'
import { peopleKey } from './list-people.ts'

export function useWithdrawInvitation() {
  return useAct(withdrawInvitation, { refreshes: [peopleKey] })
}
