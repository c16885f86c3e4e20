import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, IsoDate } from './fields.ts'
import { Protocol, Test } from './tests.ts'

/** A landing whose peak force is above the club's limit for its protocol, heaviest first. */
export const HighLanding = z.strictObject({
  trialId: Id,
  sessionId: Id,
  sessionTitle: z.string(),
  date: IsoDate,
  athlete: z.strictObject({ id: Id, name: z.string() }),
  test: Test,
  /** Body weights. */
  peak: z.number(),
  U: z.number().nullable(),
  limit: z.number(),
  /** True where a failed check affects the landing: listed, and no flag. */
  unverified: z.boolean(),
})
export type HighLanding = z.infer<typeof HighLanding>

export const listHighLandings = endpoint({
  method: 'GET',
  path: '/api/landing-watch',
  access: ['physio'],
  query: z.strictObject({ days: z.coerce.number().int().min(1).max(1000).default(90) }),
  response: z.strictObject({
    /** Peak in body weights by protocol; a protocol without a limit raises nothing. */
    limits: z.partialRecord(Protocol, z.number()),
    landings: z.array(HighLanding),
  }),
})
