import { releaseSeat } from '../../../shared/contracts/seats.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'

export function useReleaseSeat() {
  return useAct(releaseSeat, { refreshes: [seatsKey] })
}
