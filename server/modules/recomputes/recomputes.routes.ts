import {
  cancelRecompute,
  getRecompute,
  getStanding,
  listRecomputes,
  startRecompute,
} from '../../../shared/contracts/recomputes.ts'
import { implement, type Route } from '../../http/implement.ts'
import { cancel, listRecent, readRecompute, readStanding, start } from './recomputes.service.ts'

export const recomputeRoutes: Route[] = [
  implement(getStanding, ({ deps, ctx, query }) => readStanding(deps, ctx, query)),
  implement(listRecomputes, ({ deps, ctx, query }) => listRecent(deps, ctx, query)),
  implement(getRecompute, ({ deps, ctx, params }) => readRecompute(deps, ctx, params.recomputeId)),
  implement(startRecompute, ({ deps, ctx, body }) => start(deps, ctx, body)),
  implement(cancelRecompute, ({ deps, ctx, params }) => cancel(deps, ctx, params.recomputeId)),
]
