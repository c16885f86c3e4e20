import {
  changePerson,
  invitePerson,
  listPeople,
  resendInvitation,
  withdrawInvitation,
} from '../../../shared/contracts/people.ts'
import { implement, type Route } from '../../http/implement.ts'
import { invite, resend, withdraw } from './invitations.service.ts'
import { changeMember, listClubPeople } from './people.service.ts'

export const peopleRoutes: Route[] = [
  implement(listPeople, ({ deps, ctx }) => listClubPeople(deps, ctx)),
  implement(invitePerson, ({ deps, ctx, body }) => invite(deps, ctx, body)),
  implement(resendInvitation, ({ deps, ctx, params, body }) =>
    resend(deps, ctx, params.invitationId, body.version),
  ),
  implement(withdrawInvitation, ({ deps, ctx, params, body }) =>
    withdraw(deps, ctx, params.invitationId, body.version),
  ),
  implement(changePerson, ({ deps, ctx, params, body }) => changeMember(deps, ctx, params.personId, body)),
]
