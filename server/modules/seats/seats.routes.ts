import { changeSeatRule, getSeatPlan, giveSeat, releaseSeat } from '../../../shared/contracts/seats.ts'
import { implement, type Route } from '../../http/implement.ts'
import { give, readSeatPlan, release, setRule } from './seat-plan.service.ts'

export const seatRoutes: Route[] = [
  implement(getSeatPlan, ({ deps, ctx }) => readSeatPlan(deps, ctx)),
  implement(giveSeat, ({ deps, ctx, body }) => give(deps, ctx, body.athleteId)),
  implement(releaseSeat, ({ deps, ctx, body }) => release(deps, ctx, body.athleteId)),
  implement(changeSeatRule, ({ deps, ctx, body }) => setRule(deps, ctx, body)),
]
