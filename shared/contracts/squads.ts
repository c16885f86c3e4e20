import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, Name, Version } from './fields.ts'
import { staffRoles } from './roles.ts'

export const Squad = z.strictObject({
  id: Id,
  name: z.string(),
  athleteIds: z.array(Id),
  archived: z.boolean(),
  version: Version,
})
export type Squad = z.infer<typeof Squad>

export const listSquads = endpoint({
  method: 'GET',
  path: '/api/squads',
  access: staffRoles,
  response: z.strictObject({ squads: z.array(Squad) }),
})
export const createSquad = endpoint({
  method: 'POST',
  path: '/api/squads',
  access: ['coach', 'admin'],
  body: z.strictObject({ name: Name, athleteIds: z.array(Id) }),
  response: Squad,
})
export const changeSquad = endpoint({
  method: 'PATCH',
  path: '/api/squads/:squadId',
  access: ['coach', 'admin'],
  params: z.strictObject({ squadId: Id }),
  body: z.strictObject({
    version: Version,
    name: Name.optional(),
    athleteIds: z.array(Id).optional(),
    archived: z.boolean().optional(),
  }),
  response: Squad,
})
