import { z } from 'zod'
import { Id } from './fields.ts'

/** GET /api/events: a stream of these as server-sent events, ids only; the client refetches what they name. */
export const ClubEvent = z.strictObject({ kind: z.enum(['session', 'athletes']), id: Id.nullable() })
export type ClubEvent = z.infer<typeof ClubEvent>
