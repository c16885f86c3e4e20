import { listAnalyses } from '../../../shared/contracts/analyses.ts'
import { implement, type Route } from '../../http/implement.ts'
import { listEditions } from './editions.service.ts'

export const analysisRoutes: Route[] = [
  implement(listAnalyses, ({ deps, ctx, params }) => listEditions(deps, ctx, params.trialId)),
]
