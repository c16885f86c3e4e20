import { changeSquad, createSquad, listSquads } from '../../../shared/contracts/squads.ts'
import { implement, type Route } from '../../http/implement.ts'
import { addSquad, editSquad, listClubSquads } from './squads.service.ts'

export const squadRoutes: Route[] = [
  implement(listSquads, ({ deps, ctx }) => listClubSquads(deps, ctx)),
  implement(createSquad, ({ deps, ctx, body }) => addSquad(deps, ctx, body)),
  implement(changeSquad, ({ deps, ctx, params, body }) => editSquad(deps, ctx, params.squadId, body)),
]
