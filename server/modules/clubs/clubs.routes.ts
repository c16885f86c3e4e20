import { changeClubSettings, getClubSettings, getSeats } from '../../../shared/contracts/clubs.ts'
import { implement, type Route } from '../../http/implement.ts'
import { editSettings, readSeats, readSettings } from './clubs.service.ts'

export const clubRoutes: Route[] = [
  implement(getClubSettings, ({ deps, ctx }) => readSettings(deps, ctx)),
  implement(changeClubSettings, ({ deps, ctx, body }) => editSettings(deps, ctx, body)),
  implement(getSeats, ({ deps, ctx }) => readSeats(deps, ctx)),
]
