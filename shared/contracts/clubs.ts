import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Version } from './fields.ts'
import { limits } from './limits.ts'
import { Protocol } from './tests.ts'

const { min: lowest, max: highest } = limits.landingPeakBodyWeights
const limitSentence = `Give a limit of ${lowest} to ${highest} body weights, or leave it empty`
/** Peak landing force, body weights. */
export const LandingPeakLimit = z.number(limitSentence).min(lowest, limitSentence).max(highest, limitSentence)

export const ClubSettings = z.strictObject({
  /** Peak landing force in body weights by protocol; none is set until the club sets one. */
  landingPeakLimits: z.partialRecord(Protocol, LandingPeakLimit),
  version: Version,
})
export type ClubSettings = z.infer<typeof ClubSettings>

export const getClubSettings = endpoint({
  method: 'GET',
  path: '/api/club/settings',
  access: ['admin', 'physio'],
  response: ClubSettings,
})
export const changeClubSettings = endpoint({
  method: 'PATCH',
  path: '/api/club/settings',
  access: ['admin', 'physio'],
  body: ClubSettings,
  response: ClubSettings,
})

/** A seat is an active athlete; staff are free. */
export const getSeats = endpoint({
  method: 'GET',
  path: '/api/club/seats',
  access: ['admin'],
  response: z.strictObject({ used: z.number().int(), paid: z.number().int(), staff: z.number().int() }),
})
