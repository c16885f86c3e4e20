import { listHighLandings } from '../../../shared/contracts/landing-watch.ts'
import { implement, type Route } from '../../http/implement.ts'
import { highLandings } from './landing-watch.service.ts'

export const landingWatchRoutes: Route[] = [
  implement(listHighLandings, ({ deps, ctx, query }) => highLandings(deps, ctx, query.days)),
]
