import { changeAthlete, createAthlete, getAthlete, listAthletes } from '../../../shared/contracts/athletes.ts'
import { implement, type Route } from '../../http/implement.ts'
import { addAthlete, editAthlete, listClubAthletes, openAthlete } from './athletes.service.ts'

export const athleteRoutes: Route[] = [
  implement(listAthletes, ({ deps, ctx }) => listClubAthletes(deps, ctx)),
  implement(getAthlete, ({ deps, ctx, params }) => openAthlete(deps, ctx, params.athleteId)),
  implement(createAthlete, ({ deps, ctx, body }) => addAthlete(deps, ctx, body)),
  implement(changeAthlete, ({ deps, ctx, params, body }) => editAthlete(deps, ctx, params.athleteId, body)),
]
