import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id } from './fields.ts'

/** GET /api/events: a stream of these as server-sent events, ids only; the client refetches what they name. */
export const ClubEvent = z.strictObject({
  kind: z.enum(['session', 'athletes', 'recomputes']),
  id: Id.nullable(),
})
export type ClubEvent = z.infer<typeof ClubEvent>

/** The stream itself; it ends now and then, and the browser asks anew. */
export const getEvents = endpoint({
  method: 'GET',
  path: '/api/events',
  access: 'signed-in',
  response: z.unknown(),
})
