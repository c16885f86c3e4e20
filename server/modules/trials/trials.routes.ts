import { changeTrial, getSamples, getTrial, moveEvents } from '../../../shared/contracts/trials.ts'
import { handled, implement, type Route } from '../../http/implement.ts'
import * as movedEvents from './moved-events.service.ts'
import * as trials from './trials.service.ts'

export const trialRoutes: Route[] = [
  implement(getTrial, ({ deps, ctx, params }) => trials.getTrial(deps, ctx, params.trialId)),
  implement(getSamples, async ({ deps, ctx, params, res }) => {
    const samples = await trials.getSamples(deps, ctx, params.trialId)
    res.type('application/octet-stream').send(samples)
    return handled
  }),
  implement(changeTrial, ({ deps, ctx, params, body }) => trials.change(deps, ctx, params.trialId, body)),
  implement(moveEvents, ({ deps, ctx, params, body }) => movedEvents.move(deps, ctx, params.trialId, body)),
]
