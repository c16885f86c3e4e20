import { invitePerson } from '../../../shared/contracts/people.ts'
import { useAct } from '../use-act.ts'
import { peopleKey } from './list-people.ts'

export function useInvitePerson() {
  return useAct(invitePerson, { refreshes: [peopleKey] })
}
