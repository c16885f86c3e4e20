import { getMyResults } from '../../../shared/contracts/results.ts'
import { implement, type Route } from '../../http/implement.ts'
import { myResults } from './results.service.ts'

export const resultRoutes: Route[] = [implement(getMyResults, ({ deps, ctx }) => myResults(deps, ctx))]
