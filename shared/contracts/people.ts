import { z } from 'zod'
import { endpoint, noContent } from './endpoint.ts'
import { Email, Id, Moment, Name, Version } from './fields.ts'
import { Role, RoleSet } from './roles.ts'

export const Person = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string(),
  roles: z.array(Role),
  active: z.boolean(),
  version: Version,
  athleteId: Id.nullable(),
})
export type Person = z.infer<typeof Person>

export const Invitation = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string(),
  roles: z.array(Role),
  athleteId: Id.nullable(),
  expiresAt: Moment,
  expired: z.boolean(),
  version: Version,
})
export type Invitation = z.infer<typeof Invitation>

export const listPeople = endpoint({
  method: 'GET',
  path: '/api/people',
  access: ['admin'],
  response: z.strictObject({ people: z.array(Person), invitations: z.array(Invitation) }),
})

export const InviteForm = z.strictObject({
  name: Name,
  email: Email,
  roles: RoleSet,
  /** The athlete record that this person is; only with the role athlete. */
  athleteId: Id.nullable(),
})
export const invitePerson = endpoint({
  method: 'POST',
  path: '/api/people/invitations',
  access: ['admin'],
  body: InviteForm,
  response: Invitation,
})
const InvitationParams = z.strictObject({ invitationId: Id })
export const resendInvitation = endpoint({
  method: 'POST',
  path: '/api/people/invitations/:invitationId/resend',
  access: ['admin'],
  params: InvitationParams,
  body: z.strictObject({ version: Version }),
  response: Invitation,
})
export const withdrawInvitation = endpoint({
  method: 'POST',
  path: '/api/people/invitations/:invitationId/withdraw',
  access: ['admin'],
  params: InvitationParams,
  body: z.strictObject({ version: Version }),
  response: noContent,
})
/** Roles and deactivation; the last active admin keeps the role. */
export const changePerson = endpoint({
  method: 'PATCH',
  path: '/api/people/:personId',
  access: ['admin'],
  params: z.strictObject({ personId: Id }),
  body: z.strictObject({
    version: Version,
    roles: RoleSet.optional(),
    active: z.boolean().optional(),
  }),
  response: Person,
})
