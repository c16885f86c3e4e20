import { changeSeats } from '../../../shared/contracts/billing.ts'
import { seatsKey } from '../clubs/get-seats.ts'
import { useAct } from '../use-act.ts'
import { billingKey } from './get-billing.ts'

export function useChangeSeats() {
  return useAct(changeSeats, { refreshes: [billingKey, seatsKey] })
}
