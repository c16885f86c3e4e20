import { giveSeat } from '../../../shared/contracts/seats.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'

export function useGiveSeat() {
  return useAct(giveSeat, { refreshes: [seatsKey] })
}
