import { changePerson } from '../../../shared/contracts/people.ts'
import { meKey } from '../account/get-me.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'
import { peopleKey } from './list-people.ts'

/** Roles and deactivation: an admin may change their own roles, and an athlete's link shows on the roster. */
export function useChangePerson() {
  return useAct(changePerson, { refreshes: [peopleKey, meKey, seatsKey, athleteKeys.all] })
}
