import { changeSeatRule } from '../../../shared/contracts/seats.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'

export function useChangeSeatRule() {
  return useAct(changeSeatRule, { refreshes: [seatsKey] })
}
